import { reach, type Points } from './points';

/** Vertices of a closed polygon; the last edge leads back to the first vertex. */
export type Polygon = readonly (readonly [number, number])[];

/** The edges of a polygon, made once for many points. */
export interface Outline {
  /**
   * (x, y) of the lower end and of the upper end of every edge, four numbers an edge. The fixed direction makes the
   * answers independent of where and which way round the polygon was begun.
   */
  readonly edges: Float64Array;
  /** Least x, greatest x, least y, greatest y of every run of CHAIN edges, so that most edges are passed by unseen. */
  readonly bounds: Float64Array;
}

/** Edges of one run: few enough that a run is small, many enough that there are few runs. */
const CHAIN = 8;

/** Prepares a polygon; edges without length are left out. */
export function outlineOf(polygon: Polygon): Outline {
  const edges = polygon.flatMap(([ax, ay], at) => {
    const [bx, by] = polygon[(at + 1) % polygon.length]!;
    if (ax === bx && ay === by) return [];
    return [ay < by || (ay === by && ax < bx) ? [ax, ay, bx, by] : [bx, by, ax, ay]];
  });
  const bounds = Array.from({ length: Math.ceil(edges.length / CHAIN) }, (_, at) => {
    const chain = edges.slice(CHAIN * at, CHAIN * (at + 1));
    const [xs, ys] = [0, 1].map((axis) => chain.flatMap((edge) => [edge[axis]!, edge[axis + 2]!]));
    return [Math.min(...xs!), Math.max(...xs!), Math.min(...ys!), Math.max(...ys!)];
  });
  return { edges: Float64Array.from(edges.flat()), bounds: Float64Array.from(bounds.flat()) };
}

/**
 * Whether the point of a row lies inside, by the even-odd rule. On the outline itself, left and lower edges count as
 * inside, right and upper ones as outside. NaN coordinates lie outside.
 */
export function isInside({ edges, bounds }: Outline, { x, y }: Points, row: number): boolean {
  const px = x[row]!;
  const py = y[row]!;
  let odd = false;
  for (let chain = 0, first = 0; chain < bounds.length; chain += 4, first += 4 * CHAIN) {
    if (bounds[chain + 1]! <= px || bounds[chain + 2]! > py || bounds[chain + 3]! <= py) continue;
    const end = Math.min(edges.length, first + 4 * CHAIN);
    for (let at = first; at < end; at += 4) {
      const y0 = edges[at + 1]!;
      const y1 = edges[at + 3]!;
      if (y0 > py || y1 <= py) continue;
      const x0 = edges[at]!;
      const x1 = edges[at + 2]!;
      // Only edges that reach beyond the point to the right, so that runs which do not may be passed by.
      if (x0 <= px && x1 <= px) continue;
      if (px < x0 + ((py - y0) / (y1 - y0)) * (x1 - x0)) odd = !odd;
    }
  }
  return odd;
}

/**
 * Whether the outline comes nearer to the point of a row than margin·σ, counted in its errors: whether it crosses the
 * open ellipse of those half axes. Without an error on one axis the ellipse is a segment along the other.
 */
export function isNear({ edges, bounds }: Outline, { x, y, sigmaX, sigmaY, margin }: Points, row: number): boolean {
  const rx = reach(sigmaX, row, margin);
  const ry = reach(sigmaY, row, margin);
  if (rx === 0 && ry === 0) return false;
  const px = x[row]!;
  const py = y[row]!;
  const rx2 = rx * rx;
  const ry2 = ry * ry;
  for (let chain = 0, first = 0; chain < bounds.length; chain += 4, first += 4 * CHAIN) {
    if (bounds[chain]! - px > rx || bounds[chain + 1]! - px < -rx) continue;
    if (bounds[chain + 2]! - py > ry || bounds[chain + 3]! - py < -ry) continue;
    const end = Math.min(edges.length, first + 4 * CHAIN);
    for (let at = first; at < end; at += 4) {
      const ay = edges[at + 1]! - py;
      const by = edges[at + 3]! - py;
      if (ay > ry || by < -ry) continue;
      const ax = edges[at]! - px;
      const bx = edges[at + 2]! - px;
      if ((ax > rx && bx > rx) || (ax < -rx && bx < -rx)) continue;
      const dx = bx - ax;
      const dy = by - ay;
      // Everything is multiplied by rx²·ry² instead of divided by it, so that either may be 0. `along`/`square` is the
      // share of the edge at which it comes nearest to the point.
      const square = dx * dx * ry2 + dy * dy * rx2;
      const along = -(ax * dx * ry2 + ay * dy * rx2);
      if (square === 0) {
        // The edge runs along the only axis with errors, and at the very height of the point.
        if (dy === 0 ? ax < rx && bx > -rx : ay < ry && by > -ry) return true;
      } else if (along < 0) {
        if (ax * ax * ry2 + ay * ay * rx2 < rx2 * ry2) return true;
      } else if (along > square) {
        if (bx * bx * ry2 + by * by * rx2 < rx2 * ry2) return true;
      } else {
        const area = ax * dy - ay * dx;
        if (area * area < square) return true;
      }
    }
  }
  return false;
}
