import type { Recipe } from '../../core/edition/recipe';

/** One step that can be undone: the recipe before it and what was done. */
export interface Step {
  readonly recipe: Recipe;
  readonly label: string;
}

/** A recipe with the steps that led to it and those that were undone, newest last. */
export interface History {
  readonly past: readonly Step[];
  readonly recipe: Recipe;
  readonly future: readonly Step[];
  /** Gesture of the newest step: further changes of the same one join it. */
  readonly gesture?: string | undefined;
}

/** Steps that are kept. */
const DEPTH = 500;

/** A history without steps. */
export function begin(recipe: Recipe): History {
  return { past: [], recipe, future: [] };
}

/** The history after a change; one gesture (a drag, a typing) makes one step. */
export function advance(history: History, recipe: Recipe, label: string, gesture?: string): History {
  if (gesture !== undefined && gesture === history.gesture) return { ...history, recipe, future: [] };
  return { past: [...history.past, { recipe: history.recipe, label }].slice(-DEPTH), recipe, future: [], gesture };
}

/** The history with every recipe of it changed, e.g. because its file moves to another folder. */
export function mapRecipes(history: History, change: (recipe: Recipe) => Recipe): History {
  const each = (steps: readonly Step[]): Step[] => steps.map((step) => ({ ...step, recipe: change(step.recipe) }));
  return { past: each(history.past), recipe: change(history.recipe), future: each(history.future) };
}

/** One step back; the same history when there is none. */
export function undo({ past, recipe, future }: History): History {
  const step = past.at(-1);
  if (!step) return { past, recipe, future };
  return { past: past.slice(0, -1), recipe: step.recipe, future: [...future, { recipe, label: step.label }] };
}

/** One step forward again. */
export function redo({ past, recipe, future }: History): History {
  const step = future.at(-1);
  if (!step) return { past, recipe, future };
  return { past: [...past, { recipe, label: step.label }], recipe: step.recipe, future: future.slice(0, -1) };
}
