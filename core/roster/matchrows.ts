import { equalWords } from '../table/arquero';
import type { Problem } from '../table/problem';
import type { Identity } from './identity';
import type { ReadSource } from './roster';
import { neighbours, type SkyPoints } from './skymatch';
import { placesOf } from './skyname';

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

/** The object of each standing row that has one already, and what was not clear about it. */
export interface Matched {
  readonly target: ReadonlyMap<number, number>;
  readonly problems: readonly Problem[];
}

/** Matches by name first, then what is left by place; an object takes one row, a row one object. */
export function matchRows(task: MatchTask): Matched {
  const target = new Map<number, number>();
  const taken = new Set<number>();
  if (task.objects.length === 0) return { target, problems: [] };
  const take = (row: number, object: number): void => {
    target.set(row, object);
    taken.add(object);
  };
  if (task.matchNames) {
    for (const { row, object } of namePairs(task)) if (!target.has(row) && !taken.has(object)) take(row, object);
  }
  const { pairs, problems } = skyPairs(task, target, taken);
  const late = new Map<number, Problem>();
  for (const { row, object } of pairs) {
    if (target.has(row)) continue;
    if (!taken.has(object)) take(row, object);
    else if (!late.has(row)) late.set(row, ambiguous(task.source, row, task.objects[object]!.name));
  }
  return { target, problems: [...problems, ...late.values()] };
}

/** Rows and objects of one name; an object's own key before a name that it bears in another source. */
function namePairs({ standing, keys, objects }: MatchTask): { row: number; object: number }[] {
  const words = standing.map((row) => keys[row]!);
  const own = objects.map(({ key }) => key);
  const others = objects.flatMap(({ key, aka }, object) =>
    aka.filter((word) => word !== key).map((word) => ({ word, object })),
  );
  const first = equalWords(words, own).map(([at, object]) => ({ row: standing[at]!, object }));
  const learned = others.map(({ word }) => word);
  const second = equalWords(words, learned).map(([at, place]) => ({
    row: standing[at]!,
    object: others[place]!.object,
  }));
  return [...first, ...second];
}

interface SkyPair {
  readonly row: number;
  readonly object: number;
  readonly apart: number;
}

/** Pairs of free rows and free objects within the radius, the closest first, so that two rows do not get one object. */
function skyPairs(
  task: MatchTask,
  target: ReadonlyMap<number, number>,
  taken: ReadonlySet<number>,
): { pairs: readonly SkyPair[]; problems: readonly Problem[] } {
  const { source, standing, keys, objects } = task;
  const open = standing.filter((row) => !target.has(row));
  const problems: Problem[] = [];
  const pairs = neighbours(placesOf(source, open), objectPlaces(task), task.radiusDeg).flatMap((near, at) => {
    const row = open[at]!;
    const free = near.filter(({ index }) => !taken.has(index));
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
  return { code: 'ambiguous-match', severity: 'warning', where: source.fileName, line: source.lines[row]!, found };
}

/** Objects stand where the most trusted source that has them puts them. */
function objectPlaces({ objects, sources }: MatchTask): SkyPoints {
  const value =
    (id: 'ra' | 'dec') =>
    ({ rows }: Identity): number => {
      const source = rows.findIndex((row) => row >= 0);
      return sources[source]!.measured.columns.get(id)?.values[rows[source]!] ?? Number.NaN;
    };
  return { ra: Float64Array.from(objects, value('ra')), dec: Float64Array.from(objects, value('dec')) };
}
