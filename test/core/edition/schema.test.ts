import { readFileSync } from 'node:fs';
import { Ajv2020 } from 'ajv/dist/2020';
import { describe, expect, test } from 'vitest';
import { jsonText } from '../../../core/edition/jsontext';
import { parseRecipe, recipeText } from '../../../core/edition/recipefile';
import { recipeJsonSchema } from '../../../core/edition/schema';
import { cut, smallRecipe } from './fixture';

const validate = new Ajv2020({ strict: true, strictTypes: false }).compile(recipeJsonSchema());

const whole = smallRecipe({
  ledger: [
    cut('metals', 'metallicity', { min: -3, max: -1 }, { evidence: ['10.1000/182'] }),
    cut('dust', 'extinction', { ebvMax: 0.3, avMax: null, absBMin: 10 }),
    cut('disc', 'disc', { combine: 'any', absZMin: 4, cylRMin: null, vPhiMax: 100, toomreMin: 210 }),
    cut('plane', 'plane', {
      preset: null,
      poleL: 1,
      poleB: 2,
      measure: 'position',
      sense: 'either',
      angleMax: 20,
      action: 'keep',
    }),
    cut('far', 'range', { quantity: 'r', min: 5, max: null, absolute: false }),
    cut('shape', 'lasso', {
      x: 'x',
      y: 'z',
      xLog: false,
      yLog: false,
      polygon: [
        [0, 0],
        [1, 0],
        [1, 1],
      ],
      action: 'drop',
    }),
    cut('eye', 'named', { objects: [{ key: 'ember1', name: 'Ember 1', action: 'keep', reason: 'seen' }] }),
  ],
});

type Document = ReturnType<typeof JSON.parse>;
const cases: readonly [string, (document: Document) => unknown, boolean][] = [
  ['every kind of cut', () => undefined, true],
  ['no cuts', (d) => (d.ledger = []), true],
  ['aliases', (d) => (d.roster.aliases = { 'Ember I': 'Ember 1' }), true],
  ['a column with a unit', (d) => (d.sources[0].columns = [{ column: 'RA', role: 'ra', unit: 'deg' }]), true],
  ['a column without a unit', (d) => (d.sources[0].columns = [{ column: 'RA', role: 'ra' }]), true],
  ['another document', (d) => (d.halosieve = 'edition'), false],
  ['version 0', (d) => (d.version = 0), false],
  ['version 2', (d) => (d.version = 2), false],
  ['an unknown key', (d) => (d.extra = 1), false],
  ['a missing key', (d) => delete d.note, false],
  ['a null title', (d) => (d.title = null), false],
  ['an empty title', (d) => (d.title = ''), false],
  ['a number as text', (d) => (d.borderlineSigma = '1'), false],
  ['a radius of zero', (d) => (d.roster.matchRadiusArcsec = 0), false],
  ['an id with capitals', (d) => (d.sources[0].id = 'Near'), false],
  ['an unknown kind', (d) => (d.ledger[0].kind = 'age'), false],
  ['parameters of another kind', (d) => (d.ledger[0].parameters = { ebvMax: 1, avMax: null, absBMin: null }), false],
  ['a limit out of range', (d) => (d.ledger[1].parameters.absBMin = 91), false],
  ['a vertex of three numbers', (d) => (d.ledger[5].parameters.polygon[0] = [0, 0, 0]), false],
  ['a vertex of one number', (d) => (d.ledger[5].parameters.polygon[0] = [0]), false],
  ['a polygon of two vertices', (d) => (d.ledger[5].parameters.polygon.length = 2), false],
  ['an unknown rule for missing values', (d) => (d.ledger[0].missing = 'ask'), false],
];

describe('the published schema', () => {
  test('is the one that the code gives; `npm run schema` writes it', () => {
    const published = new URL('../../../core/edition/recipe.schema.json', import.meta.url);
    expect(readFileSync(published, 'utf8')).toBe(jsonText(recipeJsonSchema()));
  });

  test.each(cases)('an independent validator and the program agree on %s', (_, change, accepted) => {
    const document: Document = JSON.parse(recipeText(whole));
    change(document);
    const read = (): unknown => parseRecipe(JSON.stringify(document), 'x');
    expect(validate(document)).toBe(accepted);
    if (accepted) expect(read).not.toThrow();
    else expect(read).toThrow();
  });
});
