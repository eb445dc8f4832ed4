import type { Cut } from '../../cuts/cut';
import { cutKind } from '../../cuts/kinds';
import type { EditionInput } from '../edition';
import { attritionFigure } from './attritionfigure';
import { readableTime } from '../sentences';
import { citations } from './citation';
import { html, type Html } from './html';
import { table } from './table';

const MISSING: Readonly<Record<Cut['missing'], string>> = {
  drop: 'An object without the value is dropped.',
  keep: 'An object without the value passes.',
  unjudged: 'An object without the value is unjudged, and not in the sample.',
};

/** Attrition as a figure and as a table. */
export function attritionSection(input: EditionInput): Html {
  const { attrition } = input.judged;
  const number = (text: string): { text: string; number: true } => ({ text, number: true });
  return html`<section aria-labelledby="attrition">
    <h2 id="attrition">Attrition</h2>
    ${attritionFigure(input)}
    ${table(
      'How many objects each cut removes at best values: among those that the earlier cuts left, if it stood alone, and by no other cut',
      [
        { text: 'Cut' },
        { text: 'Rule' },
        number('In turn'),
        number('Alone'),
        number('Only by it'),
        number('Unjudged'),
        number('Left'),
      ],
      attrition.map((row) => [
        row.on ? row.cut : html`<span class="off">${row.cut} (off)</span>`,
        row.describe,
        row.on ? row.inTurn : '–',
        row.alone,
        row.on ? row.onlyByIt : '–',
        row.unjudged,
        row.on ? row.left : '–',
      ]),
    )}
  </section>`;
}

/** Each cut with its reasons. */
export function ledgerSection({ recipe, judged }: EditionInput): Html {
  return html`<section aria-labelledby="ledger">
    <h2 id="ledger">Ledger</h2>
    ${recipe.ledger.length === 0 ? html`<p>The ledger is empty: every object is in the sample.</p>` : undefined}
    ${recipe.ledger.map((cut, at) => article(cut, judged.attrition[at]!.describe))}
  </section>`;
}

function article(cut: Cut, describe: string): Html {
  const kind = cutKind(cut.kind);
  const written = [cut.author, readableTime(cut.time)].filter((part) => part !== '').join(', ');
  return html`<article>
    <h3>${cut.id}: ${kind.label}${cut.on ? '' : ' (switched off)'}</h3>
    <p>${describe.charAt(0).toUpperCase()}${describe.slice(1)}. ${kind.purpose}</p>
    <dl class="facts">
      <dt>Rationale</dt>
      <dd>${cut.rationale.trim() || 'none written'}</dd>
      <dt>Evidence</dt>
      <dd>${cut.evidence.length === 0 ? 'none cited' : citations(cut.evidence)}</dd>
      <dt>Missing values</dt>
      <dd>${MISSING[cut.missing]}</dd>
      ${
        written === ''
          ? undefined
          : html`<dt>Written by</dt>
              <dd>${written}</dd>`
      }
    </dl>
    <p class="caution"><strong>Caution.</strong> ${kind.caution}</p>
  </article>`;
}
