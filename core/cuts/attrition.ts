import { Bitset, popcount } from '../table/bitset';
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
  const tally = tallied(
    outcomes,
    ledger.map(({ on }) => on),
    rows,
  );
  let left = rows;
  return ledger.map((cut, at) => {
    const inTurn = tally.inTurn[at]!;
    left -= inTurn;
    return {
      cut: cut.id,
      on: cut.on,
      describe: cutKind(cut.kind).describe(cut.parameters),
      inTurn,
      alone: tally.alone[at]!,
      onlyByIt: tally.onlyByIt[at]!,
      unjudged: tally.unjudged[at]!,
      left,
    };
  });
}

/** Counts per cut. */
type Tally = Readonly<Record<'inTurn' | 'alone' | 'onlyByIt' | 'unjudged', Uint32Array>>;

/** All counts in one pass over the words: the words of all cuts side by side stay in the cache, whole bitsets do not. */
function tallied(outcomes: readonly Outcome[], on: readonly boolean[], rows: number): Tally {
  const cuts = outcomes.length;
  const none = (): Uint32Array => new Uint32Array(cuts);
  const [inTurn, alone, onlyByIt, unjudged] = [none(), none(), none(), none()];
  const whole = Bitset.full(rows).words;
  const fails = new Int32Array(cuts);
  for (let word = 0; word < whole.length; word++) {
    const all = whole[word]!;
    let [once, twice, forced] = [0, 0, 0];
    for (let at = 0; at < cuts; at++) {
      const outcome = outcomes[at]!;
      const open = outcome.unjudged.words[word]!;
      const failing = all & ~(outcome.passes.words[word]! | open);
      fails[at] = failing;
      alone[at]! += popcount(failing);
      unjudged[at]! += popcount(open);
      if (!on[at]!) continue;
      twice |= once & failing;
      once |= failing;
      if (outcome.forced !== undefined) forced |= outcome.forced.words[word]!;
    }
    let left = all & ~forced;
    const only = left & ~twice;
    for (let at = 0; at < cuts; at++) {
      if (!on[at]!) continue;
      const failing = fails[at]!;
      inTurn[at]! += popcount(left & failing);
      onlyByIt[at]! += popcount(only & failing);
      left &= ~failing;
    }
  }
  return { inTurn, alone, onlyByIt, unjudged };
}
