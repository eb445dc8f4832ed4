import { attrition } from './attrition';
import type { Judged } from './contract';
import type { Cut } from './cut';
import { outcomeCache, type OutcomeCache } from './outcomecache';
import type { LedgerResult } from './result';
import { verdictsOf } from './verdicts';

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
  const { codes, sample, counts } = verdictsOf(objects.rows, enabled);
  return { outcomes, verdicts: codes, sample, counts, attrition: attrition(ledger, outcomes, objects.rows) };
}
