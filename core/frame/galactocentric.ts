import { CENTRE_DEC_DEG, CENTRE_RA_DEG, CENTRE_ROLL_DEG, RAD } from './constants';
import { aboutX, aboutY, aboutZ, product, type Rotation, type Vector } from './rotation';
import type { SolarFrame } from './solarframes';

/** ICRS → Galactocentric for one solar frame: r = A·d·u + offset (kpc), v = A·v_ICRS + sun (km/s). */
export interface Galactocentric {
  readonly rotation: Rotation;
  readonly offset: Vector;
  readonly sun: Vector;
}

/**
 * The right-handed Galactocentric transform of a solar frame: x from the Sun's side to the centre, y with rotation,
 * z to the north Galactic pole, the Sun at (−√(R0² − z☉²), 0, z☉).
 *
 * The direction of the centre is turned to +x, rolled so that the Galactic plane is level, and tilted by asin(z☉/R0)
 * (the definition of astropy's Galactocentric frame, so that the two can be compared to rounding).
 */
export function galactocentric(frame: SolarFrame): Galactocentric {
  const zSun = frame.zSunPc / 1000;
  const rotation = product(
    aboutY(-Math.asin(zSun / frame.r0Kpc)),
    aboutX(CENTRE_ROLL_DEG * RAD),
    aboutY(-CENTRE_DEC_DEG * RAD),
    aboutZ(CENTRE_RA_DEG * RAD),
  );
  return { rotation, offset: [-Math.sqrt(frame.r0Kpc ** 2 - zSun ** 2), 0, zSun], sun: frame.velocityKmS };
}
