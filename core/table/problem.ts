/** Everything that can be wrong with input, in stable codes; the sentences are in `wording.ts`. */
export type ProblemCode =
  | 'empty-file'
  | 'not-text'
  | 'not-a-table'
  | 'unclosed-quote'
  | 'ragged-row'
  | 'comment-rows'
  | 'duplicate-column'
  | 'unnamed-column'
  | 'unknown-column'
  | 'unknown-quantity'
  | 'unknown-unit'
  | 'wrong-unit'
  | 'words-among-numbers'
  | 'out-of-range'
  | 'negative-error'
  | 'role-taken'
  | 'no-position'
  | 'duplicate-name'
  | 'ambiguous-match'
  | 'far-namesake'
  | 'parallax-distance'
  | 'placeholder-velocity'
  | 'too-large'
  | 'file-missing'
  | 'file-unreadable'
  | 'folder-missing'
  | 'folder-read-only'
  | 'disk-full'
  | 'source-changed'
  | 'recipe-not-json'
  | 'recipe-version'
  | 'recipe-invalid'
  | 'bench-in-use'
  | 'unsaved-left'
  | 'recipe-edited'
  | 'work-beside-edit'
  | 'rationale-missing'
  | 'empty-sample'
  | 'edition-not-found'
  | 'edition-differs'
  | 'unknown-option'
  | 'engine-stopped'
  | 'program-fault'
  | 'cancelled';

/** One thing that is wrong, as data: where, what was found, what was expected, what to do. */
export interface Problem {
  readonly code: ProblemCode;
  /** An error stops what was asked; a warning does not; a note is only worth knowing. */
  readonly severity: 'error' | 'warning' | 'note';
  /** File name, or the id of a source or cut. */
  readonly where?: string | undefined;
  /** 1-based line of the file. */
  readonly line?: number | undefined;
  readonly column?: string | undefined;
  readonly found?: string | undefined;
  readonly expected?: string | undefined;
  readonly remedy?: string | undefined;
  /** How many rows share the problem, when one stands for many. */
  readonly count?: number | undefined;
}

/** Thrown when what was asked cannot be done for a reason that lies in the input. */
export class ProblemError extends Error {
  override readonly name = 'ProblemError';
  readonly problems: readonly Problem[];

  constructor(problems: readonly Problem[]) {
    super(problems.map((problem) => problem.code).join(', '));
    this.problems = problems;
  }
}

/** Shorthand to fail with one problem of severity error. */
export function fail(code: ProblemCode, details: Omit<Problem, 'code' | 'severity'> = {}): never {
  throw new ProblemError([{ code, severity: 'error', ...details }]);
}
