import { RAD } from '../frame/constants';

const STEPS = 64;
const SCALE_LENGTH = 4.2;
const SCALE_HEIGHT = 0.11;
const SUN_RADIUS = 8.1;
/** E(B−V) per kiloparsec in the plane at the Sun. */
const LOCAL = 0.3;

/**
 * Colour excess of the invented foreground between the Sun and a distance (kpc) towards (l, b): an exponential disc of
 * dust, made patchy on the sky.
 */
export function foregroundExcess(lDeg: number, bDeg: number, distance: number): number {
  const [l, b] = [lDeg * RAD, bDeg * RAD];
  // Beyond this length the line of sight has left the layer or the disc.
  const length = Math.min(distance, 30, (8 * SCALE_HEIGHT) / Math.max(Math.abs(Math.sin(b)), 1e-3));
  const step = length / STEPS;
  let column = 0;
  for (let at = step / 2; at < length; at += step) {
    const [x, y] = [SUN_RADIUS - at * Math.cos(b) * Math.cos(l), at * Math.cos(b) * Math.sin(l)];
    const R = Math.hypot(x, y);
    column += step * Math.exp((SUN_RADIUS - R) / SCALE_LENGTH - Math.abs(at * Math.sin(b)) / SCALE_HEIGHT);
  }
  return LOCAL * column * patchiness(l, b);
}

function patchiness(l: number, b: number): number {
  return (
    1 +
    0.35 * Math.sin(3 * l + 1.1) * Math.cos(4 * b) +
    0.25 * Math.sin(11 * l + 7 * b) +
    0.15 * Math.sin(23 * l - 17 * b + 0.4)
  );
}
