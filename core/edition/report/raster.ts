import type { LedgerResult } from '../../cuts/result';
import { type Field, placeX, placeY } from './canvas';
import { html, type Html } from './html';

export const COLUMNS = 96;
export const ROWS = 72;
/** Upper count of each level but the last. */
const LEVELS = [1, 3, 10, 30];

/**
 * Density of many objects: cells that hold members of the sample are squares, darker for more members; cells that hold
 * only other objects are small dots.
 */
export function raster(field: Field, x: Float64Array, y: Float64Array, judged: LedgerResult): Html {
  const members = new Uint32Array(COLUMNS * ROWS);
  const others = new Uint32Array(COLUMNS * ROWS);
  for (let object = 0; object < x.length; object++) {
    const column = Math.floor(((x[object]! - field.x.min) / (field.x.max - field.x.min)) * COLUMNS);
    const row = Math.floor(((y[object]! - field.y.min) / (field.y.max - field.y.min)) * ROWS);
    if (Number.isNaN(column) || Number.isNaN(row)) continue;
    (judged.sample.has(object) ? members : others)[row * COLUMNS + column]!++;
  }
  const squares = Array.from({ length: LEVELS.length + 1 }, () => '');
  let dots = '';
  const edge = (axis: 'x' | 'y', at: number, of: number): number =>
    (axis === 'x' ? placeX : placeY)(field, field[axis].min + (at / of) * (field[axis].max - field[axis].min));
  for (let row = 0; row < ROWS; row++) {
    const [bottom, top] = [edge('y', row, ROWS), edge('y', row + 1, ROWS)];
    for (let column = 0; column < COLUMNS; column++) {
      const cell = row * COLUMNS + column;
      const [left, right] = [edge('x', column, COLUMNS), edge('x', column + 1, COLUMNS)];
      if (members[cell]! > 0) squares[levelOf(members[cell]!)]! += `M${left} ${top}H${right}V${bottom}H${left}z`;
      else if (others[cell]! > 0) dots += `M${short(left + 1.2)} ${short((top + bottom) / 2)}h1.8`;
    }
  }
  return html`<path
      class="dots"
      d="${dots}"
    />${squares.map((path, level) => html`<path class="density level${level}" d="${path}" />`)}`;
}

/** What each level of the raster stands for. */
export function levelTexts(): string[] {
  return [
    ...LEVELS.map((most, at) =>
      most === (LEVELS[at - 1] ?? 0) + 1 ? String(most) : `${(LEVELS[at - 1] ?? 0) + 1}–${most}`,
    ),
    `over ${LEVELS.at(-1)!}`,
  ];
}

function levelOf(count: number): number {
  const level = LEVELS.findIndex((most) => count <= most);
  return level < 0 ? LEVELS.length : level;
}

function short(value: number): number {
  return Math.round(value * 10) / 10;
}
