import type { QuantitySet } from '../quantities/quantity';
import type { Judged } from './contract';

/** What cuts see of a roster: its quantities, its names, and a memory for costly columns. */
export function judgedObjects(quantities: QuantitySet, names: readonly string[], keys: readonly string[]): Judged {
  const kept = new Map<string, unknown>();
  return {
    rows: quantities.rows,
    names,
    keys,
    column: (id) => quantities.column(id),
    phaseCovariance: () => quantities.phaseCovariance(),
    memo<T>(key: string, make: () => T): T {
      if (!kept.has(key)) kept.set(key, make());
      return kept.get(key) as T;
    },
  };
}
