import { type GalactocentricState, type Gradient, type Kernel, put } from './kernel';
import type { Motions } from './motions';

/** A quantity of the motions with its gradient. */
function kernel(id: keyof Motions, gradient: (state: GalactocentricState) => Gradient): Kernel {
  return { moving: true, values: (state) => state.motions()[id], gradient };
}

function alongCylR(state: GalactocentricState): Gradient {
  const { x, y, vX, vY } = state.phase;
  const [{ cylR }, { vCylR }] = [state.places(), state.motions()];
  return (i, to) => {
    const R = cylR[i]!;
    const cos = x[i]! / R;
    const sin = y[i]! / R;
    const v = vCylR[i]!;
    put(to, (vX[i]! - v * cos) / R, (vY[i]! - v * sin) / R, 0, cos, sin, 0);
  };
}

function alongPhi(state: GalactocentricState): Gradient {
  const { x, y, vX, vY } = state.phase;
  const [{ cylR }, { vPhi }] = [state.places(), state.motions()];
  return (i, to) => {
    const R = cylR[i]!;
    const cos = x[i]! / R;
    const sin = y[i]! / R;
    const v = vPhi[i]!;
    put(to, (-vY[i]! - v * cos) / R, (vX[i]! - v * sin) / R, 0, sin, -cos, 0);
  };
}

function alongR(state: GalactocentricState): Gradient {
  const { x, y, z, vX, vY, vZ } = state.phase;
  const [{ r: radius }, { vR }] = [state.places(), state.motions()];
  return (i, to) => {
    const r = radius[i]!;
    const ux = x[i]! / r;
    const uy = y[i]! / r;
    const uz = z[i]! / r;
    const v = vR[i]!;
    put(to, (vX[i]! - v * ux) / r, (vY[i]! - v * uy) / r, (vZ[i]! - v * uz) / r, ux, uy, uz);
  };
}

function alongTheta(state: GalactocentricState): Gradient {
  const { x, y, z, vX, vY, vZ } = state.phase;
  const [{ cylR, r: radius }, { vCylR, vTheta }] = [state.places(), state.motions()];
  return (i, to) => {
    const R = cylR[i]!;
    const r = radius[i]!;
    const out = vCylR[i]!;
    const cos = x[i]! / R;
    const sin = y[i]! / R;
    const up = vZ[i]!;
    const byX = (z[i]! * (vX[i]! - out * cos)) / R - cos * up;
    const byY = (z[i]! * (vY[i]! - out * sin)) / R - sin * up;
    const perR = vTheta[i]! / r;
    const toX = (byX - perR * x[i]!) / r;
    const toY = (byY - perR * y[i]!) / r;
    const toZ = (out - perR * z[i]!) / r;
    put(to, toX, toY, toZ, (z[i]! * cos) / r, (z[i]! * sin) / r, -R / r);
  };
}

/** v_t² = v² − v_r². */
function tangential(state: GalactocentricState): Gradient {
  const { vX, vY, vZ } = state.phase;
  const { vR, vT } = state.motions();
  const radial = alongR(state);
  return (i, to) => {
    radial(i, to);
    const v = vT[i]!;
    const share = vR[i]! / vT[i]!;
    const toX = -share * to[0]!;
    const toY = -share * to[1]!;
    const toZ = -share * to[2]!;
    put(to, toX, toY, toZ, vX[i]! / v - share * to[3]!, vY[i]! / v - share * to[4]!, vZ[i]! / v - share * to[5]!);
  };
}

function total(state: GalactocentricState): Gradient {
  const { vX, vY, vZ } = state.phase;
  const { speed } = state.motions();
  return (i, to) => put(to, 0, 0, 0, vX[i]! / speed[i]!, vY[i]! / speed[i]!, vZ[i]! / speed[i]!);
}

/** T² = v² − 2 V v_φ + V². */
function toomre(state: GalactocentricState): Gradient {
  const { vX, vY, vZ, lsrSpeedKmS } = state.phase;
  const { toomreSpeed } = state.motions();
  const turning = alongPhi(state);
  return (i, to) => {
    turning(i, to);
    const v = toomreSpeed[i]!;
    const share = lsrSpeedKmS / toomreSpeed[i]!;
    const toX = -share * to[0]!;
    const toY = -share * to[1]!;
    const toZ = -share * to[2]!;
    put(to, toX, toY, toZ, vX[i]! / v - share * to[3]!, vY[i]! / v - share * to[4]!, vZ[i]! / v - share * to[5]!);
  };
}

export const VELOCITY_KERNELS = {
  v_cyl_r: kernel('vCylR', alongCylR),
  v_phi: kernel('vPhi', alongPhi),
  v_r: kernel('vR', alongR),
  v_theta: kernel('vTheta', alongTheta),
  v_t: kernel('vT', tangential),
  speed: kernel('speed', total),
  toomre_speed: kernel('toomreSpeed', toomre),
} as const satisfies Record<string, Kernel>;
