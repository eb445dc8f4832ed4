import type { MeasuredColumn } from '../table/measured';
import type { MeasuredId } from '../table/role';
import { MEASURED } from '../table/role';
import type { Identity } from './identity';
import type { ReadSource, SettledColumn } from './roster';
import { usable, valueOf } from './values';

/** Values that are taken from one source together. */
interface Group {
  readonly ids: readonly MeasuredId[];
  /** How many of the first ids a source must have, all of them, for the group to be there. */
  readonly needed: number;
  /** Of these kinds of one thing, only the first that is of use is taken. */
  readonly oneOf: boolean;
}

const group = (needed: number, ...ids: MeasuredId[]): Group => ({ ids, needed, oneOf: false });
const GROUPS: readonly Group[] = [
  group(2, 'ra', 'dec'),
  { ids: ['distance_modulus', 'distance', 'parallax'], needed: 0, oneOf: true },
  group(2, 'pm_ra', 'pm_dec', 'pm_correlation'),
  group(1, 'v_los'),
  group(1, 'feh'),
  group(0, 'ebv', 'a_v'),
];

/** Source indices, most trusted first; sources that the priority does not name follow in their own order. */
export function priorityOrder(sources: readonly ReadSource[], priority: readonly string[]): number[] {
  const place = (id: string): number => (priority.includes(id) ? priority.indexOf(id) : priority.length);
  return sources.map((_, index) => index).sort((a, b) => place(sources[a]!.id) - place(sources[b]!.id) || a - b);
}

/**
 * For every object and group the first source, in order of priority, that has it; its values with their origin.
 * A distance that is not positive, or a parallax too noisy to give one, stands only where no source has better.
 */
export function settle(
  sources: readonly ReadSource[],
  objects: readonly Identity[],
  order: readonly number[],
): ReadonlyMap<MeasuredId, SettledColumn> {
  const settled = new Map<MeasuredId, SettledColumn>();
  for (const { id } of MEASURED) {
    const found = sources.flatMap((source) => source.measured.columns.get(id) ?? []);
    if (found.length > 0) settled.set(id, emptyColumn(objects.length, found));
  }
  for (const wanted of GROUPS) {
    for (let index = 0; index < objects.length; index++) {
      const { rows } = objects[index]!;
      const source = bestSource(sources, rows, order, wanted);
      if (source >= 0) take(sources, source, rows[source]!, wanted, settled, index);
    }
  }
  return settled;
}

/** A column without values; with errors only of the kinds that a source gives. */
function emptyColumn(size: number, found: readonly MeasuredColumn[]): SettledColumn {
  const missing = (): Float64Array => new Float64Array(size).fill(Number.NaN);
  const given = (kind: 'sigma' | 'minus' | 'plus'): Float64Array | undefined =>
    found.some((column) => column[kind]) ? missing() : undefined;
  return {
    values: missing(),
    sigma: given('sigma'),
    minus: given('minus'),
    plus: given('plus'),
    fromSource: new Int16Array(size).fill(-1),
    fromLine: new Int32Array(size),
  };
}

/** The first source that has the group in a form that is of use, else the first that has it at all; −1 for none. */
function bestSource(
  sources: readonly ReadSource[],
  rows: readonly number[],
  order: readonly number[],
  wanted: Group,
): number {
  let having = -1;
  for (const source of order) {
    const row = rows[source]!;
    if (row < 0 || !hasGroup(sources[source]!, row, wanted)) continue;
    for (const id of wanted.ids) if (usable(sources[source]!, row, id)) return source;
    if (having < 0) having = source;
  }
  return having;
}

function hasGroup(source: ReadSource, row: number, { ids, needed }: Group): boolean {
  let found = 0;
  for (let at = 0; at < ids.length; at++) {
    if (!Number.isNaN(valueOf(source, row, ids[at]!))) found++;
    else if (at < needed) return false;
  }
  return found > 0;
}

function take(
  sources: readonly ReadSource[],
  source: number,
  row: number,
  { ids, oneOf }: Group,
  settled: ReadonlyMap<MeasuredId, SettledColumn>,
  object: number,
): void {
  const from = sources[source]!;
  const kind = oneOf
    ? (ids.find((id) => usable(from, row, id)) ?? ids.find((id) => isThere(from, row, id)))
    : undefined;
  for (const id of ids) {
    if (!isThere(from, row, id) || (oneOf && id !== kind)) continue;
    const to = settled.get(id)!;
    const { values, sigma, minus, plus } = from.measured.columns.get(id)!;
    to.values[object] = values[row]!;
    if (to.sigma && sigma) to.sigma[object] = sigma[row]!;
    if (to.minus && minus) to.minus[object] = minus[row]!;
    if (to.plus && plus) to.plus[object] = plus[row]!;
    to.fromSource[object] = source;
    to.fromLine[object] = from.lines[row]!;
  }
}

function isThere(source: ReadSource, row: number, id: MeasuredId): boolean {
  return !Number.isNaN(valueOf(source, row, id));
}
