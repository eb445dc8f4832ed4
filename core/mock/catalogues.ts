import { csvRow } from '../formats/csv/write';
import type { Cluster } from './clusters';
import { type Dice, dice } from './dice';
import { respelled } from './names';
import { type Errors, measure } from './observe';
import { degreesText, hoursText } from './sexagesimal';

/** Said in the first line of every invented file. */
export const INVENTED = 'INVENTED DATA: an invented Galaxy seen by invented surveys; no real object is in this file.';

/** The wide survey as CSV: degrees, distance moduli, km/s, A_V; some velocities are missing. */
export function wideCatalogue(all: readonly Cluster[], seed: number): string {
  const d = dice(seed);
  const header = [
    'Name',
    'RA_deg',
    'Dec_deg',
    'DistMod',
    'DistMod_err',
    'pmRA',
    'pmRA_err',
    'pmDec',
    'pmDec_err',
    'RV_kms',
    'RV_err',
    'FeH',
    'FeH_err',
    'A_V',
    'A_V_err',
  ];
  const rows = all.filter(({ wide }) => wide).map((cluster) => wideRow(cluster, d));
  return `# ${INVENTED}\n# Brackwater Wide Survey of Clusters, release 2 (invented)\n${csvRow(header)}${rows.map(csvRow).join('')}`;
}

function wideRow(cluster: Cluster, d: Dice): string[] {
  const far = cluster.modulus > 17;
  const errors: Errors = {
    modulus: far ? 0.12 : 0.07,
    pm: 0.02 + 0.05 * d.uniform(),
    pmCorrelation: 0,
    vLos: 0.4 + 4 * d.uniform() ** 2,
    feh: 0.08 + 0.1 * d.uniform(),
    ebv: 0.02,
  };
  const found = measure(cluster, errors, d);
  const unseen = d.uniform() < (far ? 0.3 : 0.06);
  const metalless = d.uniform() < 0.03;
  return [
    cluster.name,
    cluster.truth.ra.toFixed(5),
    cluster.truth.dec.toFixed(5),
    found.modulus.toFixed(3),
    errors.modulus.toFixed(2),
    found.pmRa.toFixed(3),
    errors.pm.toFixed(3),
    found.pmDec.toFixed(3),
    errors.pm.toFixed(3),
    unseen ? '' : found.vLos.toFixed(2),
    unseen ? '' : errors.vLos.toFixed(2),
    metalless ? 'null' : found.feh.toFixed(2),
    metalless ? 'null' : errors.feh.toFixed(2),
    (3.1 * found.ebv).toFixed(2),
    (3.1 * (0.02 + 0.05 * found.ebv)).toFixed(2),
  ];
}

/** Value that the deep survey writes for "missing". */
export const DEEP_MISSING = '-99.9';

/**
 * The deep survey as TSV: sexagesimal, parsecs with separate minus and plus errors, m/s, E(B−V), its own spellings and
 * its own word for missing; one row stands twice, one is ragged, one has no position, and six values disagree honestly
 * with the wide survey.
 */
export function deepCatalogue(all: readonly Cluster[], seed: number): string {
  const d = dice(seed);
  const header = [
    'cluster',
    'RAJ2000',
    'DEJ2000',
    'dist_pc',
    'dist_em',
    'dist_ep',
    'pm_ra',
    'pm_dec',
    'e_pm_ra',
    'e_pm_dec',
    'pm_corr',
    'vlos_ms',
    'e_vlos_ms',
    '[Fe/H]',
    'e_[Fe/H]',
    'EBV',
    'e_EBV',
  ];
  const rows = all.filter(({ deep }) => deep).map((cluster) => deepRow(cluster, d));
  all
    .filter(({ deep }) => deep)
    .forEach(({ wide }, at) => {
      if (wide && at % 13 === 4) disagree(rows[at]!, Math.floor(at / 13));
    });
  rows.splice(31, 0, [
    ...rows[12]!.slice(0, 3),
    ...rows[12]!.slice(3).map((cell, at) => (at === 0 ? String(Number(cell) + 180) : cell)),
  ]);
  rows.splice(47, 0, rows[40]!.slice(0, 9));
  rows.splice(60, 0, ['Unplaced 1', '', '', ...rows[50]!.slice(3)]);
  const lines = rows.map((cells) => `${cells.join('\t')}\n`).join('');
  const head = `# ${INVENTED}\n# Osprey Deep Fields, cluster table (invented); ${DEEP_MISSING} where not measured; distances in pc, velocities in m/s\n`;
  return `${head}${header.join('\t')}\n${lines}`;
}

function deepRow(cluster: Cluster, d: Dice): string[] {
  const errors: Errors = {
    modulus: 0.045 + 0.03 * d.uniform(),
    pm: 0.015 + 0.03 * d.uniform(),
    pmCorrelation: 0.6 * d.uniform() - 0.3,
    vLos: 0.2 + 1.5 * d.uniform(),
    feh: 0.05 + 0.06 * d.uniform(),
    ebv: 0.01,
  };
  const found = measure(cluster, errors, d);
  const parsecs = 10 ** (found.modulus / 5 + 1);
  const unseen = d.uniform() < 0.12;
  const velocity = unseen
    ? [DEEP_MISSING, DEEP_MISSING]
    : [(1000 * found.vLos).toFixed(0), (1000 * errors.vLos).toFixed(0)];
  return [
    respelled(cluster.name, d),
    hoursText(cluster.truth.ra),
    degreesText(cluster.truth.dec),
    parsecs.toFixed(0),
    (parsecs * (1 - 10 ** (-errors.modulus / 5))).toFixed(0),
    (parsecs * (10 ** (errors.modulus / 5) - 1)).toFixed(0),
    found.pmRa.toFixed(4),
    found.pmDec.toFixed(4),
    errors.pm.toFixed(4),
    errors.pm.toFixed(4),
    errors.pmCorrelation.toFixed(2),
    ...velocity,
    d.uniform() < 0.05 ? DEEP_MISSING : found.feh.toFixed(3),
    errors.feh.toFixed(3),
    found.ebv.toFixed(3),
    (0.01 + 0.05 * found.ebv).toFixed(3),
  ];
}

/** Moves one value of a row by far more than its error. */
function disagree(row: string[], which: number): void {
  const [column, move, digits] = (
    [
      [3, (v: number) => v * 1.45, 0],
      [11, (v: number) => v + 61_000, 0],
      [13, (v: number) => v + 1.4, 3],
      [6, (v: number) => v + 1.1, 4],
    ] as const
  )[which % 4]!;
  if (row[column] !== DEEP_MISSING) row[column] = move(Number(row[column])).toFixed(digits);
}
