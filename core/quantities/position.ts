import { type Gradient, type Kernel, put } from './kernel';

/** A Cartesian component of the state, already there. */
function component(id: 'x' | 'y' | 'z' | 'vX' | 'vY' | 'vZ', axis: number): Kernel {
  const gradient: Gradient = (_, to) => {
    to.fill(0);
    to[axis] = 1;
  };
  return { moving: axis > 2, values: ({ phase }) => phase[id], gradient: () => gradient };
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
    values: (state) => state.places().cylR,
    gradient(state) {
      const { x, y } = state.phase;
      const { cylR } = state.places();
      return (i, to) => put(to, x[i]! / cylR[i]!, y[i]! / cylR[i]!, 0, 0, 0, 0);
    },
  },
  r: {
    moving: false,
    values: (state) => state.places().r,
    gradient(state) {
      const { x, y, z } = state.phase;
      const { r } = state.places();
      return (i, to) => put(to, x[i]! / r[i]!, y[i]! / r[i]!, z[i]! / r[i]!, 0, 0, 0);
    },
  },
} as const satisfies Record<string, Kernel>;
