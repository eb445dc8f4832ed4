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
  for (let axis = 0; axis < 3; axis++) {
    const mx = m[3 * axis]!;
    const my = m[3 * axis + 1]!;
    const mz = m[3 * axis + 2]!;
    const level = mx * ca + my * sa;
    basis[axis] = cd * level + sd * mz;
    basis[3 + axis] = my * ca - mx * sa;
    basis[6 + axis] = cd * mz - sd * level;
  }
}
