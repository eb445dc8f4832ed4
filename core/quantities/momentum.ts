import { RAD } from '../frame/constants';
import type { Phase } from '../frame/phase';
import { type GalactocentricState, type Gradient, type Kernel, put } from './kernel';
import { poleLatitudes, poleLongitudes } from './momenta';

/** Writes the gradient of a·(r × v) for a vector a that is taken as fixed. */
function along(p: Phase, i: number, to: Float64Array, ax: number, ay: number, az: number): void {
  const x = p.x[i]!;
  const y = p.y[i]!;
  const z = p.z[i]!;
  const vX = p.vX[i]!;
  const vY = p.vY[i]!;
  const vZ = p.vZ[i]!;
  put(to, vY * az - vZ * ay, vZ * ax - vX * az, vX * ay - vY * ax, ay * z - az * y, az * x - ax * z, ax * y - ay * x);
}

function fixed(ax: number, ay: number, az: number): (state: GalactocentricState) => Gradient {
  return ({ phase }) =>
    (i, to) =>
      along(phase, i, to, ax, ay, az);
}

export const MOMENTUM_KERNELS = {
  l_x: { moving: true, values: (state) => state.momenta().x, gradient: fixed(1, 0, 0) },
  l_y: { moving: true, values: (state) => state.momenta().y, gradient: fixed(0, 1, 0) },
  l_z: { moving: true, values: (state) => state.momenta().prograde, gradient: fixed(0, 0, -1) },
  l_tot: {
    moving: true,
    values: (state) => state.momenta().total,
    gradient(state) {
      const { x, y, prograde, total } = state.momenta();
      return (i, to) => along(state.phase, i, to, x[i]! / total[i]!, y[i]! / total[i]!, -prograde[i]! / total[i]!);
    },
  },
  pole_l: {
    moving: true,
    values: (state) => poleLongitudes(state.momenta(), state.make),
    gradient(state) {
      const { x, y } = state.momenta();
      return (i, to) => {
        const level = (x[i]! * x[i]! + y[i]! * y[i]!) * RAD;
        along(state.phase, i, to, -y[i]! / level, x[i]! / level, 0);
      };
    },
  },
  pole_b: {
    moving: true,
    values: (state) => poleLatitudes(state.momenta(), state.make),
    gradient(state) {
      const { x, y, prograde, total } = state.momenta();
      return (i, to) => {
        const level = Math.sqrt(x[i]! * x[i]! + y[i]! * y[i]!);
        const square = total[i]! * total[i]! * RAD;
        const tilt = prograde[i]! / level / square;
        along(state.phase, i, to, tilt * x[i]!, tilt * y[i]!, level / square);
      };
    },
  },
} as const satisfies Record<string, Kernel>;
