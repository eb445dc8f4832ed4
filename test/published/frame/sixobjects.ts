// Galactocentric values of six objects in frame G18, recomputed with independent code (astropy's v4.0 parameter set:
// 2018A&A...615L..15G, 2019MNRAS.482.1417B, 2018RNAAS...2..210D, 2004ApJ...616..872R). v_phi is in the right-handed
// sense there, so its sign is turned here. The last two numbers are the direction of r × v.
export interface SixObject {
  readonly name: string;
  /** RA, Dec (deg), distance (kpc), pm_ra, pm_dec (mas/yr), v_los (km/s). */
  readonly seen: readonly [number, number, number, number, number, number];
  readonly position: readonly [number, number, number];
  readonly velocity: readonly [number, number, number];
  readonly r?: number;
  readonly vR?: number;
  readonly vPhiRightHanded?: number;
  readonly pole: readonly [number, number];
}

export const SIX_OBJECTS: readonly SixObject[] = [
  {
    name: '47 Tuc',
    seen: [6.023792, -72.081306, 4.52, 5.253, -2.557, -17.45],
    position: [-6.25265, -2.59416, -3.17394],
    velocity: [-75.589, 164.213, 46.779],
    r: 7.47658,
    vR: -13.621,
    vPhiRightHanded: -180.644,
    pole: [53.092, -61.432],
  },
  {
    name: 'ω Cen',
    seen: [201.696991, -47.479473, 5.43, -3.236, -6.731, 232.78],
    position: [-4.80989, -4.07084, 1.41481],
    velocity: [97.492, -28.402, -86.621],
    r: 6.4582,
    vR: -73.683,
    vPhiRightHanded: 84.662,
    pole: [324.643, 47.924],
  },
  {
    name: 'M3',
    seen: [205.548416, 28.377277, 10.18, -0.153, -2.679, -147.2],
    position: [-6.62, 1.33952, 9.99989],
    velocity: [66.769, 121.122, -133.783],
    r: 12.06716,
    vR: -134.047,
    vPhiRightHanded: -131.958,
    pole: [188.909, -32.345],
  },
  {
    name: 'Pal 5',
    seen: [229.019167, -0.121, 21.94, -2.754, -2.643, -58.61],
    position: [7.19709, 0.22369, 15.72557],
    velocity: [-47.568, -150.743, -9.472],
    r: 17.29571,
    vR: -30.355,
    vPhiRightHanded: -149.193,
    pole: [343.984, -23.556],
  },
  {
    name: 'NGC 2419',
    seen: [114.535286, 38.881944, 88.47, 0.002, -0.54, -21.1],
    position: [-88.04624, -0.51614, 37.95214],
    velocity: [7.75, 27.118, -55.257],
    r: 95.87894,
    vR: -29.136,
    vPhiRightHanded: -27.072,
    pole: [257.652, -26.994],
  },
  {
    name: 'LMC',
    seen: [78.76, -69.19, 49.59, 1.91, 0.229, 262.2],
    position: [-1.046, -40.616, -27.537],
    velocity: [-53.95, -228.51, 217.55],
    pole: [173.54, -7.31],
  },
];
