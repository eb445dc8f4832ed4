import { Bitset } from '../table/bitset';
import type { Outcome } from './contract';

/** Every row passes for certain: what a cut without tests says. */
function everythingPasses(rows: number): Outcome {
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
export function allOf(rows: number, tests: readonly Outcome[]): Outcome {
  const [first, ...others] = tests;
  return first === undefined ? everythingPasses(rows) : others.reduce(both, first);
}

/** Kleene's OR: a clear pass decides; otherwise an unknown leaves the row unjudged. An empty list passes. */
export function anyOf(rows: number, tests: readonly Outcome[]): Outcome {
  const [only, ...others] = tests;
  return only === undefined || others.length === 0 ? allOf(rows, tests) : opposite(allOf(rows, tests.map(opposite)));
}

/** The opposite of an outcome; unknown stays unknown. */
export function opposite(outcome: Outcome): Outcome {
  return {
    surely: neither(outcome.possibly, outcome.unjudged),
    passes: neither(outcome.passes, outcome.unjudged),
    possibly: neither(outcome.surely, outcome.unjudged),
    unjudged: outcome.unjudged,
  };
}

function both(a: Outcome, b: Outcome): Outcome {
  const unknown = a.unjudged.or(b.unjudged);
  // Where one test is unknown, the other decides only by failing.
  const unjudged = unknown.and(a.passes.or(a.unjudged)).and(b.passes.or(b.unjudged));
  return {
    surely: a.surely.and(b.surely),
    passes: a.passes.and(b.passes),
    possibly: a.possibly.or(a.unjudged).and(b.possibly.or(b.unjudged)).without(unjudged),
    unjudged,
  };
}

function neither(a: Bitset, b: Bitset): Bitset {
  return a.or(b).not();
}
