import { separationDeg } from '../frame/sphere';
import type { Problem } from '../table/problem';
import { cleanName } from './cleanname';
import { condensed } from './condensed';
import { withoutDuplicates } from './duplicates';
import type { Identity } from './identity';
import { matchRows } from './matchrows';
import type { DuplicateRow, ReadSource } from './roster';
import { skyName } from './skyname';
import type { RosterPolicy } from './sourcemap';
import { valueOf } from './values';

/** An object whose rows bear one name but stand further apart than the radius; `first` and `second` are sources. */
export interface FarNamesake {
  readonly object: number;
  readonly first: number;
  readonly second: number;
  readonly separationDeg: number;
}

export interface Identification {
  readonly objects: readonly Identity[];
  readonly duplicates: readonly DuplicateRow[];
  readonly problems: readonly Problem[];
  readonly farNamesakes: readonly FarNamesake[];
}

/**
 * Finds, source by source with stops between, which rows of several sources are one object: by cleaned name (aliases applied first), then by place on the
 * sky. Sources are taken in the order given; each new one is matched to the objects so far. An object takes at most
 * one row of a source; a later row with the same name in the same source is a duplicate.
 *
 * An object found by place is known by the names of all its rows from then on. Its key is the cleaned name of its
 * first row; where two distinct objects share one (names may be left unmatched), the later gets `#2`, `#3`, … behind it.
 */
export function* identify(sources: readonly ReadSource[], policy: RosterPolicy): Generator<undefined, Identification> {
  const objects: Identity[] = [];
  const keysTaken = new Set<string>();
  const duplicates: DuplicateRow[] = [];
  const problems: Problem[] = [];
  const farNamesakes: FarNamesake[] = [];
  const cleaned = keyMaker(policy.aliases);
  const radiusDeg = policy.matchRadiusArcsec / 3600;

  for (const [index, source] of sources.entries()) {
    yield;
    const keys = source.names.map(cleaned);
    yield;
    const standing = withoutDuplicates(source, keys);
    yield;
    const { matchNames } = policy;
    const found = matchRows({ source, sources, standing: standing.rows, keys, objects, matchNames, radiusDeg });
    for (const duplicate of standing.duplicates) duplicates.push(duplicate);
    problems.push(...condensed(standing.problems, 'rows'), ...condensed(found.problems, 'rows'));
    yield;
    for (const row of standing.rows) {
      const target = found.target[row]!;
      if (target < 0) {
        const object = newObject(source, row, keys[row]!, keysTaken, sources.length);
        object.rows[index] = row;
        objects.push(object);
      } else {
        const object = objects[target]!;
        const far = farNamesake(sources, object, index, row, radiusDeg);
        if (far) farNamesakes.push({ object: target, ...far });
        object.rows[index] = row;
        if (keys[row] !== '' && keys[row] !== object.key) object.aka.push(keys[row]!);
      }
    }
  }
  const far = farNamesakes.map((namesake) => farProblem(namesake, objects, sources));
  problems.push(...condensed(far, 'objects'));
  return { objects, duplicates, problems, farNamesakes };
}

function keyMaker(aliases: RosterPolicy['aliases']): (name: string) => string {
  const named = new Map(Object.entries(aliases).map(([other, name]) => [cleanName(other), name]));
  return (name) => {
    const clean = cleanName(name);
    const alias = named.get(clean);
    return alias === undefined ? clean : cleanName(alias);
  };
}

function newObject(source: ReadSource, row: number, clean: string, keysTaken: Set<string>, sources: number): Identity {
  const base = clean || cleanName(skyName(source, row));
  let key = base;
  for (let number = 2; keysTaken.has(key); number++) key = `${base}#${number}`;
  keysTaken.add(key);
  // Not pushed one by one: an array that grows takes room for many more.
  const rows = new Array<number>(sources).fill(-1);
  const aka = clean === '' || clean === key ? [] : [clean];
  return { key, name: source.names[row]! || skyName(source, row), rows, aka };
}

function farNamesake(
  sources: readonly ReadSource[],
  object: Identity,
  second: number,
  row: number,
  radiusDeg: number,
): Omit<FarNamesake, 'object'> | undefined {
  const first = object.rows.findIndex((other) => other >= 0);
  const [from, other, to] = [sources[first]!, object.rows[first]!, sources[second]!];
  const apart = separationDeg(
    valueOf(from, other, 'ra'),
    valueOf(from, other, 'dec'),
    valueOf(to, row, 'ra'),
    valueOf(to, row, 'dec'),
  );
  return apart > radiusDeg ? { first, second, separationDeg: apart } : undefined;
}

function farProblem(far: FarNamesake, objects: readonly Identity[], sources: readonly ReadSource[]): Problem {
  const [object, source] = [objects[far.object]!, sources[far.second]!];
  return {
    code: 'far-namesake',
    severity: 'warning',
    where: source.id,
    line: source.lines[object.rows[far.second]!]!,
    found: object.name,
    expected: `${far.separationDeg.toFixed(4)}°`,
  };
}
