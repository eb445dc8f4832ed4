import { z } from 'zod';
import { Bitset } from '../table/bitset';
import type { CutKind } from './contract';

const parameters = z.strictObject({
  objects: z
    .array(
      z.strictObject({
        key: z.string().describe('Cleaned name of the object'),
        name: z.string().describe('Name as shown'),
        action: z.enum(['keep', 'drop']),
        reason: z.string().describe('Why this object is decided by name'),
      }),
    )
    .describe('Objects decided by eye'),
});
type Parameters = z.infer<typeof parameters>;

/** Keeps or drops single objects by name; a kept one stays whatever other cuts say. */
export const named: CutKind<Parameters, 'named'> = {
  kind: 'named',
  label: 'Named objects',
  purpose: 'Decides single objects by eye, each with its reason.',
  caution: 'A choice by name cannot be modelled as a selection: keep the list short and its reasons good.',
  parameters,
  defaults: { objects: [] },
  proposals: [],
  needs: () => [],
  judge(p, objects) {
    const rowOf = objects.memo('rows by key', '', () => new Map(objects.keys.map((key, row) => [key, row])));
    const dropped = new Bitset(objects.rows);
    const forced = new Bitset(objects.rows);
    for (const { key, action } of p.objects) {
      const row = rowOf.get(key);
      if (row !== undefined) (action === 'keep' ? forced : dropped).add(row);
    }
    const passes = dropped.not();
    return [{ surely: passes, passes, possibly: passes, unjudged: new Bitset(objects.rows), forced }];
  },
  passing: () => 'every',
  describe(p) {
    const list = (action: string): string =>
      p.objects
        .filter((object) => object.action === action)
        .map((object) => object.name)
        .join(', ');
    const words = [
      ['keep', list('keep')],
      ['drop', list('drop')],
    ].filter(([, names]) => names !== '');
    return words.map(([verb, names]) => `${verb} ${names}`).join('; ') || 'no object is named';
  },
  limits: () => [],
  limitColumn: () => undefined,
};

/** Entries of a list of named objects that no object of the roster has the key of. */
export function unmatchedNames(objects: Parameters['objects'], keys: ReadonlySet<string>): string[] {
  return objects.filter(({ key }) => !keys.has(key)).map(({ name }) => name);
}
