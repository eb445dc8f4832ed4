import type { DelimitedFile } from '../formats/csv/file';
import { icrsFromGalactic } from '../frame/galactic';
import { cellText, type NumberColumn } from '../table/column';
import type { MeasuredColumn } from '../table/measured';
import type { Problem } from '../table/problem';
import { MEASURED, type MeasuredId, type RoleId } from '../table/role';
import { type Assigned, assignRoles } from './meaning';
import { canonicalValues, clampMissing, readErrors } from './readcolumn';
import type { QuarantinedRow, ReadSource } from './roster';
import type { ColumnMeaning } from './sourcemap';

const LONGEST_TEXT = 2000;

/**
 * Gives the columns of a file their meaning: canonical units, one kind of position, errors beside values.
 *
 * Values that cannot be become missing and are reported; rows without a readable position go to quarantine. Galactic
 * positions become ICRS. An error is taken in the unit given for it, or in the canonical one.
 */
export function understandSource(id: string, file: DelimitedFile, meanings: readonly ColumnMeaning[]): ReadSource {
  const where = file.fileName;
  const { assigned, extras, problems } = assignRoles(file.table, meanings, where);
  const columns = new Map<MeasuredId, MeasuredColumn>();
  for (const { id: quantity } of MEASURED) {
    const column = readMeasured(quantity, assigned, file, problems);
    if (column) columns.set(quantity, column);
  }
  positionsFromGalactic(assigned, file, columns, problems);
  problems.push(...cautions(columns, assigned, where));

  const kept = placedRows(columns, file.table.rows);
  const pick = (values: Float64Array): Float64Array => picked(values, kept, new Float64Array(kept.length));
  return {
    id,
    names: namesOf(kept, assigned.get('name')),
    measured: { rows: kept.length, columns: mapColumns(columns, pick) },
    extras: extras.map(({ column }) => extraColumn(id, column as NumberColumn, pick)),
    lines: picked(file.lines, kept, new Int32Array(kept.length)),
    quarantine: [...file.quarantine.map((row) => ({ source: id, ...row })), ...unplaced(id, file, kept, assigned)],
    problems: [...file.problems, ...problems],
  };
}

function readMeasured(
  id: MeasuredId,
  roles: ReadonlyMap<RoleId, Assigned>,
  file: DelimitedFile,
  problems: Problem[],
): MeasuredColumn | undefined {
  const assigned = roles.get(id);
  if (!assigned) return undefined;
  const values = canonicalValues(assigned, file.table.rows);
  if (id === 'ra') values.forEach((value, row) => (values[row] = value < 0 && value >= -180 ? value + 360 : value));
  const problem = clampMissing(values, assigned, id, file.lines, file.fileName);
  if (problem) problems.push(problem);
  return { values, ...readErrors(id, roles, file.lines, file.fileName, problems) };
}

function positionsFromGalactic(
  roles: ReadonlyMap<RoleId, Assigned>,
  file: DelimitedFile,
  columns: Map<MeasuredId, MeasuredColumn>,
  problems: Problem[],
): void {
  const [gl, gb] = [roles.get('gal_l'), roles.get('gal_b')];
  if ((columns.has('ra') && columns.has('dec')) || !gl || !gb) return;
  const [l, b] = [canonicalValues(gl, file.table.rows), canonicalValues(gb, file.table.rows)];
  const problem = clampMissing(b, gb, 'dec', file.lines, file.fileName);
  if (problem) problems.push(problem);
  const [ra, dec] = [new Float64Array(l.length), new Float64Array(l.length)];
  for (let row = 0; row < l.length; row++) [ra[row], dec[row]] = icrsFromGalactic(l[row]!, b[row]!);
  columns.set('ra', { values: ra });
  columns.set('dec', { values: dec });
}

/** Biases that the columns themselves bring along. */
function cautions(
  columns: ReadonlyMap<MeasuredId, MeasuredColumn>,
  roles: ReadonlyMap<RoleId, Assigned>,
  where: string,
): Problem[] {
  const found: Problem[] = [];
  if (columns.has('parallax') && !columns.has('distance') && !columns.has('distance_modulus')) {
    found.push({ code: 'parallax-distance', severity: 'warning', where, column: roles.get('parallax')?.column.name });
  }
  const velocity = columns.get('v_los');
  let placeholders = 0;
  velocity?.values.forEach((value, row) => {
    if (value === 0 && (velocity.sigma?.[row] ?? 0) >= 100) placeholders++;
  });
  if (placeholders > 0) {
    const column = roles.get('v_los')?.column.name;
    found.push({ code: 'placeholder-velocity', severity: 'warning', where, column, count: placeholders });
  }
  return found;
}

function placedRows(columns: ReadonlyMap<MeasuredId, MeasuredColumn>, rows: number): Int32Array {
  const [ra, dec] = [columns.get('ra')?.values, columns.get('dec')?.values];
  const placed = new Int32Array(rows);
  let count = 0;
  for (let row = 0; row < rows; row++) if (ra && dec && !Number.isNaN(ra[row]! + dec[row]!)) placed[count++] = row;
  return placed.slice(0, count);
}

/** The values of some rows, in `into`; all of them as they are when every row is kept. */
function picked<Values extends Float64Array | Int32Array>(values: Values, rows: Int32Array, into: Values): Values {
  if (rows.length === values.length) return values;
  for (let at = 0; at < rows.length; at++) into[at] = values[rows[at]!]!;
  return into;
}

function namesOf(rows: Int32Array, name: Assigned | undefined): string[] {
  const names: string[] = [];
  for (let at = 0; at < rows.length; at++) names.push(name === undefined ? '' : cellText(name.column, rows[at]!));
  return names;
}

function mapColumns(
  columns: ReadonlyMap<MeasuredId, MeasuredColumn>,
  pick: (values: Float64Array) => Float64Array,
): ReadonlyMap<MeasuredId, MeasuredColumn> {
  const optional = (values: Float64Array | undefined): Float64Array | undefined => values && pick(values);
  return new Map(
    [...columns].map(([id, { values, sigma, minus, plus }]) => [
      id,
      { values: pick(values), sigma: optional(sigma), minus: optional(minus), plus: optional(plus) },
    ]),
  );
}

function extraColumn(source: string, column: NumberColumn, pick: (values: Float64Array) => Float64Array): NumberColumn {
  return { ...column, name: `${source}.${column.name}`, values: pick(column.values) };
}

function unplaced(
  source: string,
  file: DelimitedFile,
  kept: Int32Array,
  roles: ReadonlyMap<RoleId, Assigned>,
): QuarantinedRow[] {
  let placed = 0;
  const parts = (['ra', 'dec', 'gal_l', 'gal_b'] as const).flatMap((role) => roles.get(role) ?? []);
  const rows: QuarantinedRow[] = [];
  for (let row = 0; row < file.table.rows; row++) {
    if (kept[placed] === row) {
      placed++;
      continue;
    }
    const line = file.lines[row]!;
    const cells = parts.map(({ column }) => `${column.name} = "${cellText(column, row)}"`);
    const found = cells.length === 0 ? 'no column with a position' : cells.join(', ');
    rows.push({
      source,
      line,
      text: file.table.columns
        .map((column) => cellText(column, row))
        .join(file.delimiter)
        .slice(0, LONGEST_TEXT),
      reason: { code: 'no-position', severity: 'warning', where: file.fileName, line, found },
    });
  }
  return rows;
}
