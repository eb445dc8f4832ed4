import fc from 'fast-check';
import { expect, test } from 'vitest';
import { separationDeg } from '../../core/frame/sphere';
import { cleanName } from '../../core/roster/cleanname';
import { mergeSources } from '../../core/roster/merge';
import type { Roster } from '../../core/roster/roster';
import { MOST_NEIGHBOURS, neighbours } from '../../core/roster/skymatch';
import { policy, readSource, type Row } from '../core/roster/readsource';

const word = fc.constantFrom('Tarnow', 'Brévane', 'Venn-Ashdown', 'Ibarrola', '');
const name = fc
  .tuple(word, fc.integer({ min: 0, max: 12 }))
  .map(([who, number]) => (who === '' ? '' : `${who} ${number}`));
// A few places close together, so that matches by place and ambiguous ones are common.
const place = fc.record({
  ra: fc.constantFrom(0, 0.004, 359.998, 120, 120.005),
  dec: fc.constantFrom(-5, -5.004, 89.999),
});
const maybe = (value: fc.Arbitrary<number>): fc.Arbitrary<number> => fc.oneof(value, fc.constant(Number.NaN));
const row: fc.Arbitrary<Row> = fc
  .tuple(name, place, maybe(fc.integer({ min: -20, max: 0 })), maybe(fc.integer({ min: 10, max: 20 })))
  .map(([called, at, feh, modulus]) => ({ name: called, ...at, feh: feh / 10, distance_modulus: modulus }));
const rows = fc.array(row, { maxLength: 25 });
const sources = fc.tuple(rows, rows, rows, fc.nat(4));

test('cleaning a cleaned name changes nothing', () => {
  const text = fc.oneof(
    fc.string({ unit: 'grapheme' }),
    fc.string({ unit: fc.constantFrom('a', '0', '1', '2', '9', '+', '-', '−', '.', ' ') }),
  );
  fc.assert(fc.property(text, (given) => cleanName(cleanName(given)) === cleanName(given)));
});

test('neighbours are those that comparing every pair finds', () => {
  const point = fc.tuple(
    fc.oneof(fc.double({ min: 0, max: 360, noNaN: true }), fc.constantFrom(0, 360, 359.9, 0.1, Number.NaN)),
    fc.oneof(fc.double({ min: -90, max: 90, noNaN: true }), fc.constantFrom(-90, 90, 89.9, -89.95, 0)),
  );
  const list = fc.array(point, { maxLength: MOST_NEIGHBOURS });
  fc.assert(
    fc.property(list, list, fc.double({ min: 1e-4, max: 180, noNaN: true }), (a, b, radius) => {
      const columns = (points: readonly (readonly [number, number])[]) => ({
        ra: Float64Array.from(points, ([ra]) => ra),
        dec: Float64Array.from(points, ([, dec]) => dec),
      });
      const all = a.map(([ra, dec]) =>
        b
          .map(([ra2, dec2], index) => ({ index, separationDeg: separationDeg(ra, dec, ra2, dec2) }))
          .filter(({ separationDeg: apart }) => apart <= radius)
          .sort((p, q) => p.separationDeg - q.separationDeg || p.index - q.index),
      );
      expect(neighbours(columns(a), columns(b), radius)).toEqual(all);
    }),
  );
});

test('every row is an object’s, a duplicate or in quarantine, and no row is two of them', () => {
  fc.assert(
    fc.property(sources, fc.boolean(), ([a, b, c, torn], matchNames) => {
      const read = [readSource('a', a, torn), readSource('b', b), readSource('c', c)];
      const roster = mergeSources(read, policy({ matchNames, priority: ['b'] }));
      read.forEach((source, at) => {
        const count = roster.counts[at]!;
        const placed = [...roster.lines[at]!].filter((line) => line > 0);
        const repeated = roster.duplicates.filter(({ source: id }) => id === source.id).map(({ line }) => line);
        expect(count.rowsRead).toBe(source.names.length + source.quarantine.length);
        expect(count.objectRows + count.duplicates + count.quarantine).toBe(count.rowsRead);
        expect([placed.length, repeated.length]).toEqual([count.objectRows, count.duplicates]);
        expect(new Set([...placed, ...repeated])).toEqual(new Set(source.lines));
      });
      expect(new Set(roster.keys).size).toBe(roster.rows);
    }),
  );
});

