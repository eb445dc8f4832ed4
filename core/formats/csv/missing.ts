const USUAL = new Set(['', 'nan', 'null', 'none', 'na', 'n/a', '-', '--', '---', '...', '…']);
const LONGEST = 4;

/** Tells which cells mean "missing": the usual spellings in any case, and those that the user named. */
export interface MissingTest {
  text(cell: string): boolean;
  /** For cells that read as a number; −99.9 also stands for −99.90. */
  number(value: number): boolean;
  /** Whether a cell of that many bytes can be one of the spellings. */
  possible(bytes: number): boolean;
}

/** See MissingTest. */
export function missingTest(named: readonly string[] = []): MissingTest {
  const words = new Set(named.map((word) => word.trim()));
  const numbers = new Set(
    named.filter((word) => word.trim() !== '' && Number.isFinite(Number(word))).map((word) => Number(word)),
  );
  const longest = Math.max(LONGEST, ...[...words].map((word) => 4 * word.length));
  return {
    text: (cell) => words.has(cell) || (cell.length <= LONGEST && USUAL.has(cell.toLowerCase())),
    number: (value) => numbers.size > 0 && numbers.has(value),
    possible: (bytes) => bytes <= longest,
  };
}
