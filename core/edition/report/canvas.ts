import { type Axis, tickText } from './axis';
import { html, type Html } from './html';

/** The field of a plate in SVG units, and how data get there. */
export interface Field {
  readonly x: Axis;
  readonly y: Axis;
}

export const WIDTH = 480;
export const HEIGHT = 380;
const LEFT = 62;
const RIGHT = WIDTH - 12;
const TOP = 10;
const BOTTOM = HEIGHT - 50;

/** Horizontal place of a value, rounded to a tenth of a unit. */
export function placeX({ x }: Field, value: number): number {
  return tenth(LEFT + ((value - x.min) / (x.max - x.min)) * (RIGHT - LEFT));
}

/** Vertical place of a value, rounded to a tenth of a unit. */
export function placeY({ y }: Field, value: number): number {
  return tenth(BOTTOM - ((value - y.min) / (y.max - y.min)) * (BOTTOM - TOP));
}

function tenth(value: number): number {
  return Math.round(value * 10) / 10;
}

/** Frame, ticks and labels of a field. */
export function axes(field: Field, xLabel: Html, yLabel: Html): Html {
  return html`<g class="axes">
    <rect x="${LEFT}" y="${TOP}" width="${RIGHT - LEFT}" height="${BOTTOM - TOP}" />
    ${field.x.ticks.map((tick) => {
      const at = placeX(field, tick);
      return html`<path d="M${at} ${BOTTOM}v-6M${at} ${TOP}v6" /><text x="${at}" y="${BOTTOM + 17}" text-anchor="middle"
          >${tickText(field.x, tick)}</text
        >`;
    })}
    ${field.y.ticks.map((tick) => {
      const at = placeY(field, tick);
      return html`<path d="M${LEFT} ${at}h6M${RIGHT} ${at}h-6" /><text x="${LEFT - 7}" y="${at + 4.5}" text-anchor="end"
          >${tickText(field.y, tick)}</text
        >`;
    })}
    <text class="label" x="${(LEFT + RIGHT) / 2}" y="${HEIGHT - 9}" text-anchor="middle">${xLabel}</text>
    <text class="label" transform="translate(15 ${(TOP + BOTTOM) / 2}) rotate(-90)" text-anchor="middle"
      >${yLabel}</text
    >
  </g>`;
}

/** A line across the whole field where one coordinate has a value; nothing outside the field. */
export function across(field: Field, axis: 'x' | 'y', value: number): string {
  const { min, max } = field[axis];
  if (value < min || value > max) return '';
  return axis === 'x' ? `M${placeX(field, value)} ${TOP}V${BOTTOM}` : `M${LEFT} ${placeY(field, value)}H${RIGHT}`;
}

/** Clips to the field; the id must be unique in the document. */
export function clip(id: string): Html {
  return html`<clipPath id="${id}"
    ><rect x="${LEFT}" y="${TOP}" width="${RIGHT - LEFT}" height="${BOTTOM - TOP}"
  /></clipPath>`;
}
