import type { Column } from '../table/column';
import { measured, type MeasuredId, type RoleId } from '../table/role';
import { degreesFromSexagesimal } from '../table/sexagesimal';
import type { Table } from '../table/table';
import { COMMON_UNITS, SEXAGESIMAL, unitFactor } from '../table/units';
import { cleanWord, type NameReading, readColumnName } from './columnname';

/** A proposal for the meaning of one column; nothing comes of it until it stands in a recipe. */
export interface Guess {
  readonly column: string;
  readonly role: RoleId;
  readonly unit: string | undefined;
  /** 0…1; below ½ the role is 'ignore'. */
  readonly confidence: number;
  readonly reason: string;
}

/**
 * Proposes a role and a unit for every column from its name, its unit and its values.
 *
 * One column gets a role: the best-named one that holds values; the others are ignored, with the reason said. A
 * distance beside a modulus is ignored, as it was most likely computed from it.
 */
export function guessMeanings(table: Table): Guess[] {
  const first = table.columns.map((column) => propose(column));
  const values = holders(first.filter(({ of }) => of === ''));
  const proposals = first.map((proposal) => companion(proposal, first, values));
  const taken = holders(proposals);
  return proposals.map((ranked) => {
    const { column, role, unit, confidence, reason, stated } = ranked;
    const proposal: Guess = { column, role, unit, confidence, reason };
    if (proposal.role === 'ignore') return proposal;
    const guess = stated ? proposal : inUnitOfValue(proposal, taken);
    const holder = taken.get(guess.role)!;
    if (holder.column !== guess.column)
      return ignored(guess, `"${holder.column}" is the better column for ${guess.role}`);
    return secondary(guess, taken);
  });
}

type Ranked = Guess & {
  readonly rank: number;
  readonly of: string;
  /** Whether the file states the unit. */
  readonly stated: boolean;
};

/** An error is in the unit of its value unless the file says otherwise. */
function inUnitOfValue(guess: Guess, taken: ReadonlyMap<string, Guess>): Guess {
  const value = taken.get(baseRole(guess.role) ?? '');
  if (!value || value.unit === guess.unit || SEXAGESIMAL.has(value.unit ?? '')) return guess;
  return { ...guess, unit: value.unit, reason: `by its name, in the unit of "${value.column}"` };
}

/** The best proposal for each role. */
function holders(proposals: readonly Ranked[]): Map<string, Ranked> {
  const taken = new Map<string, Ranked>();
  for (const proposal of proposals) {
    const holder = taken.get(proposal.role);
    if (proposal.role !== 'ignore' && (holder === undefined || better(proposal, holder)))
      taken.set(proposal.role, proposal);
  }
  return taken;
}

/** An error column belongs to the column that bears its name; one of another name only where there is none such. */
function companion(proposal: Ranked, all: readonly Ranked[], values: ReadonlyMap<string, Ranked>): Ranked {
  const base = baseRole(proposal.role);
  const holder = base === undefined ? undefined : values.get(base);
  if (!holder) return proposal;
  const name = cleanWord(holder.column);
  const belongs = (candidate: Ranked): boolean => candidate.of === name;
  if (belongs(proposal) || !all.some((other) => baseRole(other.role) === base && belongs(other))) return proposal;
  return {
    ...ignored(proposal, `it is not the error of "${holder.column}", which has the role ${base}`),
    rank: 99,
    of: '',
    stated: false,
  };
}

function baseRole(role: string): string | undefined {
  return /^(.*?)_error/.exec(role)?.[1];
}

function better(a: Ranked, b: Ranked): boolean {
  return a.confidence > b.confidence || (a.confidence === b.confidence && a.rank < b.rank);
}

function ignored(guess: Guess, reason: string): Guess {
  return { ...guess, role: 'ignore', unit: undefined, confidence: 0, reason };
}

/** Sets aside what another column says better: a computed distance, Galactic beside equatorial positions. */
function secondary(guess: Guess, taken: ReadonlyMap<string, Guess>): Guess {
  if (/^distance(_error|$)/.test(guess.role) && taken.has('distance_modulus')) {
    return ignored(guess, 'a distance modulus is there, from which this was most likely computed');
  }
  if (guess.role.startsWith('parallax') && (taken.has('distance_modulus') || taken.has('distance'))) {
    return ignored(guess, 'a distance is there, and the inverse of a noisy parallax is a biased one');
  }
  if ((guess.role === 'gal_l' || guess.role === 'gal_b') && taken.has('ra') && taken.has('dec')) {
    return ignored(guess, 'equatorial positions are there, from which it follows');
  }
  const base = baseRole(guess.role);
  if (base !== undefined && !taken.has(base))
    return ignored(guess, `no column has the role ${base} that it is the error of`);
  return guess;
}

