import { stat } from 'node:fs/promises';
import { basename, resolve } from 'node:path';
import type { Judged } from '../../core/cuts/contract';
import { judgedObjects } from '../../core/cuts/judged';
import type { Recipe } from '../../core/edition/recipe';
import { solarFrame } from '../../core/frame/solarframes';
import { deriveQuantities } from '../../core/quantities/derive';
import type { QuantitySet } from '../../core/quantities/quantity';
import { mergeSteps } from '../../core/roster/merge';
import type { ReadSource, Roster } from '../../core/roster/roster';
import type { Source } from '../../core/roster/sourcemap';
import { understandSource } from '../../core/roster/understand';
import { fail } from '../../core/table/problem';
import type { Progress } from '../contract/messages';
import { withFile } from './files';
import { loadSource } from './loader';
import type { SourceFile } from './sourcefile';

/** Fewer rows are merged before a word about it could be read. */
const SHOWN_FROM = 100_000;

/** A recipe with everything that follows from its sources, before any cut. */
export interface Prepared {
  readonly recipe: Recipe;
  readonly folder: string;
  readonly files: ReadonlyMap<string, SourceFile>;
  readonly roster: Roster;
  readonly quantities: QuantitySet;
  readonly objects: Judged;
}

export interface PrepareOptions {
  readonly onProgress?: ((progress: Progress) => void) | undefined;
  readonly signal?: AbortSignal | undefined;
  /** What to do about a source whose bytes are not those that the recipe names; refused unless said otherwise. */
  readonly changed?: 'refuse' | 'take';
}

/**
 * Reads a recipe's sources and derives every quantity. Paths are relative to `folder`.
 * Errors: source-changed, cancelled, and whatever is wrong with a file.
 */
export async function prepare(recipe: Recipe, folder: string, options: PrepareOptions = {}): Promise<Prepared> {
  const files = new Map<string, SourceFile>();
  for (const source of recipe.sources) {
    const file = await openSource(source, folder, options);
    if (file.sha256 !== source.sha256 && options.changed !== 'take') {
      fail('source-changed', { where: source.path, found: file.sha256, expected: source.sha256 });
    }
    files.set(source.id, file);
  }
  return assemble(recipe, folder, files, options);
}

/** Reads one source of a recipe in the loader thread. */
export async function openSource(source: Source, folder: string, options: PrepareOptions): Promise<SourceFile> {
  const path = resolve(folder, source.path);
  const { size } = await withFile(path, true, () => stat(path));
  const label = `Reading ${source.path}`;
  const onBytes = options.onProgress && ((soFar: number) => options.onProgress!({ label, share: soFar / size }));
  // The bare name, so that what is said of a file does not hang on where it stands.
  return loadSource(
    { path, fileName: basename(source.path), missing: source.missing },
    { onBytes, signal: options.signal },
  );
}

/**
 * Roster and quantities of sources that are already read; sources without a file are left out. Other requests, a stop
 * among them, get their turn between the steps. Errors: cancelled.
 */
export async function assemble(
  recipe: Recipe,
  folder: string,
  files: ReadonlyMap<string, SourceFile>,
  { onProgress, signal }: PrepareOptions,
): Promise<Prepared> {
  const rows = [...files.values()].reduce((sum, { file }) => sum + file.rowsRead, 0);
  if (rows > SHOWN_FROM) onProgress?.({ label: 'Merging the sources', share: undefined });
  const pause = async (): Promise<void> => {
    await new Promise(setImmediate);
    if (signal?.aborted === true) fail('cancelled');
  };
  const read: ReadSource[] = [];
  for (const { id, columns } of recipe.sources) {
    const found = files.get(id);
    if (!found) continue;
    read.push(understandSource(id, found.file, columns));
    await pause();
  }
  const steps = mergeSteps(read, recipe.roster);
  let step = steps.next();
  for (; step.done !== true; step = steps.next()) await pause();
  const roster = step.value;
  const { rv, recalibration } = recipe.extinction;
  const quantities = deriveQuantities(roster, {
    frame: solarFrame(recipe.frame)!,
    rv,
    recalibration,
    extras: roster.extras,
  });
  return { recipe, folder, files, roster, quantities, objects: judgedObjects(quantities, roster.names, roster.keys) };
}
