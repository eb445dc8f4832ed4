import { RAD } from '../frame/constants';
import { TRIANGLE } from '../frame/covariance';
import type { QuantityColumn } from '../quantities/quantity';
import { poleAngleGradients } from './poleangle';

/**
 * Angular distance of positions from the plane through the origin with this unit pole, degrees in [0, 90].
 *
 * NaN for a missing position and at the origin. The error needs the position part of the covariance alone, so that
 * missing velocity errors do not matter.
 * @param axes x, y, z in kpc
 */
export function planeDistance(
  [x, y, z]: readonly [Float64Array, Float64Array, Float64Array],
  pole: Float64Array,
  covariance: Float64Array | undefined,
): QuantityColumn {
  const rows = x.length;
  const values = new Float64Array(rows);
  const sigma = covariance && new Float64Array(rows);
  const position = new Float64Array(3);
  const gradients = new Float64Array(6);
  const px = pole[0]!;
  const py = pole[1]!;
  const pz = pole[2]!;
  for (let row = 0; row < rows; row++) {
    const ux = x[row]!;
    const uy = y[row]!;
    const uz = z[row]!;
    if (!(ux * ux + uy * uy + uz * uz > 0)) {
      values[row] = Number.NaN;
      if (sigma) sigma[row] = Number.NaN;
      continue;
    }
    const cx = uy * pz - uz * py;
    const cy = uz * px - ux * pz;
    const cz = ux * py - uy * px;
    const along = ux * px + uy * py + uz * pz;
    values[row] = Math.atan2(Math.abs(along), Math.sqrt(cx * cx + cy * cy + cz * cz)) / RAD;
    if (!sigma) continue;
    position[0] = ux;
    position[1] = uy;
    position[2] = uz;
    const end = 3 * poleAngleGradients(position, pole, gradients);
    const c = TRIANGLE * row;
    let variance = 0;
    for (let at = 0; at < end; at += 3) {
      const gx = gradients[at]!;
      const gy = gradients[at + 1]!;
      const gz = gradients[at + 2]!;
      variance +=
        gx * (gx * covariance[c]! + 2 * (gy * covariance[c + 1]! + gz * covariance[c + 2]!)) +
        gy * (gy * covariance[c + 6]! + 2 * gz * covariance[c + 7]!) +
        gz * gz * covariance[c + 11]!;
    }
    sigma[row] = Math.sqrt(Math.max(variance, 0)) / RAD;
  }
  return { values, sigma };
}
