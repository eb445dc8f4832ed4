import type { Cut } from '../../../core/cuts/cut';
import { cutSchema } from '../../../core/cuts/cut';
import { judgedObjects } from '../../../core/cuts/judged';
import type { Judged } from '../../../core/cuts/contract';
import type { QuantityColumn } from '../../../core/quantities/quantity';

/** Objects with given columns: a list of values, or of [value, sigma]; and their phase covariance, 21 numbers each. */
export function objectsWith(
  columns: Readonly<Record<string, readonly (number | readonly [number, number])[]>>,
  covariance?: Float64Array,
): Judged {
  const made = new Map<string, QuantityColumn>();
  let rows = 0;
  for (const [id, cells] of Object.entries(columns)) {
    rows = cells.length;
    const values = Float64Array.from(cells, (cell) => (typeof cell === 'number' ? cell : cell[0]));
    const sigma = Float64Array.from(cells, (cell) => (typeof cell === 'number' ? Number.NaN : cell[1]));
    made.set(id, { values, sigma });
  }
  const names = Array.from({ length: rows }, (_, row) => `Object ${row}`);
  const quantities = { rows, definitions: [], column: (id: string) => made.get(id), phaseCovariance: () => covariance };
  return judgedObjects(
    quantities,
    names,
    names.map((name) => name.toLowerCase().replace(' ', '')),
  );
}

/** A valid cut of a kind. */
export function cutOf(kind: string, parameters: object, more: Partial<Omit<Cut, 'kind' | 'parameters'>> = {}): Cut {
  return cutSchema.parse({
    id: kind,
    kind,
    parameters,
    on: true,
    missing: 'unjudged',
    rationale: 'Because.',
    evidence: [],
    author: '',
    time: '2026-01-01T00:00:00.000Z',
    ...more,
  });
}
