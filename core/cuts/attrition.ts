import { Bitset } from '../table/bitset';
import type { Outcome } from './contract';
import type { Cut } from './cut';
import { cutKind } from './kinds';
import type { AttritionRow } from './result';

/**
 * How many objects each cut removes at best values: in turn, alone, and only by it.
 *
 * An object that a cut cannot judge is not removed by it. Objects kept by name are removed by nothing, but they still
 * count in `alone`, which asks what the cut would do without its company. A disabled cut removes nothing in turn.
 */
export function attrition(ledger: readonly Cut[], outcomes: readonly Outcome[], rows: number): AttritionRow[] {
  const fails = outcomes.map((outcome) => outcome.passes.or(outcome.unjudged).not());
  const forced = outcomes.reduce(
    (all, outcome, at) => (ledger[at]!.on && outcome.forced ? all.or(outcome.forced) : all),
    new Bitset(rows),
  );
  const { once, twice } = failCounts(ledger, fails, rows);
  let left = Bitset.full(rows);
  return ledger.map((cut, at) => {
    const failing = fails[at]!;
    const before = left;
    if (cut.on) left = left.without(failing.without(forced));
    return {
      cut: cut.id,
      on: cut.on,
      describe: cutKind(cut.kind).describe(cut.parameters),
      inTurn: before.count() - left.count(),
      alone: failing.count(),
      onlyByIt: cut.on ? failing.and(once).without(twice).without(forced).count() : 0,
      unjudged: outcomes[at]!.unjudged.count(),
      left: left.count(),
    };
  });
}

/** Objects that at least one, and at least two, enabled cuts fail. */
function failCounts(ledger: readonly Cut[], fails: readonly Bitset[], rows: number): { once: Bitset; twice: Bitset } {
  let [once, twice] = [new Bitset(rows), new Bitset(rows)];
  fails.forEach((failing, at) => {
    if (!ledger[at]!.on) return;
    twice = twice.or(once.and(failing));
    once = once.or(failing);
  });
  return { once, twice };
}
