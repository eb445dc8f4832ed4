import type { MeasuredId } from '../table/role';

type Guessed = MeasuredId | 'name' | 'gal_l' | 'gal_b';

/** Names that columns of this role have been given, cleaned of case and punctuation; the more telling first. */
export const ALIASES: Readonly<Record<Guessed, readonly string[]>> = {
  name: [
    'name',
    'object',
    'cluster',
    'objectname',
    'id',
    'sourceid',
    'starid',
    'objid',
    'galaxy',
    'target',
    'main_id',
    'key',
  ],
  ra: ['ra', 'raj2000', 'radeg', 'raicrs', 'rightascension', 'alpha', 'rah'],
  dec: ['dec', 'de', 'decj2000', 'dej2000', 'decdeg', 'dedeg', 'decicrs', 'deicrs', 'declination', 'delta'],
  gal_l: ['l', 'll', 'glon', 'gall', 'galacticlongitude', 'lgal'],
  gal_b: ['b', 'bb', 'glat', 'galb', 'galacticlatitude', 'bgal'],
  distance_modulus: ['distancemodulus', 'distmod', 'mm0', 'dm', 'mu0', 'truemodulus', 'modulus', 'mod', 'mu'],
  distance: [
    'distance',
    'dist',
    'd',
    'rsun',
    'dsun',
    'rhelio',
    'dhelio',
    'heliocentricdistance',
    'distkpc',
    'distpc',
    'dkpc',
    'dpc',
  ],
  parallax: ['parallax', 'plx', 'varpi'],
  pm_ra: ['pmra', 'pmracosdec', 'pmracosd', 'pmracosde', 'mualphastar', 'mura', 'mualpha', 'pmrastar'],
  pm_dec: ['pmdec', 'pmde', 'mudec', 'mudelta', 'mude'],
  pm_correlation: ['pmcorrelation', 'pmrapmdeccorr', 'pmcorr', 'rhopm', 'pmrho', 'corrpm'],
  v_los: [
    'vlos',
    'rv',
    'radialvelocity',
    'hrv',
    'vhelio',
    'vrad',
    'vlossystemic',
    'heliocentricvelocity',
    'vel',
    'losvelocity',
  ],
  feh: [
    'feh',
    'metallicity',
    'met',
    'fe',
    'mh',
    'metallicityspectroscopic',
    'metallicityphotometric',
    'metallicityisochrone',
  ],
  ebv: ['ebv', 'ebminusv', 'reddening', 'colourexcess', 'colorexcess', 'eb_v'],
  a_v: ['av', 'extinctionv', 'extinction', 'a0'],
};

/** Parts of a name that make a column a companion of another, in front of it or behind. */
export const COMPANIONS: readonly {
  readonly pattern: RegExp;
  readonly suffix: '_error' | '_error_minus' | '_error_plus';
}[] = [
  { pattern: /^(.+?)[_.\s-]*(?:em|errm|errminus|errorminus|lower|lowererror|minus|lo)$/i, suffix: '_error_minus' },
  { pattern: /^(.+?)[_.\s-]*(?:ep|errp|errplus|errorplus|upper|uppererror|plus|hi|up)$/i, suffix: '_error_plus' },
  { pattern: /^(.+?)[_.\s-]*(?:error|err|unc|uncertainty|sigma|sig|std|e)$/i, suffix: '_error' },
  { pattern: /^(?:e|err|error|sigma|sig|unc|s)[_.\s-]+(.+)$/i, suffix: '_error' },
];

/** Units that a column's name may carry at its end. */
export const UNIT_SUFFIXES: Readonly<Record<string, string>> = {
  kpc: 'kpc',
  mpc: 'Mpc',
  pc: 'pc',
  deg: 'deg',
  rad: 'rad',
  mas: 'mas',
  masyr: 'mas/yr',
  kms: 'km/s',
  ms: 'm/s',
};
