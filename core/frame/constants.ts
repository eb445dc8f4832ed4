/** Kilometres per second for one milliarcsecond per year at one kiloparsec (IAU 2012 B2 au, Julian year). */
export const KM_S_PER_MAS_YR_KPC = 4.740470463533348;

/** Radians in a degree. */
export const RAD = Math.PI / 180;

/** Right ascension and declination of the north Galactic pole, ICRS, degrees (ESA 1997, SP-1200 vol. 1 §1.5.3; exact). */
export const NGP_RA_DEG = 192.85948;
export const NGP_DEC_DEG = 27.12825;

/** Galactic longitude of the ascending node of the Galactic plane on the equator, degrees (ibid.; exact). */
export const NODE_L_DEG = 32.93192;

/** ICRS direction of the Galactic centre, degrees (2004ApJ...616..872R). */
export const CENTRE_RA_DEG = 266.4051;
export const CENTRE_DEC_DEG = -28.936175;

/** Roll about the line to the centre that lays the Galactic plane level, degrees (definition of the frame compared with). */
export const CENTRE_ROLL_DEG = 58.5986320306;
