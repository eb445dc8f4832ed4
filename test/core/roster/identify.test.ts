import { expect, test } from 'vitest';
import { mergeSources } from '../../../core/roster/merge';
import { policy, readSource } from './readsource';

const arcsec = 1 / 3600;

test('no sources, and sources without rows, make an empty roster', () => {
  const none = mergeSources([], policy());
  expect([none.rows, none.names, none.counts]).toEqual([0, [], []]);
  const empty = mergeSources([readSource('a', []), readSource('b', [], 3)], policy());
  expect(empty.rows).toBe(0);
  expect(empty.counts[1]).toEqual({ source: 'b', rowsRead: 3, objectRows: 0, duplicates: 0, quarantine: 3 });
});

test('two spellings of one name in two sources are one object, shown under the name of the more trusted source', () => {
  const sources = [readSource('a', [{ name: 'Tarnow 7' }]), readSource('b', [{ name: 'TARNOW-07' }])];
  const roster = mergeSources(sources, policy({ priority: ['b', 'a'] }));
  expect([roster.names, roster.keys]).toEqual([['TARNOW-07'], ['tarnow7']]);
  expect(roster.lines.map((lines) => [...lines])).toEqual([[2], [2]]);
});

test('objects stand in the order of the most trusted source, then of the others', () => {
  const sources = [
    readSource('a', [{ name: 'One' }, { name: 'Two', ra: 50 }]),
    readSource('b', [
      { name: 'Three', ra: 90 },
      { name: 'Two', ra: 50 },
    ]),
  ];
  expect(mergeSources(sources, policy({ priority: ['b'] })).names).toEqual(['Three', 'Two', 'One']);
});

test('rows of different names within the radius are one object, beyond it two', () => {
  const at = (dec: number): number =>
    mergeSources([readSource('a', [{ name: 'One', dec: 20 }]), readSource('b', [{ name: 'Uno', dec }])], policy()).rows;
  expect(at(20 + 29.9 * arcsec)).toBe(1);
  expect(at(20 + 30.1 * arcsec)).toBe(2);
});

test('an alias is applied before names are compared, in any spelling of it', () => {
  const sources = [readSource('a', [{ name: 'Tarnow 7' }]), readSource('b', [{ name: 'tn-07', ra: 10.2 }])];
  expect(mergeSources(sources, policy()).rows).toBe(2);
  expect(mergeSources(sources, policy({ aliases: { 'TN 7': 'Tarnow 7' } })).rows).toBe(1);
});

test('a later row of one source for the same name is listed as a duplicate, and the first stands', () => {
  const source = readSource('a', [
    { name: 'One', feh: -1 },
    { name: 'ONE', feh: -2, line: 9 },
  ]);
  const roster = mergeSources([source], policy());
  expect(roster.duplicates).toEqual([{ source: 'a', line: 9, name: 'ONE', firstLine: 2 }]);
  expect([...roster.columns.get('feh')!.values]).toEqual([-1]);
  expect(roster.counts[0]).toEqual({ source: 'a', rowsRead: 2, objectRows: 1, duplicates: 1, quarantine: 0 });
  expect(roster.problems.map(({ code, line }) => [code, line])).toEqual([['duplicate-name', 9]]);
});

test('thousands of duplicates are all listed, but told in a few problems', () => {
  const source = readSource(
    'a',
    Array.from({ length: 150_000 }, () => ({ name: 'One' })),
  );
  const roster = mergeSources([source], policy());
  expect(roster.duplicates).toHaveLength(149_999);
  expect(roster.problems.length).toBeLessThan(100);
  expect(roster.problems.reduce((sum, { count }) => sum + (count ?? 1), 0)).toBe(149_999);
});

test('rows without a name are named after their source and place, and are never duplicates of each other', () => {
  const roster = mergeSources([readSource('a', [{ ra: 187.70593, dec: -12.39112 }, {}, {}])], policy());
  expect(roster.names).toEqual(['a J187.7059-12.3911', 'a J10.0000+20.0000', 'a J10.0000+20.0000']);
  expect(roster.duplicates).toEqual([]);
  expect(roster.keys).toEqual(['aj1877059-123911', 'aj100000+200000', 'aj100000+200000#2']);
});

