import { freshColumn } from '../table/columnpool';
import { TRIANGLE } from '../frame/covariance';
import type { Gradient } from './kernel';

/**
 * Linear 1σ errors √(gᵀ C g) of every row from the packed covariance; NaN where an input error that matters is missing.
 * @param moving whether the quantity hangs on the velocity; one of the position alone must not see velocity errors,
 *   which may be missing
 */
export function sigmasOf(
  gradient: Gradient,
  moving: boolean,
  covariance: Float64Array,
  make = freshColumn,
): Float64Array {
  const sigmas = make(covariance.length / TRIANGLE);
  const g = new Float64Array(6);
  const c = covariance;
  for (let row = 0, at = 0; row < sigmas.length; row++, at += TRIANGLE) {
    gradient(row, g);
    const x = g[0]!;
    const y = g[1]!;
    const z = g[2]!;
    // Written out: loops over a triangle cost five times as much.
    let sum =
      x * (x * c[at]! + 2 * (y * c[at + 1]! + z * c[at + 2]!)) +
      y * (y * c[at + 6]! + 2 * z * c[at + 7]!) +
      z * z * c[at + 11]!;
    if (moving) {
      const u = g[3]!;
      const v = g[4]!;
      const w = g[5]!;
      sum +=
        2 *
          (x * (u * c[at + 3]! + v * c[at + 4]! + w * c[at + 5]!) +
            y * (u * c[at + 8]! + v * c[at + 9]! + w * c[at + 10]!) +
            z * (u * c[at + 12]! + v * c[at + 13]! + w * c[at + 14]!)) +
        u * (u * c[at + 15]! + 2 * (v * c[at + 16]! + w * c[at + 17]!)) +
        v * (v * c[at + 18]! + 2 * w * c[at + 19]!) +
        w * w * c[at + 20]!;
    }
    sigmas[row] = Math.sqrt(sum < 0 ? 0 : sum);
  }
  return sigmas;
}
