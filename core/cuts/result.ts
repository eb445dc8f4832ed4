import type { Bitset } from '../table/bitset';
import type { Outcome } from './contract';

/** What the whole ledger says of an object; also the value in `LedgerResult.verdicts`. */
export const VERDICTS = ['kept', 'borderline', 'dropped', 'unjudged'] as const;
export type Verdict = (typeof VERDICTS)[number];

/** How many objects one cut removes. Objects kept by name are never removed. */
export interface AttritionRow {
  readonly cut: string;
  readonly on: boolean;
  readonly describe: string;
  /** Removed among those that every earlier enabled cut left. */
  readonly inTurn: number;
  /** Removed if this were the only cut. */
  readonly alone: number;
  /** Removed by this cut and by no other enabled one. */
  readonly onlyByIt: number;
  /** Objects this cut cannot judge for want of a value, after its missing-value rule. */
  readonly unjudged: number;
  /** Objects left after this cut, in turn. */
  readonly left: number;
}

export interface VerdictCounts {
  readonly objects: number;
  readonly kept: number;
  readonly borderline: number;
  readonly dropped: number;
  readonly unjudged: number;
  /** Objects in the sample: kept, and borderline ones that pass at best values. */
  readonly sample: number;
}

export interface LedgerResult {
  /** One outcome per cut of the ledger, disabled ones included, after the missing-value rule. */
  readonly outcomes: readonly Outcome[];
  /** Index into VERDICTS per object. */
  readonly verdicts: Uint8Array;
  /** Members at best values: what a freeze writes as the sample. */
  readonly sample: Bitset;
  readonly counts: VerdictCounts;
  readonly attrition: readonly AttritionRow[];
}
