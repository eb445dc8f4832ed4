import { equalWords } from '../table/arquero';
import type { Problem } from '../table/problem';
import type { Identity } from './identity';
import type { ReadSource } from './roster';
import { neighbours, type SkyPoints } from './skymatch';
import { placesOf } from './skyname';
import { valueOf } from './values';

/** One more source to be laid over the objects that earlier sources gave. */
export interface MatchTask {
  readonly source: ReadSource;
  /** All sources in the order of trust; `Identity.rows` has their order. */
  readonly sources: readonly ReadSource[];
  /** Rows of the source that stand. */
  readonly standing: readonly number[];
  /** Cleaned name of every row of the source. */
  readonly keys: readonly string[];
  readonly objects: readonly Identity[];
  readonly matchNames: boolean;
  readonly radiusDeg: number;
}

/** The object of each row of the source, −1 for a row that has none yet, and what was not clear about it. */
export interface Matched {
  readonly target: Int32Array;
  readonly problems: readonly Problem[];
}

/** Matches by name first, then what is left by place; an object takes one row, a row one object. */
export function matchRows(task: MatchTask): Matched {
  const target = new Int32Array(task.keys.length).fill(-1);
  const taken = new Uint8Array(task.objects.length);
  if (task.objects.length === 0) return { target, problems: [] };
  const take = (row: number, object: number): void => {
    target[row] = object;
    taken[object] = 1;
  };
  if (task.matchNames) {
    eachNamePair(task, (row, object) => {
      if (target[row]! < 0 && taken[object] === 0) take(row, object);
    });
  }
  const { pairs, problems } = skyPairs(task, target, taken);
  const late = new Map<number, Problem>();
  for (const { row, object } of pairs) {
    if (target[row]! >= 0) continue;
    if (taken[object] === 0) take(row, object);
    else if (!late.has(row)) late.set(row, ambiguous(task.source, row, task.objects[object]!.name));
  }
  return { target, problems: [...problems, ...late.values()] };
}

/** Rows and objects of one name; an object's own key before a name that it bears in another source. */
function eachNamePair({ standing, keys, objects }: MatchTask, found: (row: number, object: number) => void): void {
  const words = standing.map((row) => keys[row]!);
  const own = objects.map(({ key }) => key);
  for (const [at, object] of equalWords(words, own)) found(standing[at]!, object);
  const others: { readonly word: string; readonly object: number }[] = [];
  objects.forEach(({ aka }, object) => {
    for (const word of aka) others.push({ word, object });
  });
  if (others.length === 0) return;
  const learned = others.map(({ word }) => word);
  for (const [at, place] of equalWords(words, learned)) found(standing[at]!, others[place]!.object);
}

interface SkyPair {
  readonly row: number;
  readonly object: number;
  readonly apart: number;
}

/** Pairs of free rows and free objects within the radius, the closest first, so that two rows do not get one object. */
function skyPairs(
  task: MatchTask,
  target: Int32Array,
  taken: Uint8Array,
): { pairs: readonly SkyPair[]; problems: readonly Problem[] } {
  const { source, standing, keys, objects } = task;
  const open = standing.filter((row) => target[row]! < 0);
  const problems: Problem[] = [];
  if (open.length === 0) return { pairs: [], problems };
  const pairs = neighbours(placesOf(source, open), objectPlaces(task), task.radiusDeg).flatMap((near, at) => {
    const row = open[at]!;
    const free = near.filter(({ index }) => taken[index] === 0);
    if (free.length > 1) problems.push(ambiguous(source, row, source.names[row]! || `line ${source.lines[row]!}`));
    return free.map(({ index, separationDeg }): SkyPair => ({ row, object: index, apart: separationDeg }));
  });
  // Ties go by name, so that the order of the rows does not decide.
  pairs.sort(
    (p, q) =>
      p.apart - q.apart ||
      byText(keys[p.row]!, keys[q.row]!) ||
      byText(objects[p.object]!.key, objects[q.object]!.key) ||
      p.row - q.row,
  );
  return { pairs, problems };
}

function byText(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}

function ambiguous(source: ReadSource, row: number, found: string): Problem {
  return { code: 'ambiguous-match', severity: 'warning', where: source.id, line: source.lines[row]!, found };
}

/** Objects stand where the most trusted source that has them puts them. */
function objectPlaces({ objects, sources }: MatchTask): SkyPoints {
  const [ra, dec] = [new Float64Array(objects.length), new Float64Array(objects.length)];
  for (let object = 0; object < objects.length; object++) {
    const { rows } = objects[object]!;
    const source = rows.findIndex((row) => row >= 0);
    ra[object] = valueOf(sources[source]!, rows[source]!, 'ra');
    dec[object] = valueOf(sources[source]!, rows[source]!, 'dec');
  }
  return { ra, dec };
}
