import { basename, dirname, resolve } from 'node:path';
import { parseRecipe } from '../../core/edition/recipefile';
import { readText } from '../engine/files';
import { prepare, type Prepared } from '../engine/pipeline';
import type { Invocation } from './command';

/** Reads a recipe and its sources, as every command without a window does. */
export async function openRecipe(path: string, { onProgress, signal }: Invocation): Promise<Prepared> {
  const recipe = parseRecipe(await readText(path), basename(path));
  return prepare(recipe, dirname(resolve(path)), { onProgress, signal });
}
