import type { Dimension } from './dimension';

/** Base dimensions of a unit: angle, length, time, magnitude, abundance. */
interface Powers {
  angle: number;
  length: number;
  time: number;
  mag: number;
  dex: number;
}

interface Unit {
  readonly factor: number;
  readonly powers: Powers;
}

const NONE: Powers = { angle: 0, length: 0, time: 0, mag: 0, dex: 0 };
const KPC_KM = 3.085677581491367e16;
const YEAR_S = 365.25 * 86400;
const unit = (factor: number, powers: Partial<Powers>): Unit => ({ factor, powers: { ...NONE, ...powers } });
const angle = (degrees: number): Unit => unit(degrees, { angle: 1 });
const length = (km: number): Unit => unit(km, { length: 1 });
const time = (seconds: number): Unit => unit(seconds, { time: 1 });

/** Symbols in use, in base units degree, kilometre, second, magnitude, dex. */
const SYMBOLS: Readonly<Record<string, Unit>> = {
  deg: angle(1),
  degree: angle(1),
  degrees: angle(1),
  '°': angle(1),
  rad: angle(180 / Math.PI),
  radian: angle(180 / Math.PI),
  radians: angle(180 / Math.PI),
  hourangle: angle(15),
  arcmin: angle(1 / 60),
  arcsec: angle(1 / 3600),
  mas: angle(1 / 3.6e6),
  uas: angle(1 / 3.6e9),
  µas: angle(1 / 3.6e9),
  m: length(1e-3),
  km: length(1),
  au: length(1.495978707e8),
  pc: length(KPC_KM / 1000),
  kpc: length(KPC_KM),
  mpc: length(KPC_KM * 1000),
  ly: length(9.4607304725808e12),
  kly: length(9.4607304725808e15),
  s: time(1),
  sec: time(1),
  yr: time(YEAR_S),
  year: time(YEAR_S),
  a: time(YEAR_S),
  century: time(100 * YEAR_S),
  cy: time(100 * YEAR_S),
  mag: unit(1, { mag: 1 }),
  dex: unit(1, { dex: 1 }),
};

/** Base dimensions and the size of the canonical unit, in base units, of every dimension. */
const CANONICAL: Readonly<Partial<Record<Dimension, Unit>>> = {
  angle: angle(1),
  parallax: angle(1 / 3.6e6),
  length: length(KPC_KM),
  magnitude: unit(1, { mag: 1 }),
  'proper motion': unit(1 / 3.6e6 / YEAR_S, { angle: 1, time: -1 }),
  velocity: unit(1, { length: 1, time: -1 }),
  dex: unit(1, { dex: 1 }),
  number: unit(1, {}),
};

/** Spellings of "no unit". */
const UNITLESS = new Set(['', '-', '[-]', '---', 'none', 'dimensionless', '1']);

/** Units offered for each dimension; the first is the canonical one. */
export const COMMON_UNITS: Readonly<Partial<Record<Dimension, readonly string[]>>> = {
  angle: ['deg', 'rad', 'hourangle', 'arcmin', 'arcsec', 'mas', 'h:m:s', 'd:m:s'],
  parallax: ['mas', 'uas', 'arcsec'],
  length: ['kpc', 'pc', 'Mpc', 'ly'],
  magnitude: ['mag'],
  'proper motion': ['mas/yr', 'arcsec/yr', 'uas/yr', 'arcsec/century'],
  velocity: ['km/s', 'm/s'],
  dex: ['dex'],
  number: [''],
};

/** Sexagesimal spellings: their cells are text, not numbers. */
export const SEXAGESIMAL = new Set(['h:m:s', 'd:m:s']);

/**
 * Factor from a unit to the canonical unit of its dimension (deg, mas for parallaxes, kpc, mag, mas/yr, km/s); undefined when the unit is
 * not understood or of another dimension.
 *
 * Reads what tables hold: products with '.', '*' or blanks, one or more '/', powers as '**n', '^n', or a sign and
 * digits behind the symbol. No unit at all counts as canonical for magnitudes and abundances and pure numbers.
 */
export function unitFactor(text: string, dimension: Dimension): number | undefined {
  const canonical = CANONICAL[dimension];
  const parsed = parseUnit(text);
  if (parsed === undefined || canonical === undefined) return undefined;
  const bare = dimension === 'magnitude' || dimension === 'dex';
  if (bare && same(parsed.powers, NONE)) return parsed.factor;
  if (!same(parsed.powers, canonical.powers)) return undefined;
  const factor = parsed.factor / canonical.factor;
  // Another spelling of the canonical unit must leave numbers as they are, to the last bit.
  return Math.abs(factor - 1) < 1e-14 ? 1 : factor;
}

function same(a: Powers, b: Powers): boolean {
  return (Object.keys(NONE) as (keyof Powers)[]).every((key) => a[key] === b[key]);
}

function parseUnit(text: string): Unit | undefined {
  const clean = text
    .trim()
    .replace(/^\[(.*)\]$/, '$1')
    .replace(/^"(.*)"$/, '$1')
    .trim();
  if (UNITLESS.has(clean.toLowerCase()) || UNITLESS.has(text.trim())) return unit(1, {});
  let result = unit(1, {});
  let divide = false;
  // 'a.b', 'a*b', 'a b' multiply; every term after a '/' divides.
  for (const token of clean
    .replace(/\*\*/g, '^')
    .replace(/\s*\/\s*/g, ' / ')
    .split(/[\s.*]+/)) {
    if (token === '/') {
      if (divide) return undefined;
      divide = true;
      continue;
    }
    const term = parseTerm(token);
    if (term === undefined) return undefined;
    result = multiply(result, term, divide ? -1 : 1);
    divide = false;
  }
  return result;
}

function parseTerm(token: string): Unit | undefined {
  const match = /^(µas|°|[A-Za-z]+)(?:\^?\(?([+-]?\d+)\)?)?$/.exec(token);
  if (!match) return undefined;
  const symbol = match[1]!;
  const found = SYMBOLS[symbol] ?? SYMBOLS[symbol.toLowerCase()];
  return found && multiply(unit(1, {}), found, match[2] === undefined ? 1 : Number(match[2]));
}

function multiply(a: Unit, b: Unit, power: number): Unit {
  const powers = { ...a.powers };
  for (const key of Object.keys(NONE) as (keyof Powers)[]) powers[key] += power * b.powers[key];
  return { factor: a.factor * b.factor ** power, powers };
}
