import type { Phase } from '../frame/phase';
import { type Kernel, put } from './kernel';
import { cylRadius, radius } from './position';

function vCylR(p: Phase, i: number): number {
  return (p.x[i]! * p.vX[i]! + p.y[i]! * p.vY[i]!) / cylRadius(p, i);
}

function vPhi(p: Phase, i: number): number {
  return (p.y[i]! * p.vX[i]! - p.x[i]! * p.vY[i]!) / cylRadius(p, i);
}

function vRadial(p: Phase, i: number): number {
  return (p.x[i]! * p.vX[i]! + p.y[i]! * p.vY[i]! + p.z[i]! * p.vZ[i]!) / radius(p, i);
}

function vTheta(p: Phase, i: number): number {
  return (p.z[i]! * vCylR(p, i) - cylRadius(p, i) * p.vZ[i]!) / radius(p, i);
}

function vTangential(p: Phase, i: number): number {
  const theta = vTheta(p, i);
  const phi = vPhi(p, i);
  return Math.sqrt(theta * theta + phi * phi);
}

function speed(p: Phase, i: number): number {
  return Math.sqrt(p.vX[i]! * p.vX[i]! + p.vY[i]! * p.vY[i]! + p.vZ[i]! * p.vZ[i]!);
}

function toomreSpeed(p: Phase, i: number): number {
  const out = vCylR(p, i);
  const turn = vPhi(p, i) - p.lsrSpeedKmS;
  const up = p.vZ[i]!;
  return Math.sqrt(out * out + turn * turn + up * up);
}

const vCylRKernel: Kernel = {
  moving: true,
  value: vCylR,
  gradient(p, i, to) {
    const R = cylRadius(p, i);
    const [cos, sin, v] = [p.x[i]! / R, p.y[i]! / R, vCylR(p, i)];
    put(to, (p.vX[i]! - v * cos) / R, (p.vY[i]! - v * sin) / R, 0, cos, sin, 0);
  },
};

const vPhiKernel: Kernel = {
  moving: true,
  value: vPhi,
  gradient(p, i, to) {
    const R = cylRadius(p, i);
    const [cos, sin, v] = [p.x[i]! / R, p.y[i]! / R, vPhi(p, i)];
    put(to, (-p.vY[i]! - v * cos) / R, (p.vX[i]! - v * sin) / R, 0, sin, -cos, 0);
  },
};

const vRadialKernel: Kernel = {
  moving: true,
  value: vRadial,
  gradient(p, i, to) {
    const r = radius(p, i);
    const [ux, uy, uz, v] = [p.x[i]! / r, p.y[i]! / r, p.z[i]! / r, vRadial(p, i)];
    put(to, (p.vX[i]! - v * ux) / r, (p.vY[i]! - v * uy) / r, (p.vZ[i]! - v * uz) / r, ux, uy, uz);
  },
};

const vThetaKernel: Kernel = {
  moving: true,
  value: vTheta,
  gradient(p, i, to) {
    const [R, r, out, v] = [cylRadius(p, i), radius(p, i), vCylR(p, i), vTheta(p, i)];
    const [cos, sin, z, up] = [p.x[i]! / R, p.y[i]! / R, p.z[i]!, p.vZ[i]!];
    const byX = (z * (p.vX[i]! - out * cos)) / R - cos * up;
    const byY = (z * (p.vY[i]! - out * sin)) / R - sin * up;
    const perR = v / r;
    put(
      to,
      (byX - perR * p.x[i]!) / r,
      (byY - perR * p.y[i]!) / r,
      (out - perR * z) / r,
      (z * cos) / r,
      (z * sin) / r,
      -R / r,
    );
  },
};

const vTangentialKernel: Kernel = {
  moving: true,
  value: vTangential,
  gradient(p, i, to) {
    // v_t² = v² − v_r².
    vRadialKernel.gradient(p, i, to);
    const [radial, v] = [vRadial(p, i), vTangential(p, i)];
    for (let axis = 0; axis < 6; axis++) to[axis] = (-radial * to[axis]!) / v;
    to[3]! += p.vX[i]! / v;
    to[4]! += p.vY[i]! / v;
    to[5]! += p.vZ[i]! / v;
  },
};

const speedKernel: Kernel = {
  moving: true,
  value: speed,
  gradient(p, i, to) {
    const v = speed(p, i);
    put(to, 0, 0, 0, p.vX[i]! / v, p.vY[i]! / v, p.vZ[i]! / v);
  },
};

const toomreKernel: Kernel = {
  moving: true,
  value: toomreSpeed,
  gradient(p, i, to) {
    // T² = v² − 2 V v_φ + V².
    vPhiKernel.gradient(p, i, to);
    const v = toomreSpeed(p, i);
    for (let axis = 0; axis < 6; axis++) to[axis] = (-p.lsrSpeedKmS * to[axis]!) / v;
    to[3]! += p.vX[i]! / v;
    to[4]! += p.vY[i]! / v;
    to[5]! += p.vZ[i]! / v;
  },
};

export const VELOCITY_KERNELS = {
  v_cyl_r: vCylRKernel,
  v_phi: vPhiKernel,
  v_r: vRadialKernel,
  v_theta: vThetaKernel,
  v_t: vTangentialKernel,
  speed: speedKernel,
  toomre_speed: toomreKernel,
} as const satisfies Record<string, Kernel>;
