import { EDITION_FILES } from '../contents';
import type { EditionInput } from '../edition';
import { inventedSources } from '../edition';
import { jobParagraph, readableTime } from '../sentences';
import { conflictsSection } from './conflicts';
import { html, type Html, raw } from './html';
import { attritionSection, ledgerSection } from './ledger';
import { borderlineSection, namedSection } from './objects';
import { plateFigure } from './platefigure';
import { frameSection, sourcesSection, troublesSection } from './sources';
import { STYLE } from './style';

const POLICY = "default-src 'none'; style-src 'unsafe-inline'";

/** The report of an edition: one HTML page that needs nothing beside it, neither network nor scripts. */
export function reportText(input: EditionInput): string {
  const { recipe, number } = input;
  const page = html`<!doctype html>
    <html lang="en">
      <head>
        <meta charset="utf-8" />
        <meta http-equiv="Content-Security-Policy" content="${POLICY}" />
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <title>${recipe.title}, edition ${number}</title>
        <style>
          ${raw(STYLE)}
        </style>
      </head>
      <body>
        ${heading(input)}
        <main>
          ${countsSection(input)} ${sourcesSection(input)} ${frameSection(input)} ${attritionSection(input)}
          ${ledgerSection(input)} ${platesSection(input)} ${borderlineSection(input)} ${namedSection(input)}
          ${conflictsSection(input)} ${troublesSection(input)} ${rebuildSection(input)}
        </main>
        <footer><p>Written by Halosieve ${input.program.version} on ${readableTime(input.time)}.</p></footer>
      </body>
    </html> `;
  return page.html;
}

function heading(input: EditionInput): Html {
  const { recipe, number, time } = input;
  const invented = inventedSources(input);
  const links = ['sources', 'frame', 'attrition', 'ledger', 'plates', 'borderline', 'conflicts', 'troubles', 'rebuild'];
  const words: Readonly<Record<string, string>> = { troubles: 'duplicates and quarantine', rebuild: 'how to rebuild' };
  return html`<header>
    ${invented.length === 0 ? undefined : html`<p class="invented">Invented data: ${invented.join(', ')}. Nothing here says anything of the sky.</p>`}
    <h1>${recipe.title}</h1>
    <p class="byline">
      Edition ${number}, ${readableTime(time)}${recipe.author.trim() === '' ? '' : `, by ${recipe.author}`}
    </p>
    ${recipe.note.trim() === '' ? undefined : html`<p>${recipe.note}</p>`}
    <nav aria-label="Sections">
      <ul>
        ${links.map((id) => html`<li><a href="#${id}">${words[id] ?? id}</a></li>`)}
      </ul>
    </nav>
  </header>`;
}

function countsSection(input: EditionInput): Html {
  const { counts } = input.judged;
  const shown: readonly [string, number][] = [
    ['in the sample', counts.sample],
    ['objects', counts.objects],
    ['kept', counts.kept],
    ['borderline', counts.borderline],
    ['dropped', counts.dropped],
    ['unjudged', counts.unjudged],
  ];
  return html`<section aria-labelledby="job">
    <h2 id="job">What this sample is</h2>
    <p>${jobParagraph(input)}</p>
    <dl class="counts">
      ${shown.map(
        ([name, count]) =>
          html`<div>
            <dt>${name}</dt>
            <dd>${count}</dd>
          </div>`,
      )}
    </dl>
    <p class="note">
      The sample holds the kept objects and those borderline ones that pass every cut at their best values.
    </p>
  </section>`;
}

function platesSection(input: EditionInput): Html {
  const { plates } = input.recipe;
  return html`<section aria-labelledby="plates">
    <h2 id="plates">Plates</h2>
    ${plates.length === 0 ? html`<p>The recipe has no plates.</p>` : html`<div class="plates">${plates.map((plate, at) => plateFigure(plate, at, input))}</div>`}
  </section>`;
}

function rebuildSection({ program }: EditionInput): Html {
  return html`<section aria-labelledby="rebuild">
    <h2 id="rebuild">How to check and rebuild</h2>
    <p>
      In the folder of the edition, <code>sha256sum -c SHA256SUMS</code> checks that no file was changed. With Halosieve
      ${program.version} and the source files, this rebuilds the edition and compares every byte:
    </p>
    <pre tabindex="0">npx halosieve verify FOLDER-OF-THE-EDITION</pre>
    <dl class="facts">
      ${EDITION_FILES.map(
        ({ name, holds }) =>
          html`<dt><code>${name}</code></dt>
            <dd>${holds}</dd>`,
      )}
    </dl>
  </section>`;
}
