// The reference is the engine's own Math, an independent implementation with errors below one unit in the last place.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { atan2Deg, sinCosDeg, turnPositive } from '../../../core/frame/trigonometry';

const RAD = Math.PI / 180;

function sinCos(angles: readonly number[]): [Float64Array, Float64Array] {
  const [sin, cos] = [new Float64Array(angles.length), new Float64Array(angles.length)];
  sinCosDeg(Float64Array.from(angles), sin, cos);
  return [sin, cos];
}

function atan2(y: number, x: number): number {
  const to = new Float64Array(1);
  atan2Deg(Float64Array.of(y), Float64Array.of(x), to);
  return to[0]!;
}

describe('sinCosDeg', () => {
  test('agrees with Math to the rounding of the angle in radians', () => {
    fc.assert(
      fc.property(fc.double({ min: -720, max: 720, noNaN: true }), (angle) => {
        const [sin, cos] = sinCos([angle]);
        // Half a unit in the last place of 720° in radians is 9e-16.
        expect(Math.abs(sin[0]! - Math.sin(angle * RAD))).toBeLessThan(1.5e-15);
        expect(Math.abs(cos[0]! - Math.cos(angle * RAD))).toBeLessThan(1.5e-15);
      }),
      { numRuns: 2000 },
    );
  });

  test('is exact at quarter turns', () => {
    const [sin, cos] = sinCos([0, 90, 180, 270, 360, -90, 720]);
    expect([...sin].map((value) => value + 0)).toEqual([0, 1, 0, -1, 0, -1, 0]);
    expect([...cos].map((value) => value + 0)).toEqual([1, 0, -1, 0, 1, 0, 1]);
  });

  test('lets NaN spread', () => {
    const [sin, cos] = sinCos([Number.NaN, 30]);
    expect([sin[0], cos[0]]).toEqual([Number.NaN, Number.NaN]);
    expect(sin[1]).toBeCloseTo(0.5, 15);
  });
});

describe('atan2Deg', () => {
  test('agrees with Math', () => {
    const part = fc.double({ min: -1e6, max: 1e6, noNaN: true });
    fc.assert(
      fc.property(part, part, (y, x) => {
        fc.pre(Math.max(Math.abs(x), Math.abs(y)) > 1e-290);
        // Two units in the last place of 180; adding 0 turns −0, which Math takes for −180°, into 0.
        expect(Math.abs(atan2(y, x) - Math.atan2(y + 0, x) / RAD)).toBeLessThanOrEqual(6e-14);
      }),
      { numRuns: 5000 },
    );
  });

  test('keeps the relative precision of small angles', () => {
    for (const y of [1e-3, 1e-9, -1e-300]) {
      expect(atan2(y, 1) / (Math.atan2(y, 1) / RAD)).toBeCloseTo(1, 14);
    }
  });

  test('is exact on the axes and diagonals, and has no angle for the zero vector', () => {
    const axes = [
      [0, 1, 0],
      [1, 1, 45],
      [1, 0, 90],
      [1, -1, 135],
      [0, -1, 180],
      [-1, -1, -135],
      [-1, 0, -90],
      [-1, 1, -45],
    ] as const;
    for (const [y, x, angle] of axes) expect(atan2(y, x)).toBeCloseTo(angle, 13);
    expect(atan2(0, 0)).toBeNaN();
    expect(atan2(Number.NaN, 1)).toBeNaN();
  });
});

test('turnPositive wraps into [0, 360), tiny negative angles too', () => {
  const angles = Float64Array.of(-180, -1e-300, -1, 0, 179, Number.NaN);
  turnPositive(angles);
  expect([...angles]).toEqual([180, 0, 359, 0, 179, Number.NaN]);
});
