import type { Rotation } from './rotation';
import { sinCosDeg } from './trigonometry';

/** Sines and cosines of the directions of one block of rows, counted from the block's first row. */
export interface SkyBlock {
  readonly sinRa: Float64Array;
  readonly cosRa: Float64Array;
  readonly sinDec: Float64Array;
  readonly cosDec: Float64Array;
}

/** Rows of a block: its scratch columns stay in the processor's first cache. */
export const SKY_BLOCK = 512;

/** Goes through ICRS directions (degrees) block by block; rows `from` to `to`, the last one excluded, are in `sky`. */
export function bySkyBlocks(
  raDeg: Float64Array,
  decDeg: Float64Array,
  work: (sky: SkyBlock, from: number, to: number) => void,
): void {
  const column = (): Float64Array => new Float64Array(SKY_BLOCK);
  const sky = { sinRa: column(), cosRa: column(), sinDec: column(), cosDec: column() };
  for (let from = 0; from < raDeg.length; from += SKY_BLOCK) {
    const to = Math.min(raDeg.length, from + SKY_BLOCK);
    sinCosDeg(raDeg, from, to, sky.sinRa, sky.cosRa);
    sinCosDeg(decDeg, from, to, sky.sinDec, sky.cosDec);
    work(sky, from, to);
  }
}

/**
 * Writes the sky's unit vectors at a direction, seen in a rotated frame, into `basis`:
 * outward (0…2), east (3…5), north (6…8). `at` counts from the block's first row; NaN spreads.
 */
export function skyBasis(m: Rotation, sky: SkyBlock, at: number, basis: Float64Array): void {
  const sa = sky.sinRa[at]!;
  const ca = sky.cosRa[at]!;
  const sd = sky.sinDec[at]!;
  const cd = sky.cosDec[at]!;
  // Written out: an inner loop over the axes costs as much as the trigonometry.
  const x = m[0] * ca + m[1] * sa;
  const y = m[3] * ca + m[4] * sa;
  const z = m[6] * ca + m[7] * sa;
  basis[0] = cd * x + sd * m[2];
  basis[1] = cd * y + sd * m[5];
  basis[2] = cd * z + sd * m[8];
  basis[3] = m[1] * ca - m[0] * sa;
  basis[4] = m[4] * ca - m[3] * sa;
  basis[5] = m[7] * ca - m[6] * sa;
  basis[6] = cd * m[2] - sd * x;
  basis[7] = cd * m[5] - sd * y;
  basis[8] = cd * m[8] - sd * z;
}
