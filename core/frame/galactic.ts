import { NGP_DEC_DEG, NGP_RA_DEG, NODE_L_DEG, RAD } from './constants';
import { aboutX, aboutZ, inverse, product, rotate, type Rotation } from './rotation';
import { direction, unitVector } from './sphere';

/** ICRS → Galactic: R₃(−l_Ω)·R₁(90° − δ)·R₃(90° + α) (ESA 1997, SP-1200 vol. 1, eq. 1.5.11). */
export const GALACTIC_FROM_ICRS: Rotation = product(
  aboutZ(-NODE_L_DEG * RAD),
  aboutX((90 - NGP_DEC_DEG) * RAD),
  aboutZ((90 + NGP_RA_DEG) * RAD),
);
const ICRS_FROM_GALACTIC = inverse(GALACTIC_FROM_ICRS);

/** Galactic (l, b) of an ICRS direction; degrees in and out, l in [0, 360). NaN stays NaN. */
export function galacticFromIcrs(raDeg: number, decDeg: number): [number, number] {
  return direction(rotate(GALACTIC_FROM_ICRS, unitVector(raDeg, decDeg)));
}

/** ICRS (α, δ) of a Galactic direction; degrees in and out, α in [0, 360). NaN stays NaN. */
export function icrsFromGalactic(lDeg: number, bDeg: number): [number, number] {
  return direction(rotate(ICRS_FROM_GALACTIC, unitVector(lDeg, bDeg)));
}
