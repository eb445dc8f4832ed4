import { randomBytes } from 'node:crypto';
import { basename, dirname, join, resolve } from 'node:path';
import { sha256 } from './files';

/** Where a bench stands: its recipe, and its two files in the state folder. */
export interface Place {
  /** Undefined until the bench is saved. */
  readonly recipePath: string | undefined;
  /** Folder that paths of the recipe are relative to. */
  readonly folder: string;
  /** File that keeps the work; opening that of an unsaved bench brings the bench back. */
  readonly keptIn: string;
  readonly lock: string;
}

const KEPT = '.bench.json';
const UNSAVED = /^new-[0-9a-f]+$/;

/** The place of a recipe's bench: one per path. */
export function recipePlace(stateFolder: string, recipePath: string): Place {
  return { recipePath, folder: dirname(recipePath), ...stateFiles(stateFolder, sha256(recipePath).slice(0, 16)) };
}

/** A place of its own for a bench without a recipe file. */
export function newPlace(stateFolder: string): Place {
  return unsavedPlace(stateFolder, `new-${randomBytes(8).toString('hex')}`);
}

/** The place of the unsaved bench whose kept file stands at a path; undefined for any other file. */
export function placeOfKept(stateFolder: string, path: string): Place | undefined {
  const key = basename(path, KEPT);
  const ours = dirname(path) === resolve(stateFolder) && path.endsWith(KEPT) && UNSAVED.test(key);
  return ours ? unsavedPlace(stateFolder, key) : undefined;
}

function unsavedPlace(stateFolder: string, key: string): Place {
  return { recipePath: undefined, folder: process.cwd(), ...stateFiles(stateFolder, key) };
}

function stateFiles(stateFolder: string, key: string): Pick<Place, 'keptIn' | 'lock'> {
  const stem = join(resolve(stateFolder), key);
  return { keptIn: `${stem}${KEPT}`, lock: `${stem}.lock` };
}
