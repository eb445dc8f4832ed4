import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Cut } from '../../../core/cuts/cut';
import { cutSchema } from '../../../core/cuts/cut';
import { judgeLedger } from '../../../core/cuts/ledger';
import { type Verdict, VERDICTS } from '../../../core/cuts/result';
import { failedCuts } from '../../../core/cuts/way';
import { cutOf, objectsWith } from './objects';

const verdictsOf = (ledger: readonly Cut[], objects: ReturnType<typeof objectsWith>, margin = 1): Verdict[] =>
  Array.from(judgeLedger(ledger, objects, { margin }).verdicts, (code) => VERDICTS[code]!);
const metals = (max: number, more: object = {}): Cut => cutOf('metallicity', { min: null, max }, more);

describe('degenerate benches', () => {
  it('an empty ledger keeps everything', () => {
    expect(verdictsOf([], objectsWith({ feh: [-1, Number.NaN] }))).toEqual(['kept', 'kept']);
  });

  it('no objects give no verdicts and zero counts', () => {
    const result = judgeLedger([metals(-1)], objectsWith({ feh: [] }), { margin: 1 });
    expect(result.counts).toEqual({ objects: 0, kept: 0, borderline: 0, dropped: 0, unjudged: 0, sample: 0 });
  });

  it('a cut whose quantity the data lack leaves every object unjudged', () => {
    expect(verdictsOf([metals(-1)], objectsWith({ r: [1, 2] }))).toEqual(['unjudged', 'unjudged']);
  });
});

describe('one limit', () => {
  it('keeps a value on the limit', () => {
    expect(verdictsOf([metals(-1)], objectsWith({ feh: [-1, -0.999] }))).toEqual(['kept', 'dropped']);
  });

  it('calls borderline what one sigma could turn, on either side', () => {
    const objects = objectsWith({
      feh: [
        [-1.3, 0.2],
        [-1.1, 0.2],
        [-0.9, 0.2],
        [-0.7, 0.2],
      ],
    });
    expect(verdictsOf([metals(-1)], objects)).toEqual(['kept', 'borderline', 'borderline', 'dropped']);
    expect(verdictsOf([metals(-1)], objects, 0)).toEqual(['kept', 'kept', 'dropped', 'dropped']);
  });

  it('puts into the sample the borderline objects that pass at best values', () => {
    const { counts, sample } = judgeLedger(
      [metals(-1)],
      objectsWith({
        feh: [
          [-1.1, 0.2],
          [-0.9, 0.2],
        ],
      }),
      { margin: 1 },
    );
    expect(counts).toMatchObject({ borderline: 2, sample: 1 });
    expect([...sample.rows()]).toEqual([0]);
  });

  it.each([
    ['unjudged', 'unjudged'],
    ['drop', 'dropped'],
    ['keep', 'kept'],
  ] as const)('a missing value with rule "%s" is %s', (missing, verdict) => {
    expect(verdictsOf([metals(-1, { missing })], objectsWith({ feh: [Number.NaN] }))).toEqual([verdict]);
  });
});

describe('several tests', () => {
  const disc = (combine: 'any' | 'all'): Cut =>
    cutOf('disc', { combine, absZMin: 4, cylRMin: null, vPhiMax: null, toomreMin: 210 });
  // Halo by both, disc-like by |z| only, by speed only, by both; then with an unknown speed far from and near the plane.
  const objects = objectsWith({ z: [-9, 1, 9, 1, 9, 1], toomre_speed: [300, 300, 50, 50, Number.NaN, Number.NaN] });

  it('"all" drops only what every test calls disc-like, and an unknown test decides where it must', () => {
    expect(verdictsOf([disc('all')], objects)).toEqual(['kept', 'kept', 'kept', 'dropped', 'kept', 'unjudged']);
  });

  it('"any" drops what one test calls disc-like, and a known failure outweighs an unknown', () => {
    expect(verdictsOf([disc('any')], objects)).toEqual([
      'kept',
      'dropped',
      'dropped',
      'dropped',
      'unjudged',
      'dropped',
    ]);
  });

  it('a lasso keeps or drops what lies inside, by the even-odd rule', () => {
    const square = {
      x: 'x',
      y: 'y',
      xLog: false,
      yLog: false,
      polygon: [
        [0, 0],
        [2, 0],
        [2, 2],
        [0, 2],
      ],
    };
    const points = objectsWith({ x: [1, 3, Number.NaN], y: [1, 1, 1] });
    expect(verdictsOf([cutOf('lasso', { ...square, action: 'keep' })], points)).toEqual([
      'kept',
      'dropped',
      'unjudged',
    ]);
    expect(verdictsOf([cutOf('lasso', { ...square, action: 'drop' })], points)).toEqual([
      'dropped',
      'kept',
      'unjudged',
    ]);
  });

  it('an object kept by name stays whatever other cuts say, and one dropped by name goes', () => {
    const entry = (key: string, action: string): object => ({ key, name: key, action, reason: 'by eye' });
    const named = cutOf('named', { objects: [entry('object0', 'keep'), entry('object1', 'drop')] });
    const result = judgeLedger([metals(-1), named], objectsWith({ feh: [0, -2] }), { margin: 1 });
    expect([...result.verdicts].map((code) => VERDICTS[code])).toEqual(['kept', 'dropped']);
    expect(failedCuts([metals(-1), named], result, 1)).toEqual(['named']);
  });

  it('the pole of a prograde orbit lies south, and an orbit in the plane of the pole is found', () => {
    // At x = 8 kpc moving along -y: clockwise seen from the north, so prograde; r × v points to -z.
    const orbit = objectsWith({ x: [8], y: [0], z: [0], v_x: [0], v_y: [-220], v_z: [0] });
    const plane = (poleB: number, sense: 'with' | 'either'): Cut =>
      cutOf('plane', { preset: null, poleL: 0, poleB, measure: 'orbital-pole', sense, angleMax: 5, action: 'drop' });
    expect(verdictsOf([plane(-90, 'with')], orbit)).toEqual(['dropped']);
    expect(verdictsOf([plane(90, 'with')], orbit)).toEqual(['kept']);
    expect(verdictsOf([plane(90, 'either')], orbit)).toEqual(['dropped']);
  });
});

