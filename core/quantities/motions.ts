import { freshColumn } from '../table/columnpool';
import type { Phase } from '../frame/phase';
import type { Momenta } from './momenta';
import type { Places } from './places';

/**
 * Velocity components and speeds in the Galactocentric frame, km/s; v_φ is positive prograde. On the axis of rotation
 * v_R, v_φ, v_θ and the Toomre speed have no direction to be measured along: they are NaN.
 */
export interface Motions {
  readonly vCylR: Float64Array;
  readonly vPhi: Float64Array;
  readonly vR: Float64Array;
  readonly vTheta: Float64Array;
  readonly vT: Float64Array;
  readonly speed: Float64Array;
  /** Speed relative to a circular orbit at the object's own azimuth. */
  readonly toomreSpeed: Float64Array;
}

/** See Motions; all of them in one pass, because they share their parts. */
export function motionsOf(phase: Phase, { cylR, r }: Places, { total }: Momenta, make = freshColumn): Motions {
  const { rows, x, y, z, vX, vY, vZ, lsrSpeedKmS } = phase;
  const column = (): Float64Array => make(rows);
  const [vCylR, vPhi, vR, vTheta] = [column(), column(), column(), column()];
  const [vT, speed, toomreSpeed] = [column(), column(), column()];
  for (let i = 0; i < rows; i++) {
    const level = x[i]! * vX[i]! + y[i]! * vY[i]!;
    const perR = 1 / r[i]!;
    const out = level / cylR[i]!;
    const turn = (y[i]! * vX[i]! - x[i]! * vY[i]!) / cylR[i]!;
    const up = vZ[i]!;
    const lag = turn - lsrSpeedKmS;
    vCylR[i] = out;
    vPhi[i] = turn;
    vR[i] = (level + z[i]! * up) * perR;
    vTheta[i] = (z[i]! * out - cylR[i]! * up) * perR;
    vT[i] = total[i]! * perR;
    speed[i] = Math.sqrt(vX[i]! * vX[i]! + vY[i]! * vY[i]! + up * up);
    toomreSpeed[i] = Math.sqrt(out * out + lag * lag + up * up);
  }
  return { vCylR, vPhi, vR, vTheta, vT, speed, toomreSpeed };
}
