import type { MeasuredColumn, MeasuredTable } from '../../../core/table/measured';
import type { MeasuredId } from '../../../core/table/role';

/** A measured table from plain lists; `[values, sigmas]` where errors are wanted. */
export function measuredTable(
  columns: Partial<Record<MeasuredId, readonly number[] | readonly [readonly number[], readonly number[]]>>,
): MeasuredTable {
  const made = new Map<MeasuredId, MeasuredColumn>();
  let rows = 0;
  for (const [id, given] of Object.entries(columns)) {
    const [values, sigma] = (Array.isArray(given[0]) ? given : [given, undefined]) as [number[], number[] | undefined];
    rows = values.length;
    made.set(id as MeasuredId, { values: Float64Array.from(values), sigma: sigma && Float64Array.from(sigma) });
  }
  return { rows, columns: made };
}
