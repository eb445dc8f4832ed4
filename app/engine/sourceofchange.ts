import { basename, relative, resolve } from 'node:path';
import type { Recipe } from '../../core/edition/recipe';
import type { Source } from '../../core/roster/sourcemap';
import { fail } from '../../core/table/problem';
import type { Change } from '../contract/messages';
import { freeId } from './changes';
import { guessedMeanings } from './columnview';
import { openSource, type PrepareOptions } from './pipeline';
import type { Place } from './place';

type SourceChange = Extract<Change, { type: 'add-source' | 'accept-source' }>;

/** Whether a change brings a source, whose file is then read first. */
export function bringsSource(change: Change): change is SourceChange {
  return change.type === 'add-source' || change.type === 'accept-source';
}

/**
 * The source that a change brings, as its file is now.
 * Errors: unknown-quantity for a source that is not there, cancelled, and whatever is wrong with the file.
 */
export async function sourceOfChange(
  change: SourceChange,
  recipe: Recipe,
  { recipePath, folder }: Place,
  options: PrepareOptions,
): Promise<Source> {
  if (change.type === 'accept-source') {
    const source =
      recipe.sources.find(({ id }) => id === change.source) ?? fail('unknown-quantity', { found: change.source });
    return { ...source, sha256: (await openSource(source, folder, options)).sha256 };
  }
  const full = resolve(folder, change.path);
  const bare = {
    id: freeId(sourceId(full), recipe.sources),
    path: recipePath === undefined ? full : portable(relative(folder, full)),
    sha256: '0'.repeat(64),
    title: basename(full),
  };
  const source: Source = { ...bare, citation: '', invented: false, missing: [], columns: [] };
  const { file, sha256 } = await openSource(source, folder, options);
  const invented = file.comments.some((line) => /\binvented data\b/i.test(line));
  return { ...source, invented, sha256, columns: guessedMeanings(file.table) };
}

/** A recipe with its source paths relative to another folder. */
export function rebased(recipe: Recipe, from: string, to: string): Recipe {
  const sources = recipe.sources.map((source) => ({
    ...source,
    path: portable(relative(to, resolve(from, source.path))),
  }));
  return { ...recipe, sources };
}

function portable(path: string): string {
  return path.replaceAll('\\', '/');
}

function sourceId(path: string): string {
  const stem = basename(path)
    .replace(/\..*$/, '')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-+|-+$/g, '');
  return /^[a-z]/.test(stem) ? stem : `source-${stem}`.replace(/-$/, '');
}
