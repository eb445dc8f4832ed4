import { separationDeg } from '../frame/sphere';
import type { Problem } from '../table/problem';
import { cleanName } from './cleanname';
import type { DuplicateRow, ReadSource } from './roster';
import { neighbours } from './skymatch';
import type { RosterPolicy } from './sourcemap';

/** One object: its row in each source, −1 where a source lacks it. */
export interface Identity {
  key: string;
  name: string;
  readonly rows: number[];
}

export interface Identification {
  readonly objects: readonly Identity[];
  readonly duplicates: readonly DuplicateRow[];
  readonly problems: readonly Problem[];
  /** Objects whose rows bear one name but stand further apart than the radius. */
  readonly farNamesakes: readonly {
    readonly object: number;
    readonly first: number;
    readonly second: number;
    readonly separationDeg: number;
  }[];
}

/**
 * Finds which rows of several sources are one object: by cleaned name (aliases applied first), then by place on the
 * sky. Sources are taken in the order given; each new one is matched to the objects so far. An object takes at most
 * one row of a source; a later row with the same name in the same source is a duplicate.
 */
export function identify(sources: readonly ReadSource[], policy: RosterPolicy): Identification {
  const objects: Identity[] = [];
  const byKey = new Map<string, number>();
  const duplicates: DuplicateRow[] = [];
  const problems: Problem[] = [];
  const farNamesakes: { object: number; first: number; second: number; separationDeg: number }[] = [];
  const aliases = new Map(Object.entries(policy.aliases).map(([other, name]) => [cleanName(other), name]));
  const radius = policy.matchRadiusArcsec / 3600;

  sources.forEach((source, index) => {
    const keys = source.names.map((name) => cleanName(aliases.get(cleanName(name)) ?? name));
    const { standing, repeated } = withoutDuplicates(source, keys);
    duplicates.push(...repeated.duplicates);
    problems.push(...repeated.problems);
    const target = matchRows({ source, sources, standing, keys, objects, byKey, radius, policy, problems });
    for (const row of standing) {
      let object = target.get(row);
      if (object === undefined) {
        const name = source.names[row]! || placeName(source, row);
        object =
          objects.push({ key: uniqueKey(keys[row]! || cleanName(name), byKey), name, rows: sources.map(() => -1) }) - 1;
        byKey.set(objects[object]!.key, object);
      } else noteDistance(sources, objects[object]!, object, index, row, radius, farNamesakes);
      objects[object]!.rows[index] = row;
    }
  });
  for (const { object, separationDeg: apart } of farNamesakes) {
    problems.push({
      code: 'far-namesake',
      severity: 'warning',
      found: objects[object]!.name,
      expected: `${apart.toFixed(4)}°`,
    });
  }
  return { objects, duplicates, problems, farNamesakes };
}

function withoutDuplicates(
  source: ReadSource,
  keys: readonly string[],
): { standing: number[]; repeated: { duplicates: DuplicateRow[]; problems: Problem[] } } {
  const first = new Map<string, number>();
  const standing: number[] = [];
  const duplicates: DuplicateRow[] = [];
  keys.forEach((key, row) => {
    const earlier = key === '' ? undefined : first.get(key);
    if (earlier === undefined) {
      first.set(key, row);
      standing.push(row);
    } else {
      const [line, firstLine] = [source.lines[row]!, source.lines[earlier]!];
      duplicates.push({ source: source.id, line, name: source.names[row]!, firstLine });
    }
  });
  const problems = duplicates.map(({ line, name, firstLine }): Problem => ({
    code: 'duplicate-name',
    severity: 'warning',
    where: source.id,
    line,
    found: name,
    expected: `line ${firstLine}`,
  }));
  return { standing, repeated: { duplicates, problems } };
}

interface MatchTask {
  readonly source: ReadSource;
  readonly sources: readonly ReadSource[];
  readonly standing: readonly number[];
  readonly keys: readonly string[];
  readonly objects: readonly Identity[];
  readonly byKey: ReadonlyMap<string, number>;
  readonly radius: number;
  readonly policy: RosterPolicy;
  readonly problems: Problem[];
}

