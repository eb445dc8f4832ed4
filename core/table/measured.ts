import type { MeasuredId } from './role';

/** Values of one measured quantity in its canonical unit, one per row; NaN is missing. */
export interface MeasuredColumn {
  readonly values: Float64Array;
  /** Symmetric 1σ error; the mean of minus and plus where they differ. NaN where unknown. */
  readonly sigma?: Float64Array | undefined;
  readonly minus?: Float64Array | undefined;
  readonly plus?: Float64Array | undefined;
}

/** Rows of measured quantities: a source after its roles, or a settled roster. */
export interface MeasuredTable {
  readonly rows: number;
  readonly columns: ReadonlyMap<MeasuredId, MeasuredColumn>;
}

/** A range of rows, the last one excluded, without copying. */
export function measuredRows({ columns }: MeasuredTable, from: number, to: number): MeasuredTable {
  const cut = ({ values, sigma, minus, plus }: MeasuredColumn): MeasuredColumn => ({
    values: values.subarray(from, to),
    sigma: sigma?.subarray(from, to),
    minus: minus?.subarray(from, to),
    plus: plus?.subarray(from, to),
  });
  return { rows: to - from, columns: new Map([...columns].map(([id, column]) => [id, cut(column)])) };
}
