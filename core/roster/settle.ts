import { givesDistance } from '../table/parallax';
import type { MeasuredId } from '../table/role';
import { MEASURED } from '../table/role';
import type { Identity } from './identify';
import type { ReadSource, SettledColumn } from './roster';

/** Values that are taken from one source together; of a distance, the first kind that is there. */
const GROUPS: readonly (readonly MeasuredId[])[] = [
  ['ra', 'dec'],
  ['distance_modulus', 'distance', 'parallax'],
  ['pm_ra', 'pm_dec', 'pm_correlation'],
  ['v_los'],
  ['feh'],
  ['ebv', 'a_v'],
];
const ONE_OF = new Set<MeasuredId>(['distance_modulus', 'distance', 'parallax']);
/** A group is there in a source when these are. */
const NEEDED: Partial<Record<MeasuredId, readonly MeasuredId[]>> = { ra: ['ra', 'dec'], pm_ra: ['pm_ra', 'pm_dec'] };

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
    if (sources.some((source) => source.measured.columns.has(id))) settled.set(id, emptyColumn(objects.length));
  }
  objects.forEach((object, index) => {
    for (const group of GROUPS) {
      const having = order.filter((candidate) => hasGroup(sources[candidate]!, object.rows[candidate]!, group));
      const source =
        having.find((candidate) => group.some((id) => usable(sources[candidate]!, object.rows[candidate]!, id))) ??
        having[0];
      if (source === undefined) continue;
      const row = object.rows[source]!;
      for (const id of present(sources[source]!, row, group)) copy(sources, source, row, id, settled.get(id)!, index);
    }
  });
  return settled;
}

function emptyColumn(size: number): SettledColumn {
  const missing = (): Float64Array => new Float64Array(size).fill(Number.NaN);
  return {
    values: missing(),
    sigma: missing(),
    minus: missing(),
    plus: missing(),
    fromSource: new Int16Array(size).fill(-1),
    fromLine: new Int32Array(size),
  };
}

/** The value of a source's row, NaN when it has none. */
export function valueOf(source: ReadSource, row: number, id: MeasuredId): number {
  return row < 0 ? Number.NaN : (source.measured.columns.get(id)?.values[row] ?? Number.NaN);
}

function hasGroup(source: ReadSource, row: number, group: readonly MeasuredId[]): boolean {
  const has = (id: MeasuredId): boolean => !Number.isNaN(valueOf(source, row, id));
  return (NEEDED[group[0]!] ?? []).every(has) && group.some(has);
}

function present(source: ReadSource, row: number, group: readonly MeasuredId[]): readonly MeasuredId[] {
  const there = group.filter((id) => !Number.isNaN(valueOf(source, row, id)));
  if (!ONE_OF.has(group[0]!)) return there;
  return [there.find((id) => usable(source, row, id)) ?? there[0]!];
}

/** Whether a value of a source's row is there and, if it is a distance or a parallax, of use as a distance. */
export function usable(source: ReadSource, row: number, id: MeasuredId): boolean {
  const value = valueOf(source, row, id);
  if (id === 'distance') return value > 0;
  if (id === 'parallax') return givesDistance(value, sigmaOf(source, row, id));
  return !Number.isNaN(value);
}

/** The 1σ error of a source's row, NaN when it has none. */
export function sigmaOf(source: ReadSource, row: number, id: MeasuredId): number {
  return row < 0 ? Number.NaN : (source.measured.columns.get(id)?.sigma?.[row] ?? Number.NaN);
}

function copy(
  sources: readonly ReadSource[],
  source: number,
  row: number,
  id: MeasuredId,
  to: SettledColumn,
  object: number,
): void {
  const from = sources[source]!.measured.columns.get(id)!;
  to.values[object] = from.values[row]!;
  to.sigma![object] = from.sigma?.[row] ?? Number.NaN;
  to.minus![object] = from.minus?.[row] ?? Number.NaN;
  to.plus![object] = from.plus?.[row] ?? Number.NaN;
  to.fromSource[object] = source;
  to.fromLine[object] = sources[source]!.lines[row]!;
}
