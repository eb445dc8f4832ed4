import type { Phase } from '../frame/phase';

/** One quantity of the Galactocentric state: its value, and its gradient by (x, y, z, v_x, v_y, v_z). */
export interface Kernel {
  /** Whether the value hangs on the velocity. */
  readonly moving: boolean;
  value(phase: Phase, row: number): number;
  /** The whole column, where the state already holds it. */
  column?(phase: Phase): Float64Array;
  /** Writes the six derivatives. */
  gradient(phase: Phase, row: number, to: Float64Array): void;
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
