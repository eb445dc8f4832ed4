import { judgedObjects } from '../../../core/cuts/judged';
import { judgeLedger } from '../../../core/cuts/ledger';
import type { Cut } from '../../../core/cuts/cut';
import type { EditionInput } from '../../../core/edition/edition';
import type { Recipe } from '../../../core/edition/recipe';
import { emptyRecipe } from '../../../core/edition/recipefile';
import { solarFrame } from '../../../core/frame/solarframes';
import { deriveQuantities } from '../../../core/quantities/derive';
import { mergeSources } from '../../../core/roster/merge';
import type { QuarantinedRow, ReadSource } from '../../../core/roster/roster';
import { numberColumn } from '../../../core/table/column';
import type { MeasuredColumn } from '../../../core/table/measured';
import type { MeasuredId } from '../../../core/table/role';

const { NaN: none } = Number;

/** A source from plain lists: `[values, sigmas]` where there are errors. Lines count from 2. */
export function source(
  id: string,
  names: readonly string[],
  columns: Partial<Record<MeasuredId, readonly [values: readonly number[], sigma?: readonly number[]]>>,
  more: { quarantine?: readonly QuarantinedRow[]; extras?: Record<string, readonly number[]> } = {},
): ReadSource {
  const measured = new Map<MeasuredId, MeasuredColumn>();
  for (const [column, [values, sigma]] of Object.entries(columns)) {
    const column64 = { values: Float64Array.from(values), sigma: sigma && Float64Array.from(sigma) };
    measured.set(column as MeasuredId, column64);
  }
  return {
    id,
    fileName: `${id}.csv`,
    names,
    measured: { rows: names.length, columns: measured },
    extras: Object.entries(more.extras ?? {}).map(([name, values]) =>
      numberColumn(name, Float64Array.from(values), { unit: 'odd unit', description: 'as the source has it' }),
    ),
    lines: Int32Array.from(names, (_, row) => row + 2),
    quarantine: more.quarantine ?? [],
    problems: [],
  };
}

/** Two small invented sources: `near` has moduli and metals, `far` distances; "Ember 2" stands in both. */
export function twoSources(): ReadSource[] {
  return [
    source(
      'near',
      ['Ember 1', 'Ember 2', '=Ember 3', 'Ember 4', 'Ember 5'],
      {
        ra: [[10, 80, 150, 220, 300]],
        dec: [[-40, 10, 60, -5, 20]],
        distance_modulus: [
          [15, 16, 17, 14, none],
          [0.1, 0.1, 0.2, 0.1, none],
        ],
        pm_ra: [
          [1, -2, 0.5, 3, 0.1],
          [0.05, 0.05, 0.05, 0.05, 0.05],
        ],
        pm_dec: [
          [-1, 0.3, -0.2, 2, 0.4],
          [0.05, 0.05, 0.05, 0.05, 0.05],
        ],
        v_los: [
          [100, -150, 30, 220, none],
          [1, 1, 2, 1, none],
        ],
        feh: [
          [-1.5, -1.02, -0.4, -2.1, none],
          [0.1, 0.05, 0.1, 0.1, none],
        ],
      },
      {
        quarantine: [
          {
            source: 'near',
            line: 7,
            text: '=1+1,2',
            reason: {
              code: 'ragged-row',
              severity: 'warning',
              where: 'near.csv',
              line: 7,
              found: '2 cells',
              expected: '8 cells',
            },
          },
        ],
        extras: { 'near.snr': [12, 30, none, 8, 15] },
      },
    ),
    source('far', ['EMBER-2', 'Cinder 9', 'cinder 09'], {
      ra: [[80.0002, 200, 200]],
      dec: [[10.0002, 30, 30]],
      distance: [
        [15, 60, 61],
        [1, 5, 5],
      ],
      feh: [
        [-1.9, -1.7, -1.7],
        [0.05, 0.1, 0.1],
      ],
    }),
  ];
}

/** A cut with everything that a recipe wants of it. */
export function cut<Kind extends Cut['kind']>(
  id: string,
  kind: Kind,
  parameters: Extract<Cut, { kind: Kind }>['parameters'],
  more: Partial<Pick<Cut, 'on' | 'missing' | 'rationale' | 'evidence' | 'author' | 'time'>> = {},
): Cut {
  const common = { on: true, missing: 'unjudged', rationale: `reason of ${id}`, evidence: [], author: '', time: '' };
  return { id, kind, parameters, ...common, ...more } as unknown as Cut;
}

/** A recipe over `twoSources` with one metallicity cut. */
export function smallRecipe(change: Partial<Recipe> = {}): Recipe {
  const about = (id: string): Recipe['sources'][number] => ({
    id,
    path: `data/${id}.csv`,
    sha256: (id === 'near' ? 'a' : 'b').repeat(64),
    title: `The ${id} survey`,
    citation: id === 'near' ? '10.1234/near' : '',
    invented: false,
    missing: [],
    columns: [],
  });
  return {
    ...emptyRecipe('Embers'),
    author: 'E. Tester',
    sources: [about('near'), about('far')],
    ledger: [cut('metals', 'metallicity', { min: null, max: -1 })],
    ...change,
  };
}

/** Everything an edition is made of, through the real merging, deriving and judging. */
export function editionInput(
  recipe: Recipe = smallRecipe(),
  sources: readonly ReadSource[] = twoSources(),
  change: Partial<EditionInput> = {},
): EditionInput {
  const roster = mergeSources(sources, recipe.roster);
  const { rv, recalibration } = recipe.extinction;
  const frame = solarFrame(recipe.frame)!;
  const quantities = deriveQuantities(roster, { frame, rv, recalibration, extras: roster.extras });
  const objects = judgedObjects(quantities, roster.names, roster.keys);
  return {
    recipe,
    sources: recipe.sources.map(({ id, path, sha256 }) => {
      const rowsRead = roster.counts.find(({ source: counted }) => counted === id)?.rowsRead ?? 0;
      return { id, fileName: path.replace('data/', ''), bytes: 1234, sha256, rowsRead };
    }),
    roster,
    quantities,
    judged: judgeLedger(recipe.ledger, objects, { margin: recipe.borderlineSigma }),
    number: 3,
    time: '2026-05-06T07:08:09.000Z',
    program: { version: '9.8.7', node: '20.0.0' },
    ...change,
  };
}
