import type { Density, DensityAsk } from '../contract/messages';
import type { Session } from './session';

/** Counts of all objects and of the sample on a grid over two quantities; undefined when one is not there. */
export function plateDensity(session: Session, ask: DensityAsk): Density | undefined {
  const { prepared, result } = session;
  const [x, y] = [prepared.quantities.column(ask.x)?.values, prepared.quantities.column(ask.y)?.values];
  if (!x || !y) return undefined;
  const { x: rangeX, y: rangeY } = ask.range;
  const all = new Float64Array(ask.columns * ask.rows);
  const sample = new Float64Array(all.length);
  const scaleX = ask.columns / (rangeX[1] - rangeX[0] || 1);
  const scaleY = ask.rows / (rangeY[1] - rangeY[0] || 1);
  for (let row = 0; row < x.length; row++) {
    const column = Math.floor((x[row]! - rangeX[0]) * scaleX);
    const line = Math.floor((y[row]! - rangeY[0]) * scaleY);
    if (!(column >= 0 && column < ask.columns && line >= 0 && line < ask.rows)) continue;
    const cell = line * ask.columns + column;
    all[cell]!++;
    if (result.sample.has(row)) sample[cell]!++;
  }
  return { x: rangeX, y: rangeY, columns: ask.columns, rows: ask.rows, all, sample };
}
