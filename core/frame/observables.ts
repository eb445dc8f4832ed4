import { KM_S_PER_MAS_YR_KPC } from './constants';
import { galactocentric } from './galactocentric';
import { inverse, rotate, type Rotation, type Vector } from './rotation';
import { direction } from './sphere';
import { skyBasis, skyOf } from './sky';
import type { SolarFrame } from './solarframes';

/** What an observer at the Sun measures: ICRS degrees, kpc, mas/yr (μ_α cos δ), km/s. */
export interface Observables {
  readonly ra: number;
  readonly dec: number;
  readonly distance: number;
  readonly pmRa: number;
  readonly pmDec: number;
  readonly vLos: number;
}

const UNTURNED: Rotation = [1, 0, 0, 0, 1, 0, 0, 0, 1];

/** The inverse of `phaseOf` for one object: Galactocentric position (kpc) and velocity (km/s) → observables. */
export function observe(position: Vector, velocity: Vector, frame: SolarFrame): Observables {
  const { rotation, offset, sun } = galactocentric(frame);
  const back = inverse(rotation);
  const place = rotate(back, [position[0] - offset[0], position[1] - offset[1], position[2] - offset[2]]);
  const motion = rotate(back, [velocity[0] - sun[0], velocity[1] - sun[1], velocity[2] - sun[2]]);
  const distance = Math.hypot(...place);
  const [ra, dec] = direction(place);
  const basis = new Float64Array(9);
  skyBasis(UNTURNED, skyOf(Float64Array.of(ra), Float64Array.of(dec)), 0, basis);
  const along = (from: number): number =>
    motion[0] * basis[from]! + motion[1] * basis[from + 1]! + motion[2] * basis[from + 2]!;
  const scale = KM_S_PER_MAS_YR_KPC * distance;
  return { ra, dec, distance, pmRa: along(3) / scale, pmDec: along(6) / scale, vLos: along(0) };
}
