import { RAD } from '../frame/constants';
import type { Phase } from '../frame/phase';
import { wrapDeg } from '../frame/sphere';
import { type Kernel, put } from './kernel';

// L = r × v, right-handed: negative along z for the disc. `l_z` is published with its sign turned, the pole is not.
function lX(p: Phase, i: number): number {
  return p.y[i]! * p.vZ[i]! - p.z[i]! * p.vY[i]!;
}

function lY(p: Phase, i: number): number {
  return p.z[i]! * p.vX[i]! - p.x[i]! * p.vZ[i]!;
}

function lUp(p: Phase, i: number): number {
  return p.x[i]! * p.vY[i]! - p.y[i]! * p.vX[i]!;
}

function lTotal(p: Phase, i: number): number {
  const x = lX(p, i);
  const y = lY(p, i);
  const z = lUp(p, i);
  return Math.sqrt(x * x + y * y + z * z);
}

/** Gradient of a·L for a fixed vector a, given as components. */
function along(p: Phase, i: number, to: Float64Array, ax: number, ay: number, az: number): void {
  const [x, y, z, vX, vY, vZ] = [p.x[i]!, p.y[i]!, p.z[i]!, p.vX[i]!, p.vY[i]!, p.vZ[i]!];
  put(to, vY * az - vZ * ay, vZ * ax - vX * az, vX * ay - vY * ax, ay * z - az * y, az * x - ax * z, ax * y - ay * x);
}

export const MOMENTUM_KERNELS = {
  l_x: { moving: true, value: lX, gradient: (p, i, to) => along(p, i, to, 1, 0, 0) },
  l_y: { moving: true, value: lY, gradient: (p, i, to) => along(p, i, to, 0, 1, 0) },
  l_z: { moving: true, value: (p, i) => -lUp(p, i), gradient: (p, i, to) => along(p, i, to, 0, 0, -1) },
  l_tot: {
    moving: true,
    value: lTotal,
    gradient(p, i, to) {
      const l = lTotal(p, i);
      along(p, i, to, lX(p, i) / l, lY(p, i) / l, lUp(p, i) / l);
    },
  },
  pole_l: {
    moving: true,
    value: (p, i) => wrapDeg(Math.atan2(lY(p, i), lX(p, i)) / RAD),
    gradient(p, i, to) {
      const [x, y] = [lX(p, i), lY(p, i)];
      const level = (x * x + y * y) * RAD;
      along(p, i, to, -y / level, x / level, 0);
    },
  },
  pole_b: {
    moving: true,
    value: (p, i) => Math.atan2(lUp(p, i), Math.sqrt(lX(p, i) * lX(p, i) + lY(p, i) * lY(p, i))) / RAD,
    gradient(p, i, to) {
      const [x, y, z] = [lX(p, i), lY(p, i), lUp(p, i)];
      const level = Math.sqrt(x * x + y * y);
      const square = (level * level + z * z) * RAD;
      along(p, i, to, (-z * x) / level / square, (-z * y) / level / square, level / square);
    },
  },
} as const satisfies Record<string, Kernel>;
