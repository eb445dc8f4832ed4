/** Vertices of a closed polygon; the last edge leads back to the first vertex. */
export type Polygon = readonly (readonly [number, number])[];

/** Edges as start, end and bounds, made once for many points. */
export interface Edges {
  readonly count: number;
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly minX: number;
  readonly maxX: number;
  readonly minY: number;
  readonly maxY: number;
}

/** Prepares a polygon; vertex i is joined to vertex i + 1, and a copy of the first one closes it. */
export function edgesOf(polygon: Polygon): Edges {
  const closed = [...polygon, ...polygon.slice(0, 1)];
  const x = Float64Array.from(closed, (vertex) => vertex[0]);
  const y = Float64Array.from(closed, (vertex) => vertex[1]);
  return {
    count: polygon.length,
    x,
    y,
    minX: Math.min(...x),
    maxX: Math.max(...x),
    minY: Math.min(...y),
    maxY: Math.max(...y),
  };
}

/** Whether a point lies inside by the even-odd rule; NaN coordinates lie outside. */
export function inside(edges: Edges, px: number, py: number): boolean {
  if (!(px >= edges.minX && px <= edges.maxX && py >= edges.minY && py <= edges.maxY)) return false;
  let odd = false;
  for (let i = 0; i < edges.count; i++) {
    const [y0, y1] = [edges.y[i]!, edges.y[i + 1]!];
    if (y0 > py !== y1 > py) {
      const [x0, x1] = [edges.x[i]!, edges.x[i + 1]!];
      if (px < x0 + ((py - y0) / (y1 - y0)) * (x1 - x0)) odd = !odd;
    }
  }
  return odd;
}

/**
 * Distance of a point from the outline in units of its errors (1 = one σ along either axis).
 * An error of zero or NaN along an axis makes every step along that axis infinitely far.
 */
export function outlineDistance(edges: Edges, px: number, py: number, sx: number, sy: number): number {
  const scale = (step: number, sigma: number): number => (step === 0 ? 0 : sigma > 0 ? step / sigma : Infinity);
  let least = Infinity;
  for (let i = 0; i < edges.count; i++) {
    const ax = scale(edges.x[i]! - px, sx);
    const ay = scale(edges.y[i]! - py, sy);
    const bx = scale(edges.x[i + 1]! - px, sx);
    const by = scale(edges.y[i + 1]! - py, sy);
    const distance = segmentDistance(ax, ay, bx, by);
    if (distance < least) least = distance;
  }
  return least;
}

/** Distance of the origin from a segment. */
function segmentDistance(ax: number, ay: number, bx: number, by: number): number {
  const [dx, dy] = [bx - ax, by - ay];
  const square = dx * dx + dy * dy;
  if (!(square > 0) || !Number.isFinite(square)) return Math.min(Math.hypot(ax, ay), Math.hypot(bx, by));
  const along = Math.min(1, Math.max(0, -(ax * dx + ay * dy) / square));
  return Math.hypot(ax + along * dx, ay + along * dy);
}
