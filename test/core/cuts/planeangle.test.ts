import { describe, expect, it } from 'vitest';
import { planeAngle, type PlaneMeasure } from '../../../core/cuts/planeangle';
import { objectsWith } from './objects';

const DEG = 180 / Math.PI;

/** The upper triangle of a diagonal covariance, from six 1σ errors. */
function diagonal(sigmas: readonly number[]): Float64Array {
  const packed = sigmas.flatMap((sigma, i) => sigmas.slice(i).map((_, j) => (j === 0 ? sigma * sigma : 0)));
  return Float64Array.from(packed);
}

function angleOf(
  phase: readonly number[],
  plane: Partial<PlaneMeasure>,
  covariance?: Float64Array,
): { angle: number; sigma: number | undefined } {
  const ids = ['x', 'y', 'z', 'v_x', 'v_y', 'v_z'];
  const objects = objectsWith(Object.fromEntries(ids.map((id, at) => [id, [phase[at]!]])), covariance);
  const column = planeAngle({ poleL: 0, poleB: 90, measure: 'orbital-pole', sense: 'with', ...plane }, objects)!;
  return { angle: column.values[0]!, sigma: column.sigma?.[0] };
}

// r × v = (220 z − 0, 0 − 8 v_z, −1760) near this orbit: the pole tilts by σ_z/8 about one axis and by σ_vz/220 about
// the other, here by 0.1 and 0.2 radians.
const ORBIT = [8, 0, 0, 0, -220, 0];
const ERRORS = diagonal([0.5, 0.5, 0.8, 30, 30, 44]);
const EVERY_WAY = Math.sqrt((0.1 ** 2 + 0.2 ** 2) / 2) * DEG;

describe('the error of the angle of an orbital pole', () => {
  it('on the pole and on the antipole it is the mean over all directions', () => {
    expect(angleOf(ORBIT, { poleB: -90 }, ERRORS).angle).toBeCloseTo(0, 10);
    expect(angleOf(ORBIT, { poleB: -90 }, ERRORS).sigma).toBeCloseTo(EVERY_WAY, 10);
    expect(angleOf(ORBIT, { poleB: 90 }, ERRORS).angle).toBeCloseTo(180, 10);
    expect(angleOf(ORBIT, { poleB: 90 }, ERRORS).sigma).toBeCloseTo(EVERY_WAY, 10);
    expect(angleOf(ORBIT, { poleB: 90, sense: 'either' }, ERRORS).sigma).toBeCloseTo(EVERY_WAY, 10);
  });

  it('at a right angle it is the tilt towards the reference pole, whichever sense counts', () => {
    for (const sense of ['with', 'either'] as const) {
      const [towardsX, towardsY] = [0, 90].map((poleL) => angleOf(ORBIT, { poleL, poleB: 0, sense }, ERRORS));
      expect(towardsX!.angle).toBeCloseTo(90, 10);
      expect(towardsX!.sigma).toBeCloseTo(0.1 * DEG, 10);
      expect(towardsY!.sigma).toBeCloseTo(0.2 * DEG, 10);
    }
  });

  it('close to the pole it is the tilt along the one direction that leads there', () => {
    expect(angleOf(ORBIT, { poleL: 0, poleB: -89.9 }, ERRORS).sigma).toBeCloseTo(0.1 * DEG, 6);
    expect(angleOf(ORBIT, { poleL: 90, poleB: -89.9 }, ERRORS).sigma).toBeCloseTo(0.2 * DEG, 6);
  });

  it('follows a full covariance as the angle itself changes', () => {
    const phase = [-6.6, 1.3, 10, 67, 121, -134];
    const plane = { poleL: 200, poleB: 15 };
    // Any symmetric matrix A·Aᵀ will do; its packed upper triangle.
    const root = Array.from({ length: 6 }, (_, i) =>
      Array.from({ length: 6 }, (_, j) => (i < 3 ? 0.01 : 1) * (1 + ((3 * i + 5 * j) % 7))),
    );
    const entry = (i: number, j: number): number => root[i]!.reduce((sum, a, k) => sum + a * root[j]![k]!, 0);
    const packed = [0, 1, 2, 3, 4, 5].flatMap((i) => [0, 1, 2, 3, 4, 5].slice(i).map((j) => entry(i, j)));
    const slope = phase.map((_, axis) => {
      const step = axis < 3 ? 1e-5 : 1e-4;
      const moved = (by: number): number => angleOf(phase.with(axis, phase[axis]! + by), plane).angle;
      return (moved(step) - moved(-step)) / (2 * step);
    });
    const variance = slope.reduce((sum, a, i) => sum + slope.reduce((part, b, j) => part + a * b * entry(i, j), 0), 0);
    const { sigma } = angleOf(phase, plane, Float64Array.from(packed));
    // Central differences with these steps are good to about 1e-8.
    expect(Math.abs(sigma! / Math.sqrt(variance) - 1)).toBeLessThan(1e-7);
  });
});