describe('attrition', () => {
  const ledger = [metals(-1), cutOf('range', { quantity: 'r', min: 5, max: null, absolute: false })];
  const objects = objectsWith({ feh: [-2, 0, 0, -2], r: [10, 10, 1, 1] });

  it('counts in turn, alone, only by it, and what is left', () => {
    const { attrition } = judgeLedger(ledger, objects, { margin: 0 });
    expect(attrition).toMatchObject([
      { inTurn: 2, alone: 2, onlyByIt: 1, left: 2 },
      { inTurn: 1, alone: 2, onlyByIt: 1, left: 1 },
    ]);
  });

  it('a disabled cut removes nothing and still says what it would do alone', () => {
    const { attrition, counts } = judgeLedger([{ ...ledger[0]!, on: false }, ledger[1]!], objects, { margin: 0 });
    expect(attrition[0]).toMatchObject({ on: false, inTurn: 0, alone: 2, onlyByIt: 0, left: 4 });
    expect(counts.kept).toBe(2);
  });
});

describe('properties', () => {
  const value = fc.oneof(fc.constant(Number.NaN), fc.double({ min: -3, max: 1, noNaN: true }));
  const cells = fc.array(fc.tuple(value, fc.double({ min: 0, max: 0.5, noNaN: true }), value), {
    minLength: 0,
    maxLength: 70,
  });
  const make = (rows: readonly (readonly [number, number, number])[]) =>
    objectsWith({ feh: rows.map(([feh, sigma]) => [feh, sigma] as const), r: rows.map(([, , r]) => r) });
  const ledger = [metals(-1), cutOf('range', { quantity: 'r', min: -1, max: 0.5, absolute: false })];

  it('verdicts add up, and what is left plus what was removed in turn is everything', () => {
    fc.assert(
      fc.property(cells, (rows) => {
        const { counts, attrition } = judgeLedger(ledger, make(rows), { margin: 1 });
        expect(counts.kept + counts.borderline + counts.dropped + counts.unjudged).toBe(rows.length);
        expect(attrition.reduce((sum, { inTurn }) => sum + inTurn, attrition.at(-1)!.left)).toBe(rows.length);
      }),
    );
  });

  it('the order of the ledger changes neither verdicts nor what a cut does alone or only by it', () => {
    fc.assert(
      fc.property(cells, (rows) => {
        const [forward, backward] = [
          judgeLedger(ledger, make(rows), { margin: 1 }),
          judgeLedger(ledger.toReversed(), make(rows), { margin: 1 }),
        ];
        expect(forward.verdicts).toEqual(backward.verdicts);
        for (const row of forward.attrition) {
          expect(backward.attrition.find(({ cut }) => cut === row.cut)).toMatchObject({
            alone: row.alone,
            onlyByIt: row.onlyByIt,
          });
        }
      }),
    );
  });

  it('a tighter limit never lets more into the sample', () => {
    fc.assert(
      fc.property(cells, fc.double({ min: 0, max: 1, noNaN: true }), (rows, step) => {
        const objects = make(rows);
        const size = (max: number): number => judgeLedger([metals(max)], objects, { margin: 1 }).counts.sample;
        expect(size(-1 - step)).toBeLessThanOrEqual(size(-1));
      }),
    );
  });
});

it('the schema refuses parameters that cannot be', () => {
  const refused = (kind: string, parameters: object): boolean =>
    !cutSchema.safeParse({ ...metals(-1), kind, parameters }).success;
  expect(refused('metallicity', { min: null, max: 'low' })).toBe(true);
  expect(refused('extinction', { ebvMax: null, avMax: null, absBMin: 91 })).toBe(true);
  expect(refused('metallicity', { min: null, max: -1, extra: 1 })).toBe(true);
  expect(refused('sieve', {})).toBe(true);
});
