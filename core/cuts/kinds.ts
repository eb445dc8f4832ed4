import type { CutKind } from './contract';
import { disc } from './disc';
import { extinction } from './extinction';
import { lasso } from './lasso';
import { metallicity } from './metallicity';
import { named } from './named';
import { plane } from './plane';
import { range } from './range';

/** Every kind of cut, in the order in which a window offers them. */
export const CUT_KINDS = [metallicity, extinction, disc, plane, range, lasso, named] as const;

/** A kind of cut whose parameters were validated by its own schema. */
export type AnyCutKind = CutKind<unknown>;

/** The kind of that name; throws RangeError for a name that no validated recipe can hold. */
export function cutKind(kind: string): AnyCutKind {
  const found = CUT_KINDS.find((candidate) => candidate.kind === kind);
  if (found === undefined) throw new RangeError(`no cut of kind ${kind}`);
  // Sound because a recipe is validated against the schema of the same kind before its parameters get here.
  return found;
}
