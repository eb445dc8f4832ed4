/** A seeded source of random numbers. */
export interface Dice {
  /** Uniform in [0, 1). */
  readonly uniform: () => number;
  /** Normal deviate of mean 0 and variance 1. */
  readonly normal: () => number;
  /** One of the list. */
  readonly pick: <T>(list: readonly T[]) => T;
}

/**
 * xoshiro128** 1.1 (2018, Blackman & Vigna, doi:10.1145/3460772), its state filled by splitmix32; normal deviates by
 * the polar form of Box and Muller.
 */
export function dice(seed: number): Dice {
  const state = Uint32Array.from({ length: 4 }, splitmix(seed));
  const next = (): number => xoshiro(state);
  const uniform = (): number => ((next() >>> 5) * 0x4000000 + (next() >>> 6)) / 2 ** 53;
  let spare: number | undefined;
  return {
    uniform,
    normal() {
      if (spare !== undefined) {
        const kept = spare;
        spare = undefined;
        return kept;
      }
      let [u, v, s] = [0, 0, 0];
      do {
        u = 2 * uniform() - 1;
        v = 2 * uniform() - 1;
        s = u * u + v * v;
      } while (s >= 1 || s === 0);
      const scale = Math.sqrt((-2 * Math.log(s)) / s);
      spare = v * scale;
      return u * scale;
    },
    pick: (list) => list[Math.floor(uniform() * list.length)]!,
  };
}

/** One step of xoshiro128**; exported so that it can be checked against the published algorithm. */
export function xoshiro(state: Uint32Array): number {
  const [s0, s1, s2, s3] = [state[0]!, state[1]!, state[2]!, state[3]!];
  const result = Math.imul(rotateLeft(Math.imul(s1, 5), 7), 9) >>> 0;
  state[2] = s2 ^ s0;
  state[3] = s3 ^ s1;
  state[1] = s1 ^ state[2];
  state[0] = s0 ^ state[3];
  state[2] ^= s1 << 9;
  state[3] = rotateLeft(state[3], 11);
  return result;
}

function rotateLeft(x: number, k: number): number {
  return (x << k) | (x >>> (32 - k));
}

function splitmix(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x9e3779b9) >>> 0;
    let z = state;
    z = Math.imul(z ^ (z >>> 16), 0x21f0aaad);
    z = Math.imul(z ^ (z >>> 15), 0x735a2d97);
    return (z ^ (z >>> 15)) >>> 0;
  };
}
