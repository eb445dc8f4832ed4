import type { Cut } from '../cuts/cut';
import type { Recipe } from '../edition/recipe';
import { emptyRecipe } from '../edition/recipefile';
import type { ColumnMeaning, Source } from '../roster/sourcemap';
import { DEEP_MISSING } from './catalogues';
import { STREAM_POLE } from './galaxy';

const AUTHOR = 'Halosieve demo';
const TIME = '2026-01-01T00:00:00.000Z';
const NOTE = 'INVENTED DATA. An invented Galaxy seen by invented surveys, to try the program on.';

type Hash = (fileName: string) => string;

function meanings(rows: readonly (readonly [column: string, role: string, unit?: string])[]): ColumnMeaning[] {
  return rows.map(([column, role, unit]) => (unit === undefined ? { column, role } : { column, role, unit }));
}

function source(
  id: string,
  path: string,
  title: string,
  hash: Hash,
  columns: ColumnMeaning[],
  missing: string[] = [],
): Source {
  return { id, path, sha256: hash(path), title, citation: '', invented: true, missing, columns };
}

function cut(fields: Pick<Cut, 'id' | 'kind' | 'parameters' | 'rationale' | 'evidence'>): Cut {
  return { on: true, missing: 'unjudged', author: AUTHOR, time: TIME, ...fields } as Cut;
}

/** The demo: the clusters of the wide and the deep survey, cleaned by the four cuts. */
export function demoRecipe(hash: Hash): Recipe {
  return {
    ...emptyRecipe('Demo: clusters of an invented halo'),
    author: AUTHOR,
    note: NOTE,
    sources: [
      source(
        'wide',
        'wide.csv',
        'Brackwater Wide Survey of Clusters (invented)',
        hash,
        meanings([
          ['Name', 'name'],
          ['RA_deg', 'ra', 'deg'],
          ['Dec_deg', 'dec', 'deg'],
          ['DistMod', 'distance_modulus', 'mag'],
          ['DistMod_err', 'distance_modulus_error', 'mag'],
          ['pmRA', 'pm_ra', 'mas/yr'],
          ['pmRA_err', 'pm_ra_error', 'mas/yr'],
          ['pmDec', 'pm_dec', 'mas/yr'],
          ['pmDec_err', 'pm_dec_error', 'mas/yr'],
          ['RV_kms', 'v_los', 'km/s'],
          ['RV_err', 'v_los_error', 'km/s'],
          ['FeH', 'feh'],
          ['FeH_err', 'feh_error'],
          ['A_V', 'a_v', 'mag'],
          ['A_V_err', 'a_v_error', 'mag'],
        ]),
      ),
      source(
        'deep',
        'deep.tsv',
        'Osprey Deep Fields, clusters (invented)',
        hash,
        meanings([
          ['cluster', 'name'],
          ['RAJ2000', 'ra', 'h:m:s'],
          ['DEJ2000', 'dec', 'd:m:s'],
          ['dist_pc', 'distance', 'pc'],
          ['dist_em', 'distance_error_minus', 'pc'],
          ['dist_ep', 'distance_error_plus', 'pc'],
          ['pm_ra', 'pm_ra', 'mas/yr'],
          ['e_pm_ra', 'pm_ra_error', 'mas/yr'],
          ['pm_dec', 'pm_dec', 'mas/yr'],
          ['e_pm_dec', 'pm_dec_error', 'mas/yr'],
          ['pm_corr', 'pm_correlation'],
          ['vlos_ms', 'v_los', 'm/s'],
          ['e_vlos_ms', 'v_los_error', 'm/s'],
          ['[Fe/H]', 'feh'],
          ['e_[Fe/H]', 'feh_error'],
          ['EBV', 'ebv', 'mag'],
          ['e_EBV', 'ebv_error', 'mag'],
        ]),
        [DEEP_MISSING],
      ),
    ],
    roster: { matchRadiusArcsec: 30, matchNames: true, aliases: {}, priority: ['deep', 'wide'], conflictSigma: 5 },
    ledger: [
      cut({
        id: 'metals',
        kind: 'metallicity',
        parameters: { min: null, max: -0.8 },
        rationale:
          'The invented disc and bulge lie around −0.5; clusters more metal-rich than −0.8 behave as a disc system.',
        evidence: ['1985ApJ...293..424Z'],
      }),
      cut({
        id: 'dust',
        kind: 'extinction',
        parameters: { ebvMax: null, avMax: 1.5, absBMin: null },
        rationale:
          'Behind more than 1.5 mag the foreground is patchy and the distances of the wide survey are doubtful. The deep survey gives E(B−V); it enters through R_V.',
        evidence: [],
      }),
      cut({
        id: 'disc',
        kind: 'disc',
        parameters: { combine: 'all', absZMin: 4, cylRMin: null, vPhiMax: null, toomreMin: 210 },
        rationale:
          'What stands within 4 kpc of the plane and also moves within 210 km/s of a circular orbit is taken for the disc; either alone would take halo objects that cross the plane.',
        evidence: ['arXiv:0801.1232', '2018ApJ...860L..11K'],
      }),
      cut({
        id: 'stream',
        kind: 'plane',
        parameters: {
          preset: null,
          poleL: STREAM_POLE.l,
          poleB: STREAM_POLE.b,
          measure: 'orbital-pole',
          sense: 'with',
          angleMax: 15,
          action: 'drop',
        },
        rationale: 'One invented stream crosses the halo; its members share one orbit and are not independent tracers.',
        evidence: ['1996ApJ...465..278J'],
      }),
    ],
    plates: [
      { id: 'sky', x: 'gal_l', y: 'gal_b' },
      { id: 'side', x: 'x', y: 'z' },
      { id: 'metals', x: 'feh', y: 'v_phi' },
      { id: 'poles', x: 'pole_l', y: 'pole_b' },
    ],
  };
}