test('exactly one kind of distance is settled, and a value always comes from a row of its object', () => {
  fc.assert(
    fc.property(rows, rows, (a, b) => {
      const withDistances = b.map(({ distance_modulus: modulus = Number.NaN, ...rest }): Row => ({
        ...rest,
        distance: modulus,
      }));
      const roster = mergeSources([readSource('a', a), readSource('b', withDistances)], policy());
      const has = (id: 'distance_modulus' | 'distance', object: number): boolean =>
        !Number.isNaN(roster.columns.get(id)?.values[object] ?? Number.NaN);
      for (let object = 0; object < roster.rows; object++) {
        expect(has('distance_modulus', object) && has('distance', object)).toBe(false);
        for (const column of roster.columns.values()) {
          const from = column.fromSource[object]!;
          expect(column.fromLine[object]).toBe(from < 0 ? 0 : roster.lines[from]![object]);
        }
      }
    }),
  );
});

/** What a roster says of each object, whatever the order: which lines it has and what was settled. */
function content(roster: Roster): string[] {
  return roster.keys
    .map((key, object) => {
      const lines = roster.lines.map((column) => column[object]);
      const values = [...roster.columns].map(([id, { values: column }]) => `${id}=${column[object]}`);
      return [key, ...lines, ...values].join(' ');
    })
    .sort();
}

test('the order of the rows within a source changes nothing but the order of the objects', () => {
  // Distinct names, as of two rows of one name the first stands; distinct places, as names may be missing.
  const distinct = fc.uniqueArray(fc.tuple(name, place, fc.nat(999)), {
    selector: ([called, , at]) => `${called}/${at}`,
    maxLength: 20,
  });
  const unique = distinct.map((list) => {
    const seen = new Set<string>();
    return list.flatMap(([called, at, shift], index): Row[] => {
      if (seen.has(cleanName(called)) || called === '') return [];
      seen.add(cleanName(called));
      return [{ name: called, ra: at.ra, dec: at.dec - shift * 1e-6, line: 100 + index, feh: -index / 10 }];
    });
  });
  const shuffled = (list: readonly Row[]) => fc.shuffledSubarray([...list], { minLength: list.length });
  const both = fc
    .tuple(unique, unique)
    .chain(([a, b]) => fc.tuple(fc.constant(a), fc.constant(b), shuffled(a), shuffled(b)));
  fc.assert(
    fc.property(both, ([a, b, a2, b2]) => {
      const merged = (first: readonly Row[], second: readonly Row[]) =>
        content(mergeSources([readSource('a', first), readSource('b', second)], policy()));
      expect(merged(a2, b2)).toEqual(merged(a, b));
    }),
  );
});

test('a source merged with a respelled copy of itself has the same objects and no conflicts', () => {
  const respelled = (given: string): string =>
    given
      .normalize('NFKD')
      .replace(/\p{Mn}/gu, '')
      .toUpperCase()
      .replace(/ (\d+)$/, '-00$1');
  fc.assert(
    fc.property(rows, (given) => {
      const named = given.filter((one) => one.name !== '');
      const copy = named.map((one) => ({ ...one, name: respelled(one.name ?? '') }));
      const alone = mergeSources([readSource('a', named)], policy());
      const twice = mergeSources([readSource('a', named), readSource('b', copy)], policy());
      expect(twice.keys).toEqual(alone.keys);
      expect(twice.conflicts).toEqual([]);
    }),
  );
});
