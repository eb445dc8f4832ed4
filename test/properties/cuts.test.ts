import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Judged, Outcome } from '../../core/cuts/contract';
import type { Cut } from '../../core/cuts/cut';
import { CUT_KINDS } from '../../core/cuts/kinds';
import { judgeLedger } from '../../core/cuts/ledger';
import { MISSING_RULES } from '../../core/cuts/missing';
import { judgeCut } from '../../core/cuts/outcomecache';
import { planeAngle } from '../../core/cuts/planeangle';
import { type Verdict, VERDICTS } from '../../core/cuts/result';
import { unitVector } from '../../core/frame/sphere';
import type { Bitset } from '../../core/table/bitset';
import { cutOf, objectsWith } from '../core/cuts/objects';

const IDS = 'feh ebv a_v gal_b x y z cyl_r v_phi toomre_speed r v_x v_y v_z'.split(' ');

// Small whole numbers fall on limits and vertices, and meet each other.
const whole = fc.integer({ min: -4, max: 4 });
const number = fc.double({ min: -5, max: 5, noNaN: true });
const value = fc.oneof(
  { weight: 4, arbitrary: whole },
  { weight: 4, arbitrary: number },
  fc.constantFrom(Number.NaN, Infinity, -Infinity),
);
const sigma = fc.oneof(
  { weight: 4, arbitrary: fc.double({ min: 0, max: 2, noNaN: true }) },
  fc.constantFrom(Number.NaN, 0, 1, Infinity),
);
const objects: fc.Arbitrary<Judged> = fc
  .array(fc.array(fc.tuple(value, sigma), { minLength: IDS.length, maxLength: IDS.length }), { maxLength: 70 })
  .chain((rows) => {
    const columns = Object.fromEntries(IDS.map((id, at) => [id, rows.map((row) => row[at]!)]));
    const diagonal = rows.flatMap((row) =>
      Array.from({ length: 21 }, (_, at) => ([0, 6, 11, 15, 18, 20].includes(at) ? row[at % 14]![1] : 0)),
    );
    return fc.constantFrom(objectsWith(columns), objectsWith(columns, Float64Array.from(diagonal)));
  });
const margin = fc.constantFrom(0, 0.5, 1, 3);

const limit = fc.option(whole);
const positive = fc.option(fc.integer({ min: 0, max: 4 }));
const action = fc.constantFrom('keep', 'drop');
const quantity = fc.constantFrom('x', 'y', 'r', 'not-there');
const polygon = fc.array(fc.tuple(whole, whole), { minLength: 3, maxLength: 20 });
const PARAMETERS: Record<(typeof CUT_KINDS)[number]['kind'], fc.Arbitrary<object>> = {
  metallicity: fc.record({ min: limit, max: limit }),
  extinction: fc.record({ ebvMax: limit, avMax: limit, absBMin: positive }),
  disc: fc.record({
    combine: fc.constantFrom('any', 'all'),
    absZMin: positive,
    cylRMin: positive,
    vPhiMax: limit,
    toomreMin: positive,
  }),
  plane: fc.record({
    preset: fc.constant(null),
    poleL: fc.integer({ min: 0, max: 360 }),
    poleB: fc.integer({ min: -90, max: 90 }),
    measure: fc.constantFrom('orbital-pole', 'position'),
    sense: fc.constantFrom('with', 'either'),
    angleMax: fc.integer({ min: 0, max: 180 }),
    action,
  }),
  range: fc.record({ quantity, min: limit, max: limit, absolute: fc.boolean() }),
  lasso: fc.record({ x: quantity, y: quantity, xLog: fc.boolean(), yLog: fc.boolean(), polygon, action }),
  named: fc.record({
    objects: fc.array(
      fc.record({
        key: fc.constantFrom('object0', 'object1', 'object33', 'nobody'),
        name: fc.constant('N'),
        action,
        reason: fc.constant(''),
      }),
      { maxLength: 3 },
    ),
  }),
};
const cutsOf = (kind: keyof typeof PARAMETERS): fc.Arbitrary<Cut> =>
  fc
    .tuple(PARAMETERS[kind], fc.constantFrom(...MISSING_RULES), fc.boolean())
    .map(([parameters, missing, on]) => cutOf(kind, parameters, { missing, on }));
const KINDS = CUT_KINDS.map(({ kind }) => kind);
const ledgers = fc
  .array(fc.oneof(...KINDS.map(cutsOf)), { maxLength: 6 })
  .map((cuts) => cuts.map((cut, at) => ({ ...cut, id: `cut-${at}` })));

const within = (inner: Bitset, outer: Bitset): boolean => inner.without(outer).count() === 0;
const verdicts = (ledger: readonly Cut[], judged: Judged, by: number): Verdict[] =>
  Array.from(judgeLedger(ledger, judged, { margin: by }).verdicts, (code) => VERDICTS[code]!);

