import fc from 'fast-check';
import { expect, test } from 'vitest';
import { assembleEdition } from '../../core/edition/assemble';
import { splitCsvLine } from '../../core/edition/csvline';
import { parseRecipe, recipeText } from '../../core/edition/recipefile';
import { csvRow } from '../../core/formats/csv/write';
import { cut, editionInput, smallRecipe } from '../core/edition/fixture';

/** JSON has no negative zero. */
const limit = fc.double({ min: -3, max: 1, noNaN: true }).map((value) => value + 0);
const recipes = fc
  .record({
    max: limit,
    ebv: fc.option(limit),
    margin: fc.double({ min: 0, max: 3, noNaN: true }),
    frame: fc.constantFrom('G18', 'G21', 'IAU85'),
    missing: fc.constantFrom('drop' as const, 'keep' as const, 'unjudged' as const),
    title: fc.string({ minLength: 1 }),
    reason: fc.string({ unit: 'binary' }),
    alias: fc.dictionary(
      fc.string().filter((name) => name !== '__proto__'),
      fc.string(),
      { maxKeys: 3 },
    ),
  })
  .map(({ max, ebv, margin, frame, missing, title, reason, alias }) =>
    smallRecipe({
      title,
      frame,
      borderlineSigma: margin,
      roster: { ...smallRecipe().roster, aliases: alias },
      ledger: [
        cut('metals', 'metallicity', { min: null, max }, { missing, rationale: reason }),
        cut('dust', 'extinction', { ebvMax: ebv, avMax: null, absBMin: 10 }, { missing, author: reason }),
      ],
    }),
  );
const texts = (input: Parameters<typeof assembleEdition>[0]): Map<string, string> =>
  new Map(assembleEdition(input).map(({ name, text }) => [name, text]));

test('assembling twice gives the same bytes', () => {
  fc.assert(
    fc.property(recipes, (recipe) => {
      expect(texts(editionInput(recipe))).toEqual(texts(editionInput(recipe)));
    }),
    { numRuns: 25 },
  );
});

test('another number, time and program change edition.json, README.md and report.html, and nothing else', () => {
  fc.assert(
    fc.property(recipes, (recipe) => {
      const stamp = { number: 41, time: '2031-01-01T00:00:00.000Z', program: { version: '77.0.0', node: '30.1.2' } };
      const [one, other] = [texts(editionInput(recipe)), texts(editionInput(recipe, undefined, stamp))];
      const changed = [...one.keys()].filter((name) => one.get(name) !== other.get(name));
      expect(changed.toSorted()).toEqual(['README.md', 'edition.json', 'report.html']);
    }),
    { numRuns: 25 },
  );
});

test('sample and dropped objects are all objects, whatever the ledger', () => {
  fc.assert(
    fc.property(recipes, (recipe) => {
      const input = editionInput(recipe);
      const files = texts(input);
      const rows = (name: string): number => files.get(name)!.split('\n').length - 2;
      expect(rows('sample.csv') + rows('dropped.csv')).toBe(input.roster.rows);
      expect(rows('sample.csv')).toBe(input.judged.counts.sample);
    }),
    { numRuns: 25 },
  );
});

test('a recipe survives its text, and its text is stable', () => {
  fc.assert(
    fc.property(recipes, (recipe) => {
      const text = recipeText(recipe);
      const read = parseRecipe(text, 'x');
      expect(read).toEqual(recipe);
      expect(recipeText(read)).toBe(text);
    }),
  );
});

test('a line of cells splits into the same cells', () => {
  fc.assert(
    fc.property(fc.array(fc.string({ unit: 'binary' }), { minLength: 1 }), (cells) => {
      expect(splitCsvLine(csvRow(cells).slice(0, -1))).toEqual(cells);
    }),
  );
});
