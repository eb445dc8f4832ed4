import type { EditionInput } from '../edition';
import { html, type Html } from './html';

const WIDTH = 480;
const STEP = 46;
const LONGEST = 62;

/** The way from all objects to the sample: after each enabled cut a dark bar of what is left and a hatched one of what it took. */
export function attritionFigure({ judged }: EditionInput): Html {
  const { attrition, counts } = judged;
  const last = attrition.filter(({ on }) => on).at(-1)?.left ?? counts.objects;
  const withheld = last - counts.sample;
  const rows = [
    { label: 'All objects', left: counts.objects, removed: 0, words: String(counts.objects) },
    ...attrition
      .filter(({ on }) => on)
      .map((row) => ({
        label: `${row.cut}: ${row.describe}`,
        left: row.left,
        removed: row.inTurn,
        words: step(row.inTurn, row.left),
      })),
    ...(withheld > 0
      ? [
          {
            label: 'Sample: without the unjudged',
            left: counts.sample,
            removed: withheld,
            words: step(withheld, counts.sample),
          },
        ]
      : []),
  ];
  const scale = (count: number): number =>
    counts.objects === 0 ? 0 : Math.round((count / counts.objects) * WIDTH * 10) / 10;
  return html`<figure class="attrition">
    <svg viewBox="0 0 ${WIDTH} ${rows.length * STEP}" role="img" aria-labelledby="t-attrition d-attrition">
      <title id="t-attrition">Objects left after each cut</title>
      <desc id="d-attrition">${rows.map(({ label, words }) => `${label}: ${words}`).join('; ')}</desc>
      <pattern id="hatch" width="5" height="5" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
        <path class="hatch" d="M0 0v5" />
      </pattern>
      ${rows.map(({ label, left, removed, words }, at) => {
        const top = at * STEP;
        return html`<text x="0" y="${top + 16}">${shortened(label, LONGEST - words.length)}</text
          ><text class="number" x="${WIDTH}" y="${top + 16}" text-anchor="end">${words}</text>
          <rect
            class="left"
            x="0"
            y="${top + 22}"
            width="${scale(left)}"
            height="14"
          />${removed > 0 ? html`<rect class="removed" x="${scale(left)}" y="${top + 22}" width="${scale(removed)}" height="14" />` : undefined}`;
      })}
    </svg>
    <figcaption>
      Dark: objects left after each enabled cut, in the order of the ledger. Hatched: removed by it in turn.
    </figcaption>
  </figure>`;
}

/** "−44 → 136". */
function step(removed: number, left: number): string {
  return `${removed === 0 ? '' : '−'}${removed} → ${left}`;
}

function shortened(text: string, most: number): string {
  return text.length > most ? `${text.slice(0, most - 1).trimEnd()}…` : text;
}
