import { ALIASES, COMPANIONS, UNIT_SUFFIXES } from './aliases';

type Base = keyof typeof ALIASES;

/** What a column's name says: the role of its base, whether it is an error, and a unit that stands in the name. */
export interface NameReading {
  readonly base: Base;
  readonly suffix: '' | '_error' | '_error_minus' | '_error_plus';
  readonly unit: string | undefined;
  /** Place in the list of aliases: 0 is the most telling name. */
  readonly rank: number;
  /** For an error: the cleaned name of the column that it seems to be the error of. */
  readonly of: string;
}

/** Reads a column's name; undefined when it says nothing. */
export function readColumnName(name: string): NameReading | undefined {
  const direct = baseOf(name);
  if (direct) return { ...direct, suffix: '', of: '' };
  for (const { pattern, suffix } of COMPANIONS) {
    const inner = pattern.exec(name)?.[1];
    const base = inner === undefined ? undefined : baseOf(inner);
    if (base && base.base !== 'name' && base.base !== 'gal_l' && base.base !== 'gal_b') {
      return { ...base, suffix, of: cleanWord(inner!) };
    }
  }
  return undefined;
}

function baseOf(name: string): { base: Base; rank: number; unit: string | undefined } | undefined {
  // A unit in brackets or parentheses is not part of the name.
  const bracket = /^(.*?)\s*[[(]([^\])]*)[\])]\s*$/.exec(name);
  if (bracket?.[1] !== undefined && bracket[1] !== '') {
    const inner = baseOf(bracket[1]);
    if (inner) return { ...inner, unit: bracket[2] };
  }
  const clean = cleanWord(name);
  const found = lookUp(clean);
  if (found) return { ...found, unit: undefined };
  for (const [ending, unit] of Object.entries(UNIT_SUFFIXES)) {
    if (!clean.endsWith(ending)) continue;
    const rest = lookUp(clean.slice(0, -ending.length));
    if (rest) return { ...rest, unit };
  }
  return undefined;
}

function lookUp(clean: string): { base: Base; rank: number } | undefined {
  for (const [base, names] of Object.entries(ALIASES)) {
    const rank = names.findIndex((alias) => cleanWord(alias) === clean);
    if (rank >= 0) return { base: base as Base, rank };
  }
  return undefined;
}

/** A name without case, punctuation and Greek letters. */
export function cleanWord(name: string): string {
  return name
    .toLowerCase()
    .replace(/μ|µ/g, 'mu')
    .replace(/α/g, 'alpha')
    .replace(/δ/g, 'delta')
    .replace(/[^a-z0-9]/g, '');
}
