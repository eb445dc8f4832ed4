import type { Density } from '../../contract/messages';
import { prepared } from './marks';
import type { AxisLayout } from './types';

type Colour = readonly [number, number, number];

/** Tones of the cells, few to many, as #rrggbb: what is not in the sample under what is. */
export interface Tones {
  readonly dropped: readonly [string, string];
  readonly sample: readonly [string, string];
}

/**
 * Colour of every cell, top row first, as RGBA: by the logarithm of the sample's count, where the cell holds none of the
 * sample by that of all objects, clear where it is empty.
 */
export function cellColours({ columns, rows, all, sample }: Density, tones: Tones): Uint8ClampedArray<ArrayBuffer> {
  const pixels = new Uint8ClampedArray(4 * columns * rows);
  const [dropped, kept] = [ramp(tones.dropped, highest(all)), ramp(tones.sample, highest(sample))];
  for (let line = 0; line < rows; line++) {
    for (let column = 0; column < columns; column++) {
      const cell = line * columns + column;
      if (all[cell] === 0) continue;
      const colour = sample[cell]! > 0 ? kept(sample[cell]!) : dropped(all[cell]!);
      pixels.set([...colour, 255], 4 * ((rows - 1 - line) * columns + column));
    }
  }
  return pixels;
}

/** Draws coloured cells where the axes have them now. */
export function drawCells(
  canvas: HTMLCanvasElement,
  density: Density,
  colours: Uint8ClampedArray<ArrayBuffer>,
  axes: { x: AxisLayout; y: AxisLayout },
): void {
  const context = prepared(canvas);
  if (!context) return;
  const cells = new OffscreenCanvas(density.columns, density.rows);
  cells.getContext('2d')?.putImageData(new ImageData(colours, density.columns, density.rows), 0, 0);
  const { x, y } = axes;
  const [left, right] = [x.d2p(density.x[0]), x.d2p(density.x[1])];
  const [top, bottom] = [y.d2p(density.y[1]), y.d2p(density.y[0])];
  context.beginPath();
  context.rect(x._offset, y._offset, x._length, y._length);
  context.clip();
  context.imageSmoothingEnabled = false;
  context.drawImage(cells, x._offset + left, y._offset + top, right - left, bottom - top);
  context.restore();
}

/** The highest count of a grid. */
export function highest(counts: Float64Array): number {
  return counts.reduce((most, count) => Math.max(most, count), 0);
}

function ramp([few, many]: readonly [string, string], most: number): (count: number) => Colour {
  const [from, to] = [parts(few), parts(many)];
  const whole = Math.log(Math.max(2, most));
  return (count) => {
    const share = Math.log(count) / whole;
    return [mixed(from[0], to[0], share), mixed(from[1], to[1], share), mixed(from[2], to[2], share)];
  };
}

function mixed(from: number, to: number, share: number): number {
  return Math.round(from + (to - from) * share);
}

function parts(colour: string): Colour {
  const number = Number.parseInt(colour.slice(1), 16);
  return [number >> 16, (number >> 8) & 255, number & 255];
}