/** The object of each standing row of a source, where there is one already. */
function matchRows(task: MatchTask): ReadonlyMap<number, number> {
  const { standing, keys, byKey, policy } = task;
  const target = new Map<number, number>();
  const taken = new Set<number>();
  if (policy.matchNames) {
    for (const row of standing) {
      const object = keys[row] === '' ? undefined : byKey.get(keys[row]!);
      if (object === undefined) continue;
      target.set(row, object);
      taken.add(object);
    }
  }
  const open = standing.filter((row) => !target.has(row));
  if (task.objects.length === 0 || open.length === 0) return target;
  const [places, candidates] = [placesOf(task.source, open), objectPlaces(task)];
  const pairs = neighbours(places, candidates, task.radius).flatMap((near, at) => {
    const free = near.filter(({ index }) => !taken.has(index));
    if (free.length > 1) {
      const [row] = [open[at]!];
      const found = task.source.names[row]! || `line ${task.source.lines[row]!}`;
      task.problems.push({
        code: 'ambiguous-match',
        severity: 'warning',
        where: task.source.id,
        line: task.source.lines[row]!,
        found,
      });
    }
    return free.map(({ index, separationDeg: apart }) => ({ row: open[at]!, object: index, apart }));
  });
  // The closest pairs first, so that two rows near one object do not both get it.
  for (const { row, object } of pairs.sort((p, q) => p.apart - q.apart || p.row - q.row)) {
    if (target.has(row) || taken.has(object)) continue;
    target.set(row, object);
    taken.add(object);
  }
  return target;
}

function placesOf(source: ReadSource, rows: readonly number[]): { ra: Float64Array; dec: Float64Array } {
  const [ra, dec] = [source.measured.columns.get('ra')?.values, source.measured.columns.get('dec')?.values];
  return {
    ra: Float64Array.from(rows, (row) => ra?.[row] ?? Number.NaN),
    dec: Float64Array.from(rows, (row) => dec?.[row] ?? Number.NaN),
  };
}

function objectPlaces({ objects, sources }: MatchTask): { ra: Float64Array; dec: Float64Array } {
  const place =
    (id: 'ra' | 'dec') =>
    (object: Identity): number => {
      const at = object.rows.findIndex((row) => row >= 0);
      return sources[at]?.measured.columns.get(id)?.values[object.rows[at]!] ?? Number.NaN;
    };
  return { ra: Float64Array.from(objects, place('ra')), dec: Float64Array.from(objects, place('dec')) };
}

function noteDistance(
  sources: readonly ReadSource[],
  object: Identity,
  index: number,
  second: number,
  row: number,
  radius: number,
  found: { object: number; first: number; second: number; separationDeg: number }[],
): void {
  const first = object.rows.findIndex((other) => other >= 0);
  const at = (source: number, id: 'ra' | 'dec', place: number): number =>
    sources[source]?.measured.columns.get(id)?.values[place] ?? Number.NaN;
  const other = object.rows[first]!;
  const apart = separationDeg(
    at(first, 'ra', other),
    at(first, 'dec', other),
    at(second, 'ra', row),
    at(second, 'dec', row),
  );
  if (apart > radius) found.push({ object: index, first, second, separationDeg: apart });
}

/** A name for a row without one: its place on the sky, J followed by right ascension and declination in degrees. */
function placeName(source: ReadSource, row: number): string {
  const { ra, dec } = placesOf(source, [row]);
  return `J${ra[0]!.toFixed(4)}${dec[0]! < 0 ? '' : '+'}${dec[0]!.toFixed(4)}`;
}

/** The key, or the key with a number behind it when another object has it. */
function uniqueKey(key: string, taken: ReadonlyMap<string, number>): string {
  if (!taken.has(key)) return key;
  for (let number = 2; ; number++) if (!taken.has(`${key}#${number}`)) return `${key}#${number}`;
}
