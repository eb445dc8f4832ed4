import fc from 'fast-check';
import { expect, test } from 'vitest';
import type { Phase } from '../../../core/frame/phase';
import { type Momenta, momentaOf, poleLatitudes, poleLongitudes } from '../../../core/quantities/momenta';
import { type Motions, motionsOf } from '../../../core/quantities/motions';
import { type Places, placesOf } from '../../../core/quantities/places';

type Vector = readonly [number, number, number];

function stateOf([x, y, z]: Vector, [vX, vY, vZ]: Vector): { places: Places; momenta: Momenta; motions: Motions } {
  const one = (value: number): Float64Array => Float64Array.of(value);
  const phase: Phase = {
    rows: 1,
    x: one(x),
    y: one(y),
    z: one(z),
    vX: one(vX),
    vY: one(vY),
    vZ: one(vZ),
    lsrSpeedKmS: 233,
  };
  const [places, momenta] = [placesOf(phase), momentaOf(phase)];
  return { places, momenta, motions: motionsOf(phase, places, momenta) };
}

test('on the axis of rotation speed, v_r and v_t are known, and what needs an azimuth is missing', () => {
  const { motions, places } = stateOf([0, 0, 5], [3, 4, 12]);
  expect([places.cylR[0], places.r[0]]).toEqual([0, 5]);
  expect([motions.speed[0], motions.vR[0], motions.vT[0]]).toEqual([13, 12, 5]);
  expect([motions.vPhi[0], motions.vCylR[0], motions.vTheta[0], motions.toomreSpeed[0]]).toEqual(
    Array(4).fill(Number.NaN),
  );
});

test('a radial orbit has no pole; one in the Galactic plane has a latitude and no longitude', () => {
  const radial = stateOf([1, 2, 3], [10, 20, 30]).momenta;
  expect([poleLongitudes(radial)[0], poleLatitudes(radial)[0], radial.total[0]]).toEqual([Number.NaN, Number.NaN, 0]);
  const disc = stateOf([-8, 0, 0], [0, 230, 0]).momenta;
  expect([poleLongitudes(disc)[0], poleLatitudes(disc)[0], disc.prograde[0]]).toEqual([Number.NaN, -90, 1840]);
});

test('a circular orbit of the disc is prograde at rest with its own azimuth', () => {
  const { motions } = stateOf([-8, 0, 0], [0, 233, 0]);
  expect([motions.vPhi[0], motions.vR[0], motions.toomreSpeed[0]]).toEqual([233, 0, 0]);
});

test('components make the speed, and turning everything about the axis changes nothing but the pole', () => {
  const length = fc.double({ min: -50, max: 50, noNaN: true });
  const speed = fc.double({ min: -400, max: 400, noNaN: true });
  const angle = fc.double({ min: 0, max: 2 * Math.PI, noNaN: true });
  fc.assert(
    fc.property(fc.tuple(length, length, length), fc.tuple(speed, speed, speed), angle, (place, motion, turn) => {
      fc.pre(Math.hypot(place[0], place[1]) > 0.1 && Math.hypot(...motion) > 1);
      const turned = ([x, y, z]: Vector): Vector => [
        x * Math.cos(turn) - y * Math.sin(turn),
        x * Math.sin(turn) + y * Math.cos(turn),
        z,
      ];
      const { motions: m, momenta } = stateOf(place, motion);
      expect(Math.hypot(m.vR[0]!, m.vT[0]!)).toBeCloseTo(m.speed[0]!, 8);
      expect(Math.hypot(m.vCylR[0]!, m.vPhi[0]!, motion[2])).toBeCloseTo(m.speed[0]!, 8);
      expect(Math.hypot(m.vTheta[0]!, m.vPhi[0]!)).toBeCloseTo(m.vT[0]!, 8);
      const after = stateOf(turned(place), turned(motion));
      for (const id of ['vCylR', 'vPhi', 'vR', 'vTheta', 'vT', 'speed', 'toomreSpeed'] as const) {
        expect(after.motions[id][0]).toBeCloseTo(m[id][0]!, 8);
      }
      expect(after.momenta.prograde[0]).toBeCloseTo(momenta.prograde[0]!, 7);
      expect(after.momenta.total[0]).toBeCloseTo(momenta.total[0]!, 7);
    }),
    { numRuns: 300 },
  );
});
