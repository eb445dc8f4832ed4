import { KM_S_PER_MAS_YR_KPC } from './constants';

/** An adopted place and motion of the Sun. Named and cited; never a global, never "latest". */
export interface SolarFrame {
  readonly id: string;
  /** Distance of the Sun from the Galactic centre with its 1σ error (statistical and systematic in quadrature), kpc. */
  readonly r0Kpc: number;
  readonly r0Sigma: number;
  /** Height of the Sun above the Galactic plane with its 1σ error, pc. */
  readonly zSunPc: number;
  readonly zSunSigma: number;
  /** Galactocentric velocity of the Sun (towards the centre, with rotation, to the north) with 1σ errors, km/s; NaN where the source gives none. */
  readonly velocityKmS: readonly [number, number, number];
  readonly velocitySigma: readonly [number, number, number];
  /** Circular speed at the Sun, the speed of the local standard of rest, km/s. */
  readonly lsrSpeedKmS: number;
  /** Bibcodes. */
  readonly sources: readonly string[];
  readonly note: string;
}

/** Peculiar motion of the Sun in the direction of rotation, km/s (2010MNRAS.403.1829S). */
const PECULIAR_V = 12.24;
const G21_R0 = 8.275;
/** Solar rotation from the proper motion of Sgr A* along the plane, 6.411 mas/yr (2020ApJ...892...39R), at the G21 distance. */
const G21_VY = KM_S_PER_MAS_YR_KPC * 6.411 * G21_R0;
const G21_R0_SIGMA = Math.hypot(0.009, 0.033);
const G21_VY_SIGMA = KM_S_PER_MAS_YR_KPC * Math.hypot(0.008 * G21_R0, 6.411 * G21_R0_SIGMA);

export const SOLAR_FRAMES: readonly SolarFrame[] = [
  {
    id: 'G18',
    r0Kpc: 8.122,
    r0Sigma: 0.031,
    zSunPc: 20.8,
    zSunSigma: 0.3,
    velocityKmS: [12.9, 245.6, 7.78],
    velocitySigma: [3.0, 1.4, 0.09],
    lsrSpeedKmS: 245.6 - PECULIAR_V,
    sources: ['2018A&A...615L..15G', '2019MNRAS.482.1417B', '2018RNAAS...2..210D', '2004ApJ...616..872R'],
    note: 'Errors of the velocity are from memory. The local standard of rest takes the peculiar motion of 2010MNRAS.403.1829S off the solar motion.',
  },
  {
    id: 'G19',
    r0Kpc: 8.178,
    r0Sigma: Math.hypot(0.013, 0.022),
    zSunPc: 20.8,
    zSunSigma: 0.3,
    velocityKmS: [11.1, 240 + PECULIAR_V, 7.25],
    velocitySigma: [0.72, 0.47, 0.37],
    lsrSpeedKmS: 240,
    sources: ['2019A&A...625L..10G', '2019MNRAS.482.1417B', '2010MNRAS.403.1829S'],
    note: 'A rounded circular speed of 240 km/s; the error along rotation is that of the peculiar motion alone.',
  },
  {
    id: 'G21',
    r0Kpc: G21_R0,
    r0Sigma: G21_R0_SIGMA,
    zSunPc: 20.8,
    zSunSigma: 0.3,
    velocityKmS: [11.1, G21_VY, 7.25],
    velocitySigma: [0.72, G21_VY_SIGMA, 0.37],
    lsrSpeedKmS: G21_VY - PECULIAR_V,
    sources: ['2021A&A...647A..59G', '2020ApJ...892...39R', '2019MNRAS.482.1417B', '2010MNRAS.403.1829S'],
    note: 'Rotation of the Sun from the proper motion of Sgr A* at this distance.',
  },
  {
    id: 'BHG16',
    r0Kpc: 8.2,
    r0Sigma: 0.1,
    zSunPc: 25,
    zSunSigma: 5,
    velocityKmS: [10, 248, 7],
    velocitySigma: [1, 3, 0.5],
    lsrSpeedKmS: 238,
    sources: ['2016ARA&A..54..529B'],
    note: 'The velocities are from memory.',
  },
  {
    id: 'M17',
    r0Kpc: 8.21,
    r0Sigma: 0.09,
    zSunPc: 20.8,
    zSunSigma: 0.3,
    velocityKmS: [11.1, 233.1 + PECULIAR_V, 7.25],
    velocitySigma: [0.72, 3.0, 0.37],
    lsrSpeedKmS: 233.1,
    sources: ['2017MNRAS.465...76M', '2019MNRAS.482.1417B', '2010MNRAS.403.1829S'],
    note: 'The best-fitting model; the error along rotation is from memory.',
  },
  {
    id: 'IAU85',
    r0Kpc: 8.5,
    r0Sigma: Number.NaN,
    zSunPc: 0,
    zSunSigma: Number.NaN,
    velocityKmS: [0, 220, 0],
    velocitySigma: [Number.NaN, Number.NaN, Number.NaN],
    lsrSpeedKmS: 220,
    sources: ['1986MNRAS.221.1023K'],
    note: 'A convention for comparison with old tables; it has no solar peculiar motion and no errors.',
  },
];

/** The solar frame of that name, or undefined. */
export function solarFrame(id: string): SolarFrame | undefined {
  return SOLAR_FRAMES.find((frame) => frame.id === id);
}
