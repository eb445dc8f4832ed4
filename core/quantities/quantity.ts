/** A named, documented column of numbers with its 1σ error; NaN is missing in both. */
export interface QuantityColumn {
  readonly values: Float64Array;
  /** Linearly propagated 1σ error; undefined when nothing is known of the error of any row. */
  readonly sigma?: Float64Array | undefined;
}

export interface QuantityDefinition {
  readonly id: string;
  readonly label: string;
  /** Canonical unit in VOUnit spelling; '' for pure numbers and dex. */
  readonly unit: string;
  readonly ucd: string;
  /** One sentence with sign, wrap and handedness. */
  readonly description: string;
  readonly origin: 'measured' | 'derived' | 'carried';
}

/** The quantities of a set of objects, computed when first asked for. */
export interface QuantitySet {
  readonly rows: number;
  /** What can be asked for with these data, in the order of the registry. */
  readonly definitions: readonly QuantityDefinition[];
  /** The column, or undefined when the data cannot give it. */
  column(id: string): QuantityColumn | undefined;
  /**
   * Upper triangle (21 numbers a row, row-major) of the covariance of (x, y, z, v_x, v_y, v_z),
   * kpc and km/s; undefined when the data have no six-dimensional errors.
   */
  phaseCovariance(): Float64Array | undefined;
}
