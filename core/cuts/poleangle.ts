/** Below this ratio a difference of doubles is all rounding: 10⁴ times their precision. */
export const ROUNDING = 1e-12;

/**
 * How fast the angle of a vector u from a unit pole changes with u, in radians per unit of u and up to its sign: one
 * gradient as three numbers, returns 1.
 *
 * On the pole and on the antipole the angle has a cone's tip and no gradient. There it writes two, at right angles to
 * each other and to u, of which the sum of the squares is the mean over all directions in which the tip can be left;
 * returns 2. So that one error follows from either: the variances by all gradients add.
 * @param vector u, of any length but 0
 * @param gradients room for six numbers
 */
export function poleAngleGradients(vector: Float64Array, pole: Float64Array, gradients: Float64Array): 1 | 2 {
  const ux = vector[0]!;
  const uy = vector[1]!;
  const uz = vector[2]!;
  const cx = uy * pole[2]! - uz * pole[1]!;
  const cy = uz * pole[0]! - ux * pole[2]!;
  const cz = ux * pole[1]! - uy * pole[0]!;
  const length2 = ux * ux + uy * uy + uz * uz;
  const across2 = cx * cx + cy * cy + cz * cz;
  if (!(across2 > ROUNDING * ROUNDING * length2)) return onPole(vector, gradients);
  // (u × p) × u leads straight to the pole and has the length |u × p||u|; the gradient has the length 1/|u|.
  const scale = 1 / (Math.sqrt(across2) * length2);
  gradients[0] = scale * (cy * uz - cz * uy);
  gradients[1] = scale * (cz * ux - cx * uz);
  gradients[2] = scale * (cx * uy - cy * ux);
  return 1;
}

function onPole(vector: Float64Array, gradients: Float64Array): 2 {
  const [ux, uy, uz] = [vector[0]!, vector[1]!, vector[2]!];
  const length2 = ux * ux + uy * uy + uz * uz;
  // At right angles to u by leaving out the least of x and z.
  const [ax, ay, az] = Math.abs(ux) > Math.abs(uz) ? [uy, -ux, 0] : [0, uz, -uy];
  const first = Math.SQRT1_2 / Math.sqrt(length2 * (ax * ax + ay * ay + az * az));
  const second = first / Math.sqrt(length2);
  gradients.set([first * ax, first * ay, first * az]);
  gradients.set([second * (uy * az - uz * ay), second * (uz * ax - ux * az), second * (ux * ay - uy * ax)], 3);
  return 2;
}
