import { expect, test } from 'vitest';
import { separationDeg } from '../../../core/frame/sphere';
import { dice } from '../../../core/mock/dice';
import { drawTracer, type Population, STREAM_POLE, type Tracer } from '../../../core/mock/galaxy';
import { PLANE_PRESETS } from '../../../core/cuts/planepresets';

const draw = (population: Population, count: number, seed: number): Tracer[] => {
  const d = dice(seed);
  return Array.from({ length: count }, () => drawTracer(population, d));
};
const mean = (values: readonly number[]): number => values.reduce((sum, value) => sum + value, 0) / values.length;
/** Rotation speed, positive with the Galaxy, which turns clockwise seen from the north. */
const prograde = ({ position: [x, y], velocity: [vx, vy] }: Tracer): number => (y * vx - x * vy) / Math.hypot(x, y);

test('the halo falls off as the stated power law, flattened, metal-poor, and does not turn', () => {
  const halo = draw('halo', 20_000, 1);
  const m = halo.map(({ position: [x, y, z] }) => Math.hypot(x, y, z / 0.8));
  // Slope of a truncated power law by maximum likelihood (bisection of the mean logarithm); it scatters by about 0.01.
  const logs = mean(m.map((r) => Math.log(r / 3)));
  const expected = (k: number): number => {
    const span = Math.log(110 / 3);
    return span / (1 - Math.exp(-k * span)) - 1 / k;
  };
  let [low, high] = [-3, -0.01];
  for (let step = 0; step < 60; step++) {
    const middle = (low + high) / 2;
    if (expected(middle) > logs) high = middle;
    else low = middle;
  }
  expect(3 - low).toBeCloseTo(3.4, 1);
  expect(Math.min(...m)).toBeGreaterThanOrEqual(3);
  expect(Math.max(...m)).toBeLessThanOrEqual(110);
  // Four standard errors: 110 km/s and 0.33 dex over √20,000.
  expect(Math.abs(mean(halo.map(prograde)))).toBeLessThan((4 * 120) / Math.sqrt(20_000));
  expect(mean(halo.map(({ feh }) => feh))).toBeCloseTo(-1.6, 1);
});

test('the halo is mildly radially anisotropic', () => {
  const halo = draw('halo', 20_000, 2);
  const radial = halo.map(({ position: p, velocity: v }) => {
    const r = Math.hypot(...p);
    const out = (p[0] * v[0] + p[1] * v[1] + p[2] * v[2]) / r;
    const square = v[0] ** 2 + v[1] ** 2 + v[2] ** 2;
    return [out ** 2, (square - out ** 2) / 2] as const;
  });
  const beta = 1 - mean(radial.map(([, t]) => t)) / mean(radial.map(([out]) => out));
  // 1 − 1/1.3² = 0.408, with a scatter of about √(2/N + 1/N)(1 − β) = 0.007.
  expect(beta).toBeGreaterThan(0.37);
  expect(beta).toBeLessThan(0.45);
});

test('the disc is thin, turns with the Galaxy and is metal-rich', () => {
  const disc = draw('disc', 5000, 3);
  expect(Math.sqrt(mean(disc.map(({ position }) => position[2] ** 2)))).toBeCloseTo(0.75, 1);
  expect(mean(disc.map(prograde))).toBeGreaterThan(185);
  expect(mean(disc.map(({ feh }) => feh))).toBeCloseTo(-0.55, 1);
});

test('the bulge stays within three kiloparsecs of the centre', () => {
  expect(Math.max(...draw('bulge', 2000, 4).map(({ position }) => Math.hypot(...position)))).toBeLessThanOrEqual(3);
});

test('the stream orbits about its own pole, which is that of no published plane', () => {
  const angles = draw('stream', 2000, 5).map(({ position: [x, y, z], velocity: [u, v, w] }) => {
    const [lx, ly, lz] = [y * w - z * v, z * u - x * w, x * v - y * u];
    const [l, b] = [Math.atan2(ly, lx), Math.atan2(lz, Math.hypot(lx, ly))].map((angle) => (angle * 180) / Math.PI);
    return separationDeg(l!, b!, STREAM_POLE.l, STREAM_POLE.b);
  });
  angles.sort((p, q) => p - q);
  expect(angles[1000]).toBeLessThan(5);
  expect(angles[1900]).toBeLessThan(12);
  for (const { poleL, poleB } of PLANE_PRESETS) {
    const apart = separationDeg(poleL, poleB, STREAM_POLE.l, STREAM_POLE.b);
    expect(Math.min(apart, 180 - apart)).toBeGreaterThan(25);
  }
});
