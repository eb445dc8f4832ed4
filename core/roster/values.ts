import { givesDistance } from '../table/parallax';
import type { MeasuredId } from '../table/role';
import type { ReadSource } from './roster';

/** The value of a source's row, NaN when it has none; row −1 is no row. */
export function valueOf(source: ReadSource, row: number, id: MeasuredId): number {
  return row < 0 ? Number.NaN : (source.measured.columns.get(id)?.values[row] ?? Number.NaN);
}

/** The 1σ error of a source's row, NaN when it has none; row −1 is no row. */
export function sigmaOf(source: ReadSource, row: number, id: MeasuredId): number {
  return row < 0 ? Number.NaN : (source.measured.columns.get(id)?.sigma?.[row] ?? Number.NaN);
}

/** Whether a value of a source's row is there and, if it is a distance or a parallax, of use as a distance. */
export function usable(source: ReadSource, row: number, id: MeasuredId): boolean {
  const value = valueOf(source, row, id);
  if (id === 'distance') return value > 0;
  if (id === 'parallax') return givesDistance(value, sigmaOf(source, row, id));
  return !Number.isNaN(value);
}
