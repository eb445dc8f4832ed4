import { resolve } from 'node:path';
import type { OutcomeCache } from '../../core/cuts/outcomecache';
import { outcomeCache } from '../../core/cuts/outcomecache';
import { judgeLedger } from '../../core/cuts/ledger';
import type { LedgerResult } from '../../core/cuts/result';
import type { Recipe } from '../../core/edition/recipe';
import type { Source } from '../../core/roster/sourcemap';
import { type Problem, ProblemError } from '../../core/table/problem';
import type { ColumnView } from '../contract/messages';
import { columnViews } from './columnview';
import { assemble, openSource, type Prepared, type PrepareOptions } from './pipeline';
import type { SourceFile } from './sourcefile';

/** How a source of the bench stands. */
export interface SourceState {
  readonly state: 'read' | 'missing' | 'changed' | 'unreadable';
  readonly file: SourceFile | undefined;
  readonly columns: readonly ColumnView[];
  readonly problems: readonly Problem[];
}

/** A recipe with its data: everything that a view of the bench shows. */
export interface Session {
  readonly recipe: Recipe;
  readonly folder: string;
  readonly sources: ReadonlyMap<string, SourceState>;
  readonly prepared: Prepared;
  readonly result: LedgerResult;
  /** Changes when objects or quantities do. */
  readonly version: number;
  readonly cache: OutcomeCache;
}

/** What a reading of a source hangs on. */
function readingKey(source: Source, folder: string): string {
  return JSON.stringify([resolve(folder, source.path), source.missing]);
}

/** What roster and quantities hang on, beside the bytes of the sources. */
function rosterKey({ sources, roster, frame, extinction }: Recipe): string {
  return JSON.stringify([sources, roster, frame, extinction]);
}

/**
 * The session of a recipe, made from the one before with as little work as the difference asks for: a moved limit
 * judges one cut, a new frame derives anew, only a new or changed source is read. It bears `version` unless objects and
 * quantities are those of the one before.
 */
export async function sessionOf(
  recipe: Recipe,
  folder: string,
  before: Session | undefined,
  options: PrepareOptions & { readonly version: number },
): Promise<Session> {
  const cache = before?.cache ?? outcomeCache();
  if (before && before.folder === folder && rosterKey(before.recipe) === rosterKey(recipe)) {
    return { ...before, recipe, result: judge(recipe, before.prepared, cache) };
  }
  const sources = new Map<string, SourceState>();
  for (const source of recipe.sources) sources.set(source.id, await stateOf(source, folder, before, options));
  const files = new Map<string, SourceFile>();
  for (const [id, { state, file }] of sources) if (state === 'read' && file) files.set(id, file);
  const prepared = await assemble(recipe, folder, files, options);
  return {
    recipe,
    folder,
    sources,
    prepared,
    result: judge(recipe, prepared, cache),
    version: options.version,
    cache,
  };
}

function judge(recipe: Recipe, prepared: Prepared, cache: OutcomeCache): LedgerResult {
  return judgeLedger(recipe.ledger, prepared.objects, { margin: recipe.borderlineSigma, cache });
}

async function stateOf(
  source: Source,
  folder: string,
  before: Session | undefined,
  options: PrepareOptions,
): Promise<SourceState> {
  const old = before?.recipe.sources.find(({ id }) => id === source.id);
  const same = old && before && readingKey(old, before.folder) === readingKey(source, folder);
  const known = same ? before.sources.get(source.id)?.file : undefined;
  if (known) return withState(source, known);
  try {
    return withState(source, await openSource(source, folder, options));
  } catch (error) {
    if (!(error instanceof ProblemError) || error.problems.some(({ code }) => code === 'cancelled')) throw error;
    const missing = error.problems.some(({ code }) => code === 'file-missing');
    return { state: missing ? 'missing' : 'unreadable', file: undefined, columns: [], problems: error.problems };
  }
}

function withState(source: Source, file: SourceFile): SourceState {
  const columns = columnViews(file.file.table, source.columns);
  if (file.sha256 === source.sha256) return { state: 'read', file, columns, problems: [] };
  const problem: Problem = {
    code: 'source-changed',
    severity: 'error',
    where: source.path,
    found: file.sha256.slice(0, 12),
    expected: source.sha256.slice(0, 12),
  };
  return { state: 'changed', file, columns, problems: [problem] };
}
