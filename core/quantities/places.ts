import { freshColumn } from '../table/columnpool';
import type { Phase } from '../frame/phase';

/** Radii of the Galactocentric position, kpc: cylindrical and spherical. */
export interface Places {
  readonly cylR: Float64Array;
  readonly r: Float64Array;
}

/** See Places; one number per row. */
export function placesOf({ rows, x, y, z }: Phase, make = freshColumn): Places {
  const [cylR, r] = [make(rows), make(rows)];
  for (let i = 0; i < rows; i++) {
    const level = x[i]! * x[i]! + y[i]! * y[i]!;
    cylR[i] = Math.sqrt(level);
    r[i] = Math.sqrt(level + z[i]! * z[i]!);
  }
  return { cylR, r };
}
