import { RAD } from '../frame/constants';
import type { Vector } from '../frame/rotation';
import { unitVector } from '../frame/sphere';
import type { Dice } from './dice';

export type Population = 'halo' | 'disc' | 'bulge' | 'stream';

/** One tracer of the invented Galaxy as it truly is: kpc, km/s (Galactocentric, right-handed), dex. */
export interface Tracer {
  readonly population: Population;
  readonly position: Vector;
  readonly velocity: Vector;
  readonly feh: number;
}

/** Pole of the invented stream, Galactic degrees; no real stream has it. */
export const STREAM_POLE = { l: 205, b: 21 } as const;
const CIRCULAR = 225;

/** Draws one tracer of a population. */
export function drawTracer(population: Population, dice: Dice): Tracer {
  return { population, ...DRAW[population](dice) };
}

type Drawn = Omit<Tracer, 'population'>;

const DRAW: Readonly<Record<Population, (dice: Dice) => Drawn>> = {
  halo(d) {
    // ρ ∝ r^−3.4 between 3 and 110 kpc, flattened to 0.8, with σ_r = 1.3 σ_t that falls slowly outwards.
    const r = powerLaw(d.uniform(), 3, 110, 3.4);
    const [x, y, z] = onSphere(d);
    const position: Vector = [r * x, r * y, 0.8 * r * z];
    const sigma = 145 * (r / 10) ** -0.12;
    return {
      position,
      velocity: spherical(position, sigma * d.normal(), (sigma / 1.3) * d.normal(), (sigma / 1.3) * d.normal()),
      feh: -1.6 + 0.33 * d.normal(),
    };
  },
  disc(d) {
    const R = 1.5 - 2.6 * Math.log((1 - d.uniform()) * (1 - d.uniform()));
    const phi = 2 * Math.PI * d.uniform();
    const z = 0.75 * d.normal();
    const out = 55 * d.normal();
    const turn = CIRCULAR - 35 + 40 * d.normal();
    const [c, s] = [Math.cos(phi), Math.sin(phi)];
    // Prograde is clockwise seen from the north, so the right-handed azimuthal velocity is −turn.
    return {
      position: [R * c, R * s, z],
      velocity: [out * c + turn * s, out * s - turn * c, 38 * d.normal()],
      feh: -0.55 + 0.22 * d.normal(),
    };
  },
  bulge(d) {
    const r = 0.4 + 2.6 * d.uniform() ** 1.5;
    const [x, y, z] = onSphere(d);
    const position: Vector = [r * x, r * y, 0.7 * r * z];
    const R = Math.hypot(position[0], position[1]);
    const turn = 70;
    return {
      position,
      velocity: [
        105 * d.normal() + (turn * position[1]) / R,
        105 * d.normal() - (turn * position[0]) / R,
        95 * d.normal(),
      ],
      feh: -0.45 + 0.35 * d.normal(),
    };
  },
  stream(d) {
    const pole = unitVector(STREAM_POLE.l, STREAM_POLE.b);
    const first: Vector = [-Math.sin(STREAM_POLE.l * RAD), Math.cos(STREAM_POLE.l * RAD), 0];
    const second = cross(pole, first);
    const along = 2 * Math.PI * d.uniform();
    const r = 24 + 9 * Math.sin(along) + 2.5 * d.normal();
    const off = 0.045 * d.normal();
    const [c, s] = [Math.cos(along), Math.sin(along)];
    const outward = combine([c, first], [s, second]);
    const forward = combine([-s, first], [c, second]);
    return {
      position: combine([r, outward], [r * off, pole]),
      velocity: combine(
        [70 * Math.cos(along) + 18 * d.normal(), outward],
        [205 * (24 / r) + 12 * d.normal(), forward],
        [11 * d.normal(), pole],
      ),
      feh: -1.3 + 0.25 * d.normal(),
    };
  },
};

function onSphere(d: Dice): Vector {
  const z = 2 * d.uniform() - 1;
  const phi = 2 * Math.PI * d.uniform();
  const R = Math.sqrt(1 - z * z);
  return [R * Math.cos(phi), R * Math.sin(phi), z];
}

/** Radius of a shell density r^−γ between two radii, from a uniform number. */
function powerLaw(u: number, min: number, max: number, gamma: number): number {
  const k = 3 - gamma;
  return (min ** k + u * (max ** k - min ** k)) ** (1 / k);
}

function spherical(position: Vector, vR: number, vTheta: number, vPhi: number): Vector {
  const [x, y, z] = position;
  const R = Math.hypot(x, y);
  const r = Math.hypot(R, z);
  const outward: Vector = [x / r, y / r, z / r];
  const south: Vector = [(z * x) / (r * R), (z * y) / (r * R), -R / r];
  return combine([vR, outward], [vTheta, south], [vPhi, [-y / R, x / R, 0]]);
}

function cross([ax, ay, az]: Vector, [bx, by, bz]: Vector): Vector {
  return [ay * bz - az * by, az * bx - ax * bz, ax * by - ay * bx];
}

function combine(...terms: readonly (readonly [number, Vector])[]): Vector {
  return [0, 1, 2].map((axis) =>
    terms.reduce((sum, [weight, vector]) => sum + weight * vector[axis]!, 0),
  ) as unknown as Vector;
}
