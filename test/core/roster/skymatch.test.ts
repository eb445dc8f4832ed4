import { expect, test } from 'vitest';
import { MOST_NEIGHBOURS, neighbours, type SkyPoints } from '../../../core/roster/skymatch';

const points = (...list: readonly (readonly [number, number])[]): SkyPoints => ({
  ra: Float64Array.from(list, ([ra]) => ra),
  dec: Float64Array.from(list, ([, dec]) => dec),
});
const found = (a: SkyPoints, b: SkyPoints, radius: number): number[][] =>
  neighbours(a, b, radius).map((near) => near.map(({ index }) => index));

test('empty lists on either side match nothing', () => {
  expect(found(points(), points([1, 1]), 1)).toEqual([]);
  expect(found(points([1, 1]), points(), 1)).toEqual([[]]);
});

test('a point with a missing coordinate is nobody’s neighbour', () => {
  expect(found(points([Number.NaN, 1], [1, Number.NaN]), points([1, 1]), 180)).toEqual([[], []]);
  expect(found(points([1, 1]), points([Number.NaN, 1], [1, Number.NaN]), 180)).toEqual([[]]);
});

test('right ascension is compared across 0/360', () => {
  expect(found(points([359.999, 0], [0.001, 0], [360, 0]), points([0.0005, 0]), 0.002)).toEqual([[0], [0], [0]]);
});

test('at the poles every right ascension is near', () => {
  expect(found(points([10, 89.9999], [10, -89.9999]), points([190, 89.9999], [100, -90]), 0.001)).toEqual([[0], [1]]);
});

test('at high declination a degree of right ascension is short', () => {
  // cos 80° = 0.1736, so 0.05° of right ascension are 0.0087° on the sky.
  expect(found(points([100, 80]), points([100.05, 80]), 0.0088)).toEqual([[0]]);
  expect(found(points([100, 80]), points([100.05, 80]), 0.0086)).toEqual([[]]);
});

test('the radius itself is inside', () => {
  const [pair] = neighbours(points([50, 10]), points([50, 10.25]), 0.25);
  expect(pair?.map(({ index }) => index)).toEqual([0]);
});

test('neighbours come nearest first with their separation in degrees', () => {
  const [near] = neighbours(points([50, 0]), points([50.3, 0], [50.1, 0], [49.8, 0]), 1);
  expect(near?.map(({ index }) => index)).toEqual([1, 2, 0]);
  expect(near?.[0]?.separationDeg).toBeCloseTo(0.1, 12);
});

test('in a crowd only the nearest few are kept', () => {
  const crowd = points(...Array.from({ length: 40 }, (_, at) => [20 + (40 - at) * 1e-4, 5] as const));
  const [near] = found(points([20, 5]), crowd, 1);
  expect(near).toEqual(Array.from({ length: MOST_NEIGHBOURS }, (_, at) => 39 - at));
});

test('a crowded stripe of the sky is matched without comparing everything with everything', () => {
  const count = 20_000;
  // All of one declination: a sweep over declination alone would make 4 × 10⁸ comparisons.
  const stripe = points(...Array.from({ length: count }, (_, at) => [(at * 360) / count, 12] as const));
  const begun = performance.now();
  expect(found(stripe, stripe, 1e-3).every((near, at) => near.length === 1 && near[0] === at)).toBe(true);
  // About 0.1 s here; the full comparison takes half a minute.
  expect(performance.now() - begun).toBeLessThan(5000);
});
