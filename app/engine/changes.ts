import type { Cut } from '../../core/cuts/cut';
import { cutKind, CUT_KINDS } from '../../core/cuts/kinds';
import { type Recipe, recipeSchema } from '../../core/edition/recipe';
import { recipeProblems } from '../../core/edition/recipeproblem';
import type { Source } from '../../core/roster/sourcemap';
import { fail, ProblemError } from '../../core/table/problem';
import type { Change } from '../contract/messages';

/** What a change needs to know beside itself. */
export interface ChangeContext {
  /** ISO 8601. */
  readonly now: string;
  /** Name of an object of the roster by its key. */
  readonly nameOf: (key: string) => string;
  /** The source that an `add-source` or `accept-source` change brings, read by the engine. */
  readonly source?: Source | undefined;
}

/** A recipe after a change, and the change in a few words for the history. */
export interface Changed {
  readonly recipe: Recipe;
  readonly label: string;
}

/**
 * Applies a change to a recipe; the old one stays as it is.
 * Errors: recipe-invalid when the result would not be a recipe; unknown-quantity for a cut or source that is not there.
 */
export function applyChange(recipe: Recipe, change: Change, context: ChangeContext): Changed {
  const { recipe: draft, label } = draftOf(recipe, change, context);
  const parsed = recipeSchema.safeParse(draft);
  if (!parsed.success) throw new ProblemError(recipeProblems(parsed.error.issues, draft, 'the change', new Map()));
  return { recipe: parsed.data, label };
}

function draftOf(recipe: Recipe, change: Change, context: ChangeContext): Changed {
  switch (change.type) {
    case 'set-title': {
      const { title, author, note } = change;
      return { recipe: { ...recipe, title, author, note }, label: 'title and note' };
    }
    case 'add-source': {
      const source = context.source!;
      const roster = { ...recipe.roster, priority: [...recipe.roster.priority, source.id] };
      return { recipe: { ...recipe, roster, sources: [...recipe.sources, source] }, label: `add source ${source.id}` };
    }
    case 'remove-source': {
      const roster = { ...recipe.roster, priority: recipe.roster.priority.filter((id) => id !== change.source) };
      const sources = recipe.sources.filter(({ id }) => id !== change.source);
      return { recipe: { ...recipe, roster, sources }, label: `remove source ${change.source}` };
    }
    case 'set-source':
      return {
        recipe: withSource(recipe, change.source, (source) => ({ ...source, ...change.set })),
        label: `source ${change.source}`,
      };
    case 'accept-source':
      return {
        recipe: withSource(recipe, change.source, () => context.source!),
        label: `accept new file of ${change.source}`,
      };
    case 'set-roster':
      return { recipe: { ...recipe, roster: { ...recipe.roster, ...change.set } }, label: 'roster' };
    case 'set-frame':
      return { recipe: { ...recipe, frame: change.frame }, label: `frame ${change.frame}` };
    case 'set-extinction': {
      const { rv, recalibration } = change;
      return { recipe: { ...recipe, extinction: { rv, recalibration } }, label: 'extinction law' };
    }
    case 'set-borderline':
      return { recipe: { ...recipe, borderlineSigma: change.sigma }, label: 'borderline margin' };
    case 'add-cut':
    case 'set-cut':
    case 'remove-cut':
    case 'move-cut':
    case 'name-object':
      return changeLedger(recipe, change, context);
    case 'add-plate': {
      const plate = { id: freeId('plate', recipe.plates), x: change.x, y: change.y };
      return { recipe: { ...recipe, plates: [...recipe.plates, plate] }, label: 'add plate' };
    }
    case 'set-plate': {
      const { x, y } = change;
      const plates = recipe.plates.map((plate) => (plate.id === change.plate ? { ...plate, x, y } : plate));
      return { recipe: { ...recipe, plates }, label: 'plate' };
    }
    case 'remove-plate':
      return {
        recipe: { ...recipe, plates: recipe.plates.filter(({ id }) => id !== change.plate) },
        label: 'remove plate',
      };
  }
}

type LedgerChange = Extract<Change, { type: 'add-cut' | 'set-cut' | 'remove-cut' | 'move-cut' | 'name-object' }>;

