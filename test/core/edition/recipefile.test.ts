import { describe, expect, test } from 'vitest';
import { emptyRecipe, parseRecipe, recipeText } from '../../../core/edition/recipefile';
import { type Problem, ProblemError } from '../../../core/table/problem';
import { problemText } from '../../../core/table/wording';
import { cut, smallRecipe } from './fixture';

function problemsOf(text: string): readonly Problem[] {
  try {
    parseRecipe(text, 'my.halosieve.json');
  } catch (error) {
    if (error instanceof ProblemError) return error.problems;
    throw error;
  }
  return [];
}

/** A recipe as a test breaks it. */
interface Loose extends Record<string, unknown> {
  readonly extinction: { rv?: number };
  readonly sources: object[];
  ledger: { readonly parameters: object }[];
}

const changed = (change: (document: Loose) => unknown): string => {
  const document = JSON.parse(recipeText(smallRecipe())) as Loose;
  change(document);
  return JSON.stringify(document, undefined, 2);
};

describe('what is no recipe', () => {
  test.each([
    ['', 1, '1'],
    ['{"a": 1,\n  "b": }', 2, '8'],
    ['{"a": 1,}', 1, '9'],
    ['[1, 2', 1, '6'],
    ['{"a": "x\ny"}', 1, '7'],
    ['{} {}', 1, '4'],
    ["{'a': 1}", 1, '2'],
    ['{"a": 01}', 1, '8'],
  ])('%j is not JSON, and the message names line and column', (text, line, column) => {
    expect(problemsOf(text)).toMatchObject([{ code: 'recipe-not-json', where: 'my.halosieve.json', line, column }]);
  });

  test('what is found and expected stands in the sentence', () => {
    expect(problemText(problemsOf('{"halosieve" 1}')[0]!)).toMatch(
      /^my\.halosieve\.json, line 1, column 14: .*found "1}", expected a colon after the key/,
    );
  });

  test('deep nesting is refused, not followed', () => {
    expect(problemsOf('['.repeat(1e5))).toMatchObject([
      { code: 'recipe-not-json', expected: 'at most 200 levels of nesting' },
    ]);
  });

  test.each(['null', '7', '"recipe"', '[]', '{}', '{"halosieve": "edition"}'])('%s is JSON but no recipe', (text) => {
    expect(problemsOf(text)).toMatchObject([{ code: 'recipe-invalid', expected: 'a recipe' }]);
  });

  test('a key that stands twice is refused instead of one being lost', () => {
    const text = recipeText(smallRecipe()).replace('"author"', '"title": "Other",\n  "author"');
    expect(problemsOf(text)).toMatchObject([
      { code: 'recipe-invalid', line: 5, column: '3', found: 'the key "title" a second time' },
    ]);
  });
});

describe('a recipe from the future', () => {
  test('is refused with both versions and the advice to update, whatever else it holds', () => {
    const [problem, ...others] = problemsOf(changed((d) => Object.assign(d, { version: 2, orbits: {} })));
    expect(others).toEqual([]);
    expect(problem).toMatchObject({ code: 'recipe-version', found: '2', expected: 'version 1 or older' });
    expect(problemText(problem!)).toContain('Update the program');
  });
});

