import type { Cut } from '../../core/cuts/cut';
import type { AttritionRow, VerdictCounts } from '../../core/cuts/result';
import type { Limit, Proposal } from '../../core/cuts/contract';
import type { Recipe } from '../../core/edition/recipe';
import type { QuantityDefinition } from '../../core/quantities/quantity';
import type { ColumnMeaning, RosterPolicy, Source } from '../../core/roster/sourcemap';
import type { Conflict, DuplicateRow, SourceCount } from '../../core/roster/roster';
import type { Problem } from '../../core/table/problem';

/** A change to the recipe. Every one can be undone; the engine is the only one that applies them. */
export type Change =
  | { readonly type: 'set-title'; readonly title: string; readonly author: string; readonly note: string }
  | { readonly type: 'add-source'; readonly path: string }
  | { readonly type: 'remove-source'; readonly source: string }
  | {
      readonly type: 'set-source';
      readonly source: string;
      readonly set: Partial<Pick<Source, 'title' | 'citation' | 'missing' | 'columns'>>;
    }
  /** Accepts that a source's bytes changed: takes the new hash into the recipe. */
  | { readonly type: 'accept-source'; readonly source: string }
  | { readonly type: 'set-roster'; readonly set: Partial<RosterPolicy> }
  | { readonly type: 'set-frame'; readonly frame: string }
  | { readonly type: 'set-extinction'; readonly rv: number; readonly recalibration: number }
  | { readonly type: 'set-borderline'; readonly sigma: number }
  | { readonly type: 'add-cut'; readonly kind: string; readonly parameters?: Record<string, unknown> }
  | {
      readonly type: 'set-cut';
      readonly cut: string;
      readonly set: Partial<Pick<Cut, 'on' | 'missing' | 'rationale' | 'evidence' | 'author'>> & {
        parameters?: Record<string, unknown>;
      };
    }
  | { readonly type: 'remove-cut'; readonly cut: string }
  | { readonly type: 'move-cut'; readonly cut: string; readonly to: number }
  /** Keeps or drops one object by name; action 'clear' takes it off the list. */
  | {
      readonly type: 'name-object';
      readonly key: string;
      readonly action: 'keep' | 'drop' | 'clear';
      readonly reason: string;
    }
  | { readonly type: 'add-plate'; readonly x: string; readonly y: string }
  | { readonly type: 'set-plate'; readonly plate: string; readonly x: string; readonly y: string }
  | { readonly type: 'remove-plate'; readonly plate: string };

/** What a window may ask. Parameters and results are structured-cloneable; typed arrays travel as they are. */
export interface Requests {
  'bench.view': { params: Record<string, never>; result: BenchView };
  /**
   * Opens a recipe, a data file as the first source of a new bench, or the kept file of an unsaved bench. Refused when
   * another process has it; the bench that was open then stays.
   */
  'bench.open': { params: { path: string }; result: BenchView };
  /** A bench without sources; its recipe has no file until it is saved. */
  'bench.new': { params: Record<string, never>; result: BenchView };
  /** Changes with the same `gesture` (one drag, one typing) make one step of the history. */
  'bench.change': { params: { change: Change; gesture?: string }; result: BenchView };
  'bench.undo': { params: Record<string, never>; result: BenchView };
  'bench.redo': { params: Record<string, never>; result: BenchView };
  /** Writes the recipe to its file, or to `path`. */
  'bench.save': { params: { path?: string }; result: { path: string } };
  /** Throws autosaved work away and goes back to the recipe's file. */
  'bench.revert': { params: Record<string, never>; result: BenchView };
  'source.preview': { params: { source: string }; result: SourcePreview };
  /** Values of quantities for plates, NaN where missing; Float64Array per id, undefined if not available. */
  'quantity.values': {
    params: { ids: readonly string[]; version: number };
    result: { version: number; values: Record<string, Float64Array | undefined> };
  };
  /** Density of two quantities for plates of many objects. */
  'plate.density': { params: DensityAsk; result: Density };
  /** Histogram of the quantity a limit stands on. */
  'cut.histogram': { params: { cut: string; parameter: string; bins: number }; result: Histogram | undefined };
  'roster.rows': { params: RosterAsk; result: RosterPage };
  'object.card': { params: { object: number }; result: ObjectCard };
  /** Folder listing for the window's own open and save panels, which the browser door needs. */
  'files.list': { params: { folder?: string }; result: FolderListing };
  'edition.freeze': { params: { folder?: string }; result: FreezeResult };
  /** Stops whatever long work is under way. */
  'work.stop': { params: Record<string, never>; result: { stopped: boolean } };
}
export type RequestName = keyof Requests;

/** What the engine tells every window without being asked. */
export interface Events {
  /** The recipe or its consequences changed. */
  bench: BenchView;
  progress: Progress | undefined;
}
export type EventName = keyof Events;

/** One long piece of work; `undefined` ends it. */
export interface Progress {
  readonly label: string;
  /** 0…1, or undefined when it cannot be known. */
  readonly share: number | undefined;
}

