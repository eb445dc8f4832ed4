import type { QuantitySet } from '../quantities/quantity';
import type { Judged } from './contract';

/**
 * How many things a shelf holds: enough for as many planes in one ledger as anyone uses, and few enough that dragging a
 * pole does not fill the memory (16 MB a column with errors at 1,000,000 objects).
 */
const SHELF = 4;

/** What cuts see of a roster: its quantities, its names, and a memory for costly columns. */
export function judgedObjects(quantities: QuantitySet, names: readonly string[], keys: readonly string[]): Judged {
  const shelves = new Map<string, Map<string, unknown>>();
  return {
    rows: quantities.rows,
    names,
    keys,
    column: (id) => quantities.column(id),
    phaseCovariance: () => quantities.phaseCovariance(),
    memo<T>(name: string, key: string, make: () => T): T {
      const shelf = shelves.get(name) ?? new Map<string, unknown>();
      const made = shelf.has(key) ? (shelf.get(key) as T) : make();
      // A Map keeps the order of insertion, so the first key is the one that was not asked for longest.
      shelf.delete(key);
      shelf.set(key, made);
      if (shelf.size > SHELF) shelf.delete(shelf.keys().next().value!);
      shelves.set(name, shelf);
      return made;
    },
  };
}
