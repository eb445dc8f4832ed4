import type { Phase } from '../frame/phase';
import { type Kernel, put } from './kernel';

/** Cylindrical radius. */
export function cylRadius(p: Phase, i: number): number {
  return Math.sqrt(p.x[i]! * p.x[i]! + p.y[i]! * p.y[i]!);
}

/** Spherical radius. */
export function radius(p: Phase, i: number): number {
  return Math.sqrt(p.x[i]! * p.x[i]! + p.y[i]! * p.y[i]! + p.z[i]! * p.z[i]!);
}

function component(id: 'x' | 'y' | 'z' | 'vX' | 'vY' | 'vZ', axis: number): Kernel {
  return {
    moving: axis > 2,
    value: (p, i) => p[id][i]!,
    column: (p) => p[id],
    gradient(_, __, to) {
      to.fill(0);
      to[axis] = 1;
    },
  };
}

export const POSITION_KERNELS = {
  x: component('x', 0),
  y: component('y', 1),
  z: component('z', 2),
  v_x: component('vX', 3),
  v_y: component('vY', 4),
  v_z: component('vZ', 5),
  cyl_r: {
    moving: false,
    value: cylRadius,
    gradient(p, i, to) {
      const R = cylRadius(p, i);
      put(to, p.x[i]! / R, p.y[i]! / R, 0, 0, 0, 0);
    },
  },
  r: {
    moving: false,
    value: radius,
    gradient(p, i, to) {
      const r = radius(p, i);
      put(to, p.x[i]! / r, p.y[i]! / r, p.z[i]! / r, 0, 0, 0);
    },
  },
} as const satisfies Record<string, Kernel>;
