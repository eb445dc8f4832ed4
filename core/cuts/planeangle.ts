import { RAD } from '../frame/constants';
import { unitVector } from '../frame/sphere';
import type { Vector } from '../frame/rotation';
import type { QuantityColumn } from '../quantities/quantity';
import type { Judged } from './contract';

export interface PlaneMeasure {
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
 * from the plane, [0, 90]. The error is propagated from the 6 × 6 covariance; NaN where that is not known. Undefined
 * when the data give no position or velocity at all. Great-circle method of 1996ApJ...465..278J.
 */
export function planeAngle(plane: PlaneMeasure, objects: Judged): QuantityColumn | undefined {
  const ids = plane.measure === 'position' ? ['x', 'y', 'z'] : ['x', 'y', 'z', 'v_x', 'v_y', 'v_z'];
  const columns = ids.map((id) => objects.column(id)?.values);
  if (columns.some((column) => column === undefined)) return undefined;
  const phase = columns as Float64Array[];
  const covariance = objects.phaseCovariance();
  const pole = unitVector(plane.poleL, plane.poleB);
  const values = new Float64Array(objects.rows);
  const sigma = covariance === undefined ? undefined : new Float64Array(objects.rows);
  for (let row = 0; row < objects.rows; row++) {
    const at = (axis: number): number => phase[axis]![row]!;
    const position: Vector = [at(0), at(1), at(2)];
    const velocity: Vector | undefined = plane.measure === 'position' ? undefined : [at(3), at(4), at(5)];
    const [angle, gradient] = angleWithGradient(plane, pole, position, velocity);
    values[row] = angle;
    if (sigma && covariance) sigma[row] = quadraticForm(gradient, covariance, 21 * row);
  }
  return { values, sigma };
}

function cross([ax, ay, az]: Vector, [bx, by, bz]: Vector): Vector {
  return [ay * bz - az * by, az * bx - ax * bz, ax * by - ay * bx];
}

function dot(a: Vector, b: Vector): number {
  return a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
}

/** The angle in degrees and its gradient by (x, y, z, v_x, v_y, v_z). */
function angleWithGradient(
  plane: PlaneMeasure,
  pole: Vector,
  position: Vector,
  velocity: Vector | undefined,
): [number, readonly number[]] {
  const vector = velocity === undefined ? position : cross(position, velocity);
  const length = Math.hypot(...vector);
  if (!(length > 0)) return [Number.NaN, []];
  const along = dot(vector, pole);
  const across = Math.hypot(...cross(vector, pole));
  const fromPole = Math.atan2(across, along);
  const folded = plane.measure === 'position' || plane.sense === 'either';
  const acute = folded && fromPole > Math.PI / 2 ? Math.PI - fromPole : fromPole;
  const angle = plane.measure === 'position' ? Math.PI / 2 - acute : acute;
  // d(angle)/d(vector): −(pole − (pole·u)u)/(|vector| sin angle), up to the signs of the folds above; only its square counts.
  const byVector = pole.map(
    (p, axis) => (p - (along / length) * (vector[axis]! / length)) / across,
  ) as unknown as Vector;
  if (velocity === undefined) return [angle / RAD, [...byVector, 0, 0, 0]];
  // vector = r × v, so g·d(vector) = (v × g)·dr + (g × r)·dv.
  return [angle / RAD, [...cross(velocity, byVector), ...cross(byVector, position)]];
}

/** √(gᵀ C g) in degrees for an upper triangle of 21 numbers at `offset`. */
function quadraticForm(gradient: readonly number[], covariance: Float64Array, offset: number): number {
  if (gradient.length === 0) return Number.NaN;
  let sum = 0;
  let at = offset;
  for (let i = 0; i < 6; i++) {
    for (let j = i; j < 6; j++, at++) {
      const weight = (i === j ? 1 : 2) * gradient[i]! * gradient[j]!;
      // A velocity that the measure does not use may be unknown: it must not spoil the position.
      if (weight !== 0) sum += weight * covariance[at]!;
    }
  }
  return Math.sqrt(Math.max(sum, 0)) / RAD;
}
