import type { NumberColumn } from '../table/column';
import type { MeasuredColumn, MeasuredTable } from '../table/measured';
import type { Problem } from '../table/problem';
import type { MeasuredId } from '../table/role';

/** A source read and understood: one row per readable row of the file. */
export interface ReadSource {
  readonly id: string;
  /** The bare name of its file, for what is said of it. */
  readonly fileName: string;
  readonly names: readonly string[];
  readonly measured: MeasuredTable;
  readonly extras: readonly NumberColumn[];
  /** 1-based file line of each row. */
  readonly lines: Int32Array;
  readonly quarantine: readonly QuarantinedRow[];
  readonly problems: readonly Problem[];
}

/** A row that could not stand in the roster, with its reason; counted and written out, never lost. */
export interface QuarantinedRow {
  readonly source: string;
  readonly line: number;
  /** The line as it stands in the file, shortened to 2,000 characters. */
  readonly text: string;
  readonly reason: Problem;
}

/** A later row of one source for an object that the source already has; the first row stands. */
export interface DuplicateRow {
  readonly source: string;
  readonly line: number;
  readonly name: string;
  /** Line of the row that stands. */
  readonly firstLine: number;
}

/** Two sources that do not agree on one value of one object. */
export interface Conflict {
  readonly object: number;
  /** Distances of every kind are compared as 'distance_modulus'. 'position': one name, but apart on the sky. */
  readonly quantity: MeasuredId | 'position';
  readonly chosen: ConflictValue;
  readonly other: ConflictValue;
  /** Difference over combined 1σ error; Infinity when neither source gives an error, and for positions. */
  readonly sigmas: number;
}

/** One side of a conflict. Of a position, `value` is the right ascension and `sigma` the separation of the two, degrees. */
export interface ConflictValue {
  readonly source: string;
  readonly line: number;
  readonly value: number;
  readonly sigma: number;
}

/** A settled measured column that remembers where each value came from. */
export interface SettledColumn extends MeasuredColumn {
  /** Index into `Roster.sources` per object, −1 where missing. */
  readonly fromSource: Int16Array;
  /** 1-based line of that source's file per object, 0 where missing. */
  readonly fromLine: Int32Array;
}

/** The merged list of tracers, one row per object. */
export interface Roster extends MeasuredTable {
  readonly sources: readonly string[];
  readonly names: readonly string[];
  /** Cleaned names, unique. */
  readonly keys: readonly string[];
  readonly columns: ReadonlyMap<MeasuredId, SettledColumn>;
  /** Numeric columns carried along, named `source.column`, aligned with the objects. */
  readonly extras: readonly NumberColumn[];
  /** For each source, the file line of each object's row there, 0 where the source lacks the object. */
  readonly lines: readonly Int32Array[];
  readonly conflicts: readonly Conflict[];
  readonly duplicates: readonly DuplicateRow[];
  readonly quarantine: readonly QuarantinedRow[];
  readonly problems: readonly Problem[];
  /** rowsRead = objectRows + duplicates + quarantine, per source. */
  readonly counts: readonly SourceCount[];
}

export interface SourceCount {
  readonly source: string;
  readonly rowsRead: number;
  readonly objectRows: number;
  readonly duplicates: number;
  readonly quarantine: number;
}
