import { MEASURED } from '../table/role';
import type { QuantityDefinition } from './quantity';

type Row = readonly [id: string, label: string, unit: string, ucd: string, description: string];

const ROWS: readonly Row[] = [
  ['gal_l', 'l', 'deg', 'pos.galactic.lon', 'Galactic longitude, 0 to 360'],
  ['gal_b', 'b', 'deg', 'pos.galactic.lat', 'Galactic latitude'],
  [
    'distance',
    'distance',
    'kpc',
    'pos.distance;pos.heliocentric',
    'Heliocentric distance, from the modulus, the distance or the parallax that was measured',
  ],
  [
    'x',
    'x',
    'kpc',
    'pos.cartesian.x;pos.galactocentric',
    'Galactocentric x, from the side of the Sun towards the centre; the Sun is at negative x',
  ],
  ['y', 'y', 'kpc', 'pos.cartesian.y;pos.galactocentric', 'Galactocentric y, towards Galactic rotation at the Sun'],
  ['z', 'z', 'kpc', 'pos.cartesian.z;pos.galactocentric', 'Galactocentric z, towards the north Galactic pole'],
  [
    'cyl_r',
    'R',
    'kpc',
    'pos.distance;pos.galactocentric',
    'Galactocentric cylindrical radius, the distance from the axis of rotation',
  ],
  ['r', 'r', 'kpc', 'pos.distance;pos.galactocentric', 'Galactocentric distance'],
  ['v_x', 'v_x', 'km/s', 'phys.veloc;pos.cartesian.x;pos.galactocentric', 'Galactocentric velocity along x'],
  ['v_y', 'v_y', 'km/s', 'phys.veloc;pos.cartesian.y;pos.galactocentric', 'Galactocentric velocity along y'],
  ['v_z', 'v_z', 'km/s', 'phys.veloc;pos.cartesian.z;pos.galactocentric', 'Galactocentric velocity along z'],
  ['v_cyl_r', 'v_R', 'km/s', 'phys.veloc;pos.galactocentric', 'Velocity away from the axis of rotation'],
  [
    'v_phi',
    'v_φ',
    'km/s',
    'phys.veloc.rotat;pos.galactocentric',
    'Rotation velocity, positive prograde (with Galactic rotation)',
  ],
  ['v_r', 'v_r', 'km/s', 'phys.veloc;pos.galactocentric', 'Galactocentric radial velocity, positive outwards'],
  [
    'v_theta',
    'v_θ',
    'km/s',
    'phys.veloc;pos.galactocentric',
    'Velocity along the polar angle, which grows from the north pole: positive southwards',
  ],
  [
    'v_t',
    'v_t',
    'km/s',
    'phys.veloc.transverse;pos.galactocentric',
    'Galactocentric tangential speed, the square root of v_theta² + v_phi²',
  ],
  ['speed', 'v', 'km/s', 'phys.veloc;pos.galactocentric', 'Galactocentric speed'],
  [
    'toomre_speed',
    'Toomre speed',
    'km/s',
    'phys.veloc;pos.lsr',
    "Speed relative to a circular orbit at the object's own azimuth, with the circular speed of the local standard of rest; equal to |v - v_LSR| at the Sun",
  ],
  ['l_x', 'L_x', 'kpc.km/s', 'phys.angMomentum;pos.galactocentric', 'x component of r × v, right-handed'],
  ['l_y', 'L_y', 'kpc.km/s', 'phys.angMomentum;pos.galactocentric', 'y component of r × v, right-handed'],
  [
    'l_z',
    'L_z',
    'kpc.km/s',
    'phys.angMomentum;pos.galactocentric',
    'Angular momentum about the axis of rotation, positive prograde: minus the z component of r × v',
  ],
  ['l_tot', 'L', 'kpc.km/s', 'phys.angMomentum;pos.galactocentric', 'Length of the angular momentum'],
  [
    'pole_l',
    'pole l',
    'deg',
    'pos.galactocentric',
    'Galactic longitude of the orbital pole, the direction of r × v (right-handed), 0 to 360',
  ],
  [
    'pole_b',
    'pole b',
    'deg',
    'pos.galactocentric',
    'Galactic latitude of the orbital pole, the direction of r × v (right-handed): negative for prograde orbits',
  ],
  [
    'a_v',
    'A_V',
    'mag',
    'phys.absorption.gal;em.opt.V',
    'Extinction in V: measured, or R_V times the recalibrated E(B-V)',
  ],
];

/** Everything that the program derives, in the order of output columns. */
export const DERIVED: readonly QuantityDefinition[] = ROWS.map(([id, label, unit, ucd, description]) => ({
  id,
  label,
  unit,
  ucd,
  description,
  origin: 'derived',
}));

const derivedIds = new Set(DERIVED.map((definition) => definition.id));

/** Measured quantities that keep their own name; a measured distance or A_V is the derived one of that name. */
export const MEASURED_QUANTITIES: readonly QuantityDefinition[] = MEASURED.filter(
  ({ id }) => !derivedIds.has(id) && id !== 'pm_correlation',
).map(({ id, label, unit, ucd, description }) => ({ id, label, unit, ucd, description, origin: 'measured' }));
