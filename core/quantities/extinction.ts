import type { MeasuredTable } from '../table/measured';
import type { QuantityColumn } from './quantity';

/** How a colour excess becomes an extinction. */
export interface ExtinctionLaw {
  readonly rv: number;
  /** Factor on every E(B−V); 1 when the column is already recalibrated. */
  readonly recalibration: number;
}

/** A_V with its error, mag: as measured, else R_V × recalibration × E(B−V); undefined when neither was measured. */
export function extinctionV(table: MeasuredTable, law: ExtinctionLaw): QuantityColumn | undefined {
  const [direct, excess] = [table.columns.get('a_v'), table.columns.get('ebv')];
  if (!direct && !excess) return undefined;
  const factor = law.rv * law.recalibration;
  const values = new Float64Array(table.rows);
  const sigma = new Float64Array(table.rows);
  for (let row = 0; row < table.rows; row++) {
    const measured = direct?.values[row] ?? Number.NaN;
    const known = !Number.isNaN(measured);
    values[row] = known ? measured : factor * (excess?.values[row] ?? Number.NaN);
    sigma[row] = known ? (direct?.sigma?.[row] ?? Number.NaN) : factor * (excess?.sigma?.[row] ?? Number.NaN);
  }
  return { values, sigma };
}

/** E(B−V) after the recalibration, mag; undefined when it was not measured. */
export function recalibratedExcess(table: MeasuredTable, law: ExtinctionLaw): QuantityColumn | undefined {
  const excess = table.columns.get('ebv');
  if (!excess || law.recalibration === 1) return excess;
  const scaled = (column: Float64Array): Float64Array => column.map((value) => value * law.recalibration);
  return { values: scaled(excess.values), sigma: excess.sigma && scaled(excess.sigma) };
}
