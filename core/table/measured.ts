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
