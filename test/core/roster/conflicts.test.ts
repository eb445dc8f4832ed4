import { expect, test } from 'vitest';
import { mergeSources } from '../../../core/roster/merge';
import type { Conflict } from '../../../core/roster/roster';
import { policy, readSource, type Row } from './readsource';

/** Conflicts between the rows that a more and a less trusted source have of one object. */
function conflicts(a: Row, b: Row): readonly Conflict[] {
  const sources = [readSource('a', [{ name: 'One', ...a }]), readSource('b', [{ name: 'One', line: 8, ...b }])];
  return mergeSources(sources, policy({ priority: ['a', 'b'] })).conflicts;
}

test('an object of one source, and a value that one side lacks, are no conflict', () => {
  expect(mergeSources([readSource('a', [{ name: 'One', feh: -1 }])], policy()).conflicts).toEqual([]);
  expect(conflicts({ feh: -1, feh_error: 0.1 }, { v_los: 3 })).toEqual([]);
});

test('a conflict is further apart than the limit in combined σ, and says both values, sources and lines', () => {
  // √(0.03² + 0.04²) = 0.05: 0.26 is 5.2 σ, 0.24 is 4.8 σ.
  expect(conflicts({ feh: -1.5, feh_error: 0.03 }, { feh: -1.26, feh_error: 0.04 })).toEqual([]);
  const [found] = conflicts({ feh: -1.5, feh_error: 0.03 }, { feh: -1.24, feh_error: 0.04 });
  expect(found).toMatchObject({
    object: 0,
    quantity: 'feh',
    chosen: { source: 'a', line: 2, value: -1.5, sigma: 0.03 },
    other: { source: 'b', line: 8, value: -1.24, sigma: 0.04 },
  });
  expect(found?.sigmas).toBeCloseTo(5.2, 10);
});

test('nothing is averaged: the settled value is the one called chosen', () => {
  const sources = [
    readSource('a', [{ name: 'One', v_los: 10, v_los_error: 1 }]),
    readSource('b', [{ name: 'One', v_los: 90, v_los_error: 1 }]),
  ];
  const roster = mergeSources(sources, policy({ priority: ['b', 'a'] }));
  expect(roster.columns.get('v_los')?.values[0]).toBe(90);
  expect(roster.conflicts[0]?.chosen.value).toBe(90);
});

test('proper motions are compared component by component', () => {
  const errors = { pm_ra_error: 0.05, pm_dec_error: 0.05 };
  const found = conflicts({ pm_ra: 1, pm_dec: 2, ...errors }, { pm_ra: 1, pm_dec: 3, ...errors });
  expect(found.map(({ quantity }) => quantity)).toEqual(['pm_dec']);
});

test('distances of different kinds are compared as moduli with linear errors', () => {
  // 10 kpc is a modulus of 15; 0.1 kpc of 10 kpc are 0.0217 mag.
  expect(
    conflicts({ distance_modulus: 15.05, distance_modulus_error: 0.01 }, { distance: 10, distance_error: 0.1 }),
  ).toEqual([]);
  const [far] = conflicts(
    { distance_modulus: 15.5, distance_modulus_error: 0.05 },
    { distance: 10, distance_error: 0.1 },
  );
  expect(far?.quantity).toBe('distance_modulus');
  expect(far?.other.value).toBeCloseTo(15, 12);
  expect(far?.other.sigma).toBeCloseTo(0.0217147, 7);
  expect(far?.sigmas).toBeCloseTo(0.5 / Math.hypot(0.05, 0.0217147), 4);
});

test('a parallax good enough for a distance is compared, a noisy one is not', () => {
  const modulus = { distance_modulus: 11, distance_modulus_error: 0.05 };
  // 1 mas is 1 kpc, a modulus of 10.
  const [found] = conflicts({ parallax: 1, parallax_error: 0.01 }, modulus);
  expect(found?.chosen.value).toBeCloseTo(10, 12);
  expect(found?.chosen.sigma).toBeCloseTo(0.0217147, 7);
  expect(conflicts({ parallax: 1, parallax_error: 0.5 }, modulus)).toEqual([]);
});

test('an error that one side lacks counts as zero', () => {
  expect(conflicts({ v_los: 10, v_los_error: 1 }, { v_los: 16 })[0]?.sigmas).toBeCloseTo(6, 12);
});

test('without any error only values that differ by more than a tenth are in conflict', () => {
  expect(conflicts({ v_los: 100 }, { v_los: 91 })).toEqual([]);
  expect(conflicts({ v_los: 100 }, { v_los: 89 })[0]?.sigmas).toBe(Infinity);
  expect(conflicts({ v_los: 0 }, { v_los: 0 })).toEqual([]);
});

test('without any error distances are in conflict when they, not their moduli, differ by more than a tenth', () => {
  expect(conflicts({ distance_modulus: 15 }, { distance: 9.1 })).toEqual([]);
  expect(conflicts({ distance_modulus: 15 }, { distance: 8.9 })[0]?.sigmas).toBe(Infinity);
});

test('conflicts stand in the order of their objects', () => {
  const rows = (shift: number): Row[] => [
    { name: 'One', v_los: 10, v_los_error: 1 },
    { name: 'Two', ra: 50 + shift, v_los: 10 + 90 * shift, v_los_error: 1 },
    { name: 'Three', ra: 80, v_los: 10 + 90 * shift, v_los_error: 1 },
  ];
  const { conflicts: found } = mergeSources([readSource('a', rows(0)), readSource('b', rows(1))], policy());
  expect(found.map(({ object, quantity }) => [object, quantity])).toEqual([
    [1, 'position'],
    [1, 'v_los'],
    [2, 'v_los'],
  ]);
});
