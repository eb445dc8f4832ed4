import { RAD } from '../frame/constants';
import { TRIANGLE } from '../frame/covariance';
import type { QuantityColumn } from '../quantities/quantity';
import { poleAngleGradients, ROUNDING } from './poleangle';

/** x, y, z in kpc and v_x, v_y, v_z in km/s. */
export type PhaseAxes = readonly [Float64Array, Float64Array, Float64Array, Float64Array, Float64Array, Float64Array];

/**
 * Angle of the orbital pole r × v from this unit pole, degrees in [0, 180]; with `either`, from the nearer of pole and
 * antipole, in [0, 90].
 *
 * NaN where position or velocity is missing, and for a radial orbit, which has no pole.
 */
export function orbitAngle(
  [x, y, z, vx, vy, vz]: PhaseAxes,
  pole: Float64Array,
  either: boolean,
  covariance: Float64Array | undefined,
): QuantityColumn {
  const rows = x.length;
  const values = new Float64Array(rows);
  const sigma = covariance && new Float64Array(rows);
  const momentum = new Float64Array(3);
  const gradients = new Float64Array(6);
  const byPhase = new Float64Array(6);
  const px = pole[0]!;
  const py = pole[1]!;
  const pz = pole[2]!;
  for (let row = 0; row < rows; row++) {
    const [rx, ry, rz] = [x[row]!, y[row]!, z[row]!];
    const [ux, uy, uz] = [vx[row]!, vy[row]!, vz[row]!];
    const lx = ry * uz - rz * uy;
    const ly = rz * ux - rx * uz;
    const lz = rx * uy - ry * ux;
    const product2 = (rx * rx + ry * ry + rz * rz) * (ux * ux + uy * uy + uz * uz);
    if (!(lx * lx + ly * ly + lz * lz > ROUNDING * ROUNDING * product2)) {
      values[row] = Number.NaN;
      if (sigma) sigma[row] = Number.NaN;
      continue;
    }
    const cx = ly * pz - lz * py;
    const cy = lz * px - lx * pz;
    const cz = lx * py - ly * px;
    const along = lx * px + ly * py + lz * pz;
    values[row] = Math.atan2(Math.sqrt(cx * cx + cy * cy + cz * cz), either ? Math.abs(along) : along) / RAD;
    if (!sigma) continue;
    momentum[0] = lx;
    momentum[1] = ly;
    momentum[2] = lz;
    const end = 3 * poleAngleGradients(momentum, pole, gradients);
    let variance = 0;
    for (let at = 0; at < end; at += 3) {
      const gx = gradients[at]!;
      const gy = gradients[at + 1]!;
      const gz = gradients[at + 2]!;
      // d(r × v)·g = (v × g)·dr + (g × r)·dv.
      byPhase[0] = uy * gz - uz * gy;
      byPhase[1] = uz * gx - ux * gz;
      byPhase[2] = ux * gy - uy * gx;
      byPhase[3] = gy * rz - gz * ry;
      byPhase[4] = gz * rx - gx * rz;
      byPhase[5] = gx * ry - gy * rx;
      variance += quadraticForm(byPhase, covariance, TRIANGLE * row);
    }
    sigma[row] = Math.sqrt(Math.max(variance, 0)) / RAD;
  }
  return { values, sigma };
}

/** gᵀCg for the packed upper triangle at an offset, written out because this is the inner loop of a moved pole. */
function quadraticForm(g: Float64Array, c: Float64Array, at: number): number {
  const g0 = g[0]!;
  const g1 = g[1]!;
  const g2 = g[2]!;
  const g3 = g[3]!;
  const g4 = g[4]!;
  const g5 = g[5]!;
  const mixed =
    g0 * (g1 * c[at + 1]! + g2 * c[at + 2]! + g3 * c[at + 3]! + g4 * c[at + 4]! + g5 * c[at + 5]!) +
    g1 * (g2 * c[at + 7]! + g3 * c[at + 8]! + g4 * c[at + 9]! + g5 * c[at + 10]!) +
    g2 * (g3 * c[at + 12]! + g4 * c[at + 13]! + g5 * c[at + 14]!) +
    g3 * (g4 * c[at + 16]! + g5 * c[at + 17]!) +
    g4 * g5 * c[at + 19]!;
  const own =
    g0 * g0 * c[at]! +
    g1 * g1 * c[at + 6]! +
    g2 * g2 * c[at + 11]! +
    g3 * g3 * c[at + 15]! +
    g4 * g4 * c[at + 18]! +
    g5 * g5 * c[at + 20]!;
  return own + 2 * mixed;
}