function propose(column: Column): Ranked {
  const nothing = (reason: string): Ranked => ({
    column: column.name,
    role: 'ignore',
    unit: undefined,
    confidence: 0,
    reason,
    rank: 99,
    of: '',
    stated: false,
  });
  const reading = readColumnName(column.name);
  if (!reading) return nothing('the name says nothing of it');
  if (reading.base === 'name') {
    return {
      column: column.name,
      role: 'name',
      unit: undefined,
      confidence: 0.9,
      reason: 'by its name',
      rank: reading.rank,
      of: '',
      stated: false,
    };
  }
  if (!hasValues(column)) return nothing('the column has no values');
  return column.type === 'text' ? proposeText(column, reading, nothing) : proposeNumber(column, reading, nothing);
}

function hasValues(column: Column): boolean {
  return column.type === 'number' ? !column.values.every(Number.isNaN) : column.dictionary.length > 0;
}

function proposeText(
  column: Column & { type: 'text' },
  reading: NameReading,
  nothing: (reason: string) => Ranked,
): Ranked {
  const hours = reading.base === 'ra';
  const isPosition = (reading.base === 'ra' || reading.base === 'dec') && reading.suffix === '';
  const readable = column.dictionary.filter((text) => !Number.isNaN(degreesFromSexagesimal(text, hours))).length;
  if (!isPosition || readable < 0.8 * column.dictionary.length)
    return nothing('the name fits, but its cells are no numbers');
  return {
    column: column.name,
    role: reading.base,
    unit: hours ? 'h:m:s' : 'd:m:s',
    confidence: 0.95,
    reason: 'by its name, and its cells are sexagesimal',
    rank: reading.rank,
    of: reading.of,
    stated: true,
  };
}

function proposeNumber(
  column: Column & { type: 'number' },
  reading: NameReading,
  nothing: (reason: string) => Ranked,
): Ranked {
  const id: MeasuredId =
    reading.base === 'gal_l' ? 'ra' : reading.base === 'gal_b' ? 'dec' : (reading.base as MeasuredId);
  const definition = measured(id);
  const stated = column.unit ?? reading.unit;
  if (stated !== undefined && unitFactor(stated, definition.dimension) === undefined) {
    return nothing(`the name fits ${definition.label}, but not its unit "${stated}"`);
  }
  const isError = reading.suffix !== '';
  const [min, max] = isError ? [0, definition.max] : [definition.min, definition.max];
  const candidates = stated === undefined ? (COMMON_UNITS[definition.dimension] ?? ['']) : [stated];
  const fits = candidates.map((unit) => ({
    unit,
    ...shareWithin(column.values, unitFactor(unit, definition.dimension), min, max),
  }));
  // One stray value is an error of the table, not a sign of another unit.
  const chosen = fits.find(({ share, outside }) => share > 0.98 || (share > 0.5 && outside === 1)) ?? fits[0]!;
  if (chosen.share < 0.5) return nothing(`the name fits ${definition.label}, but not its values`);
  const words = ['by its name'];
  if (stated !== undefined) words.push('and its unit');
  else if (chosen.unit !== definition.unit && definition.dimension !== 'dex')
    words.push(`and its values, which fit ${chosen.unit}`);
  else if (definition.unit !== '') words.push(`with values that fit ${chosen.unit}`);
  if (chosen.outside > 0) words.push(`(${chosen.outside} cannot be)`);
  if (id === 'parallax') words.push('(an inverted parallax is a biased distance)');
  return {
    column: column.name,
    role: `${reading.base}${reading.suffix}` as RoleId,
    unit: chosen.unit === '' ? undefined : chosen.unit,
    confidence: (stated === undefined ? 0.8 : 0.95) * chosen.share * (reading.rank === 0 ? 1 : 0.95),
    reason: words.join(' '),
    rank: reading.rank,
    of: reading.of,
    stated: stated !== undefined,
  };
}

/** Which share of the values lies within limits, and how many do not. */
function shareWithin(
  values: Float64Array,
  factor: number | undefined,
  min: number,
  max: number,
): { share: number; outside: number } {
  if (factor === undefined) return { share: 0, outside: 0 };
  let [present, within] = [0, 0];
  for (let row = 0; row < values.length; row++) {
    const value = values[row]!;
    if (Number.isNaN(value)) continue;
    present++;
    const converted = value * factor;
    if (converted >= min && converted <= max) within++;
  }
  return { share: present === 0 ? 0 : within / present, outside: present - within };
}
