import type { Phase } from '../frame/phase';
import type { MakeColumn } from '../table/columnpool';
import type { Momenta } from './momenta';
import type { Motions } from './motions';
import type { Places } from './places';

/** The Galactocentric state of all rows; each family of columns is computed when first asked for. */
export interface GalactocentricState {
  readonly phase: Phase;
  readonly make: MakeColumn;
  places(): Places;
  motions(): Motions;
  momenta(): Momenta;
}

/** Writes the derivatives of a quantity of one row by (x, y, z, v_x, v_y, v_z). */
export type Gradient = (row: number, to: Float64Array) => void;

/** One quantity of the Galactocentric state. */
export interface Kernel {
  /** Whether the value hangs on the velocity. */
  readonly moving: boolean;
  values(state: GalactocentricState): Float64Array;
  gradient(state: GalactocentricState): Gradient;
}

/** Writes six derivatives. */
export function put(to: Float64Array, x: number, y: number, z: number, vX: number, vY: number, vZ: number): void {
  to[0] = x;
  to[1] = y;
  to[2] = z;
  to[3] = vX;
  to[4] = vY;
  to[5] = vZ;
}
