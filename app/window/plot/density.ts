import type { Density } from '../../contract/messages';
import type { AxisLayout } from './types';
import { prepared } from './canvas';

type Colour = readonly [number, number, number];

/** From paper to ink, so that dense is dark by day and light at night. */
const SCALES: Readonly<Record<'light' | 'dark', readonly [Colour, Colour]>> = {
  light: [
    [220, 212, 194],
    [29, 27, 23],
  ],
  dark: [
    [58, 56, 51],
    [243, 236, 220],
  ],
};
/** What an object outside the sample counts, so that the kept stand out. */
const OUTSIDE = 0.1;

/** Draws counts as shades, logarithmic, an empty cell transparent. */
export function drawDensity(
  canvas: HTMLCanvasElement,
  density: Density,
  axes: { x: AxisLayout; y: AxisLayout },
  dark: boolean,
): void {
  const context = prepared(canvas);
  const image = context && shades(density, dark);
  if (!image) return;
  const { x: ax, y: ay } = axes;
  context.beginPath();
  context.rect(ax._offset, ay._offset, ax._length, ay._length);
  context.clip();
  context.imageSmoothingEnabled = false;
  const [left, right] = density.x.map((value) => ax._offset + ax.d2p(value)) as [number, number];
  const [bottom, top] = density.y.map((value) => ay._offset + ay.d2p(value)) as [number, number];
  context.drawImage(image, left, top, right - left, bottom - top);
  context.restore();
}

/** The densest cell's count, for the legend. */
export function densest({ all }: Density): number {
  let most = 0;
  for (const count of all) if (count > most) most = count;
  return most;
}

/** One pixel a cell, the first row at the top. */
function shades({ columns, rows, all, sample }: Density, dark: boolean): HTMLCanvasElement | undefined {
  const image = document.createElement('canvas');
  [image.width, image.height] = [columns, rows];
  const context = image.getContext('2d');
  if (!context) return undefined;
  const pixels = context.createImageData(columns, rows);
  const weight = (cell: number): number => Math.log1p(sample[cell]! + OUTSIDE * (all[cell]! - sample[cell]!));
  let most = 0;
  for (let cell = 0; cell < all.length; cell++) most = Math.max(most, weight(cell));
  const [low, high] = SCALES[dark ? 'dark' : 'light'];
  for (let cell = 0; cell < all.length; cell++) {
    if (all[cell] === 0) continue;
    const at = 4 * ((rows - 1 - Math.floor(cell / columns)) * columns + (cell % columns));
    const share = most > 0 ? weight(cell) / most : 0;
    for (let part = 0; part < 3; part++) pixels.data[at + part] = low[part]! + share * (high[part]! - low[part]!);
    pixels.data[at + 3] = 255;
  }
  context.putImageData(pixels, 0, 0);
  return image;
}
