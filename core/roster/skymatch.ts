import { separationDeg } from '../frame/sphere';

/** Directions on the sky, degrees. */
export interface SkyPoints {
  readonly ra: Float64Array;
  readonly dec: Float64Array;
}

/** A neighbour of one point and how far it is. */
export interface Neighbour {
  readonly index: number;
  readonly separationDeg: number;
}

/**
 * For every point of `a` the points of `b` within a radius (degrees), nearest first.
 *
 * Sweeps a window over declination, so that n points with few neighbours cost about n log n; right ascension is
 * compared on the great circle, which holds at the poles and across 0/360. Points with a NaN match nothing.
 */
export function neighbours(a: SkyPoints, b: SkyPoints, radiusDeg: number): readonly Neighbour[][] {
  const order = Int32Array.from(b.dec, (_, row) => row).filter((row) => !Number.isNaN(b.dec[row]! + b.ra[row]!));
  order.sort((p, q) => b.dec[p]! - b.dec[q]!);
  const sorted = Float64Array.from(order, (row) => b.dec[row]!);
  return Array.from(a.dec, (dec, row) => {
    const found: Neighbour[] = [];
    if (Number.isNaN(dec + a.ra[row]!)) return found;
    for (let at = lowerBound(sorted, dec - radiusDeg); at < sorted.length && sorted[at]! <= dec + radiusDeg; at++) {
      const index = order[at]!;
      const apart = separationDeg(a.ra[row]!, dec, b.ra[index]!, b.dec[index]!);
      if (apart <= radiusDeg) found.push({ index, separationDeg: apart });
    }
    return found.sort((p, q) => p.separationDeg - q.separationDeg || p.index - q.index);
  });
}

function lowerBound(sorted: Float64Array, value: number): number {
  let [from, to] = [0, sorted.length];
  while (from < to) {
    const middle = (from + to) >> 1;
    if (sorted[middle]! < value) from = middle + 1;
    else to = middle;
  }
  return from;
}
