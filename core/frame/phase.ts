import { freshColumn } from '../table/columnpool';
import { KM_S_PER_MAS_YR_KPC } from './constants';
import { type Galactocentric, galactocentric } from './galactocentric';
import { type Sky, skyBasis } from './sky';
import type { SolarFrame } from './solarframes';

/** Observed columns: ICRS directions, kpc, mas/yr (μ_α cos δ), km/s. NaN is missing. */
export interface Observed {
  readonly sky: Sky;
  readonly distance: Float64Array;
  readonly pmRa?: Float64Array | undefined;
  readonly pmDec?: Float64Array | undefined;
  readonly vLos?: Float64Array | undefined;
}

/** Galactocentric Cartesian columns, kpc and km/s; velocities are NaN where one of their three inputs is missing. */
export interface Phase {
  readonly rows: number;
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly z: Float64Array;
  readonly vX: Float64Array;
  readonly vY: Float64Array;
  readonly vZ: Float64Array;
  /** Circular speed at the Sun, km/s. */
  readonly lsrSpeedKmS: number;
}

/** Turns observed columns into Galactocentric ones (see `galactocentric` for axes and definition). */
export function phaseOf(observed: Observed, frame: SolarFrame, make = freshColumn): Phase {
  const { rows } = observed.sky;
  const column = (): Float64Array => make(rows);
  const phase = {
    rows,
    x: column(),
    y: column(),
    z: column(),
    vX: column(),
    vY: column(),
    vZ: column(),
    lsrSpeedKmS: frame.lsrSpeedKmS,
  };
  fill(observed, galactocentric(frame), phase);
  return phase;
}

function fill(observed: Observed, { rotation, offset, sun }: Galactocentric, phase: Phase): void {
  const { sky, distance, pmRa, pmDec, vLos } = observed;
  const { x, y, z, vX, vY, vZ } = phase;
  const moving = pmRa !== undefined && pmDec !== undefined && vLos !== undefined;
  const basis = new Float64Array(9);
  for (let row = 0; row < sky.rows; row++) {
    skyBasis(rotation, sky, row, basis);
    const d = distance[row]!;
    x[row] = d * basis[0]! + offset[0];
    y[row] = d * basis[1]! + offset[1];
    z[row] = d * basis[2]! + offset[2];
    const east = moving ? KM_S_PER_MAS_YR_KPC * d * pmRa[row]! : Number.NaN;
    const north = moving ? KM_S_PER_MAS_YR_KPC * d * pmDec[row]! : Number.NaN;
    const out = moving ? vLos[row]! : Number.NaN;
    vX[row] = out * basis[0]! + east * basis[3]! + north * basis[6]! + sun[0];
    vY[row] = out * basis[1]! + east * basis[4]! + north * basis[7]! + sun[1];
    vZ[row] = out * basis[2]! + east * basis[5]! + north * basis[8]! + sun[2];
  }
}
