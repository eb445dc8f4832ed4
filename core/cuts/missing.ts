import { Bitset } from '../table/bitset';
import type { Outcome } from './contract';

export const MISSING_RULES = ['drop', 'keep', 'unjudged'] as const;

/** What a test says of an object that lacks the value it tests. */
export type MissingRule = (typeof MISSING_RULES)[number];

/**
 * The outcome of one test after its rule for missing values: with `keep` its unjudged objects pass it for certain, with
 * `drop` they fail it for certain. It has to come before tests are combined: afterwards nothing tells an object with
 * one missing value from one that another test found near its limit.
 */
export function settled(test: Outcome, rule: MissingRule): Outcome {
  if (rule === 'unjudged') return test;
  const unjudged = new Bitset(test.unjudged.size);
  if (rule === 'drop') return { ...test, unjudged };
  return {
    ...test,
    surely: test.surely.or(test.unjudged),
    passes: test.passes.or(test.unjudged),
    possibly: test.possibly.or(test.unjudged),
    unjudged,
  };
}