function changeLedger(recipe: Recipe, change: LedgerChange, context: ChangeContext): Changed {
  const { ledger } = recipe;
  const next = (cuts: readonly Cut[], label: string): Changed => ({ recipe: { ...recipe, ledger: [...cuts] }, label });
  switch (change.type) {
    case 'add-cut': {
      const cut = newCut(change.kind, change.parameters, recipe, context);
      return next([...ledger, cut], `add cut ${cut.id}`);
    }
    case 'set-cut': {
      const { parameters, ...rest } = change.set;
      const cut = cutNamed(recipe, change.cut);
      const changed = { ...cut, ...rest, parameters: { ...cut.parameters, ...parameters }, time: context.now } as Cut;
      return next(replaced(ledger, changed), labelOfSet(change));
    }
    case 'remove-cut':
      return next(
        ledger.filter(({ id }) => id !== change.cut),
        `remove cut ${change.cut}`,
      );
    case 'move-cut': {
      const cut = cutNamed(recipe, change.cut);
      const others = ledger.filter((other) => other !== cut);
      return next(others.toSpliced(change.to, 0, cut), `move cut ${change.cut}`);
    }
    case 'name-object':
      return nameObject(recipe, change, context);
  }
}

function labelOfSet({ cut, set }: Extract<Change, { type: 'set-cut' }>): string {
  if (set.parameters) return `limits of ${cut}`;
  if (set.on !== undefined) return `switch ${cut} ${set.on ? 'on' : 'off'}`;
  return set.rationale === undefined ? `cut ${cut}` : `rationale of ${cut}`;
}

function nameObject(recipe: Recipe, change: Extract<Change, { type: 'name-object' }>, context: ChangeContext): Changed {
  const { key, action, reason } = change;
  const found = recipe.ledger.find((cut): cut is Extract<Cut, { kind: 'named' }> => cut.kind === 'named');
  const cut = found ?? (newCut('named', undefined, recipe, context) as Extract<Cut, { kind: 'named' }>);
  const others = cut.parameters.objects.filter((object) => object.key !== key);
  const name = context.nameOf(key);
  const objects = action === 'clear' ? others : [...others, { key, name, action, reason }];
  const changed: Cut = { ...cut, parameters: { objects }, time: context.now };
  const ledger = found ? replaced(recipe.ledger, changed) : [...recipe.ledger, changed];
  return { recipe: { ...recipe, ledger }, label: `${action} ${name}` };
}

function newCut(
  kind: string,
  parameters: Record<string, unknown> | undefined,
  recipe: Recipe,
  context: ChangeContext,
): Cut {
  if (!CUT_KINDS.some((candidate) => candidate.kind === kind)) fail('unknown-quantity', { found: kind });
  const defaults = cutKind(kind).defaults as Record<string, unknown>;
  return {
    id: freeId(kind, recipe.ledger),
    kind,
    on: true,
    missing: 'unjudged',
    parameters: { ...defaults, ...parameters },
    rationale: kind === 'named' ? 'Objects decided by eye, each with its reason.' : '',
    evidence: [],
    author: recipe.author,
    time: context.now,
  } as unknown as Cut;
}

function cutNamed(recipe: Recipe, id: string): Cut {
  return recipe.ledger.find((cut) => cut.id === id) ?? fail('unknown-quantity', { found: `cut ${id}` });
}

function replaced(ledger: readonly Cut[], changed: Cut): Cut[] {
  return ledger.map((cut) => (cut.id === changed.id ? changed : cut));
}

function withSource(recipe: Recipe, id: string, change: (source: Source) => Source): Recipe {
  if (!recipe.sources.some((source) => source.id === id)) fail('unknown-quantity', { found: `source ${id}` });
  return { ...recipe, sources: recipe.sources.map((source) => (source.id === id ? change(source) : source)) };
}

/** The stem, or the stem with the least number that no other of the list has. */
export function freeId(stem: string, list: readonly { readonly id: string }[]): string {
  const taken = new Set(list.map(({ id }) => id));
  if (!taken.has(stem)) return stem;
  for (let number = 2; ; number++) if (!taken.has(`${stem}-${number}`)) return `${stem}-${number}`;
}
