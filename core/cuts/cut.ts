import { z } from 'zod';
import { disc } from './disc';
import { extinction } from './extinction';
import { lasso } from './lasso';
import { metallicity } from './metallicity';
import { MISSING_RULES } from './missing';
import { named } from './named';
import { plane } from './plane';
import { range } from './range';

const common = z.strictObject({
  id: z.string().regex(/^[a-z0-9][a-z0-9-]*$/),
  on: z.boolean(),
  missing: z.enum(MISSING_RULES).describe('What each test of the cut says of an object that lacks the value it tests'),
  rationale: z.string().describe('Why the cut stands where it stands; a sample cannot be frozen without'),
  evidence: z.array(z.string()).describe('DOIs, bibcodes or arXiv ids'),
  author: z.string(),
  time: z.string().describe('When the cut was last changed, ISO 8601'),
});

function of<Kind extends string, P>(kind: Kind, parameters: z.ZodType<P>) {
  return common.extend({ kind: z.literal(kind), parameters });
}

/** One selection rule of the ledger with its parameters, its rationale and its evidence. */
export const cutSchema = z.discriminatedUnion('kind', [
  of('metallicity', metallicity.parameters),
  of('extinction', extinction.parameters),
  of('disc', disc.parameters),
  of('plane', plane.parameters),
  of('range', range.parameters),
  of('lasso', lasso.parameters),
  of('named', named.parameters),
]);

/** A cut as the recipe holds it. */
export type Cut = z.infer<typeof cutSchema>;
