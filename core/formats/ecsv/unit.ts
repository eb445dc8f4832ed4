/** Symbols that VOUnit and the readers of ECSV spell alike. */
const SYMBOLS = new Set(
  [
    'deg',
    'arcmin',
    'arcsec',
    'mas',
    'uas',
    'rad',
    'kpc',
    'pc',
    'Mpc',
    'AU',
    'km',
    'm',
    'cm',
    's',
    'h',
    'd',
    'yr',
  ].concat(['Myr', 'Gyr', 'mag', 'mmag', 'K', 'Jy', 'mJy', 'solMass', 'solLum', 'nm', 'um']),
);
const TERM = /^([A-Za-z]+)(?:\*\*(-?\d+))?$/;

/**
 * The unit when it is written so that every reader understands it without a warning (products with '.', at most one
 * '/', powers as '**n'); undefined for no unit and for every other spelling.
 */
export function portableUnit(unit: string): string | undefined {
  const parts = unit.split('/');
  if (unit === '' || parts.length > 2) return undefined;
  const terms = parts.flatMap((part) => part.split('.'));
  return terms.every((term) => SYMBOLS.has(TERM.exec(term)?.[1] ?? '')) ? unit : undefined;
}
