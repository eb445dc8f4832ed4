import { describe, expect, it } from 'vitest';
import { judgeThreshold, type Threshold } from '../../../core/cuts/threshold';

/** Per row: s surely, p passes at best values, b possibly, - fails, ? unjudged. */
function marks(
  values: readonly number[],
  sigmas: readonly number[] | undefined,
  threshold: Partial<Threshold> = {},
  margin = 1,
): string {
  const column = { values: Float64Array.from(values), sigma: sigmas && Float64Array.from(sigmas) };
  const full: Threshold = { limit: 4, keeps: 'below', absolute: false, ...threshold };
  const outcome = judgeThreshold(column, full, margin);
  return values
    .map((_, row) => {
      if (outcome.unjudged.has(row)) return '?';
      if (outcome.surely.has(row)) return 's';
      if (outcome.passes.has(row)) return 'p';
      return outcome.possibly.has(row) ? 'b' : '-';
    })
    .join('');
}

describe('one limit on one quantity', () => {
  it('a value on the limit passes, either way', () => {
    expect(marks([4, 4.000001, 3.999999], undefined)).toBe('s-s');
    expect(marks([4, 4.000001, 3.999999], undefined, { keeps: 'above' })).toBe('ss-');
    expect(marks([4, -4, 3, -3], undefined, { keeps: 'above', absolute: true })).toBe('ss--');
  });

  it('a value exactly margin·σ away is clear of the limit inside, and touches it outside', () => {
    expect(marks([3.5, 3.75, 4.25, 4.5, 4.75], [0.5, 0.5, 0.5, 0.5, 0.5])).toBe('spbb-');
    expect(marks([3, 3.25, 5, 5.25], [0.5, 0.5, 0.5, 0.5], {}, 2)).toBe('spb-');
    expect(marks([4, 4.5], [0.5, 0.5])).toBe('pb');
  });

  it('an error of 0, below 0 or NaN is none', () => {
    expect(marks([3.9, 4.1, 3.9, 4.1, 3.9, 4.1], [0, 0, Number.NaN, Number.NaN, -1, -1])).toBe('s-s-s-');
  });

  it('an infinite value is on its side of the limit, and an infinite error reaches over it', () => {
    expect(marks([Infinity, -Infinity], [1, 1])).toBe('-s');
    expect(marks([Infinity, -Infinity], undefined, { keeps: 'above' })).toBe('s-');
    expect(marks([3, 5], [Infinity, Infinity])).toBe('pb');
    expect(marks([-Infinity], undefined, { keeps: 'above', absolute: true })).toBe('s');
  });

  it('a missing value is unjudged whatever its error', () => {
    expect(marks([Number.NaN, Number.NaN], [0.1, Number.NaN])).toBe('??');
  });

  it('a margin of 0 asks for no error', () => {
    expect(marks([3.9, 4.1], [Infinity, 1], {}, 0)).toBe('s-');
  });

  it.each([0, 1, 31, 32, 33, 64, 65])('judges %i rows and leaves nothing behind them', (rows) => {
    const values = Float64Array.from({ length: rows }, () => 1);
    const { surely, passes, possibly, unjudged } = judgeThreshold(
      { values },
      { limit: 4, keeps: 'below', absolute: false },
      1,
    );
    expect([surely, passes, possibly, unjudged].map((set) => set.count())).toEqual([rows, rows, rows, 0]);
  });
});
