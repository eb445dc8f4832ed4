import { freshColumn } from '../table/columnpool';
import type { Phase } from '../frame/phase';
import { atan2Deg, turnPositive } from '../frame/trigonometry';

/**
 * Specific angular momentum, kpc km/s: x and y of r × v (right-handed), and *minus* its z, so that the disc's is positive
 * (prograde). The pole is that of the right-handed vector.
 */
export interface Momenta {
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly prograde: Float64Array;
  readonly total: Float64Array;
}

/** See Momenta; one number per row. */
export function momentaOf({ rows, x, y, z, vX, vY, vZ }: Phase, make = freshColumn): Momenta {
  const column = (): Float64Array => make(rows);
  const to = { x: column(), y: column(), prograde: column(), total: column() };
  for (let i = 0; i < rows; i++) {
    const lX = y[i]! * vZ[i]! - z[i]! * vY[i]!;
    const lY = z[i]! * vX[i]! - x[i]! * vZ[i]!;
    const up = x[i]! * vY[i]! - y[i]! * vX[i]!;
    to.x[i] = lX;
    to.y[i] = lY;
    to.prograde[i] = -up;
    to.total[i] = Math.sqrt(lX * lX + lY * lY + up * up);
  }
  return to;
}

/** Longitude of the orbital pole, [0, 360) degrees; NaN where no longitude is defined (pole of the Galaxy, radial orbit). */
export function poleLongitudes({ x, y }: Momenta, make = freshColumn): Float64Array {
  const longitudes = make(x.length);
  atan2Deg(y, x, longitudes);
  turnPositive(longitudes);
  return longitudes;
}

/** Latitude of the orbital pole, degrees; NaN for a radial orbit. */
export function poleLatitudes({ x, y, prograde }: Momenta, make = freshColumn): Float64Array {
  const latitudes = make(x.length);
  for (let i = 0; i < latitudes.length; i++) latitudes[i] = Math.sqrt(x[i]! * x[i]! + y[i]! * y[i]!);
  atan2Deg(prograde, latitudes, latitudes);
  for (let i = 0; i < latitudes.length; i++) latitudes[i] = -latitudes[i]!;
  return latitudes;
}
