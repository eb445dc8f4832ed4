import { SOLAR_FRAMES, solarFrame } from '../frame/solarframes';
import { fail, type Problem, ProblemError } from '../table/problem';
import { jsonText } from './jsontext';
import { scanJson } from './jsonscan';
import { RECIPE_VERSION, type Recipe, recipeSchema } from './recipe';
import { recipeProblems } from './recipeproblem';
import { member } from './schema';

/**
 * Reads a recipe document; a byte order mark is forgiven.
 *
 * Throws ProblemError `recipe-not-json` (with line and column), `recipe-version` (written by a newer program) or
 * `recipe-invalid` (one problem per finding: path and line, found, expected, remedy). Nothing unknown is dropped in silence.
 */
export function parseRecipe(text: string, fileName: string): Recipe {
  const body = text.startsWith('\uFEFF') ? text.slice(1) : text;
  const { fault, lines } = scanJson(body);
  if (fault) {
    const { line, column, found, expected } = fault;
    const place = { where: fileName, line, column: String(column) };
    if (fault.kind === 'repeated-key') fail('recipe-invalid', { ...place, found, expected });
    fail('recipe-not-json', { ...place, found: `found ${found}, expected ${expected}`, expected });
  }
  const document: unknown = JSON.parse(body);
  if (member(document, 'halosieve') !== 'recipe') {
    fail('recipe-invalid', {
      where: fileName,
      found: 'a document without "halosieve": "recipe"',
      expected: 'a recipe',
      remedy: 'Choose a file that Halosieve saved as a recipe (*.halosieve.json). The file was not changed.',
    });
  }
  refuseFuture(document, fileName);
  const result = recipeSchema.safeParse(document);
  if (!result.success) throw new ProblemError(recipeProblems(result.error.issues, document, fileName, lines));
  const inconsistent = inconsistencies(result.data, fileName, lines);
  if (inconsistent.length > 0) throw new ProblemError(inconsistent);
  return result.data;
}

function refuseFuture(document: unknown, fileName: string): void {
  const version = member(document, 'version');
  if (typeof version !== 'number' || version <= RECIPE_VERSION) return;
  fail('recipe-version', { where: fileName, found: String(version), expected: `version ${RECIPE_VERSION} or older` });
}

/** What the form of the document cannot say: ids are distinct, the frame is one that the program knows. */
function inconsistencies(recipe: Recipe, fileName: string, lines: ReadonlyMap<string, number>): Problem[] {
  const about = (path: string, found: string, expected: string): Problem => ({
    code: 'recipe-invalid',
    severity: 'error',
    where: `${fileName}, ${path}`,
    line: lines.get(path),
    found,
    expected,
  });
  const repeated = (['sources', 'ledger', 'plates'] as const).flatMap((list) => {
    const ids = recipe[list].map(({ id }) => id);
    return ids.flatMap((id, at) =>
      ids.indexOf(id) < at ? [about(`${list}[${at}].id`, `"${id}" a second time`, 'every id once')] : [],
    );
  });
  const known = SOLAR_FRAMES.map(({ id }) => id).join(', ');
  const frame = solarFrame(recipe.frame)
    ? []
    : [about('frame', `the unknown frame "${recipe.frame}"`, `one of ${known}`)];
  // A JavaScript object cannot hold this name: the alias would be lost in silence.
  const lost = 'roster.aliases.__proto__';
  return [...repeated, ...frame, ...(lines.has(lost) ? [about(lost, 'the name "__proto__"', 'another name')] : [])];
}

/**
 * The recipe as a document: keys in the order of the schema, aliases sorted, a newline at the end. Equal recipes give
 * equal texts. Throws ProblemError `recipe-invalid` rather than write what `parseRecipe` would refuse.
 */
export function recipeText(recipe: Recipe): string {
  const result = recipeSchema.safeParse(recipe);
  if (!result.success) throw new ProblemError(recipeProblems(result.error.issues, recipe, 'recipe', new Map()));
  const { roster } = result.data;
  const aliases = Object.fromEntries(Object.entries(roster.aliases).sort(([a], [b]) => (a < b ? -1 : 1)));
  return jsonText({ ...result.data, roster: { ...roster, aliases } });
}

/** A recipe without sources and cuts: frame G18, R_V 3.1, one sigma of margin, three plates to begin with. */
export function emptyRecipe(title: string): Recipe {
  return {
    halosieve: 'recipe',
    version: RECIPE_VERSION,
    title: title.trim() || 'Untitled sample',
    author: '',
    note: '',
    sources: [],
    roster: { matchRadiusArcsec: 5, matchNames: true, aliases: {}, priority: [], conflictSigma: 5 },
    frame: 'G18',
    extinction: { rv: 3.1, recalibration: 1 },
    borderlineSigma: 1,
    ledger: [],
    plates: [
      { id: 'sky', x: 'gal_l', y: 'gal_b' },
      { id: 'metals', x: 'r', y: 'feh' },
      { id: 'rotation', x: 'v_phi', y: 'z' },
    ],
  };
}
