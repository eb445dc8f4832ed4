import type { LedgerResult } from '../cuts/result';
import type { QuantitySet } from '../quantities/quantity';
import type { Roster } from '../roster/roster';
import type { Recipe } from './recipe';

/** The file of a source as it was read. */
export interface SourceBytes {
  readonly id: string;
  readonly fileName: string;
  readonly bytes: number;
  readonly sha256: string;
  /** Data rows of the file, readable or not. */
  readonly rowsRead: number;
}

/** Everything that an edition is made of. */
export interface EditionInput {
  readonly recipe: Recipe;
  readonly sources: readonly SourceBytes[];
  readonly roster: Roster;
  readonly quantities: QuantitySet;
  readonly judged: LedgerResult;
  readonly number: number;
  /** ISO 8601. */
  readonly time: string;
  readonly program: { readonly version: string; readonly node: string };
}

/** One document of an edition. */
export interface EditionFile {
  readonly name: string;
  /** The whole text; made anew at every reading. */
  readonly text: string;
  /** The text piece by piece, for documents that are too long for one string. */
  parts(): Iterable<string>;
}

/** A document from the function that writes its pieces. */
export function editionFile(name: string, parts: () => Iterable<string>): EditionFile {
  return {
    name,
    parts,
    get text() {
      return [...parts()].join('');
    },
  };
}

/** Whether any source is made up: it is the first thing that an edition says of itself. */
export function inventedSources(input: EditionInput): string[] {
  return input.recipe.sources.filter((source) => source.invented).map((source) => source.id);
}
