import { expect, test } from 'vitest';
import { mergeSources } from '../../../core/roster/merge';
import type { Roster } from '../../../core/roster/roster';
import type { MeasuredId } from '../../../core/table/role';
import { policy, readSource, type Row } from './readsource';

/** Merges one object from several sources a, b, c …, the first the most trusted. */
function merged(...rows: readonly Row[]): Roster {
  const ids = ['a', 'b', 'c'].slice(0, rows.length);
  return mergeSources(
    ids.map((id, at) => readSource(id, [{ name: 'One', line: 10 + at, ...rows[at] }])),
    policy({ priority: ids }),
  );
}

/** Value, source and line of the one object; undefined when missing. */
function settled(roster: Roster, id: MeasuredId): [number, string, number] | undefined {
  const column = roster.columns.get(id);
  const from = column?.fromSource[0] ?? -1;
  return from < 0 ? undefined : [column!.values[0]!, roster.sources[from]!, column!.fromLine[0]!];
}

test('a value that nobody has is missing, with no source and no line', () => {
  const roster = merged({ feh: Number.NaN }, {});
  expect(settled(roster, 'feh')).toBeUndefined();
  expect(roster.columns.get('feh')?.values[0]).toBeNaN();
  expect(roster.columns.get('feh')?.fromLine[0]).toBe(0);
  expect(roster.columns.has('v_los')).toBe(false);
});

test('each value is that of the most trusted source that has it, with its error, source and line', () => {
  const roster = merged({ feh: -1.5, feh_error: 0.1 }, { feh: -1.6, feh_error: 0.2, v_los: 80, v_los_error: 2 });
  expect(settled(roster, 'feh')).toEqual([-1.5, 'a', 10]);
  expect(settled(roster, 'v_los')).toEqual([80, 'b', 11]);
  expect([roster.columns.get('feh')?.sigma?.[0], roster.columns.get('v_los')?.sigma?.[0]]).toEqual([0.1, 2]);
});

test('the order of trust, not the order of the sources, decides', () => {
  const sources = [readSource('a', [{ name: 'One', feh: -1 }]), readSource('b', [{ name: 'One', feh: -1.01 }])];
  const roster = mergeSources(sources, policy({ priority: ['b', 'a'] }));
  expect(settled(roster, 'feh')).toEqual([-1.01, 'b', 2]);
});

test('right ascension and declination come from one source', () => {
  const roster = merged({ ra: 10, dec: 20 }, { ra: 10.001, dec: 20.001 });
  expect([settled(roster, 'ra'), settled(roster, 'dec')]).toEqual([
    [10, 'a', 10],
    [20, 'a', 10],
  ]);
});

test('a proper motion with one component missing yields to a whole one, which brings its own correlation', () => {
  const roster = merged({ pm_ra: 1 }, { pm_ra: 1.1, pm_dec: 2, pm_correlation: 0.3 });
  expect(settled(roster, 'pm_ra')).toEqual([1.1, 'b', 11]);
  expect(settled(roster, 'pm_dec')).toEqual([2, 'b', 11]);
  expect(settled(roster, 'pm_correlation')).toEqual([0.3, 'b', 11]);
});

test('a correlation is not taken from a source whose proper motion is not', () => {
  const roster = merged({ pm_ra: 1, pm_dec: 2 }, { pm_ra: 1, pm_dec: 2, pm_correlation: 0.9 });
  expect(settled(roster, 'pm_correlation')).toBeUndefined();
});

test('exactly one kind of distance is settled: a modulus before a distance before a parallax of one source', () => {
  const roster = merged({ distance_modulus: 15, distance: 9, parallax: 0.1, parallax_error: 0.01 });
  expect(settled(roster, 'distance_modulus')).toEqual([15, 'a', 10]);
  expect([settled(roster, 'distance'), settled(roster, 'parallax')]).toEqual([undefined, undefined]);
});

test('the distance of a more trusted source goes before the modulus of a less trusted one', () => {
  const roster = merged({ distance: 10 }, { distance_modulus: 15.01 });
  expect(settled(roster, 'distance')).toEqual([10, 'a', 10]);
  expect(settled(roster, 'distance_modulus')).toBeUndefined();
});

test('a parallax too noisy for a distance yields to a distance of a less trusted source', () => {
  const roster = merged({ parallax: 0.1, parallax_error: 0.05 }, { distance_modulus: 15 });
  expect(settled(roster, 'distance_modulus')).toEqual([15, 'b', 11]);
  expect(settled(roster, 'parallax')).toBeUndefined();
});

test('a good parallax of the most trusted source is taken, and a noisy one where there is nothing else', () => {
  expect(settled(merged({ parallax: 1, parallax_error: 0.05 }, { distance: 1 }), 'parallax')).toEqual([1, 'a', 10]);
  expect(settled(merged({ parallax: -0.1, parallax_error: 0.05 }, {}), 'parallax')).toEqual([-0.1, 'a', 10]);
});

test('a distance of zero is no distance when another source has one', () => {
  expect(settled(merged({ distance: 0 }, { distance: 12 }), 'distance')).toEqual([12, 'b', 11]);
});

test('colour excess and A_V come from one source together', () => {
  const roster = merged({ ebv: 0.1 }, { ebv: 0.1, a_v: 0.4 });
  expect(settled(roster, 'ebv')).toEqual([0.1, 'a', 10]);
  expect(settled(roster, 'a_v')).toBeUndefined();
});

test('separate minus and plus errors are carried along', () => {
  const source = readSource('a', [{ name: 'One', distance: 10 }]);
  const errors = { minus: Float64Array.of(1), plus: Float64Array.of(3), sigma: Float64Array.of(2) };
  const measured = {
    rows: 1,
    columns: new Map(source.measured.columns).set('distance', { values: Float64Array.of(10), ...errors }),
  };
  const column = mergeSources([{ ...source, measured }], policy()).columns.get('distance')!;
  expect([column.minus?.[0], column.plus?.[0], column.sigma?.[0]]).toEqual([1, 3, 2]);
});

test('extra columns stand beside the objects, missing where their source lacks the object', () => {
  const sources = [
    readSource('a', [{ name: 'One' }, { name: 'Two', ra: 50 }]),
    readSource('b', [{ name: 'Two', ra: 50, snr: 30 }]),
  ];
  const [extra] = mergeSources(sources, policy()).extras;
  expect([extra?.name, ...extra!.values]).toEqual(['b.snr', Number.NaN, 30]);
});
