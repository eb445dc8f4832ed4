/** Points of a plate with 1σ errors along its axes; NaN is missing in all of them. */
export interface Points {
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly sigmaX: Float64Array | undefined;
  readonly sigmaY: Float64Array | undefined;
  /** Number of σ by which a point may be wrong. */
  readonly margin: number;
}

/** Farther than any plate, and still finite when squared twice. */
const FAR = 1e75;

/** How far the point of a row may be off along one axis; an unknown error counts as 0. */
export function reach(sigma: Float64Array | undefined, row: number, margin: number): number {
  const far = sigma === undefined ? 0 : margin * sigma[row]!;
  return far > 0 ? Math.min(far, FAR) : 0;
}
