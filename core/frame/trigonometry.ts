import { RAD } from './constants';

/**
 * Sines and cosines of angles, degrees in, written to `sin` and `cos`; NaN spreads.
 *
 * Degrees are folded to ±45° first, which loses nothing, so that sin 180° is 0; the Taylor series end at x¹⁵ and x¹⁶ and
 * leave out less than 5e-17. No branch and no call in the loop, and terms in pairs, so that the processor need not wait
 * for one before the next.
 */
export function sinCosDeg(angles: Float64Array, sin: Float64Array, cos: Float64Array): void {
  for (let i = 0; i < angles.length; i++) {
    const angle = angles[i]!;
    const quarters = Math.floor(angle * (1 / 90) + 0.5);
    const x = (angle - 90 * quarters) * RAD;
    const q = x * x;
    const q2 = q * q;
    const s =
      x -
      x *
        q *
        (1 / 6 -
          q * (1 / 120) +
          q2 * (1 / 5040 - q * (1 / 362880) + q2 * (1 / 39916800 - q * (1 / 6227020800) + q2 * (1 / 1307674368000))));
    const c =
      1 -
      q *
        (1 / 2 -
          q * (1 / 24) +
          q2 *
            (1 / 720 -
              q * (1 / 40320) +
              q2 * (1 / 3628800 - q * (1 / 479001600) + q2 * (1 / 87178291200 - q * (1 / 20922789888000)))));
    // An odd number of quarter turns swaps sine and cosine.
    const odd = quarters & 1;
    const even = 1 - odd;
    sin[i] = (1 - (quarters & 2)) * (even * s + odd * c);
    cos[i] = (1 - ((quarters + 1) & 2)) * (even * c + odd * s);
  }
}

/**
 * Angles of the vectors (x, y) from the x axis in degrees, (−180, 180], written to `to`, which may be one of the others;
 * NaN for the zero vector, which has none. Exact to two units in the last place of 180 for vectors longer than 1e-290.
 *
 * A vector is turned by 0°, 22.5° or 45° to lie within 11.25° of an axis; the arctangent's Taylor series then ends at q²¹
 * and leaves out less than 2e-17. Comparisons become numbers, not branches that no processor could foresee,
 * and nothing is taken apart from an array, which would be made anew for every row.
 */
export function atan2Deg(y: Float64Array, x: Float64Array, to: Float64Array): void {
  for (let i = 0; i < to.length; i++) {
    const up = y[i]!;
    const right = x[i]!;
    const across = Math.abs(up);
    const along = Math.abs(right);
    const steep = +(across > along);
    const level = 1 - steep;
    const least = steep * along + level * across;
    const most = steep * across + level * along;
    // The tangents of 11.25° and 33.75°, and of 22.5° (√2 − 1).
    const first = +(least > 0.198912367379658 * most);
    const second = +(least > 0.6681786379192989 * most);
    const tan = first * (Math.SQRT2 - 1) + second * (2 - Math.SQRT2);
    const q = (least - tan * most) / (most + tan * least);
    const u = q * q;
    const u2 = u * u;
    const series =
      q -
      q *
        u *
        (1 / 3 -
          u * (1 / 5) +
          u2 *
            (1 / 7 -
              u * (1 / 9) +
              u2 * (1 / 11 - u * (1 / 13) + u2 * (1 / 15 - u * (1 / 17) + u2 * (1 / 19 - u * (1 / 21))))));
    const acute = (first + second) * 22.5 + series * (180 / Math.PI);
    const quarter = acute + steep * (90 - 2 * acute);
    const half = quarter + +(right < 0) * (180 - 2 * quarter);
    to[i] = half * (1 - 2 * +(up < 0));
  }
}

/** Turns angles in (−180, 180] into [0, 360), in place. */
export function turnPositive(angles: Float64Array): void {
  for (let i = 0; i < angles.length; i++) {
    const turned = angles[i]! + 360 * +(angles[i]! < 0);
    // A tiny negative angle rounds to 360.
    angles[i] = turned - 360 * +(turned >= 360);
  }
}