test('a name of bare punctuation is shown, but the object is keyed by its place', () => {
  const roster = mergeSources([readSource('a', [{ name: '***' }])], policy());
  expect([roster.names, roster.keys]).toEqual([['***'], ['aj100000+200000']]);
});

test('with names left unmatched, namesakes apart are two objects with keys of their own', () => {
  const sources = [readSource('a', [{ name: 'One' }]), readSource('b', [{ name: 'One', ra: 50 }])];
  const roster = mergeSources(sources, policy({ matchNames: false }));
  expect(roster.keys).toEqual(['one', 'one#2']);
  expect(roster.conflicts).toEqual([]);
});

test('namesakes further apart than the radius are one object, listed as a conflict of position and as a problem', () => {
  const sources = [readSource('a', [{ name: 'One' }]), readSource('b', [{ name: 'One', dec: 20.5, line: 7 }])];
  const roster = mergeSources(sources, policy());
  expect(roster.rows).toBe(1);
  const [conflict] = roster.conflicts;
  expect([conflict?.quantity, conflict?.chosen.source, conflict?.other.source]).toEqual(['position', 'a', 'b']);
  expect(conflict?.other.sigma).toBeCloseTo(0.5, 10);
  expect(roster.problems).toMatchObject([{ code: 'far-namesake', where: 'b.csv', line: 7, found: 'One' }]);
});

test('of several objects within the radius the nearest is taken, and the row is listed as ambiguous', () => {
  const near = readSource('a', [
    { name: 'One', dec: 20 },
    { name: 'Two', dec: 20 + 20 * arcsec },
  ]);
  const roster = mergeSources([near, readSource('b', [{ name: 'Uno', dec: 20 + 12 * arcsec, line: 5 }])], policy());
  expect([...roster.lines[1]!]).toEqual([0, 5]);
  expect(roster.problems).toMatchObject([{ code: 'ambiguous-match', where: 'b.csv', line: 5, found: 'Uno' }]);
});

test('of two rows near one object the closer gets it; the other is an object of its own and is listed', () => {
  const rows = [
    { name: 'Uno', dec: 20 + 10 * arcsec, line: 5 },
    { name: 'Due', dec: 20 + 2 * arcsec, line: 6 },
  ];
  const roster = mergeSources([readSource('a', [{ name: 'One' }]), readSource('b', rows)], policy());
  expect(roster.names).toEqual(['One', 'Uno']);
  expect([...roster.lines[1]!]).toEqual([6, 5]);
  expect(roster.problems).toMatchObject([{ code: 'ambiguous-match', where: 'b.csv', line: 5, found: 'One' }]);
});

test('a match by name goes before a closer one by place', () => {
  const near = readSource('a', [
    { name: 'One', dec: 20 },
    { name: 'Two', dec: 20 + 20 * arcsec },
  ]);
  const roster = mergeSources([near, readSource('b', [{ name: 'Two', dec: 20 }])], policy());
  expect([...roster.lines[1]!]).toEqual([0, 2]);
});

test('an object found by place is known to a third source by either name', () => {
  const sources = [
    readSource('a', [{ name: 'One' }]),
    readSource('b', [{ name: 'Uno' }]),
    readSource('c', [{ name: 'UNO', ra: 10.1 }]),
  ];
  expect(mergeSources(sources, policy()).rows).toBe(1);
});

test('when a third source holds both names of one object as two, its own name goes first and nothing is lost', () => {
  const sources = [
    readSource('a', [{ name: 'One' }]),
    readSource('b', [{ name: 'Uno' }]),
    readSource('c', [
      { name: 'Uno', ra: 10.1 },
      { name: 'One', ra: 10 },
    ]),
  ];
  const roster = mergeSources(sources, policy());
  expect(roster.keys).toEqual(['one', 'uno']);
  expect(roster.lines.map((lines) => [...lines])).toEqual([
    [2, 0],
    [2, 0],
    [3, 2],
  ]);
});
