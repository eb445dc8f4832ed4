import { Bitset, popcount } from '../table/bitset';
import type { Outcome } from './contract';
import type { VerdictCounts } from './result';

/** What a set of enabled cuts makes of every object. */
export interface Verdicts {
  /** Index into VERDICTS per object. */
  readonly codes: Uint8Array;
  readonly sample: Bitset;
  readonly counts: VerdictCounts;
}

/** Four bits as four bytes of 0 or 1, in the byte order of the machine. */
const SPREAD = new Uint32Array(Uint8Array.from({ length: 64 }, (_, at) => ((at >> 2) >> (at & 3)) & 1).buffer);

/**
 * Combines the outcomes of the enabled cuts in one pass over the words of their bitsets; see `judgeLedger` for what
 * the verdicts mean.
 */
export function verdictsOf(rows: number, enabled: readonly Outcome[]): Verdicts {
  const sample = new Bitset(rows);
  const words = sample.words.length;
  const bytes = new Uint32Array(8 * words);
  const whole = Bitset.full(rows).words;
  let [kept, dropped, unjudged, sampled] = [0, 0, 0, 0];
  for (let word = 0; word < words; word++) {
    const all = whole[word]!;
    let [sure, pass, possible, unknown, forced] = [all, all, all, 0, 0];
    for (let at = 0; at < enabled.length; at++) {
      const outcome = enabled[at]!;
      const open = outcome.unjudged.words[word]!;
      sure &= outcome.surely.words[word]!;
      pass &= outcome.passes.words[word]!;
      possible &= outcome.possibly.words[word]! | open;
      unknown |= open;
      if (outcome.forced !== undefined) forced |= outcome.forced.words[word]!;
    }
    const keep = sure | forced;
    const drop = all & ~(possible | forced);
    const lost = unknown & ~(drop | forced);
    const members = pass | forced;
    sample.words[word] = members;
    kept += popcount(keep);
    dropped += popcount(drop);
    unjudged += popcount(lost);
    sampled += popcount(members);
    // Codes 0 to 3 in two bits: kept, borderline, dropped, unjudged.
    let low = all & ~(keep | drop);
    let high = drop | lost;
    for (let at = 8 * word; low !== 0 || high !== 0; at++, low >>>= 4, high >>>= 4) {
      bytes[at] = SPREAD[low & 15]! + 2 * SPREAD[high & 15]!;
    }
  }
  const borderline = rows - kept - dropped - unjudged;
  return {
    codes: new Uint8Array(bytes.buffer, 0, rows),
    sample,
    counts: { objects: rows, kept, borderline, dropped, unjudged, sample: sampled },
  };
}