describe.each(KINDS)('what a cut of kind %s says', (kind) => {
  test('is nested, and nothing unjudged is in it', () => {
    fc.assert(
      fc.property(cutsOf(kind), objects, margin, (cut, judged, by) => {
        const { surely, passes, possibly, unjudged } = judgeCut(cut, judged, by);
        expect(within(surely, passes) && within(passes, possibly)).toBe(true);
        expect(unjudged.and(possibly).count()).toBe(0);
        if (cut.missing !== 'unjudged') expect(unjudged.count()).toBe(0);
        for (const set of [surely, passes, possibly, unjudged]) {
          expect(set.rows().every((row) => row < judged.rows)).toBe(true);
        }
      }),
    );
  });

  test('without a margin has nothing between sure and possible', () => {
    fc.assert(
      fc.property(cutsOf(kind), objects, (cut, judged) => {
        const { surely, passes, possibly } = judgeCut(cut, judged, 0);
        expect(surely.equals(passes) && passes.equals(possibly)).toBe(true);
      }),
    );
  });

  test('at best values does not hang on the margin, and a wider margin is never surer', () => {
    fc.assert(
      fc.property(cutsOf(kind), objects, (cut, judged) => {
        const [narrow, wide] = [judgeCut(cut, judged, 1), judgeCut(cut, judged, 2)];
        expect(narrow.passes.equals(wide.passes)).toBe(true);
        const [open, wideOpen] = [narrow.possibly.or(narrow.unjudged), wide.possibly.or(wide.unjudged)];
        expect(within(wide.surely, narrow.surely) && within(open, wideOpen)).toBe(true);
      }),
    );
  });
});

describe.each(['plane', 'lasso'] as const)('dropping by %s', (kind) => {
  test('is the opposite of keeping', () => {
    fc.assert(
      fc.property(PARAMETERS[kind], objects, margin, (parameters, judged, by) => {
        const [keep, drop] = ['keep', 'drop'].map((what) =>
          judgeCut(cutOf(kind, { ...parameters, action: what }), judged, by),
        ) as [Outcome, Outcome];
        expect(drop.unjudged.equals(keep.unjudged)).toBe(true);
        expect(drop.surely.equals(keep.possibly.or(keep.unjudged).not())).toBe(true);
        expect(drop.passes.equals(keep.passes.or(keep.unjudged).not())).toBe(true);
        expect(drop.possibly.equals(keep.surely.or(keep.unjudged).not())).toBe(true);
      }),
    );
  });
});

describe('a lasso', () => {
  type Cell = readonly [number, number];
  const cell = fc.tuple(whole, fc.constantFrom(Number.NaN, 0, 0.25, 0.5, 1, 3));
  const points = fc.array(fc.tuple(cell, cell), { minLength: 1, maxLength: 40 });
  const judge = (shape: readonly (readonly number[])[], cells: readonly (readonly [Cell, Cell])[]): Verdict[] => {
    const parameters = { x: 'x', y: 'y', xLog: false, yLog: false, polygon: shape, action: 'keep' };
    const judged = objectsWith({ x: cells.map(([x]) => x), y: cells.map(([, y]) => y) });
    return verdicts([cutOf('lasso', parameters)], judged, 1);
  };

  test('says the same of everything moved and stretched together', () => {
    // Whole numbers and powers of two keep the arithmetic exact.
    const stretch = fc.constantFrom(0.25, 0.5, 1, 2, 8);
    fc.assert(
      fc.property(polygon, points, whole, whole, stretch, stretch, (shape, cells, dx, dy, sx, sy) => {
        const place = ([x, y]: readonly number[]): number[] => [sx * (x! + dx), sy * (y! + dy)];
        const moved = cells.map(([[x, ex], [y, ey]]) => {
          const [px, py] = place([x, y]);
          return [[px!, sx * ex] as const, [py!, sy * ey] as const] as const;
        });
        expect(judge(shape.map(place), moved)).toEqual(judge(shape, cells));
      }),
    );
  });

  test('says the same wherever and whichever way round its shape was begun', () => {
    fc.assert(
      fc.property(polygon, points, fc.nat(19), (shape, cells, turn) => {
        const first = turn % shape.length;
        const turned = [...shape.slice(first), ...shape.slice(0, first)];
        const said = judge(shape, cells);
        expect(judge(turned, cells)).toEqual(said);
        expect(judge(shape.toReversed(), cells)).toEqual(said);
      }),
    );
  });

  test('says the same when every edge gets a vertex in its middle', () => {
    fc.assert(
      fc.property(polygon, points, (shape, cells) => {
        const even = shape.map(([x, y]) => [2 * x, 2 * y]);
        const middles = even.flatMap(([x, y], at) => {
          const [nextX, nextY] = even[(at + 1) % even.length]!;
          return [
            [x!, y!],
            [(x! + nextX!) / 2, (y! + nextY!) / 2],
          ];
        });
        expect(judge(middles, cells)).toEqual(judge(even, cells));
      }),
    );
  });
});

