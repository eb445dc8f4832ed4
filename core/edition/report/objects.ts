import type { Judged, Limit } from '../../cuts/contract';
import type { Cut } from '../../cuts/cut';
import { judgedObjects } from '../../cuts/judged';
import { cutKind } from '../../cuts/kinds';
import { unmatchedNames } from '../../cuts/named';
import { VERDICTS } from '../../cuts/result';
import { failedCuts, nearCuts } from '../../cuts/way';
import type { EditionInput } from '../edition';
import { measuredText, plainText } from '../rounded';
import { withUnit } from './axislabel';
import { html, type Html } from './html';
import { markIcon, standingOf } from './marks';
import { firstRows, table } from './table';

const MOST = 200;

/** Objects whose verdict hangs on their errors, each with the limit it stands on. */
export function borderlineSection(input: EditionInput): Html {
  const { judged, roster, recipe, quantities } = input;
  const all = Array.from(judged.verdicts.keys()).filter(
    (object) => VERDICTS[judged.verdicts[object]!] === 'borderline',
  );
  const objects = judgedObjects(quantities, roster.names, roster.keys);
  const { shown, rest } = firstRows(all, MOST, 'sample.csv and dropped.csv');
  const rows = shown.map((object) => [
    roster.names[object]!,
    html`${markIcon(standingOf(judged, object))} ${judged.sample.has(object) ? 'in' : 'out'}`,
    nearCuts(recipe.ledger, judged, object).join(', '),
    html`${nearValues(input, objects, object).map((words, at) => html`${at === 0 ? '' : '; '}${words}`)}`,
  ]);
  return html`<section aria-labelledby="borderline">
    <h2 id="borderline">Borderline objects</h2>
    ${
      all.length === 0
        ? html`<p>No object stands within the margin of a limit.</p>`
        : html`${table(
            `Objects that values wrong by ${recipe.borderlineSigma} σ could move across a limit`,
            [{ text: 'Object' }, { text: 'Sample' }, { text: 'Decided by' }, { text: 'Value and limit' }],
            rows,
          )}${rest}`
    }
  </section>`;
}

function nearValues({ recipe, judged }: EditionInput, objects: Judged, object: number): string[] {
  const near = new Set(nearCuts(recipe.ledger, judged, object));
  return recipe.ledger
    .filter((cut) => near.has(cut.id))
    .flatMap((cut) => {
      const kind = cutKind(cut.kind);
      const limits = kind.limits(cut.parameters);
      if (limits.length === 0) return [`on the outline that ${cut.id} draws`];
      return limits.flatMap((limit) =>
        nearValue(limit, kind.limitColumn(limit, cut.parameters, objects), object, recipe.borderlineSigma),
      );
    });
}

/** "z = 3.9 ± 0.3 kpc, kept when |z| ≥ 4 kpc", when the limit lies within the margin of the value. */
function nearValue(limit: Limit, column: ReturnType<Judged['column']>, object: number, margin: number): string[] {
  const [value, sigma] = [column?.values[object] ?? Number.NaN, column?.sigma?.[object] ?? Number.NaN];
  const size = limit.absolute ? Math.abs(value) : value;
  if (!(Math.abs(size - limit.value) <= margin * sigma)) return [];
  const bound = `${limit.keeps === 'below' ? '≤' : '≥'} ${withUnit(plainText(limit.value), limit.unit)}`;
  const name = limit.absolute ? `|${limit.label}| ` : '';
  return [`${limit.label} = ${withUnit(measuredText(value, sigma), limit.unit)}, kept when ${name}${bound}`];
}

/** Objects decided by eye, with the reason and what the other cuts say of them. */
export function namedSection(input: EditionInput): Html | undefined {
  const lists = input.recipe.ledger.filter((cut) => cut.kind === 'named');
  if (lists.length === 0) return undefined;
  return html`<section aria-labelledby="named">
    <h2 id="named">Named objects</h2>
    ${lists.map((cut) => namedTable(cut, input))}
  </section>`;
}

function namedTable(cut: Extract<Cut, { kind: 'named' }>, { recipe, roster, judged }: EditionInput): Html {
  const { objects } = cut.parameters;
  const strangers = new Set(unmatchedNames(objects, new Set(roster.keys)));
  const rowOf = new Map(roster.keys.map((key, row) => [key, row]));
  const others = recipe.ledger.map((one) => (one.id === cut.id ? { ...one, on: false } : one));
  const rows = objects.map(({ key, name, action, reason }) => {
    const object = rowOf.get(key);
    const failed = object === undefined ? [] : failedCuts(others, judged, object);
    const say = failed.length === 0 ? 'it passes' : `fails ${failed.join(', ')}`;
    return [
      name,
      action,
      reason || 'none written',
      strangers.has(name) ? 'no object of the roster has this name' : say,
    ];
  });
  return objects.length === 0
    ? html`<p>${cut.id} names no object.</p>`
    : table(
        `${cut.id}${cut.on ? '' : ' (switched off)'}: objects decided by eye`,
        [{ text: 'Object' }, { text: 'Action' }, { text: 'Reason' }, { text: 'The other cuts' }],
        rows,
      );
}