describe('the distance of a position from a plane', () => {
  const place = (phase: readonly number[], plane: Partial<PlaneMeasure>, covariance = ERRORS) =>
    angleOf(phase, { measure: 'position', ...plane }, covariance);
  // σ_y/8 = 0.0625 and σ_z/8 = 0.1 radians.
  const inPlane = { poleL: 0, poleB: 90 };

  it('in the plane its error is that of the height', () => {
    expect(place(ORBIT, inPlane).angle).toBeCloseTo(0, 10);
    expect(place(ORBIT, inPlane).sigma).toBeCloseTo(0.1 * DEG, 10);
  });

  it('towards the pole its error is the mean over all directions', () => {
    const onPole = place(ORBIT, { poleL: 0, poleB: 0 });
    expect(onPole.angle).toBeCloseTo(90, 10);
    expect(onPole.sigma).toBeCloseTo(Math.sqrt((0.0625 ** 2 + 0.1 ** 2) / 2) * DEG, 10);
    expect(place(ORBIT, { poleL: 180, poleB: 0 }).sigma).toBeCloseTo(onPole.sigma!, 10);
  });

  it('asks for no velocity and for no error of it', () => {
    const noVelocity = [...ORBIT.slice(0, 3), Number.NaN, Number.NaN, Number.NaN];
    const known = new Set([0, 1, 2, 6, 7, 11]);
    const partly = ERRORS.map((entry, at) => (known.has(at) ? entry : Number.NaN));
    expect(place(noVelocity, inPlane, partly).sigma).toBeCloseTo(0.1 * DEG, 10);
    expect(place(noVelocity, { poleL: 0, poleB: 0 }, partly).sigma).toBeGreaterThan(0);
    const objects = objectsWith({ x: [8], y: [0], z: [8] });
    const plane = { ...inPlane, measure: 'position', sense: 'with' } as const;
    expect(planeAngle(plane, objects)!.values[0]).toBeCloseTo(45, 10);
  });

  it('is the same on either side of the plane', () => {
    expect(place([3, 0, 4, 0, 0, 0], inPlane).angle).toBeCloseTo(place([3, 0, -4, 0, 0, 0], inPlane).angle, 12);
  });
});

describe('what has no angle', () => {
  const missing = { angle: Number.NaN, sigma: Number.NaN };

  it('a radial orbit, in whichever direction and at whichever speed', () => {
    expect(angleOf([3, 4, 5, 30, 40, 50], {}, ERRORS)).toEqual(missing);
    expect(angleOf([0.1, 0.2, 0.7, -0.3 * 11, -0.6 * 11, -2.1 * 11], {}, ERRORS)).toEqual(missing);
    expect(angleOf([3, 4, 5, 0, 0, 0], {}, ERRORS)).toEqual(missing);
  });

  it('an object at the origin, or without a value', () => {
    expect(angleOf([0, 0, 0, 1, 2, 3], {}, ERRORS)).toEqual(missing);
    expect(angleOf([0, 0, 0, 1, 2, 3], { measure: 'position' }, ERRORS)).toEqual(missing);
    expect(angleOf(ORBIT.with(1, Number.NaN), { measure: 'position' }, ERRORS)).toEqual(missing);
    expect(angleOf(ORBIT.with(4, Number.NaN), {}, ERRORS)).toEqual(missing);
  });

  it('an unknown covariance leaves the angle and no error', () => {
    expect(angleOf(ORBIT, {}).sigma).toBeUndefined();
    expect(
      angleOf(
        ORBIT,
        {},
        ERRORS.map(() => Number.NaN),
      ),
    ).toEqual({ angle: 180, sigma: Number.NaN });
  });

  it('data without velocities at all give no orbital pole', () => {
    const plane = { poleL: 0, poleB: 90, measure: 'orbital-pole', sense: 'with' } as const;
    expect(planeAngle(plane, objectsWith({ x: [8], y: [0], z: [8] }))).toBeUndefined();
  });
});
