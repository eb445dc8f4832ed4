import { type SolarFrame, solarFrame } from '../frame/solarframes';

/** The solar frame of a recipe; throws RangeError for one that no validated recipe can name. */
export function frameOf(id: string): SolarFrame {
  const frame = solarFrame(id);
  if (frame === undefined) throw new RangeError(`no solar frame ${id}`);
  return frame;
}

/** One value of a frame with its error in words: "8.122 ± 0.031 kpc". */
export function frameValue(value: number, sigma: number, unit: string): string {
  if (Number.isNaN(sigma)) return `${trimmed(value)} ${unit} (no error given)`;
  const places = Math.max(decimals(value), decimals(sigma));
  return `${trimmed(value, places)} ± ${trimmed(sigma, places)} ${unit}`;
}

/** Six significant digits at most; sums of published values carry noise behind them. */
function trimmed(value: number, places = decimals(value)): string {
  return value.toFixed(places).replace('-', '−');
}

function decimals(value: number): number {
  return Math.min(3, String(Number(value.toPrecision(6))).split('.')[1]?.length ?? 0);
}

/** The values of a frame as name and words. */
export function frameFacts(frame: SolarFrame): [string, string][] {
  const [vx, vy, vz] = frame.velocityKmS;
  const [sx, sy, sz] = frame.velocitySigma;
  return [
    ['Distance of the Sun from the centre', frameValue(frame.r0Kpc, frame.r0Sigma, 'kpc')],
    ['Height of the Sun above the plane', frameValue(frame.zSunPc, frame.zSunSigma, 'pc')],
    ['Velocity of the Sun towards the centre', frameValue(vx, sx, 'km/s')],
    ['Velocity of the Sun with rotation', frameValue(vy, sy, 'km/s')],
    ['Velocity of the Sun to the north', frameValue(vz, sz, 'km/s')],
    ['Circular speed at the Sun', `${trimmed(frame.lsrSpeedKmS)} km/s`],
  ];
}
