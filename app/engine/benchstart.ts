import { basename } from 'node:path';
import { emptyRecipe, parseRecipe, recipeText } from '../../core/edition/recipefile';
import { fail, type Problem, ProblemError } from '../../core/table/problem';
import { readAutosave } from './autosave';
import { readText, sha256 } from './files';
import { advance, begin, type History } from './history';
import type { Place } from './place';

/** What a bench begins with. */
export interface Start {
  readonly history: History;
  /** Hash of the recipe file. */
  readonly base: string | undefined;
  readonly restored: boolean;
  readonly notice?: Problem;
}

/** A bench without sources. */
export function emptyStart(): Start {
  return { history: begin(emptyRecipe('New sample')), base: undefined, restored: false };
}

/**
 * A recipe file with the unsaved work that was kept of it. When another program edited the file since that work began,
 * the file is one more step after it, so that undo and redo reach both; a notice says so unless the work had been saved.
 */
export async function recipeStart({ keptIn }: Place, path: string): Promise<Start> {
  const text = await readText(path);
  const recipe = parseRecipe(text, basename(path));
  const base = sha256(text);
  const kept = await readAutosave(keptIn);
  if (!kept || kept.history.past.length + kept.history.future.length === 0)
    return { history: begin(recipe), base, restored: false };
  const restored = recipeText(kept.history.recipe) !== recipeText(recipe);
  if (!restored || kept.base === base) return { history: kept.history, base, restored };
  const history = advance(kept.history, recipe, 'recipe file as another program left it');
  if (sha256(recipeText(kept.history.recipe)) === kept.base) return { history, base, restored: false };
  return { history, base, restored, notice: { code: 'work-beside-edit', severity: 'warning', where: path } };
}

/** Refuses to write over a recipe file that another program edited; one that is gone, or is so already, is no loss. */
export async function refuseEdited(path: string, base: string | undefined, text: string): Promise<void> {
  const there = await readText(path).catch((error: unknown) => {
    if (error instanceof ProblemError && error.problems.some(({ code }) => code === 'file-missing')) return text;
    throw error;
  });
  if (there !== text && sha256(there) !== base) fail('recipe-edited', { where: path });
}

/** An unsaved bench as it was left. */
export async function keptStart({ keptIn }: Place): Promise<Start> {
  const kept = (await readAutosave(keptIn)) ?? fail('file-unreadable', { where: keptIn, found: 'no unsaved work' });
  return { history: kept.history, base: undefined, restored: true };
}
