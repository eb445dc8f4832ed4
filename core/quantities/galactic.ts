import { freshColumn, type MakeColumn } from '../table/columnpool';
import { GALACTIC_FROM_ICRS } from '../frame/galactic';
import { type Sky, skyBasis, turnedSky } from '../frame/sky';
import { atan2Deg, turnPositive } from '../frame/trigonometry';
import type { QuantityColumn } from './quantity';

/**
 * Galactic longitude [0, 360) and latitude of every row, degrees. Their errors are the position errors (degrees) turned
 * to the Galactic axes (right ascension's taken as an angle on the sky); NaN where a row has none.
 */
export function galacticColumns(
  sky: Sky,
  sigmaRa: Float64Array | undefined,
  sigmaDec: Float64Array | undefined,
  make = freshColumn,
): { l: QuantityColumn; b: QuantityColumn } {
  const [l, b] = [make(sky.rows), make(sky.rows)];
  const [x, level] = [make(sky.rows), make(sky.rows)];
  // Longitudes and latitudes take the place of y and z.
  turnedSky(GALACTIC_FROM_ICRS, sky, x, l, b);
  for (let row = 0; row < sky.rows; row++) level[row] = Math.sqrt(x[row]! * x[row]! + l[row]! * l[row]!);
  atan2Deg(b, level, b);
  atan2Deg(l, x, l);
  turnPositive(l);
  const errors = sigmaRa && sigmaDec && galacticErrors(sky, sigmaRa, sigmaDec, make);
  return { l: { values: l, sigma: errors?.l }, b: { values: b, sigma: errors?.b } };
}

function galacticErrors(
  sky: Sky,
  sigmaRa: Float64Array,
  sigmaDec: Float64Array,
  make: MakeColumn,
): { l: Float64Array; b: Float64Array } {
  const [l, b] = [make(sky.rows), make(sky.rows)];
  const basis = new Float64Array(9);
  for (let row = 0; row < sky.rows; row++) {
    skyBasis(GALACTIC_FROM_ICRS, sky, row, basis);
    const cosB = Math.sqrt(basis[0]! * basis[0]! + basis[1]! * basis[1]!);
    // The Galactic z component of east and north is cos b times the sine and cosine of the angle between the axes.
    const sin = basis[5]! / cosB;
    const cos = basis[8]! / cosB;
    const east = sigmaRa[row]!;
    const north = sigmaDec[row]!;
    l[row] = Math.sqrt((cos * east) ** 2 + (sin * north) ** 2) / cosB;
    b[row] = Math.sqrt((sin * east) ** 2 + (cos * north) ** 2);
  }
  return { l, b };
}
