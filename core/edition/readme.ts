import type { Cut } from '../cuts/cut';
import type { EditionColumn } from './columns';
import { EDITION_FILES } from './contents';
import { type EditionInput, inventedSources } from './edition';
import { frameFacts, frameOf } from './framewords';
import { md, mdTable } from './markdown';
import { jobParagraph, readableTime } from './sentences';

/** Text of README.md: the edition for someone who has not the program. */
export function readmeText(input: EditionInput, columns: readonly EditionColumn[]): string {
  return `${[
    ...heading(input),
    '## Files',
    mdTable(
      ['file', 'holds'],
      EDITION_FILES.map(({ name, holds }) => [`\`${name}\``, md(holds)]),
    ),
    'Comma-separated UTF-8 text, one header line. An empty cell is a missing value. Numbers have full precision. In the `.csv` files, and only there, an apostrophe stands before a text that a spreadsheet would take for a formula (one that begins with `=`, `+`, `-` or `@` and is no number).',
    '## Sources',
    ...sources(input),
    '## Frame',
    ...frame(input),
    '## Cuts',
    ...cuts(input),
    '## Columns',
    'An object of `dropped.csv` has the columns `dropped_by` and `unjudged_by` besides.',
    columnTable(columns),
    '## How to check',
    'In this folder:',
    '```\nsha256sum -c SHA256SUMS\n```',
    `It was made by Halosieve ${md(input.program.version)}. With that program and the source files, this rebuilds the edition and compares every byte (\`--sources\` says where the files are, when they have moved):`,
    '```\nnpx halosieve verify FOLDER-OF-THIS-EDITION --sources FOLDER-OF-THE-SOURCES\n```',
    'An edition never changes. A new selection gets a new number.',
  ].join('\n\n')}\n`;
}

function heading(input: EditionInput): string[] {
  const { recipe, number, time } = input;
  const invented = inventedSources(input);
  return [
    ...(invented.length > 0
      ? [`**Invented data: ${invented.map(md).join(', ')}. Nothing here says anything of the sky.**`]
      : []),
    `# ${md(recipe.title)}`,
    `Edition ${number}, frozen ${md(readableTime(time))}${recipe.author.trim() === '' ? '' : ` by ${md(recipe.author)}`}.`,
    ...(recipe.note.trim() === '' ? [] : [md(recipe.note)]),
    md(jobParagraph(input)),
  ];
}

function sources({ recipe, sources: files }: EditionInput): string[] {
  const rows = files.map(({ id, fileName, rowsRead, sha256 }) => {
    const about = recipe.sources.find((source) => source.id === id);
    const citation = about?.invented === true ? 'invented, do not cite' : md(about?.citation ?? '') || 'none given';
    return [md(id), md(about?.title ?? ''), citation, md(fileName), String(rowsRead), `\`${sha256}\``];
  });
  return [
    mdTable(['source', 'title', 'citation', 'file', 'rows', 'sha256'], rows),
    'Whoever uses the sample cites these catalogues, the sources of the frame, and this edition by its title, number and author. `<quantity>_source` says which catalogue each measured value is from.',
  ];
}

function frame({ recipe }: EditionInput): string[] {
  const adopted = frameOf(recipe.frame);
  return [
    `Solar frame ${md(adopted.id)}. Galactocentric, right-handed: x from the side of the Sun towards the centre, y with Galactic rotation at the Sun, z to the north Galactic pole. \`v_phi\` and \`l_z\` are positive prograde. Errors are propagated linearly, with the frame taken as exact.`,
    mdTable(
      ['quantity', 'value'],
      frameFacts(adopted).map(([name, words]) => [name, md(words)]),
    ),
    `Sources: ${adopted.sources.map(md).join(', ')}. ${md(adopted.note)}`,
  ];
}

function cuts({ recipe, judged }: EditionInput): string[] {
  if (recipe.ledger.length === 0) return ['No cut was applied.'];
  const parts = recipe.ledger.map((cut, at) => {
    const { describe, inTurn } = judged.attrition[at]!;
    const state = cut.on ? `removes ${inTurn} in turn` : 'switched off';
    return `${at + 1}. **${md(cut.id)}**: ${md(describe)} (${state}).\n   ${reasons(cut)}`;
  });
  return [parts.join('\n')];
}

function reasons({ rationale, evidence }: Cut): string {
  const why = md(rationale) || 'No rationale was written.';
  return evidence.length === 0 ? why : `${why} Evidence: ${evidence.map(md).join(', ')}.`;
}

function columnTable(columns: readonly EditionColumn[]): string {
  return mdTable(
    ['column', 'unit', 'meaning'],
    columns.map(({ column }) => [md(column.name), md(column.unit ?? ''), md(column.description ?? '')]),
  );
}