/** Everything a window needs to draw itself, but for bulk columns. */
export interface BenchView {
  /** Changes with the objects or their quantities: cached columns of older versions are void. */
  readonly version: number;
  /** Grows with every change of anything. */
  readonly revision: number;
  readonly recipe: Recipe;
  readonly recipePath: string | undefined;
  readonly saved: boolean;
  /** True when unsaved work of an earlier run was brought back. */
  readonly restored: boolean;
  /** File in which unsaved work is kept; opening that of a bench without a recipe file brings the bench back. */
  readonly keptIn: string;
  /** What the user must hear of the bench itself: unsaved work that was left, a recipe edited by another program. */
  readonly notices: readonly WordedProblem[];
  readonly invented: boolean;
  /** Names of the next undo and redo steps, newest first. */
  readonly undo: readonly string[];
  readonly redo: readonly string[];
  readonly sources: readonly SourceView[];
  readonly conflicts: readonly ConflictView[];
  readonly duplicates: readonly DuplicateRow[];
  /** Why each row in quarantine stands there, as sentences. */
  readonly quarantine: readonly string[];
  readonly problems: readonly WordedProblem[];
  readonly quantities: readonly QuantityDefinition[];
  readonly frames: readonly FrameView[];
  readonly kinds: readonly KindView[];
  readonly cuts: readonly CutView[];
  readonly counts: VerdictCounts;
  /** Index into VERDICTS per object. */
  readonly verdicts: Uint8Array;
  readonly names: readonly string[];
  /** Enabled cuts that stand without a rationale: freezing is refused while there are any. */
  readonly withoutRationale: readonly string[];
  readonly lastEdition: string | undefined;
}

export interface WordedProblem extends Problem {
  /** The problem as a sentence with its remedy. */
  readonly text: string;
}

export interface SourceView {
  readonly source: Source;
  readonly count: SourceCount | undefined;
  readonly state: 'read' | 'missing' | 'changed' | 'unreadable';
  readonly columns: readonly ColumnView[];
  readonly problems: readonly WordedProblem[];
}

export interface ColumnView {
  readonly name: string;
  readonly type: 'number' | 'text';
  readonly unit: string | undefined;
  readonly present: number;
  readonly missing: number;
  /** First values, as they stand in the file. */
  readonly examples: readonly string[];
  /** The meaning in force, or undefined when the column is ignored. */
  readonly meaning: ColumnMeaning | undefined;
  readonly guess: {
    readonly role: string;
    readonly unit: string | undefined;
    readonly confidence: number;
    readonly reason: string;
  };
}

export interface ConflictView extends Conflict {
  readonly name: string;
  readonly text: string;
}

export interface FrameView {
  readonly id: string;
  readonly text: string;
  readonly sources: readonly string[];
}

export interface KindView {
  readonly kind: string;
  readonly label: string;
  readonly purpose: string;
  readonly caution: string;
  readonly proposals: readonly Proposal[];
  readonly defaults: Record<string, unknown>;
}

export interface CutView {
  readonly cut: Cut;
  readonly attrition: AttritionRow;
  readonly limits: readonly Limit[];
  /** Quantities that the cut needs and the bench does not have. */
  readonly lacking: readonly string[];
}

export interface Histogram {
  readonly min: number;
  readonly max: number;
  /** Counts of all objects with a value. */
  readonly all: Float64Array;
  /** Counts of the objects that reach this cut. */
  readonly reaching: Float64Array;
  readonly missing: number;
}

export interface DensityAsk {
  readonly x: string;
  readonly y: string;
  readonly columns: number;
  readonly rows: number;
  /** Window in data coordinates. */
  readonly range: { readonly x: readonly [number, number]; readonly y: readonly [number, number] };
}

export interface Density {
  readonly x: readonly [number, number];
  readonly y: readonly [number, number];
  readonly columns: number;
  readonly rows: number;
  /** Counts of all objects and of the sample, row-major from the lowest y. */
  readonly all: Float64Array;
  readonly sample: Float64Array;
}

export interface RosterAsk {
  readonly offset: number;
  readonly count: number;
  readonly columns: readonly string[];
  /** Quantity id or 'name' or 'verdict'. */
  readonly sort: string;
  readonly descending: boolean;
  /** Part of a name. */
  readonly search: string;
  /** Verdict names to show; empty for all. */
  readonly verdicts: readonly string[];
}

export interface RosterPage {
  readonly total: number;
  readonly objects: Int32Array;
  readonly names: readonly string[];
  readonly keys: readonly string[];
  readonly verdicts: Uint8Array;
  readonly values: Record<string, Float64Array>;
}

export interface ObjectCard {
  readonly object: number;
  readonly name: string;
  readonly key: string;
  readonly verdict: string;
  readonly values: readonly {
    readonly id: string;
    readonly value: number;
    readonly sigma: number;
    readonly from: string;
  }[];
  /** The object's way through the ledger. */
  readonly way: readonly {
    readonly cut: string;
    readonly describe: string;
    readonly on: boolean;
    readonly outcome: 'passes' | 'fails' | 'unjudged' | 'near' | 'kept by name';
  }[];
  readonly conflicts: readonly string[];
  readonly named: { readonly action: 'keep' | 'drop'; readonly reason: string } | undefined;
}

export interface SourcePreview {
  readonly columns: readonly string[];
  readonly rows: readonly (readonly string[])[];
}

export interface FolderListing {
  readonly folder: string;
  readonly parent: string | undefined;
  readonly entries: readonly {
    readonly name: string;
    readonly path: string;
    readonly folder: boolean;
    readonly bytes: number;
  }[];
}

export interface FreezeResult {
  readonly folder: string;
  readonly number: number;
  readonly sample: number;
  readonly dropped: number;
}
