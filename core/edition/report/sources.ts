import { problemText } from '../../table/wording';
import type { EditionInput } from '../edition';
import { frameFacts, frameOf } from '../framewords';
import { reasonText } from '../quarantine';
import { counted } from '../sentences';
import { citation, citations } from './citation';
import { html, type Html } from './html';
import { firstRows, table } from './table';

const MOST = 100;

/** Sources with the hash of each file, and how their rows became objects. */
export function sourcesSection(input: EditionInput): Html {
  const { recipe, sources, roster } = input;
  const rows = sources.map(({ id, rowsRead }) => {
    const about = recipe.sources.find((source) => source.id === id);
    const counts = roster.counts.find((count) => count.source === id);
    const cited =
      about?.invented === true ? html`<strong>invented, do not cite</strong>` : citation(about?.citation ?? '');
    return [
      id,
      about?.title ?? '',
      cited.html === '' ? 'none given' : cited,
      rowsRead,
      counts?.objectRows ?? '',
      counts?.duplicates ?? '',
      counts?.quarantine ?? '',
    ];
  });
  const files = sources.map(({ id, fileName, bytes, sha256 }) => [
    id,
    fileName,
    bytes,
    html`<span class="hash">${sha256}</span>`,
  ]);
  const { shown, rest } = firstRows(roster.problems, MOST, 'the recipe opened in the program');
  return html`<section aria-labelledby="sources">
    <h2 id="sources">Sources</h2>
    ${table(
      'Rows of each source: every one is an object row, a duplicate or in quarantine',
      [
        { text: 'Source' },
        { text: 'Title' },
        { text: 'Citation' },
        { text: 'Rows', number: true },
        { text: 'Objects', number: true },
        { text: 'Duplicates', number: true },
        { text: 'Quarantine', number: true },
      ],
      rows,
    )}
    ${table('The files as they were read', [{ text: 'Source' }, { text: 'File' }, { text: 'Bytes', number: true }, { text: 'SHA-256' }], files)}
    ${
      shown.length === 0
        ? undefined
        : html`<h3>What the program noticed in them</h3>
            <ul>
              ${shown.map((problem) => html`<li>${problemText(problem)}</li>`)}
            </ul>
            ${rest}`
    }
  </section>`;
}

/** The adopted place and motion of the Sun with its sources. */
export function frameSection({ recipe }: EditionInput): Html {
  const frame = frameOf(recipe.frame);
  return html`<section aria-labelledby="frame">
    <h2 id="frame">Frame</h2>
    <p>
      Solar frame ${frame.id}. Galactocentric, right-handed: x from the side of the Sun towards the centre, y with
      Galactic rotation at the Sun, z to the north Galactic pole. v_phi and l_z are positive prograde. Errors are
      propagated linearly; the frame itself is taken as exact.
    </p>
    <dl class="facts">
      ${frameFacts(frame).map(
        ([name, words]) =>
          html`<dt>${name}</dt>
            <dd>${words}</dd>`,
      )}
      <dt>Sources</dt>
      <dd>${citations(frame.sources)}</dd>
      <dt>Note</dt>
      <dd>${frame.note}</dd>
    </dl>
  </section>`;
}

/** Values on which sources disagree, repeated rows, and rows that could not be read. */
export function troublesSection({ roster }: EditionInput): Html {
  const quarantine = firstRows(roster.quarantine, MOST, 'quarantine.csv');
  const duplicates = firstRows(roster.duplicates, MOST, 'quarantine.csv');
  return html`<section aria-labelledby="troubles">
    <h2 id="troubles">Duplicates and quarantine</h2>
    <h3>Duplicates</h3>
    ${
      duplicates.shown.length === 0
        ? html`<p>No source lists an object twice.</p>`
        : html`${table(
            'Later rows for an object that its source already has; the first row stands',
            [
              { text: 'Name' },
              { text: 'Source' },
              { text: 'Line', number: true },
              { text: 'Line that stands', number: true },
            ],
            duplicates.shown.map((row) => [row.name, row.source, row.line, row.firstLine]),
          )}${duplicates.rest}`
    }
    <h3>Quarantine</h3>
    ${
      quarantine.shown.length === 0
        ? html`<p>Every row could be read.</p>`
        : html`<p>
              ${counted(roster.quarantine.length, 'row')} could not be read as data; quarantine.csv keeps them in full.
            </p>
            ${table(
              'Rows in quarantine, with the reason',
              [{ text: 'Source' }, { text: 'Line', number: true }, { text: 'Reason' }],
              quarantine.shown.map((row) => [row.source, row.line, reasonText(row.reason)]),
            )}${quarantine.rest}`
    }
  </section>`;
}
