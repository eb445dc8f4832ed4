import { Bitset } from '../table/bitset';
import { attrition } from './attrition';
import type { Judged, Outcome } from './contract';
import type { Cut } from './cut';
import { outcomeCache, type OutcomeCache } from './outcomecache';
import { type LedgerResult, type VerdictCounts, VERDICTS } from './result';

export interface JudgeOptions {
  /** Number of σ within which a limit makes an object borderline; 0 makes none. */
  readonly margin: number;
  readonly cache?: OutcomeCache;
}

/**
 * Judges every object by the whole ledger.
 *
 * An object that the user keeps by name is kept. One that an enabled cut fails beyond the margin is dropped. Of the
 * rest, one that an enabled cut cannot judge is unjudged, one that passes every enabled cut beyond the margin is kept,
 * and what remains is borderline. The sample holds the kept and those borderline objects that pass every enabled cut
 * at their best values. An empty ledger keeps everything.
 */
export function judgeLedger(ledger: readonly Cut[], objects: Judged, options: JudgeOptions): LedgerResult {
  const cache = options.cache ?? outcomeCache();
  const outcomes = ledger.map((cut) => cache.outcome(cut, objects, options.margin));
  const enabled = outcomes.filter((_, at) => ledger[at]!.on);
  const sets = verdictSets(objects.rows, enabled);
  return {
    outcomes,
    verdicts: verdictCodes(objects.rows, sets),
    sample: sets.sample,
    counts: countsOf(objects.rows, sets),
    attrition: attrition(ledger, outcomes, objects.rows),
  };
}

interface VerdictSets {
  readonly kept: Bitset;
  readonly borderline: Bitset;
  readonly dropped: Bitset;
  readonly unjudged: Bitset;
  readonly sample: Bitset;
}

function verdictSets(rows: number, enabled: readonly Outcome[]): VerdictSets {
  let [sure, pass, possible] = [Bitset.full(rows), Bitset.full(rows), Bitset.full(rows)];
  let [unknown, forced] = [new Bitset(rows), new Bitset(rows)];
  for (const outcome of enabled) {
    sure = sure.and(outcome.surely);
    pass = pass.and(outcome.passes);
    possible = possible.and(outcome.possibly.or(outcome.unjudged));
    unknown = unknown.or(outcome.unjudged);
    if (outcome.forced) forced = forced.or(outcome.forced);
  }
  const dropped = possible.not().without(forced);
  const unjudged = unknown.without(dropped).without(forced);
  const kept = sure.or(forced);
  return {
    kept,
    dropped,
    unjudged,
    borderline: Bitset.full(rows).without(kept).without(dropped).without(unjudged),
    sample: pass.or(forced),
  };
}

function verdictCodes(rows: number, sets: VerdictSets): Uint8Array {
  const codes = new Uint8Array(rows);
  VERDICTS.forEach((verdict, code) => {
    if (code === 0) return;
    const { words } = sets[verdict];
    for (let word = 0; word < words.length; word++) {
      for (let bits = words[word]!; bits !== 0; bits &= bits - 1)
        codes[(word << 5) + 31 - Math.clz32(bits & -bits)] = code;
    }
  });
  return codes;
}

function countsOf(rows: number, sets: VerdictSets): VerdictCounts {
  return {
    objects: rows,
    kept: sets.kept.count(),
    borderline: sets.borderline.count(),
    dropped: sets.dropped.count(),
    unjudged: sets.unjudged.count(),
    sample: sets.sample.count(),
  };
}
