import { RAD } from '../frame/constants';
import { separationDeg, unitVector, wrapDeg } from '../frame/sphere';

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

/** Zones are not made lower than this, degrees, so that a tiny radius does not mean millions of them. */
const LEAST_HEIGHT = 1 / 3600;
/** Windows are this much wider than the radius, degrees, so that rounding loses no pair on the rim. */
const PAD = 1e-9;

/** No more neighbours of one point are kept; a radius far too wide then costs time, not all memory. */
export const MOST_NEIGHBOURS = 8;

/**
 * For every point of `a` the nearest points of `b` within a radius (degrees, inclusive), nearest first, at most
 * MOST_NEIGHBOURS of them.
 *
 * Sweeps zones of declination with right ascension sorted in each, so that n points with few neighbours cost about
 * n log n wherever on the sky they crowd. Separations are great circles, which hold at the poles and across 0/360.
 * Points with a NaN match nothing.
 */
export function neighbours(a: SkyPoints, b: SkyPoints, radiusDeg: number): readonly Neighbour[][] {
  const zones = zonesOf(b, Math.max(radiusDeg, LEAST_HEIGHT));
  const limit = (2 * Math.sin(Math.min(radiusDeg + PAD, 180) * (RAD / 2))) ** 2;
  return Array.from(a.dec, (dec, row) => {
    const found: Neighbour[] = [];
    const ra = a.ra[row]!;
    if (Number.isNaN(ra + dec)) return found;
    const [x, y, z] = unitVector(ra, dec);
    const windows = raWindows(wrapDeg(ra), raReach(dec, radiusDeg));
    const last = zones.of(dec + radiusDeg + PAD);
    for (let zone = zones.of(dec - radiusDeg - PAD); zone <= last; zone++) {
      for (const [from, to] of windows) {
        for (let at = zones.firstFrom(zone, from); zones.zone[at] === zone && zones.ra[at]! <= to; at++) {
          const chord = (zones.x[at]! - x) ** 2 + (zones.y[at]! - y) ** 2 + (zones.z[at]! - z) ** 2;
          if (chord > limit) continue;
          const index = zones.row[at]!;
          const apart = separationDeg(ra, dec, b.ra[index]!, b.dec[index]!);
          if (apart <= radiusDeg) insert(found, { index, separationDeg: apart });
        }
      }
    }
    return found;
  });
}

function insert(found: Neighbour[], candidate: Neighbour): void {
  const before = (p: Neighbour, q: Neighbour): boolean =>
    p.separationDeg < q.separationDeg || (p.separationDeg === q.separationDeg && p.index < q.index);
  let at = found.length;
  while (at > 0 && before(candidate, found[at - 1]!)) at--;
  if (at === MOST_NEIGHBOURS) return;
  found.splice(at, 0, candidate);
  if (found.length > MOST_NEIGHBOURS) found.pop();
}

/** Points in the order of zone, then right ascension. */
interface Zones {
  readonly row: Int32Array;
  readonly zone: Int32Array;
  readonly ra: Float64Array;
  /** Unit vectors: their squared distance is a quick first test. */
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly z: Float64Array;
  of(dec: number): number;
  /** Place of the first point of a zone at or beyond a right ascension; where it would stand if there is none. */
  firstFrom(zone: number, ra: number): number;
}

function zonesOf({ ra, dec }: SkyPoints, height: number): Zones {
  const of = (declination: number): number => Math.floor((declination + 90) / height);
  const turned = ra.map(wrapDeg);
  const zoneOf = dec.map(of);
  const row = new Int32Array(dec.length)
    .map((_, index) => index)
    .filter((index) => !Number.isNaN(ra[index]! + dec[index]!));
  row.sort((p, q) => zoneOf[p]! - zoneOf[q]! || turned[p]! - turned[q]! || p - q);
  const zone = row.map((index) => zoneOf[index]!);
  const sorted = new Float64Array(row.length).map((_, at) => turned[row[at]!]!);
  const firstFrom = (wanted: number, start: number): number => {
    let [from, to] = [0, row.length];
    while (from < to) {
      const middle = (from + to) >> 1;
      const before = zone[middle]! < wanted || (zone[middle] === wanted && sorted[middle]! < start);
      if (before) from = middle + 1;
      else to = middle;
    }
    return from;
  };
  const [x, y, z] = [0, 1, 2].map(() => new Float64Array(row.length)) as [Float64Array, Float64Array, Float64Array];
  row.forEach((index, at) => ([x[at], y[at], z[at]] = unitVector(ra[index]!, dec[index]!)));
  return { row, zone, ra: sorted, x, y, z, of, firstFrom };
}

/** How far in right ascension a circle about a point reaches, degrees; 180 when it holds a pole. */
function raReach(dec: number, radius: number): number {
  if (Math.abs(dec) + radius + PAD >= 90) return 180;
  return Math.asin(Math.sin((radius + PAD) * RAD) / Math.cos(dec * RAD)) / RAD + PAD;
}

/** The one or two stretches of [0, 360) within a reach of a right ascension. */
function raWindows(ra: number, reach: number): (readonly [number, number])[] {
  if (reach >= 180) return [[0, 360]];
  const [from, to] = [ra - reach, ra + reach];
  if (from < 0) {
    return [
      [0, to],
      [from + 360, 360],
    ];
  }
  if (to < 360) return [[from, to]];
  return [
    [from, 360],
    [0, to - 360],
  ];
}
