import type { Plate } from '../recipe';
import type { EditionInput } from '../edition';
import { axisOf } from './axis';
import { plainLabel, svgLabel } from './axislabel';
import { axes, clip, type Field, HEIGHT, placeX, placeY, WIDTH } from './canvas';
import { guidesOf } from './guides';
import { html, type Html } from './html';
import { markIcon, type Standing, STANDINGS, standingOf } from './marks';
import { levelTexts, raster } from './raster';

/** More objects than this are drawn as a density. */
export const MOST_MARKS = 5000;
/** Up to this many objects each mark says its name when pointed at. */
const MOST_TITLES = 600;

/** One plate, the at-th of the document, as a figure: objects that have both values, axes, limits and lassos, a caption. */
export function plateFigure(plate: Plate, at: number, input: EditionInput): Html {
  const { quantities, recipe, judged } = input;
  const [x, y] = [quantities.column(plate.x)?.values, quantities.column(plate.y)?.values];
  const [xAbout, yAbout] = [plate.x, plate.y].map((id) => quantities.definitions.find((one) => one.id === id));
  const title = `${plainLabel(yAbout, plate.y)} against ${plainLabel(xAbout, plate.x)}`;
  if (!x || !y || !xAbout || !yAbout) return html`<p>The data cannot give the plate of ${title}.</p>`;
  const drawn = Array.from(x.keys()).filter((object) => !Number.isNaN(x[object]!) && !Number.isNaN(y[object]!));
  const field: Field = {
    x: axisOf(
      drawn.map((object) => x[object]!),
      xAbout.unit,
    ),
    y: axisOf(
      drawn.map((object) => y[object]!),
      yAbout.unit,
    ),
  };
  const guides = guidesOf(plate, recipe.ledger, field);
  const dense = drawn.length > MOST_MARKS;
  const lacking = x.length - drawn.length;
  const about = `${drawn.length} objects${lacking > 0 ? `; ${lacking} lack one of the two values` : ''}.`;
  return html`<figure class="plate">
    <svg viewBox="0 0 ${WIDTH} ${HEIGHT}" role="img" aria-labelledby="plate${at}-title plate${at}-text">
      <title id="plate${at}-title">${title}</title>
      <desc id="plate${at}-text">${described(input, drawn, about)}</desc>
      ${clip(`plate${at}-clip`)}
      <g clip-path="url(#plate${at}-clip)">
        ${dense ? raster(field, x, y, judged) : marks(field, drawn, x, y, input)}
        <path class="guide" d="${guides.path}" />
      </g>
      ${axes(field, svgLabel(xAbout), svgLabel(yAbout))}
    </svg>
    <figcaption>
      ${about}${guides.cuts.length > 0 ? ` Dashed: limits of ${guides.cuts.join(', ')}.` : ''}
      ${legend(input, drawn, dense)}
    </figcaption>
  </figure>`;
}

function marks(field: Field, drawn: readonly number[], x: Float64Array, y: Float64Array, input: EditionInput): Html {
  const titled = drawn.length <= MOST_TITLES;
  const at = (object: number): string => `M${placeX(field, x[object]!)} ${placeY(field, y[object]!)}`;
  return html`${STANDINGS.map(({ id, path }) => {
    const objects = drawn.filter((object) => standingOf(input.judged, object) === id);
    if (objects.length === 0) return undefined;
    if (!titled) return html`<path class="mark ${id}" d="${objects.map((object) => at(object) + path).join('')}" />`;
    return html`<g class="mark ${id}"
      >${objects.map((object) => html`<path d="${at(object)}${path}"><title>${input.roster.names[object]}</title></path>`)}</g
    >`;
  })}`;
}

function present(input: EditionInput, drawn: readonly number[]): { standing: Standing; count: number }[] {
  const counts = new Map<Standing['id'], number>();
  for (const object of drawn) {
    const id = standingOf(input.judged, object);
    counts.set(id, (counts.get(id) ?? 0) + 1);
  }
  return STANDINGS.flatMap((standing) => {
    const count = counts.get(standing.id);
    return count === undefined ? [] : [{ standing, count }];
  });
}

function described(input: EditionInput, drawn: readonly number[], about: string): string {
  const parts = present(input, drawn).map(({ standing, count }) => `${count} ${standing.label}`);
  return `${about} ${parts.join(', ')}.`;
}

function legend(input: EditionInput, drawn: readonly number[], dense: boolean): Html {
  if (!dense) {
    return html`<span class="legend"
      >${present(input, drawn).map(({ standing }) => html`<span>${markIcon(standing.id)} ${standing.label}</span> `)}</span
    >`;
  }
  return html`<span class="legend"
    >Dots: cells without members of the sample. Squares: members in a cell:
    ${levelTexts().map(
      (text, level) =>
        html`<span
          ><svg class="icon" viewBox="-6 -6 12 12" aria-hidden="true">
            <path class="density level${level}" d="M-5-5h10v10h-10z" />
          </svg>
          ${text}</span
        > `,
    )}</span
  >`;
}
