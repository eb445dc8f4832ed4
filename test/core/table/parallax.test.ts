import { expect, test } from 'vitest';
import { givesDistance } from '../../../core/table/parallax';

test('missing, zero and negative parallaxes give no distance', () => {
  for (const parallax of [Number.NaN, 0, -1]) expect(givesDistance(parallax, 0.01)).toBe(false);
});

test('a parallax gives a distance from five times its error on, and never without an error', () => {
  expect(givesDistance(0.5, 0.1)).toBe(true);
  expect(givesDistance(0.4999, 0.1)).toBe(false);
  expect(givesDistance(10, Number.NaN)).toBe(false);
});
