import { failedCuts, nearCuts, unjudgingCuts } from '../cuts/way';
import type { Outcome } from '../cuts/contract';
import { VERDICTS } from '../cuts/result';
import { textColumn, type TextColumn } from '../table/column';
import type { EditionInput } from './edition';

/** Parts of a list of cuts in one cell; no cut id holds it. */
const SEPARATOR = ' ';

function perObject(
  { roster }: EditionInput,
  name: string,
  description: string,
  cell: (object: number) => readonly string[] | string,
): TextColumn {
  const cells = Array.from({ length: roster.rows }, (_, object) => {
    const found = cell(object);
    return typeof found === 'string' ? found : found.join(SEPARATOR);
  });
  return textColumn(name, cells, { description });
}

/** What the ledger says of each object and which cuts it rests on; every list of cuts is in the order of the ledger. */
export function decisionColumns(input: EditionInput): TextColumn[] {
  const { recipe, judged } = input;
  const verdict = (object: number): string => VERDICTS[judged.verdicts[object]!]!;
  return [
    perObject(input, 'verdict', 'What the whole ledger says: kept, borderline, dropped or unjudged', verdict),
    perObject(input, 'borderline_by', 'Ids of the cuts on whose limit a borderline object stands', (object) =>
      verdict(object) === 'borderline' ? nearCuts(recipe.ledger, judged, object) : [],
    ),
    perObject(input, 'kept_by', 'Id of the cut that keeps the object by name whatever the others say', (object) =>
      keepingCuts(input, object),
    ),
  ];
}

/** Why each object is not in the sample. */
export function dropColumns(input: EditionInput): TextColumn[] {
  const { recipe, judged } = input;
  return [
    perObject(input, 'dropped_by', 'Ids of all enabled cuts that the object fails at its best values', (object) =>
      failedCuts(recipe.ledger, judged, object),
    ),
    perObject(
      input,
      'unjudged_by',
      'Ids of the enabled cuts that cannot judge the object for want of a value',
      (object) => unjudgingCuts(recipe.ledger, judged, object),
    ),
  ];
}

/** Ids of the enabled cuts that keep an object by name. */
export function keepingCuts({ recipe, judged }: EditionInput, object: number): string[] {
  const forced = (outcome: Outcome): boolean => outcome.forced?.has(object) === true;
  return recipe.ledger.filter((cut, at) => cut.on && forced(judged.outcomes[at]!)).map(({ id }) => id);
}
