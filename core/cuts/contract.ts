import type { ZodType } from 'zod';
import type { Bitset } from '../table/bitset';
import type { QuantityColumn } from '../quantities/quantity';

/** What a cut sees of the objects it judges. */
export interface Judged {
  readonly rows: number;
  /** Names as shown, one per object. */
  readonly names: readonly string[];
  /** Stable keys (cleaned names), one per object; named objects are listed by key. */
  readonly keys: readonly string[];
  column(id: string): QuantityColumn | undefined;
  /** See QuantitySet.phaseCovariance. */
  phaseCovariance(): Float64Array | undefined;
  /** Keeps something costly (an angle from a plane) until the objects change, or newer keys of its shelf push it out. */
  memo<T>(shelf: string, key: string, make: () => T): T;
}

/**
 * What a cut, or one test of it, says of every object, on four nested bitsets.
 *
 * `surely` ⊆ `passes` ⊆ `possibly`: passes even if every value is wrong by the margin against it; passes at
 * best values; passes if the values are wrong by the margin in its favour. `unjudged` objects, whose outcome
 * hangs on a missing value, are in none of the three.
 */
export interface Outcome {
  readonly surely: Bitset;
  readonly passes: Bitset;
  readonly possibly: Bitset;
  readonly unjudged: Bitset;
  /** Objects that the user keeps by name whatever other cuts say. */
  readonly forced?: Bitset | undefined;
}

/** A published or customary limit, offered with its reason; never applied by itself. */
export interface Proposal {
  readonly parameter: string;
  readonly value: number;
  readonly reason: string;
  /** DOI, bibcode or arXiv id, or 'common practice, no source'. */
  readonly source: string;
}

/** One limit of a cut that a window can draw as a handle on a histogram. */
export interface Limit {
  /** Name of the numeric parameter that the handle moves. */
  readonly parameter: string;
  readonly label: string;
  /** Quantity id, or a memo key of the cut that `limitColumn` understands. */
  readonly quantity: string;
  /** True when the limit is on the absolute value. */
  readonly absolute: boolean;
  readonly keeps: 'below' | 'above';
  readonly value: number;
  readonly unit: string;
}

/** One kind of cut: everything that shared code must know of it. */
export interface CutKind<P, Kind extends string = string> {
  readonly kind: Kind;
  readonly label: string;
  /** One sentence: which contamination the cut is against. */
  readonly purpose: string;
  /** What could mislead here; shown where the limit is set. */
  readonly caution: string;
  readonly parameters: ZodType<P>;
  readonly defaults: P;
  readonly proposals: readonly Proposal[];
  /** Quantity ids without which the cut cannot judge anything, for these parameters. */
  needs(parameters: P): readonly string[];
  /**
   * Judges every object by each test of the cut on its own; a cut without tests passes everything.
   * @param margin number of σ by which values may be wrong for `surely` and `possibly`; 0 switches it off
   */
  judge(parameters: P, objects: Judged, margin: number): readonly Outcome[];
  /** Whether an object has to pass every test, or any one of them. */
  passing(parameters: P): 'every' | 'any';
  /** The cut in words, with units, as a referee would read it: "[Fe/H] ≤ −1.0". */
  describe(parameters: P): string;
  /** Active limits, for drawing. */
  limits(parameters: P): readonly Limit[];
  /** The column a limit is drawn on (absolute value not yet taken). */
  limitColumn(limit: Limit, parameters: P, objects: Judged): QuantityColumn | undefined;
}