describe('a recipe that does not fit', () => {
  test('an unknown key is named with its path, its line and the known keys', () => {
    const text = changed((d) => Object.assign(d.extinction, { rV: 3 }));
    const [problem] = problemsOf(text);
    const line = text.split('\n').findIndex((one) => one.includes('"rV"')) + 1;
    expect(problem).toMatchObject({
      code: 'recipe-invalid',
      where: 'my.halosieve.json, extinction.rV',
      line,
      found: 'the unknown key "rV"',
      expected: 'one of: rv, recalibration',
    });
  });

  test('an unknown parameter of a cut is told the parameters of that kind', () => {
    const text = changed((d) => Object.assign(d.ledger[0]!.parameters, { maximum: 1 }));
    expect(problemsOf(text)).toMatchObject([
      { where: 'my.halosieve.json, ledger[0].parameters.maximum', expected: 'one of: min, max' },
    ]);
  });

  test.each<[string, (d: Loose) => unknown, Partial<Problem>]>([
    ['a number for text', (d) => Object.assign(d, { title: 3 }), { found: '3', expected: 'text' }],
    [
      'text for a number',
      (d) => Object.assign(d, { borderlineSigma: 'one' }),
      { found: '"one"', expected: 'a number' },
    ],
    ['a list for an object', (d) => Object.assign(d, { roster: [] }), { found: 'a list of 0', expected: 'an object' }],
    ['an empty title', (d) => Object.assign(d, { title: '' }), { found: '""', expected: 'some text' }],
    ['a negative margin', (d) => Object.assign(d, { borderlineSigma: -1 }), { found: '-1', expected: 'a number ≥ 0' }],
    ['R_V of zero', (d) => Object.assign(d.extinction, { rv: 0 }), { found: '0', expected: 'a number > 0' }],
    [
      'a short hash',
      (d) => Object.assign(d.sources[0]!, { sha256: 'ab' }),
      { expected: '64 hexadecimal digits (0-9, a-f)' },
    ],
    ['an unknown frame', (d) => Object.assign(d, { frame: 'G99' }), { found: 'the unknown frame "G99"' }],
    [
      'an unknown kind of cut',
      (d) => Object.assign(d.ledger[0]!, { kind: 'age' }),
      { found: '"age"', expected: 'one of "metallicity", "extinction", "disc", "plane", "range", "lasso", "named"' },
    ],
    [
      'two cuts of one id',
      (d) => (d.ledger = [d.ledger[0]!, d.ledger[0]!]),
      { where: 'my.halosieve.json, ledger[1].id', found: '"metals" a second time' },
    ],
  ])('%s is refused with what was found and expected', (_, change, expected) => {
    expect(problemsOf(changed(change))).toMatchObject([{ code: 'recipe-invalid', ...expected }]);
  });

  test('a missing key is found as nothing, on the line of what lacks it', () => {
    const text = changed((d) => delete d.extinction.rv);
    const line = text.split('\n').findIndex((one) => one.includes('"extinction"')) + 1;
    expect(problemsOf(text)).toMatchObject([{ where: 'my.halosieve.json, extinction.rv', line, found: 'nothing' }]);
  });

  test('an alias that JavaScript would lose is refused', () => {
    const text = recipeText(smallRecipe()).replace('"aliases": {}', '"aliases": { "__proto__": "Ember 1" }');
    expect(problemsOf(text)).toMatchObject([{ code: 'recipe-invalid', found: 'the name "__proto__"' }]);
  });

  test('every finding is told at once', () => {
    expect(problemsOf(changed((d) => Object.assign(d, { title: 1, note: 2, frame: 3 })))).toHaveLength(3);
  });
});

describe('the text of a recipe', () => {
  test('an empty recipe reads back as itself', () => {
    expect(parseRecipe(recipeText(emptyRecipe('New')), 'x')).toEqual(emptyRecipe('New'));
  });

  test('a recipe without a title gets one', () => {
    expect(parseRecipe(recipeText(emptyRecipe('  ')), 'x').title).toBe('Untitled sample');
  });

  test('the order of keys in memory does not matter', () => {
    const recipe = smallRecipe({ roster: { ...smallRecipe().roster, aliases: { b: 'x', a: 'y' } } });
    const backwards = Object.fromEntries(Object.entries(recipe).reverse()) as typeof recipe;
    backwards.roster = { ...recipe.roster, aliases: { a: 'y', b: 'x' } };
    expect(recipeText(backwards)).toBe(recipeText(recipe));
  });

  test('keys stand in the order of the schema and the text ends with a newline', () => {
    const text = recipeText(smallRecipe());
    expect(text).toMatch(/^\{\n {2}"halosieve": "recipe",\n {2}"version": 1,\n {2}"title": "Embers",/);
    expect(text.endsWith('}\n')).toBe(true);
  });

  test('a byte order mark is forgiven', () => {
    expect(parseRecipe(`\uFEFF${recipeText(smallRecipe())}`, 'x')).toEqual(smallRecipe());
  });

  test('what could not be read again is not written', () => {
    expect(() => recipeText({ ...smallRecipe(), title: '' })).toThrow(ProblemError);
    const outside = cut('far', 'range', { quantity: 'r', min: Infinity, max: null, absolute: false });
    expect(() => recipeText(smallRecipe({ ledger: [outside] }))).toThrow(ProblemError);
  });
});
