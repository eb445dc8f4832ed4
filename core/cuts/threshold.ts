import { Bitset } from '../table/bitset';
import type { QuantityColumn } from '../quantities/quantity';
import type { Outcome } from './contract';

/** One limit on one quantity: values on the limit pass. */
export interface Threshold {
  readonly limit: number;
  readonly keeps: 'below' | 'above';
  readonly absolute: boolean;
}

/**
 * Judges every row against one limit.
 *
 * With a margin of m, `surely` holds values at least m·σ inside the limit and `possibly` those at most m·σ outside.
 * A NaN value is unjudged; a NaN or absent σ counts as 0.
 */
export function judgeThreshold(column: QuantityColumn, threshold: Threshold, margin: number): Outcome {
  const { values, sigma } = column;
  const rows = values.length;
  const [surely, passes, possibly, unjudged] = [new Bitset(rows), new Bitset(rows), new Bitset(rows), new Bitset(rows)];
  const sign = threshold.keeps === 'below' ? 1 : -1;
  const limit = sign * threshold.limit;
  const spread = margin > 0 ? sigma : undefined;
  for (let word = 0, row = 0; row < rows; word++) {
    const end = Math.min(rows, row + 32);
    let [sure, pass, possible, unknown] = [0, 0, 0, 0];
    for (let bit = 0; row < end; row++, bit++) {
      const raw = values[row]!;
      const value = sign * (threshold.absolute ? Math.abs(raw) : raw);
      const error = spread === undefined ? 0 : spread[row]!;
      // A comparison with NaN is false: `error >= 0` turns an unknown error into none.
      const reach = +(error >= 0) === 1 ? margin * error : 0;
      sure |= +(value + reach <= limit) << bit;
      pass |= +(value <= limit) << bit;
      possible |= +(value - reach <= limit) << bit;
      unknown |= +(value !== value) << bit;
    }
    surely.words[word] = sure;
    passes.words[word] = pass;
    possibly.words[word] = possible;
    unjudged.words[word] = unknown;
  }
  return { surely, passes, possibly, unjudged };
}
