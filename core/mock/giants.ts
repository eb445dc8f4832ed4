import { csvRow } from '../formats/csv/write';
import { INVENTED } from './catalogues';
import { type Dice, dice } from './dice';
import { drawTracer, type Population } from './galaxy';
import { type Errors, measure, type Seen, seen } from './observe';
import { giantChance } from './selection';

const COUNT = 20_000;

/** A giant of the invented Galaxy with its 19-digit identifier. */
export interface Giant extends Seen {
  readonly id: string;
}

/**
 * Halo giants with some disc, bulge and stream among them, in the order of the invented survey; those that it misses
 * behind dust or for their distance are left out.
 */
export function giants(seed: number): Giant[] {
  const d = dice(seed);
  const listed: Giant[] = [];
  while (listed.length < COUNT) {
    const star = { id: identifier(d), ...seen(drawTracer(population(d), d)) };
    if (d.uniform() < giantChance(star)) listed.push(star);
  }
  return listed;
}

function population(d: Dice): Population {
  const u = d.uniform();
  if (u < 0.78) return 'halo';
  if (u < 0.9) return 'disc';
  return u < 0.98 ? 'stream' : 'bulge';
}

/** Nineteen digits: more than a double holds exactly. */
function identifier(d: Dice): string {
  const digits = (count: number): string => String(Math.floor(d.uniform() * 10 ** count)).padStart(count, '0');
  return `${1 + Math.floor(d.uniform() * 8)}${digits(9)}${digits(9)}`;
}

/** The catalogue of giants as CSV. */
export function giantCatalogue(all: readonly Giant[], seed: number): string {
  const d = dice(seed);
  const header = [
    'star_id',
    'ra',
    'dec',
    'dist_kpc',
    'e_dist_kpc',
    'pmra',
    'pmdec',
    'e_pmra',
    'e_pmdec',
    'rv',
    'e_rv',
    'feh',
    'e_feh',
    'ebv',
    'snr',
  ];
  return `# ${INVENTED}\n# Marshlight Giants, data release 1 (invented); distances in kpc, velocities in km/s\n${csvRow(header)}${all.map((giant) => csvRow(giantRow(giant, d))).join('')}`;
}

function giantRow(giant: Giant, d: Dice): string[] {
  const errors: Errors = {
    modulus: 0.25,
    pm: 0.03 + 0.04 * d.uniform(),
    pmCorrelation: 0,
    vLos: 1 + 4 * d.uniform(),
    feh: 0.12,
    ebv: 0.01,
  };
  const found = measure(giant, errors, d);
  const kpc = 10 ** (found.modulus / 5 - 2);
  const unseen = d.uniform() < 0.08;
  return [
    giant.id,
    giant.truth.ra.toFixed(6),
    giant.truth.dec.toFixed(6),
    kpc.toPrecision(5),
    (kpc * (Math.LN10 / 5) * errors.modulus).toPrecision(3),
    found.pmRa.toFixed(3),
    found.pmDec.toFixed(3),
    errors.pm.toFixed(3),
    errors.pm.toFixed(3),
    unseen ? '' : found.vLos.toFixed(1),
    unseen ? '' : errors.vLos.toFixed(1),
    found.feh.toFixed(2),
    errors.feh.toFixed(2),
    found.ebv.toFixed(3),
    (8 + 60 * d.uniform()).toFixed(1),
  ];
}
