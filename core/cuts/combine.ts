import { Bitset } from '../table/bitset';
import type { Outcome } from './contract';

/** Every row passes for certain: what a cut without tests says. */
export function everythingPasses(rows: number): Outcome {
  const all = Bitset.full(rows);
  return { surely: all, passes: all, possibly: all, unjudged: new Bitset(rows) };
}

/** No row can be judged: what a test says whose quantity the data cannot give. */
export function nothingJudged(rows: number): Outcome {
  const none = new Bitset(rows);
  return { surely: none, passes: none, possibly: none, unjudged: Bitset.full(rows) };
}

/**
 * Kleene's AND: a clear failure decides whatever is unknown beside it; otherwise an unknown leaves the row unjudged.
 * An empty list passes.
 */
export function allOf(rows: number, outcomes: readonly Outcome[]): Outcome {
  return outcomes.reduce((a, b) => {
    const unknown = a.unjudged.or(b.unjudged);
    // Where one test is unknown, the other decides only by failing.
    const passesUpper = a.passes.or(a.unjudged).and(b.passes.or(b.unjudged));
    const unjudged = unknown.and(passesUpper);
    const possiblyUpper = a.possibly.or(a.unjudged).and(b.possibly.or(b.unjudged));
    return {
      surely: a.surely.and(b.surely),
      passes: a.passes.and(b.passes),
      possibly: possiblyUpper.without(unjudged),
      unjudged,
    };
  }, everythingPasses(rows));
}

/** The opposite of an outcome; unknown stays unknown. */
export function opposite(outcome: Outcome): Outcome {
  return {
    surely: outcome.possibly.or(outcome.unjudged).not(),
    passes: outcome.passes.or(outcome.unjudged).not(),
    possibly: outcome.surely.or(outcome.unjudged).not(),
    unjudged: outcome.unjudged,
  };
}

/** Kleene's OR: a clear pass decides; otherwise an unknown leaves the row unjudged. An empty list fails. */
export function anyOf(rows: number, outcomes: readonly Outcome[]): Outcome {
  return opposite(allOf(rows, outcomes.map(opposite)));
}
