import { createHash } from 'node:crypto';
import { judgedObjects } from '../../../core/cuts/judged';
import { judgeLedger } from '../../../core/cuts/ledger';
import type { LedgerResult } from '../../../core/cuts/result';
import { parseRecipe } from '../../../core/edition/recipefile';
import { readDelimited } from '../../../core/formats/csv/read';
import { solarFrame } from '../../../core/frame/solarframes';
import { demoFiles } from '../../../core/mock/demo';
import { deriveQuantities } from '../../../core/quantities/derive';
import type { QuantitySet } from '../../../core/quantities/quantity';
import { cleanName } from '../../../core/roster/cleanname';
import { mergeSources } from '../../../core/roster/merge';
import type { Roster } from '../../../core/roster/roster';
import { understandSource } from '../../../core/roster/understand';

/** The files of the demo as the generator makes them now. */
export const DEMO: ReadonlyMap<string, string> = demoFiles((text) => createHash('sha256').update(text).digest('hex'));

/** What is true of one invented object. */
export interface Truth {
  readonly population: string;
  readonly x: number;
  readonly y: number;
  readonly z: number;
}

/** The truth of a demo by cleaned name. */
export function truthOf(file: 'clusters' | 'giants'): ReadonlyMap<string, Truth> {
  const [header, ...lines] = DEMO.get(`truth/${file}.csv`)!.split('\n').slice(1).filter(Boolean);
  const columns = header!.split(',');
  return new Map(
    lines.map((line) => {
      const cells = line.split(',');
      const number = (name: string): number => Number(cells[columns.indexOf(name)]);
      return [cleanName(cells[0]!), { population: cells[1]!, x: number('x'), y: number('y'), z: number('z') }];
    }),
  );
}

/** A demo recipe carried out up to its verdicts. */
export async function carriedOut(
  name: 'demo' | 'giants',
): Promise<{ roster: Roster; quantities: QuantitySet; result: LedgerResult }> {
  const recipe = parseRecipe(DEMO.get(`${name}.halosieve.json`)!, name);
  const sources = [];
  for (const { id, path, missing, columns } of recipe.sources) {
    const bytes = new TextEncoder().encode(DEMO.get(path));
    sources.push(understandSource(id, await readDelimited([bytes], { fileName: path, missing }), columns));
  }
  const roster = mergeSources(sources, recipe.roster);
  const options = { frame: solarFrame(recipe.frame)!, ...recipe.extinction, extras: roster.extras };
  const quantities = deriveQuantities(roster, options);
  const objects = judgedObjects(quantities, roster.names, roster.keys);
  return { roster, quantities, result: judgeLedger(recipe.ledger, objects, { margin: recipe.borderlineSigma }) };
}
