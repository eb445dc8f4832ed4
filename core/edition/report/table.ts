import { html, type Html } from './html';

/** One column of a table for reading. */
export interface Heading {
  readonly text: string;
  readonly number?: boolean;
}

type Cell = Html | string | number;

/** A table with a caption and header cells that say what they head; the first cell of each row heads it. */
export function table(caption: string, headings: readonly Heading[], rows: readonly (readonly Cell[])[]): Html {
  const side = (at: number): Html => html`${headings[at]?.number === true ? html` class="number"` : undefined}`;
  return html`<div class="wide" tabindex="0" role="group" aria-label="${caption}">
    <table>
      <caption>
        ${caption}
      </caption>
      <thead>
        <tr>
          ${headings.map(({ text }, at) => html`<th scope="col" ${side(at)}>${text}</th>`)}
        </tr>
      </thead>
      <tbody>
        ${rows.map(
          (row) =>
            html`<tr>
              ${row.map((cell, at) => (at === 0 ? html`<th scope="row" ${side(at)}>${cell}</th>` : html`<td${side(at)}>${cell}</td>`))}
            </tr> `,
        )}
      </tbody>
    </table>
  </div>`;
}

/** The first rows of a long list, and a sentence on where the others are. */
export function firstRows<T>(
  items: readonly T[],
  most: number,
  where: string,
): { shown: readonly T[]; rest: Html | undefined } {
  if (items.length <= most) return { shown: items, rest: undefined };
  return { shown: items.slice(0, most), rest: html`<p class="note">${items.length - most} more are in ${where}.</p>` };
}
