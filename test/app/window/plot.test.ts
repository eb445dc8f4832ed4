import { afterEach, beforeEach, expect, it, vi } from 'vitest';
import { oncePerFrame } from '../../../app/window/plot/frame';
import { nearest } from '../../../app/window/plot/marks';
import { cellColours } from '../../../app/window/plot/raster';
import { firstRange } from '../../../app/window/plot/range';
import type { AxisLayout } from '../../../app/window/plot/types';

it('colours only cells that hold something, by the sample where there is any, the highest line first', () => {
  const density = {
    x: [0, 2],
    y: [10, 30],
    columns: 2,
    rows: 2,
    all: Float64Array.of(100, 10, 0, 100),
    sample: Float64Array.of(0, 10, 0, 100),
  } as const;
  const pixels = cellColours(density, { dropped: ['#000000', '#640000'], sample: ['#000000', '#000064'] });
  const pixel = (at: number): number[] => Array.from(pixels.subarray(4 * at, 4 * at + 4));
  expect(pixel(0)).toEqual([0, 0, 0, 0]);
  expect(pixel(1)).toEqual([0, 0, 100, 255]);
  expect(pixel(2)).toEqual([100, 0, 0, 255]);
  expect(pixel(3)).toEqual([0, 0, 50, 255]);
});

it('shows nearly the same range of very many values as of all of them', () => {
  const many = Float64Array.from({ length: 400_001 }, (_, row) => row);
  const [low, high] = firstRange('r', many);
  expect(low).toBeLessThan(0);
  expect(high).toBeGreaterThan(400_000);
  expect(firstRange('r', Float64Array.of(Number.NaN))).toEqual([0, 1]);
});

it('finds the nearest object within reach, and none that has no place', () => {
  const axis: AxisLayout = {
    _offset: 50,
    _length: 100,
    range: [0, 10],
    d2p: (value: number) => value * 10,
    p2d: Number,
  };
  const axes = { x: axis, y: axis };
  const marks = {
    x: Float64Array.of(Number.NaN, 1, 2),
    y: Float64Array.of(1, 1, 2),
    verdicts: new Uint8Array(3),
  };
  expect(nearest(marks, axes, 61, 62)).toBe(1);
  expect(nearest(marks, axes, 90, 90)).toBe(-1);
});

beforeEach(() => vi.useFakeTimers({ toFake: ['requestAnimationFrame', 'cancelAnimationFrame'] }));
afterEach(() => vi.useRealTimers());

it('draws once a frame however often it is asked, at once when told, never when stopped', () => {
  const draw = vi.fn();
  const framed = oncePerFrame(draw);
  [1, 2, 3].forEach(() => framed.ask());
  expect(draw).toHaveBeenCalledTimes(0);
  vi.advanceTimersToNextFrame();
  expect(draw).toHaveBeenCalledTimes(1);
  framed.ask();
  framed.now();
  vi.advanceTimersToNextFrame();
  expect(draw).toHaveBeenCalledTimes(2);
  framed.now();
  framed.ask();
  framed.stop();
  vi.advanceTimersToNextFrame();
  expect(draw).toHaveBeenCalledTimes(2);
});
