import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, test } from 'vitest';
import { parseRecipe } from '../../../core/edition/recipefile';
import { DEMO } from './carriedout';

const SAMPLES = join(import.meta.dirname, '../../../samples');

test('the generator still makes exactly the bytes that are committed', () => {
  const changed = [...DEMO].filter(([name, text]) => readFileSync(join(SAMPLES, name), 'utf8') !== text);
  expect(changed.map(([name]) => name)).toEqual([]);
});

test('every invented catalogue and truth says in its first line that it is invented', () => {
  for (const [name, text] of DEMO) if (!name.endsWith('.json')) expect(text.slice(0, 15)).toBe('# INVENTED DATA');
});

test('recipes fit the schema, mark their sources as invented and give every cut a rationale', () => {
  for (const name of ['demo', 'giants']) {
    const recipe = parseRecipe(DEMO.get(`${name}.halosieve.json`)!, name);
    expect(recipe.sources.every(({ invented }) => invented)).toBe(true);
    expect(recipe.ledger.every(({ rationale }) => rationale.length > 20)).toBe(true);
  }
});

test('the giants bear 19-digit identifiers, all different, and some lack a velocity', () => {
  const rows = DEMO.get('giants.csv')!
    .split('\n')
    .slice(3)
    .filter(Boolean)
    .map((line) => line.split(','));
  expect(rows).toHaveLength(20_000);
  expect(rows.every(([id]) => /^\d{19}$/.test(id!))).toBe(true);
  expect(new Set(rows.map(([id]) => id)).size).toBe(20_000);
  const still = rows.filter((cells) => cells[9] === '').length;
  expect(still).toBeGreaterThan(1000);
  expect(still).toBeLessThan(2500);
});
