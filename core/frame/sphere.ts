import { RAD } from './constants';
import type { Vector } from './rotation';

/** Unit vector of a direction given in degrees. */
export function unitVector(lonDeg: number, latDeg: number): Vector {
  const [lon, lat] = [lonDeg * RAD, latDeg * RAD];
  return [Math.cos(lat) * Math.cos(lon), Math.cos(lat) * Math.sin(lon), Math.sin(lat)];
}

/** Longitude in [0, 360) and latitude in [−90, 90], degrees, of a vector of any length; NaN for the zero vector. */
export function direction([x, y, z]: Vector): [number, number] {
  if (x === 0 && y === 0 && z === 0) return [Number.NaN, Number.NaN];
  return [wrapDeg(Math.atan2(y, x) / RAD), Math.atan2(z, Math.hypot(x, y)) / RAD];
}

/** An angle in degrees turned into [0, 360). */
export function wrapDeg(angle: number): number {
  // The remainder is slow, and few angles need it.
  const turned = angle >= 360 || angle <= -360 ? angle % 360 : angle;
  const positive = turned < 0 ? turned + 360 : turned;
  return positive === 360 ? 0 : positive;
}

/**
 * Great-circle distance of two directions, degrees in and out, [0, 180]; NaN when a coordinate is NaN.
 * The atan2 form of 1975SurRv..23...88V, exact at all separations, where arccos loses everything below 10 mas.
 */
export function separationDeg(lon1: number, lat1: number, lon2: number, lat2: number): number {
  const turn = (lon2 - lon1) * RAD;
  const [s1, c1, s2, c2] = [Math.sin(lat1 * RAD), Math.cos(lat1 * RAD), Math.sin(lat2 * RAD), Math.cos(lat2 * RAD)];
  const east = c2 * Math.sin(turn);
  const north = c1 * s2 - s1 * c2 * Math.cos(turn);
  return Math.atan2(Math.hypot(east, north), s1 * s2 + c1 * c2 * Math.cos(turn)) / RAD;
}
