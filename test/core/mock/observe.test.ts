import { expect, test } from 'vitest';
import { observe } from '../../../core/frame/observables';
import { phaseOf } from '../../../core/frame/phase';
import { skyOf } from '../../../core/frame/sky';
import { SOLAR_FRAMES } from '../../../core/frame/solarframes';
import { dice } from '../../../core/mock/dice';
import { drawTracer, type Population } from '../../../core/mock/galaxy';
import { measure, seen } from '../../../core/mock/observe';

const POPULATIONS: readonly Population[] = ['halo', 'disc', 'bulge', 'stream'];

test('what is observed goes back to the same place and motion in every solar frame', () => {
  const d = dice(11);
  for (const frame of SOLAR_FRAMES) {
    for (let at = 0; at < 200; at++) {
      const { position, velocity } = drawTracer(POPULATIONS[at % 4]!, d);
      const seenThere = observe(position, velocity, frame);
      const one = (value: number): Float64Array => Float64Array.of(value);
      const back = phaseOf(
        {
          sky: skyOf(one(seenThere.ra), one(seenThere.dec)),
          distance: one(seenThere.distance),
          pmRa: one(seenThere.pmRa),
          pmDec: one(seenThere.pmDec),
          vLos: one(seenThere.vLos),
        },
        frame,
      );
      const place = Math.hypot(back.x[0]! - position[0], back.y[0]! - position[1], back.z[0]! - position[2]);
      const motion = Math.hypot(back.vX[0]! - velocity[0], back.vY[0]! - velocity[1], back.vZ[0]! - velocity[2]);
      // Relative to the size of what was turned: angles in degrees keep about 1e-14 of it.
      expect(place / Math.max(8, seenThere.distance)).toBeLessThan(1e-12);
      expect(motion / 300).toBeLessThan(1e-9);
    }
  }
});

test('errors of a measurement have the stated size, and proper motions the stated correlation', () => {
  const d = dice(12);
  const object = seen(drawTracer('halo', d));
  const errors = { modulus: 0.1, pm: 0.05, pmCorrelation: 0.6, vLos: 3, feh: 0.2, ebv: 0.02 };
  const count = 20_000;
  const off = Array.from({ length: count }, () => {
    const found = measure(object, errors, d);
    return {
      modulus: (found.modulus - object.modulus) / errors.modulus,
      ra: (found.pmRa - object.truth.pmRa) / errors.pm,
      dec: (found.pmDec - object.truth.pmDec) / errors.pm,
      vLos: (found.vLos - object.truth.vLos) / errors.vLos,
      feh: (found.feh - object.tracer.feh) / errors.feh,
    };
  });
  const mean = (of: (value: (typeof off)[number]) => number): number =>
    off.reduce((sum, one) => sum + of(one), 0) / count;
  // Four standard errors of a variance, √(2/N), and of a correlation of 0.6, (1 − ρ²)/√N.
  for (const key of ['modulus', 'ra', 'dec', 'vLos', 'feh'] as const) {
    expect(Math.abs(mean((one) => one[key] ** 2) - 1)).toBeLessThan(4 * Math.sqrt(2 / count));
  }
  expect(Math.abs(mean((one) => one.ra * one.dec) - 0.6)).toBeLessThan((4 * (1 + 0.6 ** 2)) / Math.sqrt(count));
});
