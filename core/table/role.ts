import type { Dimension } from './dimension';

/** Measured quantities that the roster settles, in the unit named in `MEASURED`. */
export type MeasuredId =
  | 'ra'
  | 'dec'
  | 'distance'
  | 'distance_modulus'
  | 'parallax'
  | 'pm_ra'
  | 'pm_dec'
  | 'pm_correlation'
  | 'v_los'
  | 'feh'
  | 'ebv'
  | 'a_v';

/** What a column can be. `gal_l`/`gal_b` are turned into ra/dec; `extra` is carried along under its own name. */
export type RoleId =
  | MeasuredId
  | `${MeasuredId}_error`
  | `${MeasuredId}_error_minus`
  | `${MeasuredId}_error_plus`
  | 'name'
  | 'gal_l'
  | 'gal_b'
  | 'extra'
  | 'ignore';

export interface MeasuredDefinition {
  readonly id: MeasuredId;
  readonly label: string;
  /** Canonical unit; '' for pure numbers and dex. */
  readonly unit: string;
  readonly dimension: Dimension;
  /** Inclusive range of possible values in the canonical unit. */
  readonly min: number;
  readonly max: number;
  readonly ucd: string;
  readonly description: string;
}

const row = (
  id: MeasuredId,
  label: string,
  unit: string,
  dimension: Dimension,
  min: number,
  max: number,
  ucd: string,
  description: string,
): MeasuredDefinition => ({ id, label, unit, dimension, min, max, ucd, description });

/** Every measured quantity with its canonical unit. */
export const MEASURED: readonly MeasuredDefinition[] = [
  row('ra', 'right ascension', 'deg', 'angle', 0, 360, 'pos.eq.ra;meta.main', 'ICRS right ascension'),
  row('dec', 'declination', 'deg', 'angle', -90, 90, 'pos.eq.dec;meta.main', 'ICRS declination'),
  row(
    'distance',
    'distance',
    'kpc',
    'length',
    0,
    1e4,
    'pos.distance;pos.heliocentric',
    'heliocentric distance as measured',
  ),
  row('distance_modulus', 'distance modulus', 'mag', 'magnitude', -5, 35, 'phot.mag.distMod', 'true distance modulus'),
  row('parallax', 'parallax', 'mas', 'parallax', -100, 1000, 'pos.parallax.trig', 'trigonometric parallax'),
  row(
    'pm_ra',
    'proper motion in right ascension',
    'mas/yr',
    'proper motion',
    -1e4,
    1e4,
    'pos.pm;pos.eq.ra',
    'proper motion in right ascension times cos(declination)',
  ),
  row(
    'pm_dec',
    'proper motion in declination',
    'mas/yr',
    'proper motion',
    -1e4,
    1e4,
    'pos.pm;pos.eq.dec',
    'proper motion in declination',
  ),
  row(
    'pm_correlation',
    'proper-motion correlation',
    '',
    'number',
    -1,
    1,
    'stat.correlation;pos.pm;pos.eq.ra;pos.pm;pos.eq.dec',
    'correlation of the two proper-motion components',
  ),
  row(
    'v_los',
    'line-of-sight velocity',
    'km/s',
    'velocity',
    -3000,
    3000,
    'spect.dopplerVeloc',
    'heliocentric line-of-sight velocity, positive for recession',
  ),
  row('feh', '[Fe/H]', '', 'dex', -6, 2, 'phys.abund.Fe', 'iron abundance relative to the Sun'),
  row('ebv', 'E(B−V)', 'mag', 'magnitude', -0.5, 30, 'phot.color.excess', 'colour excess E(B-V)'),
  row('a_v', 'A_V', 'mag', 'magnitude', -1, 100, 'phys.absorption.gal;em.opt.V', 'total extinction in V'),
];

/** Definition of a measured quantity. */
export function measured(id: MeasuredId): MeasuredDefinition {
  return MEASURED.find((definition) => definition.id === id)!;
}
