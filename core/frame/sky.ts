import { freshColumn } from '../table/columnpool';
import type { Rotation } from './rotation';
import { sinCosDeg } from './trigonometry';

/** Sines and cosines of ICRS directions, made once for every frame that they are turned to. */
export interface Sky {
  readonly rows: number;
  readonly sinRa: Float64Array;
  readonly cosRa: Float64Array;
  readonly sinDec: Float64Array;
  readonly cosDec: Float64Array;
}

/** ICRS directions in degrees, one per row; NaN is missing and spreads. */
export function skyOf(raDeg: Float64Array, decDeg: Float64Array, make = freshColumn): Sky {
  const rows = raDeg.length;
  const column = (): Float64Array => make(rows);
  const sky = { rows, sinRa: column(), cosRa: column(), sinDec: column(), cosDec: column() };
  sinCosDeg(raDeg, sky.sinRa, sky.cosRa);
  sinCosDeg(decDeg, sky.sinDec, sky.cosDec);
  return sky;
}

/** Writes the directions, seen in a rotated frame, as unit vectors. */
export function turnedSky(m: Rotation, sky: Sky, x: Float64Array, y: Float64Array, z: Float64Array): void {
  const { sinRa, cosRa, sinDec, cosDec } = sky;
  for (let row = 0; row < sky.rows; row++) {
    const sd = sinDec[row]!;
    const a = cosDec[row]! * cosRa[row]!;
    const b = cosDec[row]! * sinRa[row]!;
    x[row] = m[0] * a + m[1] * b + m[2] * sd;
    y[row] = m[3] * a + m[4] * b + m[5] * sd;
    z[row] = m[6] * a + m[7] * b + m[8] * sd;
  }
}

/**
 * Writes the sky's unit vectors at the direction of a row, seen in a rotated frame, into `basis`:
 * outward (0…2), east (3…5), north (6…8).
 */
export function skyBasis(m: Rotation, sky: Sky, row: number, basis: Float64Array): void {
  const sa = sky.sinRa[row]!;
  const ca = sky.cosRa[row]!;
  const sd = sky.sinDec[row]!;
  const cd = sky.cosDec[row]!;
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
