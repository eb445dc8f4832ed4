import { GALACTIC_FROM_ICRS } from '../frame/galactic';
import { bySkyBlocks, SKY_BLOCK, skyBasis } from '../frame/skybasis';
import { atan2Deg, turnPositive } from '../frame/trigonometry';
import type { QuantityColumn } from './quantity';

/**
 * Galactic longitude [0, 360) and latitude of every row, degrees. Their errors are the position errors turned to the
 * Galactic axes (right ascension's taken as an angle on the sky); NaN where a row has none.
 */
export function galacticColumns(ra: QuantityColumn, dec: QuantityColumn): { l: QuantityColumn; b: QuantityColumn } {
  const rows = ra.values.length;
  const [l, b] = [new Float64Array(rows), new Float64Array(rows)];
  const [sigmaRa, sigmaDec] = [ra.sigma, dec.sigma];
  const known = sigmaRa !== undefined && sigmaDec !== undefined;
  const [sigmaL, sigmaB] = known ? [new Float64Array(rows), new Float64Array(rows)] : [];
  const basis = new Float64Array(9);
  const scratch = (): Float64Array => new Float64Array(SKY_BLOCK);
  const [x, y, z, level] = [scratch(), scratch(), scratch(), scratch()];
  bySkyBlocks(ra.values, dec.values, (sky, from, to) => {
    const [longitudes, latitudes] = [l.subarray(from, to), b.subarray(from, to)];
    for (let at = 0; at < to - from; at++) {
      skyBasis(GALACTIC_FROM_ICRS, sky, at, basis);
      const cosB = Math.sqrt(basis[0]! * basis[0]! + basis[1]! * basis[1]!);
      x[at] = basis[0]!;
      y[at] = basis[1]!;
      z[at] = basis[2]!;
      level[at] = cosB;
      if (!known) continue;
      // The Galactic z component of east and north is cos b times the sine and cosine of the angle between the axes.
      const [sin, cos] = [basis[5]! / cosB, basis[8]! / cosB];
      const [east, north] = [sigmaRa[from + at]!, sigmaDec[from + at]!];
      sigmaL![from + at] = Math.hypot(cos * east, sin * north) / cosB;
      sigmaB![from + at] = Math.hypot(sin * east, cos * north);
    }
    atan2Deg(y, x, longitudes);
    turnPositive(longitudes);
    atan2Deg(z, level, latitudes);
  });
  return { l: { values: l, sigma: sigmaL }, b: { values: b, sigma: sigmaB } };
}
