import { galacticFromIcrs } from '../frame/galactic';
import { type Observables, observe } from '../frame/observables';
import { solarFrame } from '../frame/solarframes';
import type { Dice } from './dice';
import { foregroundExcess } from './dust';
import type { Tracer } from './galaxy';

/** The frame in which the invented Galaxy was made; a recipe that uses it recovers the truth. */
export const MOCK_FRAME = 'G18';

/** A tracer with what a perfect observer at the Sun would see of it. */
export interface Seen {
  readonly tracer: Tracer;
  readonly truth: Observables;
  readonly l: number;
  readonly b: number;
  readonly modulus: number;
  readonly ebv: number;
}

/** Places a tracer on the sky. */
export function seen(tracer: Tracer): Seen {
  const truth = observe(tracer.position, tracer.velocity, solarFrame(MOCK_FRAME)!);
  const [l, b] = galacticFromIcrs(truth.ra, truth.dec);
  return {
    tracer,
    truth,
    l,
    b,
    modulus: 5 * Math.log10(truth.distance) + 10,
    ebv: foregroundExcess(l, b, truth.distance),
  };
}

/** 1σ errors of a survey. */
export interface Errors {
  readonly modulus: number;
  readonly pm: number;
  readonly pmCorrelation: number;
  readonly vLos: number;
  readonly feh: number;
  readonly ebv: number;
}

/** What a survey measured. */
export interface Measurement {
  readonly modulus: number;
  readonly pmRa: number;
  readonly pmDec: number;
  readonly vLos: number;
  readonly feh: number;
  readonly ebv: number;
}

/** One noisy measurement; errors are Gaussian in what was measured, the proper motions correlated. */
export function measure(object: Seen, errors: Errors, dice: Dice): Measurement {
  const [a, b] = [dice.normal(), dice.normal()];
  const rho = errors.pmCorrelation;
  return {
    modulus: object.modulus + errors.modulus * dice.normal(),
    pmRa: object.truth.pmRa + errors.pm * a,
    pmDec: object.truth.pmDec + errors.pm * (rho * a + Math.sqrt(1 - rho * rho) * b),
    vLos: object.truth.vLos + errors.vLos * dice.normal(),
    feh: object.tracer.feh + errors.feh * dice.normal(),
    ebv: Math.max(0, object.ebv * (1 + 0.05 * dice.normal()) + errors.ebv * dice.normal()),
  };
}
