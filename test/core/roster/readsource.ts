import type { ReadSource } from '../../../core/roster/roster';
import type { RosterPolicy } from '../../../core/roster/sourcemap';
import { numberColumn } from '../../../core/table/column';
import type { MeasuredColumn } from '../../../core/table/measured';
import { MEASURED, type MeasuredId } from '../../../core/table/role';

/** One row as a test writes it: values by id, errors by `<id>_error`, and what a source gives beside them. */
export type Row = Partial<Record<MeasuredId | `${MeasuredId}_error`, number>> & {
  readonly name?: string;
  readonly line?: number;
  readonly snr?: number;
};

/** A source from rows; those without ra and dec stand at (10°, 20°). Lines count from 2 unless given. */
export function readSource(id: string, rows: readonly Row[], quarantined = 0): ReadSource {
  const columns = new Map<MeasuredId, MeasuredColumn>();
  const placed = rows.map((row) => ({ ra: 10, dec: 20, ...row }));
  for (const { id: quantity } of MEASURED) {
    if (!placed.some((row) => row[quantity] !== undefined)) continue;
    const pick = (key: MeasuredId | `${MeasuredId}_error`): Float64Array =>
      Float64Array.from(placed, (row) => row[key] ?? Number.NaN);
    columns.set(quantity, { values: pick(quantity), sigma: pick(`${quantity}_error`) });
  }
  const snr = Float64Array.from(rows, (row) => row.snr ?? Number.NaN);
  return {
    id,
    fileName: `${id}.csv`,
    names: rows.map(({ name }) => name ?? ''),
    measured: { rows: rows.length, columns },
    extras: snr.every(Number.isNaN) ? [] : [numberColumn(`${id}.snr`, snr)],
    lines: Int32Array.from(rows, ({ line }, at) => line ?? at + 2),
    quarantine: Array.from({ length: quarantined }, (_, at) => ({
      source: id,
      line: 1000 + at,
      text: 'torn',
      reason: { code: 'ragged-row', severity: 'warning' },
    })),
    problems: [],
  };
}

/** A policy of 30″ and 5 σ by name, changed where a test says so. */
export function policy(changes: Partial<RosterPolicy> = {}): RosterPolicy {
  return { matchRadiusArcsec: 30, matchNames: true, aliases: {}, priority: [], conflictSigma: 5, ...changes };
}
