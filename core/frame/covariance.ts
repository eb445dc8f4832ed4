import { freshColumn } from '../table/columnpool';
import { KM_S_PER_MAS_YR_KPC, RAD } from './constants';
import { galactocentric } from './galactocentric';
import type { Observed } from './phase';
import { skyBasis } from './sky';
import type { SolarFrame } from './solarframes';

/** 1σ errors of observed columns in the units of the columns; right ascension as an angle on the sky (times cos δ). */
export interface ObservedErrors {
  readonly ra?: Float64Array | undefined;
  readonly dec?: Float64Array | undefined;
  readonly distance: Float64Array;
  readonly pmRa?: Float64Array | undefined;
  readonly pmDec?: Float64Array | undefined;
  /** Correlation of the proper-motion components, −1…1; NaN counts as 0. */
  readonly pmCorrelation?: Float64Array | undefined;
  readonly vLos?: Float64Array | undefined;
}

/** Numbers per row of a packed upper triangle of a 6 × 6 matrix. */
export const TRIANGLE = 21;

/**
 * Linear propagation C = J Σ Jᵀ of observed errors to (x, y, z, v_x, v_y, v_z), kpc and km/s: the packed upper
 * triangle (row-major, 21 numbers) of every row.
 *
 * A missing position error counts as 0. A missing distance error makes everything NaN that depends on the distance; a
 * missing velocity error leaves the position block as it is. The frame is taken as exact.
 */
export function phaseCovariance(
  observed: Observed,
  errors: ObservedErrors,
  frame: SolarFrame,
  make = freshColumn,
): Float64Array {
  const { rotation } = galactocentric(frame);
  const { sky } = observed;
  const packed = make(TRIANGLE * sky.rows);
  const basis = new Float64Array(9);
  const jacobian = new Float64Array(36);
  const scaled = new Float64Array(36);
  for (let row = 0; row < sky.rows; row++) {
    skyBasis(rotation, sky, row, basis);
    fillJacobian(observed, row, basis, jacobian);
    scaleColumns(errors, row, jacobian, scaled);
    const rho = errors.pmCorrelation?.[row] ?? 0;
    pack(scaled, Number.isNaN(rho) ? 0 : rho, packed, TRIANGLE * row);
  }
  return packed;
}

/** d(x, y, z, v)/d(α*, δ, d, μ_α*, μ_δ, v_los), row-major, angles in radians. */
function fillJacobian(observed: Observed, row: number, basis: Float64Array, jacobian: Float64Array): void {
  const d = observed.distance[row]!;
  const kd = KM_S_PER_MAS_YR_KPC * d;
  const muA = observed.pmRa?.[row] ?? Number.NaN;
  const muD = observed.pmDec?.[row] ?? Number.NaN;
  const v = observed.vLos?.[row] ?? Number.NaN;
  const tan = observed.sky.sinDec[row]! / observed.sky.cosDec[row]!;
  for (let axis = 0; axis < 3; axis++) {
    const out = basis[axis]!;
    const east = basis[3 + axis]!;
    const north = basis[6 + axis]!;
    const at = 6 * axis;
    jacobian[at] = d * east;
    jacobian[at + 1] = d * north;
    jacobian[at + 2] = out;
    jacobian[at + 3] = 0;
    jacobian[at + 4] = 0;
    jacobian[at + 5] = 0;
    const to = 18 + at;
    jacobian[to] = v * east + kd * (muA * (tan * north - out) - muD * tan * east);
    jacobian[to + 1] = v * north - kd * muD * out;
    jacobian[to + 2] = KM_S_PER_MAS_YR_KPC * (muA * east + muD * north);
    jacobian[to + 3] = kd * east;
    jacobian[to + 4] = kd * north;
    jacobian[to + 5] = out;
  }
}

function scaleColumns(errors: ObservedErrors, row: number, jacobian: Float64Array, scaled: Float64Array): void {
  const sky = (sigma: number | undefined): number => (sigma === undefined || Number.isNaN(sigma) ? 0 : sigma * RAD);
  const ra = sky(errors.ra?.[row]);
  const dec = sky(errors.dec?.[row]);
  const distance = errors.distance[row]!;
  const pmRa = errors.pmRa?.[row] ?? Number.NaN;
  const pmDec = errors.pmDec?.[row] ?? Number.NaN;
  const vLos = errors.vLos?.[row] ?? Number.NaN;
  for (let at = 0; at < 36; at += 6) {
    scaled[at] = ra === 0 ? 0 : jacobian[at]! * ra;
    scaled[at + 1] = dec === 0 ? 0 : jacobian[at + 1]! * dec;
    scaled[at + 2] = jacobian[at + 2]! * distance;
    scaled[at + 3] = at < 18 ? 0 : jacobian[at + 3]! * pmRa;
    scaled[at + 4] = at < 18 ? 0 : jacobian[at + 4]! * pmDec;
    scaled[at + 5] = at < 18 ? 0 : jacobian[at + 5]! * vLos;
  }
}

function pack(scaled: Float64Array, rho: number, packed: Float64Array, offset: number): void {
  let to = offset;
  for (let i = 0; i < 36; i += 6) {
    for (let j = i; j < 36; j += 6, to++) {
      let sum = scaled[i]! * scaled[j]! + scaled[i + 1]! * scaled[j + 1]! + scaled[i + 2]! * scaled[j + 2]!;
      // A position does not hang on velocity errors: skip them, they may be NaN.
      if (i >= 18) {
        sum += scaled[i + 3]! * scaled[j + 3]! + scaled[i + 4]! * scaled[j + 4]! + scaled[i + 5]! * scaled[j + 5]!;
        sum += rho * (scaled[i + 3]! * scaled[j + 4]! + scaled[i + 4]! * scaled[j + 3]!);
      }
      packed[to] = sum;
    }
  }
}
