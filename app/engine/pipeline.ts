import { stat } from 'node:fs/promises';
import { basename, resolve } from 'node:path';
import type { Judged } from '../../core/cuts/contract';
import { judgedObjects } from '../../core/cuts/judged';
import type { Recipe } from '../../core/edition/recipe';
import { solarFrame } from '../../core/frame/solarframes';
import { deriveQuantities } from '../../core/quantities/derive';
import type { QuantitySet } from '../../core/quantities/quantity';
import { mergeSources } from '../../core/roster/merge';
import type { Roster } from '../../core/roster/roster';
import type { Source } from '../../core/roster/sourcemap';
import { understandSource } from '../../core/roster/understand';
import { fail } from '../../core/table/problem';
import type { Progress } from '../contract/messages';
import { withFile } from './files';
import { loadSource } from './loader';
import type { SourceFile } from './sourcefile';

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
  return assemble(recipe, folder, files);
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

/** Roster and quantities of sources that are already read; sources without a file are left out. */
export function assemble(recipe: Recipe, folder: string, files: ReadonlyMap<string, SourceFile>): Prepared {
  const read = recipe.sources.flatMap((source) => {
    const found = files.get(source.id);
    return found ? [understandSource(source.id, found.file, source.columns)] : [];
  });
  const roster = mergeSources(read, recipe.roster);
  const { rv, recalibration } = recipe.extinction;
  const quantities = deriveQuantities(roster, {
    frame: solarFrame(recipe.frame)!,
    rv,
    recalibration,
    extras: roster.extras,
  });
  return { recipe, folder, files, roster, quantities, objects: judgedObjects(quantities, roster.names, roster.keys) };
}
