import type { EditionFile } from './edition';
import { splitCsvLine } from './csvline';

/** One way in which an edition is not what its recipe and sources give. */
export interface Difference {
  readonly file: string;
  readonly kind: 'missing' | 'unexpected' | 'differs';
  /** 1-based first line that differs. */
  readonly line?: number;
  /** In a table: the first column that differs in that line, and the key of its object. */
  readonly column?: string;
  readonly row?: string;
  /** What the edition holds and what was rebuilt, shortened. */
  readonly found?: string;
  readonly rebuilt?: string;
}

const LONGEST = 120;

/**
 * Compares the files of an edition with the rebuilt ones, byte by byte as text; SHA256SUMS is left to the hashes. Empty
 * when nothing differs; otherwise one entry per file with the first place where it does.
 */
export function compareFiles(found: ReadonlyMap<string, string>, rebuilt: readonly EditionFile[]): Difference[] {
  const expected = new Set(rebuilt.map(({ name }) => name));
  const differing = rebuilt.flatMap((file): Difference[] => {
    const old = found.get(file.name);
    if (old === undefined) return [{ file: file.name, kind: 'missing' }];
    const { text } = file;
    return old === text ? [] : [firstDifference(file.name, old, text)];
  });
  const unexpected = [...found.keys()].filter((name) => name !== 'SHA256SUMS' && !expected.has(name));
  return [...differing, ...unexpected.map((file): Difference => ({ file, kind: 'unexpected' }))];
}

function firstDifference(file: string, old: string, text: string): Difference {
  let at = 0;
  while (at < old.length && at < text.length && old.charCodeAt(at) === text.charCodeAt(at)) at++;
  const start = old.lastIndexOf('\n', at - 1) + 1;
  const line = countLines(old, start) + 1;
  const [oldLine, newLine] = [lineAt(old, start), lineAt(text, start)];
  const cell = /\.e?csv$/.test(file) ? firstCell(header(old), oldLine, newLine) : undefined;
  return { file, kind: 'differs', line, ...(cell ?? { found: shown(oldLine), rebuilt: shown(newLine) }) };
}

/** The first cell that differs, when both lines are whole rows of the table. */
function firstCell(
  columns: readonly string[],
  oldLine: string | undefined,
  newLine: string | undefined,
): Pick<Difference, 'column' | 'row' | 'found' | 'rebuilt'> | undefined {
  if (oldLine === undefined || newLine === undefined || oldLine.startsWith('#')) return undefined;
  const [oldCells, newCells] = [splitCsvLine(oldLine), splitCsvLine(newLine)];
  if (oldCells?.length !== columns.length || newCells?.length !== columns.length) return undefined;
  const at = oldCells.findIndex((cell, index) => cell !== newCells[index]);
  if (at < 0) return undefined;
  return { column: columns[at]!, row: oldCells[0]!, found: shown(oldCells[at]), rebuilt: shown(newCells[at]) };
}

function header(text: string): string[] {
  let start = 0;
  while (text.startsWith('#', start)) {
    const end = text.indexOf('\n', start);
    if (end < 0) return [];
    start = end + 1;
  }
  return splitCsvLine(lineAt(text, start) ?? '') ?? [];
}

function lineAt(text: string, start: number): string | undefined {
  if (start >= text.length) return undefined;
  const end = text.indexOf('\n', start);
  return text.slice(start, end < 0 ? text.length : end);
}

function countLines(text: string, end: number): number {
  let lines = 0;
  for (let at = text.indexOf('\n'); at >= 0 && at < end; at = text.indexOf('\n', at + 1)) lines++;
  return lines;
}

function shown(text: string | undefined): string {
  if (text === undefined) return 'the end of the file';
  return text.length > LONGEST ? `${text.slice(0, LONGEST)}…` : text;
}
