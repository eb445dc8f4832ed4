import { RAD } from '../frame/constants';
import { GALACTIC_FROM_ICRS } from '../frame/galactic';
import { skyBasis } from '../frame/skybasis';
import type { MeasuredTable } from '../table/measured';
import type { QuantityColumn } from './quantity';

/**
 * Galactic longitude [0, 360) and latitude of every row, degrees. Their errors are the position errors turned to the
 * Galactic axes (right ascension's taken as an angle on the sky); NaN where a row has none.
 */
export function galacticColumns(table: MeasuredTable): { l: QuantityColumn; b: QuantityColumn } | undefined {
  const [ra, dec] = [table.columns.get('ra'), table.columns.get('dec')];
  if (!ra || !dec) return undefined;
  const column = (): Float64Array => new Float64Array(table.rows);
  const [l, b, sigmaL, sigmaB] = [column(), column(), column(), column()];
  const [sigmaRa, sigmaDec] = [ra.sigma, dec.sigma];
  const known = sigmaRa !== undefined && sigmaDec !== undefined;
  const basis = new Float64Array(9);
  for (let row = 0; row < table.rows; row++) {
    skyBasis(GALACTIC_FROM_ICRS, ra.values[row]!, dec.values[row]!, basis);
    const turn = Math.atan2(basis[1]!, basis[0]!) / RAD;
    const lat = Math.atan2(basis[2]!, Math.sqrt(basis[0]! * basis[0]! + basis[1]! * basis[1]!)) / RAD;
    l[row] = turn < 0 ? turn + 360 : turn;
    b[row] = lat;
    if (!known) continue;
    // The Galactic z component of east and north is cos b times the sine and cosine of the angle between the axes.
    const cosB = Math.cos(lat * RAD);
    const [sin, cos] = [basis[5]! / cosB, basis[8]! / cosB];
    const [east, north] = [sigmaRa[row]!, sigmaDec[row]!];
    sigmaL[row] = Math.hypot(cos * east, sin * north) / cosB;
    sigmaB[row] = Math.hypot(sin * east, cos * north);
  }
  return { l: { values: l, sigma: known ? sigmaL : undefined }, b: { values: b, sigma: known ? sigmaB : undefined } };
}
