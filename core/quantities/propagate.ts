import { TRIANGLE } from '../frame/covariance';
import type { Phase } from '../frame/phase';
import type { Kernel } from './kernel';

/** Values of a quantity, one per row. */
export function valuesOf(kernel: Kernel, phase: Phase): Float64Array {
  const there = kernel.column?.(phase);
  if (there) return there;
  const values = new Float64Array(phase.rows);
  for (let row = 0; row < phase.rows; row++) values[row] = kernel.value(phase, row);
  return values;
}

/** Linear 1σ errors √(gᵀ C g) from the packed covariance; NaN where an input error that matters is missing. */
export function sigmasOf(kernel: Kernel, phase: Phase, covariance: Float64Array): Float64Array {
  const sigmas = new Float64Array(phase.rows);
  const g = new Float64Array(6);
  // A quantity of the position alone must not see velocity errors, which may be missing.
  const size = kernel.moving ? 6 : 3;
  for (let row = 0; row < phase.rows; row++) {
    kernel.gradient(phase, row, g);
    const at = TRIANGLE * row;
    let sum = 0;
    for (let i = 0; i < size; i++) {
      // Row i of the packed triangle starts at i(13 − i)/2 with its diagonal.
      const start = at + (i * (13 - i)) / 2 - i;
      const gi = g[i]!;
      sum += gi * gi * covariance[start + i]!;
      for (let j = i + 1; j < size; j++) sum += 2 * gi * g[j]! * covariance[start + j]!;
    }
    sigmas[row] = Math.sqrt(sum < 0 ? 0 : sum);
  }
  return sigmas;
}
