import type { Cut } from './cut';
import type { Outcome } from './contract';
import type { LedgerResult } from './result';

export type WayMark = 'passes' | 'near' | 'fails' | 'unjudged' | 'kept by name';

/** What one cut says of one object; `near` when the margin could turn its outcome. */
export function wayMark(outcome: Outcome, object: number): WayMark {
  if (outcome.forced?.has(object) === true) return 'kept by name';
  if (outcome.unjudged.has(object)) return 'unjudged';
  if (outcome.surely.has(object)) return 'passes';
  return outcome.possibly.has(object) ? 'near' : 'fails';
}

/** Ids of the enabled cuts that fail an object at best values, in the order of the ledger. */
export function failedCuts(ledger: readonly Cut[], result: LedgerResult, object: number): string[] {
  return enabledWhere(ledger, result, (outcome) => !outcome.passes.has(object) && !outcome.unjudged.has(object));
}

/** Ids of the enabled cuts that cannot judge an object. */
export function unjudgingCuts(ledger: readonly Cut[], result: LedgerResult, object: number): string[] {
  return enabledWhere(ledger, result, (outcome) => outcome.unjudged.has(object));
}

/** Ids of the enabled cuts on whose limit a borderline object stands. */
export function nearCuts(ledger: readonly Cut[], result: LedgerResult, object: number): string[] {
  return enabledWhere(ledger, result, (outcome) => wayMark(outcome, object) === 'near');
}

function enabledWhere(ledger: readonly Cut[], result: LedgerResult, test: (outcome: Outcome) => boolean): string[] {
  return ledger.filter((cut, at) => cut.on && test(result.outcomes[at]!)).map((cut) => cut.id);
}
