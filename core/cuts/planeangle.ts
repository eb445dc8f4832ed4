import { unitVector } from '../frame/sphere';
import type { QuantityColumn } from '../quantities/quantity';
import type { Judged } from './contract';
import { orbitAngle } from './orbitangle';
import { planeDistance } from './planedistance';

export interface PlaneMeasure {
  /** Galactic direction of the pole of the plane, degrees. */
  readonly poleL: number;
  readonly poleB: number;
  readonly measure: 'orbital-pole' | 'position';
  readonly sense: 'with' | 'either';
}

/**
 * Angle of every object from a plane, degrees, with its 1σ error.
 *
 * `orbital-pole`: angle between the pole of r × v (right-handed) and the reference pole, [0, 180]; with sense
 * `either` the nearer of pole and antipole counts, [0, 90]. `position`: angular distance of the Galactocentric position
 * from the plane, [0, 90]. The error is propagated linearly from the covariance; NaN where that is not known. On the
 * pole itself, where the angle has no gradient, it is the root mean square over all directions. Undefined when the
 * data give no position or velocity at all. Great-circle method of 1996ApJ...465..278J.
 */
export function planeAngle(plane: PlaneMeasure, objects: Judged): QuantityColumn | undefined {
  const values = (id: string): Float64Array | undefined => objects.column(id)?.values;
  const [x, y, z] = [values('x'), values('y'), values('z')];
  if (!x || !y || !z) return undefined;
  const pole = Float64Array.from(unitVector(plane.poleL, plane.poleB));
  if (plane.measure === 'position') return planeDistance([x, y, z], pole, objects.phaseCovariance());
  const [vx, vy, vz] = [values('v_x'), values('v_y'), values('v_z')];
  if (!vx || !vy || !vz) return undefined;
  return orbitAngle([x, y, z, vx, vy, vz], pole, plane.sense === 'either', objects.phaseCovariance());
}
