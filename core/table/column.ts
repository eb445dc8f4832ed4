/** A column of numbers. NaN is the one spelling of "missing". */
export interface NumberColumn {
  readonly type: 'number';
  readonly name: string;
  readonly values: Float64Array;
  /** Unit string as the file or the user gave it; undefined when none is known. */
  readonly unit?: string | undefined;
  readonly description?: string | undefined;
}

/** A column of words, dictionary-coded: `codes[row]` indexes `dictionary`, −1 is missing. */
export interface TextColumn {
  readonly type: 'text';
  readonly name: string;
  readonly codes: Int32Array;
  readonly dictionary: readonly string[];
  readonly unit?: string | undefined;
  readonly description?: string | undefined;
}

export type Column = NumberColumn | TextColumn;

/** Cell text of a column: the shortest text that reads back to the same number, '' when missing. */
export function cellText(column: Column, row: number): string {
  if (column.type === 'number') return numberText(column.values[row]!);
  const code = column.codes[row]!;
  return code < 0 ? '' : column.dictionary[code]!;
}

/** Shortest decimal text that reads back to the same double; '' for NaN, sign of zero kept. */
export function numberText(value: number): string {
  if (Number.isNaN(value)) return '';
  if (Object.is(value, -0)) return '-0';
  return String(value);
}

/** Builds a dictionary-coded column; undefined and '' are missing. */
export function textColumn(
  name: string,
  cells: readonly (string | undefined)[],
  about: { unit?: string; description?: string } = {},
): TextColumn {
  const codes = new Int32Array(cells.length);
  const dictionary: string[] = [];
  const codeOf = new Map<string, number>();
  cells.forEach((cell, row) => {
    if (cell === undefined || cell === '') {
      codes[row] = -1;
      return;
    }
    let code = codeOf.get(cell);
    if (code === undefined) {
      code = dictionary.push(cell) - 1;
      codeOf.set(cell, code);
    }
    codes[row] = code;
  });
  return { type: 'text', name, codes, dictionary, ...about };
}

/** Wraps values as a number column without copying. */
export function numberColumn(
  name: string,
  values: Float64Array,
  about: { unit?: string; description?: string } = {},
): NumberColumn {
  return { type: 'number', name, values, ...about };
}