/** The second demo: twenty thousand giants of the same halo. */
export function giantsRecipe(hash: Hash): Recipe {
  return {
    ...emptyRecipe('Demo: giants of an invented halo'),
    author: AUTHOR,
    note: NOTE,
    sources: [
      source(
        'giants',
        'giants.csv',
        'Marshlight Giants (invented)',
        hash,
        meanings([
          ['star_id', 'name'],
          ['ra', 'ra', 'deg'],
          ['dec', 'dec', 'deg'],
          ['dist_kpc', 'distance', 'kpc'],
          ['e_dist_kpc', 'distance_error', 'kpc'],
          ['pmra', 'pm_ra', 'mas/yr'],
          ['e_pmra', 'pm_ra_error', 'mas/yr'],
          ['pmdec', 'pm_dec', 'mas/yr'],
          ['e_pmdec', 'pm_dec_error', 'mas/yr'],
          ['rv', 'v_los', 'km/s'],
          ['e_rv', 'v_los_error', 'km/s'],
          ['feh', 'feh'],
          ['e_feh', 'feh_error'],
          ['ebv', 'ebv', 'mag'],
          ['snr', 'extra'],
        ]),
      ),
    ],
    roster: { matchRadiusArcsec: 1, matchNames: true, aliases: {}, priority: ['giants'], conflictSigma: 5 },
    ledger: [
      cut({
        id: 'metals',
        kind: 'metallicity',
        parameters: { min: null, max: -1 },
        rationale: 'Keeps the metal-poor side of the gap between the halo and the disc.',
        evidence: ['Borkova & Marsakov 2000, Astron. Rep. 44, 665'],
      }),
      cut({
        id: 'dust',
        kind: 'extinction',
        parameters: { ebvMax: 0.3, avMax: null, absBMin: 10 },
        rationale: 'Low latitudes are crowded and reddened; the invented survey is incomplete there.',
        evidence: [],
      }),
      cut({
        id: 'disc',
        kind: 'disc',
        parameters: { combine: 'any', absZMin: 4, cylRMin: null, vPhiMax: null, toomreMin: 180 },
        rationale: 'With so many stars a clean sample is worth more than a complete one.',
        evidence: ['arXiv:0801.1232'],
      }),
      cut({
        id: 'stream',
        kind: 'plane',
        parameters: {
          preset: null,
          poleL: STREAM_POLE.l,
          poleB: STREAM_POLE.b,
          measure: 'orbital-pole',
          sense: 'with',
          angleMax: 20,
          action: 'drop',
        },
        rationale: 'The invented stream holds one star in twelve.',
        evidence: [],
      }),
      cut({
        id: 'quality',
        kind: 'range',
        parameters: { quantity: 'giants.snr', min: 12, max: null, absolute: false },
        rationale: 'Spectra below 12 give velocities and metallicities with tails.',
        evidence: [],
      }),
    ],
    plates: [
      { id: 'sky', x: 'gal_l', y: 'gal_b' },
      { id: 'radius', x: 'r', y: 'v_r' },
      { id: 'metals', x: 'feh', y: 'v_phi' },
      { id: 'poles', x: 'pole_l', y: 'pole_b' },
    ],
  };
}
