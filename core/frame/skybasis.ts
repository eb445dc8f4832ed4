import { RAD } from './constants';
import type { Rotation } from './rotation';

/**
 * Writes the sky's unit vectors at an ICRS direction, seen in a rotated frame, into `basis`:
 * outward (0…2), east (3…5), north (6…8). Degrees in; NaN spreads.
 */
export function skyBasis(m: Rotation, raDeg: number, decDeg: number, basis: Float64Array): void {
  const sa = Math.sin(raDeg * RAD);
  const ca = Math.cos(raDeg * RAD);
  const sd = Math.sin(decDeg * RAD);
  const cd = Math.cos(decDeg * RAD);
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