describe('a ledger', () => {
  test('gives each object the verdict that follows from what each cut says of it', () => {
    fc.assert(
      fc.property(ledgers, objects, margin, (ledger, judged, by) => {
        const result = judgeLedger(ledger, judged, { margin: by });
        const enabled = result.outcomes.filter((_, at) => ledger[at]!.on);
        const expected = Array.from({ length: judged.rows }, (_, row): Verdict => {
          if (enabled.some(({ forced }) => forced?.has(row))) return 'kept';
          if (enabled.some(({ possibly, unjudged }) => !possibly.has(row) && !unjudged.has(row))) return 'dropped';
          if (enabled.some(({ unjudged }) => unjudged.has(row))) return 'unjudged';
          return enabled.every(({ surely }) => surely.has(row)) ? 'kept' : 'borderline';
        });
        expect(Array.from(result.verdicts, (code) => VERDICTS[code])).toEqual(expected);
        for (const verdict of VERDICTS) {
          expect(result.counts[verdict]).toBe(expected.filter((one) => one === verdict).length);
        }
        expect(result.counts.sample).toBe(result.sample.count());
        const { kept, borderline, dropped, unjudged } = result.counts;
        expect(kept + borderline + dropped + unjudged).toBe(judged.rows);
      }),
    );
  });

  test('counts in turn, alone and only by it what each cut fails, object by object', () => {
    fc.assert(
      fc.property(ledgers, objects, (ledger, judged) => {
        const { attrition, outcomes } = judgeLedger(ledger, judged, { margin: 1 });
        const rows = Array.from({ length: judged.rows }, (_, row) => row);
        const on = outcomes.filter((_, at) => ledger[at]!.on);
        const fails = (outcome: Outcome, row: number): boolean =>
          !outcome.passes.has(row) && !outcome.unjudged.has(row);
        const forced = (row: number): boolean => on.some((outcome) => outcome.forced?.has(row));
        let left = rows;
        attrition.forEach((counted, at) => {
          const outcome = outcomes[at]!;
          const failing = rows.filter((row) => fails(outcome, row));
          const only = failing.filter((row) => !forced(row) && on.filter((other) => fails(other, row)).length === 1);
          const next = ledger[at]!.on ? left.filter((row) => forced(row) || !fails(outcome, row)) : left;
          expect(counted).toMatchObject({
            alone: failing.length,
            onlyByIt: ledger[at]!.on ? only.length : 0,
            inTurn: left.length - next.length,
            left: next.length,
            unjudged: outcome.unjudged.count(),
          });
          expect(counted.onlyByIt).toBeLessThanOrEqual(counted.alone);
          left = next;
        });
      }),
    );
  });

  test('gives the same verdicts in any order', () => {
    fc.assert(
      fc.property(ledgers, objects, margin, fc.nat(5), (ledger, judged, by, turn) => {
        const said = verdicts(ledger, judged, by);
        expect(verdicts(ledger.toReversed(), judged, by)).toEqual(said);
        expect(verdicts([...ledger.slice(turn), ...ledger.slice(0, turn)], judged, by)).toEqual(said);
      }),
    );
  });
});

test('the angle from a plane does not change when everything turns about its pole', () => {
  const component = fc.double({ min: -200, max: 200, noNaN: true });
  const vector = fc.tuple(component, component, component);
  const angle = fc.double({ min: 0, max: 360, noNaN: true });
  const latitude = fc.double({ min: -90, max: 90, noNaN: true });
  const measures = fc.constantFrom('orbital-pole' as const, 'position' as const);
  fc.assert(
    fc.property(vector, vector, angle, latitude, angle, measures, (r, v, poleL, poleB, turn, measure) => {
      const sine = Math.hypot(r[1] * v[2] - r[2] * v[1], r[2] * v[0] - r[0] * v[2], r[0] * v[1] - r[1] * v[0]);
      // The direction of the pole of a nearly radial orbit is lost in rounding.
      fc.pre(sine > 1e-3 * Math.hypot(...r) * Math.hypot(...v) && Math.hypot(...r) > 1e-3 && Math.hypot(...v) > 1e-3);
      const pole = unitVector(poleL, poleB);
      const [sin, cos] = [Math.sin((turn * Math.PI) / 180), Math.cos((turn * Math.PI) / 180)];
      // Rotation by an angle about an axis p: u cos + (p × u) sin + p (p·u)(1 − cos).
      const turned = (u: readonly [number, number, number]): number[] => {
        const along = (pole[0] * u[0] + pole[1] * u[1] + pole[2] * u[2]) * (1 - cos);
        return [0, 1, 2].map((i) => {
          const [j, k] = [(i + 1) % 3, (i + 2) % 3];
          return u[i]! * cos + (pole[j]! * u[k]! - pole[k]! * u[j]!) * sin + pole[i]! * along;
        });
      };
      const at = (place: readonly number[], speed: readonly number[]): number => {
        const [x, y, z, vx, vy, vz] = [...place, ...speed].map((one) => [one]);
        const judged = objectsWith({ x: x!, y: y!, z: z!, v_x: vx!, v_y: vy!, v_z: vz! });
        return planeAngle({ poleL, poleB, measure, sense: 'with' }, judged)!.values[0]!;
      };
      // Rounding of 1e-16, made 1000 times worse by a pole that is nearly lost, in degrees.
      expect(Math.abs(at(turned(r), turned(v)) - at(r, v))).toBeLessThan(1e-10);
    }),
  );
});
