import { csvText } from '../formats/csv/write';
import { ecsvText } from '../formats/ecsv/write';
import { droppedColumns, type EditionColumn, sampleColumns } from './columns';
import { type EditionFile, editionFile, type EditionInput, inventedSources } from './edition';
import { manifestText } from './manifest';
import { quarantineText } from './quarantine';
import { readmeText } from './readme';
import { recipeText } from './recipefile';
import { reportText } from './report/page';

export type { EditionFile, EditionInput } from './edition';

/**
 * Every document of an edition but SHA256SUMS, which the bytes give.
 *
 * Pure: equal input gives equal texts, and only edition.json, README.md and report.html hold the number, the time and the
 * program. The sample and the dropped objects together are all objects of the roster, in its order.
 */
export function assembleEdition(input: EditionInput): EditionFile[] {
  const { judged } = input;
  const sample = sampleColumns(input);
  const dropped = droppedColumns(sample, input);
  const [inside, outside] = [judged.sample.rows(), judged.sample.not().rows()];
  return [
    ...tables('sample', 'Objects of the sample', sample, inside, input),
    ...tables('dropped', 'Objects that are not in the sample', dropped, outside, input),
    editionFile('quarantine.csv', () => quarantineText(input)),
    editionFile('recipe.halosieve.json', () => [recipeText(input.recipe)]),
    editionFile('edition.json', () => [manifestText(input)]),
    editionFile('README.md', () => [readmeText(input, sample)]),
    editionFile('report.html', () => [reportText(input)]),
  ];
}

function tables(
  name: string,
  what: string,
  columns: readonly EditionColumn[],
  rows: Int32Array,
  input: EditionInput,
): EditionFile[] {
  const { recipe } = input;
  const invented = inventedSources(input).join(' ');
  const about = {
    ...(invented === '' ? {} : { invented_data: `INVENTED DATA in: ${invented}` }),
    contents: what,
    title: recipe.title,
    author: recipe.author,
    solar_frame: recipe.frame,
    conventions: 'v_phi and l_z positive prograde; Galactocentric axes right-handed, the Sun at negative x',
    made_by: 'Halosieve',
  };
  const plain = columns.map(({ column }) => column);
  return [
    editionFile(`${name}.csv`, () => csvText(plain, rows)),
    editionFile(`${name}.ecsv`, () => ecsvText(columns, rows, about)),
  ];
}
