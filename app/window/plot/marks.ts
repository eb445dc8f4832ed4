import type { AxisLayout } from './types';

/** Colours of a plate, read from the style sheet. */
export interface Inks {
  readonly kept: string;
  readonly borderline: string;
  readonly dropped: string;
  readonly unjudged: string;
}

/** What is drawn: values by object, and the verdict of each (index into VERDICTS). */
export interface Marks {
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly verdicts: Uint8Array;
}

/** Drawing order: what was dropped lies under what was kept. */
const ORDER = [2, 3, 1, 0] as const;

/**
 * Draws every object with the mark of its verdict: kept a solid disc, borderline a half-filled disc, dropped a small
 * stroke, unjudged an open square; shape and weight tell them apart without colour.
 */
export function drawMarks(
  canvas: HTMLCanvasElement,
  marks: Marks,
  axes: { x: AxisLayout; y: AxisLayout },
  inks: Inks,
): void {
  const context = prepared(canvas);
  if (!context) return;
  const { x: ax, y: ay } = axes;
  const [toX, toY] = [pixels(ax), pixels(ay)];
  context.beginPath();
  context.rect(ax._offset, ay._offset, ax._length, ay._length);
  context.clip();
  const size = markSize(marks.x.length);
  const [wide, high] = [ax._offset + ax._length + 9, ay._offset + ay._length + 9];
  const colours = [inks.kept, inks.borderline, inks.dropped, inks.unjudged];
  for (const verdict of ORDER) {
    context.strokeStyle = context.fillStyle = colours[verdict]!;
    context.lineWidth = verdict === 2 ? 1 : 1.3;
    const path = new Path2D();
    for (let row = 0; row < marks.x.length; row++) {
      if (marks.verdicts[row] !== verdict) continue;
      const [px, py] = [toX.at + toX.per * marks.x[row]!, toY.at + toY.per * marks.y[row]!];
      if (px > -9 && py > -9 && px < wide && py < high) SHAPES[verdict](path, px, py, size);
    }
    if (verdict === 0) context.fill(path);
    else context.stroke(path);
  }
  // The lower half of the borderline discs is filled.
  context.fillStyle = inks.borderline;
  const halves = new Path2D();
  for (let row = 0; row < marks.x.length; row++) {
    if (marks.verdicts[row] !== 1) continue;
    const [px, py] = [toX.at + toX.per * marks.x[row]!, toY.at + toY.per * marks.y[row]!];
    if (!(px > -9 && py > -9 && px < wide && py < high)) continue;
    halves.moveTo(px, py);
    halves.arc(px, py, size + 0.6, 0, Math.PI);
  }
  context.fill(halves);
  context.restore();
}

/** Draws a ring around single objects: the one under the pointer, the chosen one. */
export function drawRings(
  canvas: HTMLCanvasElement,
  marks: Marks,
  rows: readonly number[],
  axes: { x: AxisLayout; y: AxisLayout },
  colour: string,
): void {
  const context = prepared(canvas);
  if (!context) return;
  context.strokeStyle = colour;
  context.lineWidth = 2;
  for (const row of rows) {
    if (row < 0) continue;
    const [px, py] = [axes.x._offset + axes.x.d2p(marks.x[row]!), axes.y._offset + axes.y.d2p(marks.y[row]!)];
    context.beginPath();
    context.arc(px, py, 8, 0, 2 * Math.PI);
    context.stroke();
  }
  context.restore();
}

/** The object nearest to a place of the plate, within a reach in pixels; −1 for none. */
export function nearest(
  marks: Marks,
  axes: { x: AxisLayout; y: AxisLayout },
  px: number,
  py: number,
  reach = 9,
): number {
  let [best, least] = [-1, reach * reach];
  const [toX, toY] = [pixels(axes.x), pixels(axes.y)];
  for (let row = 0; row < marks.x.length; row++) {
    const dx = toX.at + toX.per * marks.x[row]! - px;
    const dy = toY.at + toY.per * marks.y[row]! - py;
    const square = dx * dx + dy * dy;
    if (square < least) [best, least] = [row, square];
  }
  return best;
}

/** How data become pixels of the canvas: the axes of plates are linear. */
function pixels(axis: AxisLayout): { at: number; per: number } {
  const at = axis.d2p(0);
  return { at: axis._offset + at, per: axis.d2p(1) - at };
}

/** The canvas at the screen's resolution, cleared; restore its context after drawing. */
export function prepared(canvas: HTMLCanvasElement): CanvasRenderingContext2D | null {
  const context = canvas.getContext('2d');
  const scale = window.devicePixelRatio;
  const [width, height] = [canvas.clientWidth * scale, canvas.clientHeight * scale];
  if (canvas.width !== width || canvas.height !== height) [canvas.width, canvas.height] = [width, height];
  context?.setTransform(scale, 0, 0, scale, 0, 0);
  context?.clearRect(0, 0, canvas.clientWidth, canvas.clientHeight);
  context?.save();
  return context;
}

function markSize(count: number): number {
  return count > 20_000 ? 1.1 : count > 2000 ? 1.8 : 3.2;
}

const SHAPES: Readonly<Record<0 | 1 | 2 | 3, (path: Path2D, x: number, y: number, size: number) => void>> = {
  0(path, x, y, size) {
    path.moveTo(x + size, y);
    path.arc(x, y, size, 0, 2 * Math.PI);
  },
  1(path, x, y, size) {
    path.moveTo(x + size + 0.6, y);
    path.arc(x, y, size + 0.6, 0, 2 * Math.PI);
  },
  2(path, x, y, size) {
    path.moveTo(x - size, y + size);
    path.lineTo(x + size, y - size);
  },
  3(path, x, y, size) {
    path.rect(x - size, y - size, 2 * size, 2 * size);
  },
};
