/** Gives a column of so many numbers, whose content is arbitrary: whoever asks writes every row. */
export type MakeColumn = (rows: number) => Float64Array;

/** A column of its own. */
export const freshColumn: MakeColumn = (rows) => new Float64Array(rows);

/** Columns that are lent again and again, for tables that are gone through block by block. */
export interface ColumnPool {
  readonly make: MakeColumn;
  /** Takes every column back: what was derived before must no longer be read. */
  reset(): void;
}

/** A pool that lends its columns in the same order every time; memory that is new costs more than what is written to it. */
export function columnPool(): ColumnPool {
  const columns: Float64Array[] = [];
  let lent = 0;
  return {
    make(rows) {
      const at = lent++;
      if (columns[at] === undefined || columns[at].length < rows) columns[at] = new Float64Array(rows);
      return columns[at].length === rows ? columns[at] : columns[at].subarray(0, rows);
    },
    reset() {
      lent = 0;
    },
  };
}
