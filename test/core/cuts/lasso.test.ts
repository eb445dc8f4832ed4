import { describe, expect, it } from 'vitest';
import { judgeLedger } from '../../../core/cuts/ledger';
import { type Verdict, VERDICTS } from '../../../core/cuts/result';
import { cutOf, objectsWith } from './objects';

type Cells = readonly (number | readonly [number, number])[];
type Vertices = readonly (readonly [number, number])[];

const SQUARE: Vertices = [
  [0, 0],
  [2, 0],
  [2, 2],
  [0, 2],
];
/** Its left side rises from (0, 0) to (2, 2): at height y it stands at x = y. */
const SLANTED: Vertices = [
  [0, 0],
  [4, 0],
  [6, 2],
  [2, 2],
];

function verdicts(polygon: Vertices, x: Cells, y: Cells, more: { margin?: number; log?: boolean } = {}): Verdict[] {
  const axes = { x: 'x', y: 'y', xLog: more.log ?? false, yLog: more.log ?? false };
  const cut = cutOf('lasso', { ...axes, polygon, action: 'keep' });
  const { verdicts: codes } = judgeLedger([cut], objectsWith({ x, y }), { margin: more.margin ?? 1 });
  return Array.from(codes, (code) => VERDICTS[code]!);
}
/** One object with an error of 0.2 in x and none in y. */
const withErrorInX = (polygon: Vertices, x: number, y: number): Verdict => verdicts(polygon, [[x, 0.2]], [y])[0]!;
/** One object with an error of 0.2 in y and none in x. */
const withErrorInY = (polygon: Vertices, x: number, y: number): Verdict => verdicts(polygon, [x], [[y, 0.2]])[0]!;

describe('a lasso and an object with errors on one axis only', () => {
  it('a vertical edge within the error is near, one beyond it is not', () => {
    expect(withErrorInX(SQUARE, 0.02, 1)).toBe('borderline');
    expect(withErrorInX(SQUARE, -0.02, 1)).toBe('borderline');
    expect(withErrorInX(SQUARE, 0.21, 1)).toBe('kept');
    expect(withErrorInX(SQUARE, -0.21, 1)).toBe('dropped');
  });

  it('a slanted edge is as far as it stands along the axis with the error', () => {
    expect(withErrorInX(SLANTED, 1.02, 1)).toBe('borderline');
    expect(withErrorInX(SLANTED, 0.81, 1)).toBe('borderline');
    // Only 0.13 or 0.14 away at right angles, but 0.21 along x.
    expect(withErrorInX(SLANTED, 1.21, 1)).toBe('kept');
    expect(withErrorInX(SLANTED, 0.79, 1)).toBe('dropped');
    expect(withErrorInY(SLANTED, 1, 0.81)).toBe('borderline');
    expect(withErrorInY(SLANTED, 1, 0.79)).toBe('kept');
  });

  it('an edge along the other axis is never reached, however near it is', () => {
    expect(withErrorInX(SQUARE, 1, 1.999)).toBe('kept');
    expect(withErrorInX(SQUARE, 1, 2.001)).toBe('dropped');
    expect(withErrorInY(SQUARE, 0.001, 1)).toBe('kept');
  });

  it('an edge on which the object stands is near, and so is a vertex it can reach', () => {
    expect(withErrorInX(SQUARE, 1, 0)).toBe('borderline');
    expect(withErrorInX(SQUARE, -0.1, 2)).toBe('borderline');
    expect(withErrorInX(SQUARE, -0.3, 2)).toBe('dropped');
  });
});

describe('a lasso and an object with errors on both axes', () => {
  const at = (x: number, y: number, sx: number, sy: number, margin = 1): Verdict =>
    verdicts(SQUARE, [[x, sx]], [[y, sy]], { margin })[0]!;

  it('the ellipse of the errors, not its box, has to reach a corner', () => {
    // From the corner (2, 2) by (0.3, 0.4): 0.3/0.5 and 0.4/0.5 make exactly 1 σ, by a hair more or less.
    expect(at(2.3, 2.4, 0.501, 0.501)).toBe('borderline');
    expect(at(2.3, 2.4, 0.499, 0.499)).toBe('dropped');
    // 0.3/0.4 and 0.4/0.8: √(0.5625 + 0.25) = 0.901 σ.
    expect(at(2.3, 2.4, 0.4, 0.8)).toBe('borderline');
    expect(at(2.3, 2.4, 0.4, 0.8, 0.9)).toBe('dropped');
  });

  it('a margin of 0 leaves nothing borderline', () => {
    expect(at(0.001, 1, 1, 1, 0)).toBe('kept');
    expect(at(-0.001, 1, 1, 1, 0)).toBe('dropped');
  });

  it('an infinite error reaches every edge that the other axis allows', () => {
    expect(at(1, 1, Infinity, 0.1)).toBe('borderline');
    expect(at(100, 1, Infinity, 0.1)).toBe('borderline');
    expect(at(100, 3, Infinity, 0.1)).toBe('dropped');
    expect(at(100, 100, Infinity, Infinity)).toBe('borderline');
  });

  it('an infinite value lies outside for certain', () => {
    expect(at(Infinity, 1, 1, 1)).toBe('dropped');
    expect(at(1, -Infinity, Infinity, Infinity)).toBe('dropped');
  });
});

it('an object on the outline without errors is inside on the left and below, outside on the right and above', () => {
  expect(verdicts(SQUARE, [0, 1, 2, 1], [1, 0, 1, 2])).toEqual(['kept', 'kept', 'dropped', 'dropped']);
});

it('a star that crosses itself is open where its loops overlap', () => {
  const star: Vertices = [0, 2, 4, 1, 3].map((corner) => {
    const turn = Math.PI / 2 + (2 * Math.PI * corner) / 5;
    return [Math.cos(turn), Math.sin(turn)];
  });
  expect(verdicts(star, [0, 0, 0], [0, 0.9, 1.1])).toEqual(['dropped', 'kept', 'dropped']);
});

it('a shape without extent holds nothing', () => {
  const nowhere: Vertices = [
    [1, 1],
    [1, 1],
    [1, 1],
  ];
  expect(verdicts(nowhere, [1], [1])).toEqual(['dropped']);
});

describe('a lasso on logarithmic axes', () => {
  const DECADES: Vertices = [
    [1, 1],
    [100, 1],
    [100, 100],
    [1, 100],
  ];
  const onLog = (x: Cells, y: Cells): Verdict[] => verdicts(DECADES, x, y, { log: true });

  it('what is not positive has no place on the axis and lies outside, whatever its error', () => {
    expect(onLog([0, -5, [0, 50], [-0.1, 50], 10], [10, 10, 10, 10, [-1, 50]])).toEqual(Array(5).fill('dropped'));
  });

  it('a missing value stays unjudged', () => {
    expect(onLog([Number.NaN, 10], [10, Number.NaN])).toEqual(['unjudged', 'unjudged']);
  });

  it('one σ is σ/(x ln 10)', () => {
    // log10(90) = 1.9542 stands 0.0458 below the edge at 2; 0.0458 · 90 · ln 10 = 9.48.
    expect(onLog([[90, 9.6]], [10])).toEqual(['borderline']);
    expect(onLog([[90, 9.4]], [10])).toEqual(['kept']);
  });

  it('a vertex that is not positive lies at the end of the axis', () => {
    const open: Vertices = DECADES.map(([x, y]) => [x === 1 ? 0 : x, y]);
    expect(verdicts(open, [1e-300, 0], [10, 10], { log: true })).toEqual(['kept', 'dropped']);
  });
});
