import type { NumberColumn } from '../table/column';
import { valueConflicts } from './conflicts';
import { type Identification, identify } from './identify';
import type { Identity } from './identity';
import type { Conflict, ReadSource, Roster, SourceCount } from './roster';
import { priorityOrder, settle } from './settle';
import type { RosterPolicy } from './sourcemap';
import { valueOf } from './values';

/** Merges sources in one go; see `mergeSteps`. */
export function mergeSources(sources: readonly ReadSource[], policy: RosterPolicy): Roster {
  const steps = mergeSteps(sources, policy);
  for (;;) {
    const { done, value } = steps.next();
    if (done === true) return value;
  }
}

/**
 * Merges sources into one roster with one row per object, in the order of the most trusted source and then of the
 * others. Nothing is averaged: each value is that of the most trusted source that has it, and remembers source and
 * line. Per source, rowsRead = objectRows + duplicates + quarantine.
 *
 * Stops between its steps, so that who runs it can do other things, or give up, while many rows are merged.
 */
export function* mergeSteps(sources: readonly ReadSource[], policy: RosterPolicy): Generator<undefined, Roster> {
  const order = priorityOrder(sources, policy.priority);
  const found = yield* identify(
    order.map((index) => sources[index]!),
    policy,
  );
  const asGiven = order.every((source, place) => source === place);
  const objects = asGiven ? found.objects : found.objects.map((object) => inSourceOrder(object, order));
  yield;
  const columns = settle(sources, objects, order);
  yield;
  return {
    rows: objects.length,
    sources: sources.map(({ id }) => id),
    names: objects.map(({ name }) => name),
    keys: objects.map(({ key }) => key),
    columns,
    extras: sources.flatMap((source, index) => source.extras.map((column) => aligned(column, objects, index))),
    lines: sources.map((source, index) => linesOf(source, objects, index)),
    conflicts: [
      ...positionConflicts(sources, objects, order, found),
      ...valueConflicts(sources, objects, columns, policy.conflictSigma),
    ].sort((a, b) => a.object - b.object),
    duplicates: found.duplicates,
    quarantine: sources.flatMap(({ quarantine }) => quarantine),
    problems: [...sources.flatMap(({ problems }) => problems), ...found.problems],
    counts: sources.map((source) => countsOf(source, found)),
  };
}

/** Turns rows listed in the order of priority back to the order of the sources. */
function inSourceOrder(object: Identity, order: readonly number[]): Identity {
  const rows = order.map(() => -1);
  order.forEach((source, place) => (rows[source] = object.rows[place]!));
  return { ...object, rows };
}

function aligned(column: NumberColumn, objects: readonly Identity[], source: number): NumberColumn {
  const values = new Float64Array(objects.length);
  for (let object = 0; object < objects.length; object++) {
    const row = objects[object]!.rows[source]!;
    values[object] = row < 0 ? Number.NaN : column.values[row]!;
  }
  return { ...column, values };
}

function linesOf({ lines }: ReadSource, objects: readonly Identity[], source: number): Int32Array {
  const found = new Int32Array(objects.length);
  for (let object = 0; object < objects.length; object++) {
    const row = objects[object]!.rows[source]!;
    found[object] = row < 0 ? 0 : lines[row]!;
  }
  return found;
}

function positionConflicts(
  sources: readonly ReadSource[],
  objects: readonly Identity[],
  order: readonly number[],
  { farNamesakes }: Identification,
): Conflict[] {
  return farNamesakes.map(({ object, first, second, separationDeg }) => {
    const side = (place: number): Conflict['chosen'] => {
      const source = order[place]!;
      const row = objects[object]!.rows[source]!;
      return {
        source: sources[source]!.id,
        line: sources[source]!.lines[row]!,
        value: valueOf(sources[source]!, row, 'ra'),
        sigma: separationDeg,
      };
    };
    return { object, quantity: 'position', chosen: side(first), other: side(second), sigmas: Infinity };
  });
}

function countsOf(source: ReadSource, { duplicates }: Identification): SourceCount {
  const repeated = duplicates.filter((duplicate) => duplicate.source === source.id).length;
  return {
    source: source.id,
    rowsRead: source.names.length + source.quarantine.length,
    objectRows: source.names.length - repeated,
    duplicates: repeated,
    quarantine: source.quarantine.length,
  };
}
