import { z } from 'zod';
import type { CutKind } from './contract';
import { CUT_KINDS } from './kinds';
import { MISSING_RULES } from './missing';

const common = z.strictObject({
  id: z.string().regex(/^[a-z0-9][a-z0-9-]*$/),
  on: z.boolean(),
  missing: z.enum(MISSING_RULES).describe('What each test of the cut says of an object that lacks the value it tests'),
  rationale: z.string().describe('Why the cut stands where it stands; a sample cannot be frozen without'),
  evidence: z.array(z.string()).describe('DOIs, bibcodes or arXiv ids'),
  author: z.string(),
  time: z.string().describe('When the cut was last changed, ISO 8601'),
});

function schemaOf<Kind extends string, P>({ kind, parameters }: Pick<CutKind<P, Kind>, 'kind' | 'parameters'>) {
  return common.extend({ kind: z.literal(kind), parameters });
}

type SchemaOf<K> = K extends CutKind<infer P, infer Kind> ? ReturnType<typeof schemaOf<Kind, P>> : never;
type SchemasOf<Kinds extends readonly unknown[]> = { [At in keyof Kinds]: SchemaOf<Kinds[At]> };

// A map of a tuple is typed as a list of unions; the schemas are made one by one in the order of the kinds.
const schemas = CUT_KINDS.map(schemaOf<string, unknown>) as unknown as SchemasOf<typeof CUT_KINDS>;

/** One selection rule of the ledger with its parameters, its rationale and its evidence; one variant per kind. */
export const cutSchema = z.discriminatedUnion('kind', schemas);

/** A cut as the recipe holds it. */
export type Cut = z.infer<typeof cutSchema>;
