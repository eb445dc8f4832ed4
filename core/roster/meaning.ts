import type { Column } from '../table/column';
import { type Problem } from '../table/problem';
import { MEASURED, measured, type MeasuredId, type RoleId } from '../table/role';
import { columnNamed, type Table } from '../table/table';
import { SEXAGESIMAL, unitFactor } from '../table/units';
import type { ColumnMeaning } from './sourcemap';

const SUFFIXES = ['', '_error', '_error_minus', '_error_plus'] as const;

/** Every role that a column can be given. */
export const ROLES: readonly RoleId[] = [
  'name',
  ...MEASURED.flatMap(({ id }) => SUFFIXES.map((suffix) => `${id}${suffix}` as RoleId)),
  'gal_l',
  'gal_b',
  'extra',
  'ignore',
];

/** A column with a role that fits it. */
export interface Assigned {
  readonly column: Column;
  readonly role: RoleId;
  /** Multiplies the file's numbers to the canonical unit; undefined for sexagesimal cells and words. */
  readonly factor: number | undefined;
  /** Whether sexagesimal cells count hours. */
  readonly hours: boolean;
}

/** The measured quantity that a role gives a value or an error of. */
export function measuredOf(role: RoleId): MeasuredId | undefined {
  if (role === 'gal_l') return 'ra';
  if (role === 'gal_b') return 'dec';
  const base = role.replace(/_error(_minus|_plus)?$/, '');
  return MEASURED.find(({ id }) => id === base)?.id;
}

/**
 * Checks the meanings of a source against its columns; what cannot stand is left out and reported
 * (unknown-column, unknown-quantity, role-taken, unknown-unit, wrong-unit).
 */
export function assignRoles(
  table: Table,
  meanings: readonly ColumnMeaning[],
  where: string,
): { assigned: ReadonlyMap<RoleId, Assigned>; extras: Assigned[]; problems: Problem[] } {
  const assigned = new Map<RoleId, Assigned>();
  const extras: Assigned[] = [];
  const problems: Problem[] = [];
  const unitOf = new Map(meanings.map(({ column, role, unit }) => [role, unit ?? columnNamed(table, column)?.unit]));
  for (const meaning of meanings) {
    if (meaning.role === 'ignore') continue;
    // An error without a unit of its own is in that of its value.
    const base = unitOf.get(meaning.role.replace(/_error(_minus|_plus)?$/, ''));
    const made = assign(table, meaning, SEXAGESIMAL.has(base ?? '') ? undefined : base, where);
    if ('code' in made) {
      problems.push(made);
      continue;
    }
    const holder = assigned.get(made.role);
    if (made.role === 'extra') extras.push(made);
    else if (holder === undefined) assigned.set(made.role, made);
    else
      problems.push({
        code: 'role-taken',
        severity: 'warning',
        where,
        column: meaning.column,
        found: made.role,
        expected: holder.column.name,
      });
  }
  return { assigned, extras, problems };
}

function assign(table: Table, meaning: ColumnMeaning, baseUnit: string | undefined, where: string): Assigned | Problem {
  const problem = (code: Problem['code'], more: Partial<Problem> = {}): Problem => ({
    code,
    severity: 'warning',
    where,
    column: meaning.column,
    ...more,
  });
  const column = columnNamed(table, meaning.column);
  if (column === undefined) return problem('unknown-column');
  const role = ROLES.find((candidate) => candidate === meaning.role);
  if (role === undefined) return problem('unknown-quantity', { found: meaning.role });
  if (role === 'name' || role === 'ignore') return { column, role, factor: undefined, hours: false };
  if (role === 'extra') {
    return column.type === 'number'
      ? { column, role, factor: 1, hours: false }
      : problem('wrong-unit', { found: 'words', expected: 'numbers' });
  }
  const { dimension, unit } = measured(measuredOf(role)!);
  if (column.type === 'text') {
    if (dimension === 'angle' && SEXAGESIMAL.has(meaning.unit ?? '')) {
      return { column, role, factor: undefined, hours: meaning.unit === 'h:m:s' };
    }
    return problem('wrong-unit', { found: 'words', expected: unit === '' ? 'numbers' : `numbers in ${unit}` });
  }
  const stated = meaning.unit ?? column.unit ?? baseUnit ?? unit;
  const factor = unitFactor(stated, dimension);
  if (factor !== undefined) return { column, role, factor, hours: false };
  const known = SEXAGESIMAL.has(stated) || unitFactor(stated, 'number') !== undefined || isUnit(stated);
  return known
    ? problem('wrong-unit', { found: stated, expected: `${dimension} (${unit})` })
    : problem('unknown-unit', { found: stated });
}

function isUnit(text: string): boolean {
  const dimensions = ['angle', 'length', 'proper motion', 'velocity', 'magnitude', 'dex'] as const;
  return dimensions.some((dimension) => unitFactor(text, dimension) !== undefined);
}
