import { expect, test } from 'vitest';
import { foregroundExcess } from '../../../core/mock/dust';
import { giantChance } from '../../../core/mock/selection';

test('there is no dust before the eye', () => {
  expect(foregroundExcess(30, 5, 0)).toBe(0);
});

test('dust grows along every line of sight and is never negative', () => {
  for (const l of [0, 77, 180, 301]) {
    for (const b of [-90, -30, -2, 0, 5, 60, 90]) {
      const column = [0.1, 0.5, 2, 8, 30, 100].map((distance) => foregroundExcess(l, b, distance));
      expect(column.every((value, at) => value > 0 && value >= (column[at - 1] ?? 0) - 1e-3)).toBe(true);
    }
  }
});

test('the plane is dustier than the poles, the centre than the anticentre', () => {
  const mean = (b: number, ls: readonly number[]): number =>
    ls.reduce((sum, l) => sum + foregroundExcess(l, b, 20), 0) / ls.length;
  const round = Array.from({ length: 36 }, (_, at) => 10 * at);
  expect(mean(1, round)).toBeGreaterThan(10 * mean(60, round));
  const towards = (l: number): number[] => Array.from({ length: 21 }, (_, at) => l - 20 + 2 * at);
  expect(mean(0, towards(360))).toBeGreaterThan(mean(0, towards(180)));
});

test('it is patchy: neighbours at one latitude differ', () => {
  const around = Array.from({ length: 60 }, (_, at) => foregroundExcess(6 * at, 30, 20));
  expect(Math.max(...around)).toBeGreaterThan(1.5 * Math.min(...around));
});

test('the survey of giants loses stars with dust and with distance', () => {
  const chance = (modulus: number, ebv: number): number => giantChance({ modulus, ebv, b: 40 });
  expect(chance(15, 0)).toBeGreaterThan(0.99);
  expect(chance(19, 0)).toBeCloseTo(0.5, 12);
  expect(chance(15, 1)).toBeLessThan(chance(15, 0.3));
  expect(chance(21, 0)).toBeLessThan(0.01);
});
