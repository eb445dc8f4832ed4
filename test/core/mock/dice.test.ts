import { expect, test } from 'vitest';
import { dice, xoshiro } from '../../../core/mock/dice';

test('the generator gives the reference values of xoshiro128** 1.1', () => {
  // Made with the authors' xoshiro128starstar.c (v1.1) from the state (1, 2, 3, 4); as quoted in the tests of the Rust
  // crate rand_xoshiro (repository rust-random/rngs, rand_xoshiro/src/xoshiro128starstar.rs).
  const state = Uint32Array.of(1, 2, 3, 4);
  const reference = [
    11520, 0, 5927040, 70819200, 2031721883, 1637235492, 1287239034, 3734860849, 3729100597, 4258142804,
  ];
  expect(reference.map(() => xoshiro(state))).toEqual(reference);
});

test('the same seed gives the same numbers, another seed others', () => {
  const five = (seed: number): number[] => Array.from({ length: 5 }, dice(seed).uniform);
  expect(five(7)).toEqual(five(7));
  expect(five(7)).not.toEqual(five(8));
  expect(five(0).every((value) => value > 0 && value < 1)).toBe(true);
});

test('uniform numbers fill [0, 1) evenly', () => {
  const { uniform } = dice(1);
  const counts = new Array<number>(10).fill(0);
  for (let at = 0; at < 100_000; at++) counts[Math.floor(10 * uniform())]!++;
  // χ² of 9 degrees of freedom is above 27.9 in one seed of a thousand.
  expect(counts.reduce((sum, count) => sum + (count - 10_000) ** 2 / 10_000, 0)).toBeLessThan(27.9);
});

test('normal deviates have the mean, the spread and the tails of the normal distribution', () => {
  const count = 100_000;
  const { normal } = dice(2);
  const values = Array.from({ length: count }, normal);
  const mean = values.reduce((sum, value) => sum + value, 0) / count;
  const variance = values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / count;
  const beyondTwo = values.filter((value) => Math.abs(value) > 2).length / count;
  // Four standard errors each: 1/√N, √(2/N), √(p(1−p)/N) with p = 0.04550.
  expect(Math.abs(mean)).toBeLessThan(4 / Math.sqrt(count));
  expect(Math.abs(variance - 1)).toBeLessThan(4 * Math.sqrt(2 / count));
  expect(Math.abs(beyondTwo - 0.0455)).toBeLessThan(4 * Math.sqrt((0.0455 * 0.9545) / count));
});

test('one of a list is any of it', () => {
  const { pick } = dice(3);
  expect(new Set(Array.from({ length: 50 }, () => pick(['a', 'b', 'c'])))).toEqual(new Set(['a', 'b', 'c']));
});
