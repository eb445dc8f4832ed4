// Stream coordinates: the Galactic → (Λ, B) matrix of the model code of 2010ApJ...714..229L (Λ, B are left-handed; B is
// positive towards the pole (l, b) = (273.75, −13.46)), with directions recomputed to six decimals. Pole of the orbit of
// the Sagittarius dwarf: recomputed from 2018A&A...616A..12G, frame G18. Normal of the vast polar structure: plane
// papers of 2015 (bibcode not verified). Orbital poles of six objects: see ../frame/sixobjects.
import { describe, expect, it } from 'vitest';
import { planeAngle, type PlaneMeasure } from '../../../core/cuts/planeangle';
import { PLANE_PRESETS } from '../../../core/cuts/planepresets';
import { separationDeg, unitVector } from '../../../core/frame/sphere';
import { objectsWith } from '../../core/cuts/objects';
import { SIX_OBJECTS } from '../frame/sixobjects';

const DEG = 180 / Math.PI;

const STREAM_FROM_GALACTIC = [
  [0.9640348059, 0.1200587976, -0.237113429],
  [-0.258052482, 0.2093129759, -0.9431844966],
  [0.0636066792, -0.970450392, -0.2327664648],
] as const;

/** l, b, Λ, B in degrees. */
const DIRECTIONS = [
  [111.413, 13.51, 168.128916, -72.827611],
  [174.123, 10.12, 173.665905, -11.59597],
  [272.435, 68.46, 255.400865, 8.074558],
] as const;

const preset = (id: string): { poleL: number; poleB: number } => PLANE_PRESETS.find((plane) => plane.id === id)!;
const dot = (a: readonly number[], b: readonly number[]): number => a[0]! * b[0]! + a[1]! * b[1]! + a[2]! * b[2]!;

function distanceFromPlane(plane: { poleL: number; poleB: number }, [x, y, z]: readonly number[]): number {
  const measure: PlaneMeasure = { ...plane, measure: 'position', sense: 'with' };
  return planeAngle(measure, objectsWith({ x: [x!], y: [y!], z: [z!] }))!.values[0]!;
}

describe.each(DIRECTIONS)('the direction l = %d, b = %d', (l, b, lambda, beta) => {
  const towards = unitVector(l, b);
  const sagittarius = preset('sagittarius-stream');
  // Half a unit of the sixth decimal, and the tenth decimal of the matrix.
  const tolerance = 6e-7;

  it('has the published Λ and B by the published matrix', () => {
    const [x, y, z] = STREAM_FROM_GALACTIC.map((row) => dot(row, towards));
    expect(separationDeg(Math.atan2(y!, x!) * DEG, Math.asin(z!) * DEG, lambda, beta)).toBeLessThan(2 * tolerance);
  });

  it('stands |B| from the plane of the stream, at any distance, on the side of its pole where B is positive', () => {
    for (const kpc of [1, 50, 1e6]) {
      const place = towards.map((axis) => kpc * axis);
      expect(Math.abs(distanceFromPlane(sagittarius, place) - Math.abs(beta))).toBeLessThan(tolerance);
    }
    expect(Math.sign(dot(unitVector(sagittarius.poleL, sagittarius.poleB), towards))).toBe(Math.sign(beta));
  });
});

describe('the published poles', () => {
  it('the pole of the stream is the third axis of the published matrix', () => {
    const { poleL, poleB } = preset('sagittarius-stream');
    const [x, y, z] = STREAM_FROM_GALACTIC[2];
    expect([poleL, poleB]).toEqual([273.75, -13.46]);
    expect(separationDeg(poleL, poleB, Math.atan2(y, x) * DEG, Math.asin(z) * DEG)).toBeLessThan(1e-7);
  });

  it('the dwarf and the vast polar structure have theirs', () => {
    expect(preset('sagittarius-dwarf')).toMatchObject({ poleL: 273.88, poleB: -11.52 });
    expect(preset('vast-polar-structure')).toMatchObject({ poleL: 164.0, poleB: -6.9 });
  });

  it('a position at a pole is 90° from its plane, and one in the plane 0°', () => {
    for (const plane of PLANE_PRESETS) {
      expect(distanceFromPlane(plane, unitVector(plane.poleL, plane.poleB))).toBeCloseTo(90, 6);
      expect(distanceFromPlane(plane, unitVector(plane.poleL + 90, 0))).toBeCloseTo(0, 12);
    }
  });
});

describe.each(SIX_OBJECTS)('the orbit of $name', ({ name, position, velocity, pole }) => {
  const [x, y, z] = position.map((value) => [value]);
  const [vx, vy, vz] = velocity.map((value) => [value]);
  const objects = objectsWith({ x: x!, y: y!, z: z!, v_x: vx!, v_y: vy!, v_z: vz! });
  const angle = (poleL: number, poleB: number, sense: 'with' | 'either'): number =>
    planeAngle({ poleL, poleB, measure: 'orbital-pole', sense }, objects)!.values[0]!;
  // The pole is given to 0.001° (0.01° for the LMC): half a unit in both coordinates; and the rounding of the phase.
  const tolerance = name === 'LMC' ? 1.2e-2 : 1.2e-3;

  it('has its pole where it was published, and its antipole opposite', () => {
    const [l, b] = pole;
    expect(angle(l, b, 'with')).toBeLessThan(tolerance);
    expect(180 - angle(l + 180, -b, 'with')).toBeLessThan(tolerance);
    expect(angle(l + 180, -b, 'either')).toBeLessThan(tolerance);
  });
});
