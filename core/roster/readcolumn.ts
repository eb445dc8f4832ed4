import type { MeasuredColumn } from '../table/measured';
import type { Problem } from '../table/problem';
import { measured, type MeasuredId, type RoleId } from '../table/role';
import { degreesFromSexagesimal } from '../table/sexagesimal';
import type { Assigned } from './meaning';

/** A column of a source in its canonical unit, as far as its cells can be read. */
export function canonicalValues(assigned: Assigned, rows: number): Float64Array {
  const { column, factor } = assigned;
  // Loops: Float64Array.from with a function takes ten times as long.
  if (column.type === 'number') {
    const values = column.values.slice(0, rows);
    const convert = conversion(factor!);
    if (convert) for (let row = 0; row < rows; row++) values[row] = convert(values[row]!);
    return values;
  }
  const degrees = column.dictionary.map((text) => degreesFromSexagesimal(text, assigned.hours));
  const values = new Float64Array(rows);
  for (let row = 0; row < rows; row++) {
    const code = column.codes[row]!;
    values[row] = code < 0 ? Number.NaN : degrees[code]!;
  }
  return values;
}

/** Undefined for the factor 1. Multiplies by a factor; divides where its inverse is a whole number, so that 11540 pc are 11.54 kpc to the last bit. */
function conversion(factor: number): ((value: number) => number) | undefined {
  if (factor === 1) return undefined;
  const divisor = Math.round(1 / factor);
  const whole = divisor > 1 && Math.abs(1 / factor - divisor) < 1e-9 * divisor;
  return whole ? (value) => value / divisor : (value) => value * factor;
}

/** Values outside what can be become missing; one problem stands for all, with the first lines. */
export function clampMissing(
  values: Float64Array,
  assigned: Assigned,
  id: MeasuredId,
  lineOf: Int32Array,
  where: string,
): Problem | undefined {
  const { min, max, unit, label } = measured(id);
  const bad: number[] = [];
  values.forEach((value, row) => {
    if (value < min || value > max) bad.push(row);
  });
  if (bad.length === 0) return undefined;
  const places = bad.slice(0, 5).map((row) => `${numberWord(values[row]!)} (line ${lineOf[row]!})`);
  for (const row of bad) values[row] = Number.NaN;
  return {
    code: 'out-of-range',
    severity: 'warning',
    where,
    column: assigned.column.name,
    line: lineOf[bad[0]!]!,
    count: bad.length,
    found: `${places.join(', ')}${bad.length > 5 ? ' …' : ''}`,
    expected: `${label} from ${min} to ${max}${unit === '' ? '' : ` ${unit}`}`,
  };
}

/** The error of a quantity from its one symmetric column or its minus and plus columns, in the canonical unit. */
export function readErrors(
  id: MeasuredId,
  roles: ReadonlyMap<RoleId, Assigned>,
  lineOf: Int32Array,
  where: string,
  problems: Problem[],
): Omit<MeasuredColumn, 'values'> {
  const column = (suffix: '' | '_minus' | '_plus'): Float64Array | undefined => {
    const assigned = roles.get(`${id}_error${suffix}` as RoleId);
    if (!assigned) return undefined;
    const values = canonicalValues(assigned, lineOf.length);
    // Some tables write the minus error with its sign.
    if (suffix === '_minus' && values.every((value) => !(value > 0)))
      values.forEach((value, row) => (values[row] = Math.abs(value)));
    const problem = dropNegative(values, assigned, lineOf, where);
    if (problem) problems.push(problem);
    return values;
  };
  const [symmetric, minus, plus] = [column(''), column('_minus'), column('_plus')];
  if (!minus && !plus) return { sigma: symmetric };
  const sigma = new Float64Array(lineOf.length);
  for (let row = 0; row < sigma.length; row++) {
    const [low, high] = [minus?.[row] ?? Number.NaN, plus?.[row] ?? Number.NaN];
    const both = Number.isNaN(low) ? high : Number.isNaN(high) ? low : (low + high) / 2;
    sigma[row] = Number.isNaN(both) ? (symmetric?.[row] ?? Number.NaN) : both;
  }
  return { sigma, minus, plus };
}

function dropNegative(
  values: Float64Array,
  assigned: Assigned,
  lineOf: Int32Array,
  where: string,
): Problem | undefined {
  const bad: number[] = [];
  values.forEach((value, row) => {
    if (value < 0) bad.push(row);
  });
  if (bad.length === 0) return undefined;
  const first = bad[0]!;
  const found = `${numberWord(values[first]!)} (line ${lineOf[first]!})`;
  for (const row of bad) values[row] = Number.NaN;
  return {
    code: 'negative-error',
    severity: 'warning',
    where,
    column: assigned.column.name,
    line: lineOf[first]!,
    count: bad.length,
    found,
  };
}

function numberWord(value: number): string {
  return String(Number(value.toPrecision(8)));
}
