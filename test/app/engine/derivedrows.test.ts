import { expect, it } from 'vitest';
import { derivedRows, ROWS_AT_ONCE } from '../../../app/engine/derivedrows';
import { RowBytes } from '../../../core/formats/csv/rowbytes';
import { solarFrame } from '../../../core/frame/solarframes';
import { dice } from '../../../core/mock/dice';
import { deriveQuantities } from '../../../core/quantities/derive';
import { DERIVED } from '../../../core/quantities/registry';
import { columnPool } from '../../../core/table/columnpool';
import { measuredTable } from '../../core/quantities/measuredtable';

it('rows derived block by block are those of the whole table, also where a block has no errors', () => {
  const d = dice(5);
  const rows = 2 * ROWS_AT_ONCE + 77;
  const fill = (make: (row: number) => number): number[] => Array.from({ length: rows }, (_, row) => make(row));
  const error = fill(() => 0.05);
  // The second block has no distance errors, and so none of what hangs on them.
  const far = fill((row) => (row >= ROWS_AT_ONCE && row < 2 * ROWS_AT_ONCE ? Number.NaN : 0.3));
  const table = measuredTable({
    ra: [fill(() => 360 * d.uniform()), error],
    dec: [fill(() => 180 * d.uniform() - 90), error],
    distance: [fill(() => 1 + 50 * d.uniform()), far],
    pm_ra: [fill(() => d.normal()), error],
    pm_dec: [fill(() => d.normal()), error],
    v_los: [fill((row) => (row % 9 === 0 ? Number.NaN : 100 * d.normal())), error],
  });
  const options = { frame: solarFrame('G18')!, rv: 3.1, recalibration: 1 };
  const [blocks, whole] = [new RowBytes(), new RowBytes()];
  const write = derivedRows(table, options);
  const set = deriveQuantities(table, options);
  const columns = DERIVED.map(({ id }) => set.column(id));
  for (let row = 0; row < rows; row++) {
    write(row, blocks);
    for (const column of columns) {
      whole.number(column?.values[row] ?? Number.NaN);
      whole.number(column?.sigma?.[row] ?? Number.NaN);
    }
  }
  const [got, wanted] = [blocks.take(), whole.take()];
  expect(got.length).toBe(wanted.length);
  expect(got.every((byte, at) => byte === wanted[at])).toBe(true);
});

it('a pool lends the same columns again after it took them back, and never one twice before', () => {
  const pool = columnPool();
  const [a, b] = [pool.make(10), pool.make(10)];
  expect(a).not.toBe(b);
  pool.reset();
  expect(pool.make(10)).toBe(a);
  const short = pool.make(4);
  expect([short.length, short.buffer]).toEqual([4, b.buffer]);
  pool.reset();
  expect(pool.make(20).length).toBe(20);
});
