import { z } from 'zod';
import { RECIPE_VERSION, recipeSchema } from './recipe';

/** A JSON Schema, or a part of one. */
export interface SchemaNode {
  readonly [keyword: string]: unknown;
  readonly properties?: Readonly<Record<string, SchemaNode>>;
  readonly items?: SchemaNode;
  readonly oneOf?: readonly SchemaNode[];
  readonly const?: unknown;
}

/**
 * JSON Schema (draft 2020-12) of the recipe document, made from the schema that the program itself reads with.
 *
 * It says what form a recipe has; that ids are distinct and that the frame is known is checked on reading only.
 */
export function recipeJsonSchema(): SchemaNode {
  const { $schema, ...rest } = z.toJSONSchema(recipeSchema);
  return {
    $schema,
    $id: `urn:halosieve:recipe:${RECIPE_VERSION}`,
    title: 'Halosieve recipe',
    description: 'The document of all decisions behind a sample: sources, roles, frame, ledger of cuts, plates.',
    ...rest,
  } as SchemaNode;
}

/** Keys that an object of the recipe may have at this path; empty where any key may stand. */
export function knownKeys(path: readonly PropertyKey[], document: unknown): string[] {
  let node: SchemaNode | undefined = recipeJsonSchema();
  let value = document;
  for (const step of path) {
    value = member(value, step);
    node = typeof step === 'number' ? node?.items : node?.properties?.[String(step)];
    if (node?.oneOf) node = node.oneOf.find((option) => option.properties?.['kind']?.const === member(value, 'kind'));
  }
  return Object.keys(node?.properties ?? {});
}

/** What stands under a key of an object or list; undefined when there is nothing. */
export function member(value: unknown, step: PropertyKey): unknown {
  if (typeof value !== 'object' || value === null || !Object.hasOwn(value, step)) return undefined;
  return (value as Record<PropertyKey, unknown>)[step];
}
