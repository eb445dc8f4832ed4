import type { RowBytes } from '../../core/formats/csv/rowbytes';
import { deriveQuantities, type DeriveOptions } from '../../core/quantities/derive';
import type { QuantityColumn } from '../../core/quantities/quantity';
import { DERIVED } from '../../core/quantities/registry';
import { columnPool } from '../../core/table/columnpool';
import { type MeasuredTable, measuredRows } from '../../core/table/measured';

/** Rows derived at once: few enough for the processor's cache, whatever the size of the table. */
export const ROWS_AT_ONCE = 1 << 11;

/** Names of the derived columns in their order, each followed by its error. */
export const DERIVED_NAMES: readonly string[] = DERIVED.flatMap(({ id }) => [id, `${id}_error`]);

/**
 * Writes the derived cells of rows that are asked for in ascending order; row −1 gets empty cells. Quantities are
 * derived block by block, so that a table of any size needs no more memory than its own.
 */
export function derivedRows(measured: MeasuredTable, options: DeriveOptions): (row: number, to: RowBytes) => void {
  const pool = columnPool();
  let [from, end] = [0, 0];
  let columns: readonly (QuantityColumn | undefined)[] = [];
  return (row, to) => {
    if (row >= end) {
      from = row;
      end = Math.min(measured.rows, row + ROWS_AT_ONCE);
      pool.reset();
      const block = deriveQuantities(measuredRows(measured, from, end), { ...options, make: pool.make });
      columns = DERIVED.map(({ id }) => block.column(id));
    }
    for (const column of columns) {
      to.number(row < 0 || column === undefined ? Number.NaN : column.values[row - from]!);
      to.number(row < 0 || column?.sigma === undefined ? Number.NaN : column.sigma[row - from]!);
    }
  };
}
