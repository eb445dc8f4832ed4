import type { Judged } from '../../core/cuts/contract';
import type { Cut } from '../../core/cuts/cut';
import { judgedObjects } from '../../core/cuts/judged';
import { judgeLedger } from '../../core/cuts/ledger';
import { outcomeCache } from '../../core/cuts/outcomecache';
import type { QuantityColumn } from '../../core/quantities/quantity';
import { median, python, show } from './table';

const ROWS = 1_000_000;
const STEPS = 41;

/** A fixed stream of uniform numbers in [0, 1): the same data in every run. */
function uniform(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 2 ** 32;
  };
}

function column(seed: number, centre: number, width: number, sigma: number): QuantityColumn {
  const next = uniform(seed);
  const bell = (): number => next() + next() + next() - 1.5;
  return {
    values: Float64Array.from({ length: ROWS }, () => (next() < 0.02 ? Number.NaN : centre + width * bell())),
    sigma: Float64Array.from({ length: ROWS }, () => sigma * (0.5 + next())),
  };
}

function invented(): Judged {
  const columns = new Map<string, QuantityColumn>([
    ['feh', column(1, -1.4, 1, 0.1)],
    ['ebv', column(2, 0.2, 0.3, 0.03)],
    ['gal_b', column(3, 0, 90, 0.0001)],
    ['r', column(4, 30, 40, 3)],
    ['toomre_speed', column(5, 250, 300, 30)],
    ...['x', 'y', 'z'].map((id, at) => [id, column(6 + at, 0, 30, 2)] as const),
    ...['v_x', 'v_y', 'v_z'].map((id, at) => [id, column(9 + at, 0, 250, 20)] as const),
  ]);
  const definitions = [] as const;
  const set = { rows: ROWS, definitions, column: (id: string) => columns.get(id), phaseCovariance: () => undefined };
  return judgedObjects(set, [], []);
}

const common = {
  on: true,
  missing: 'unjudged',
  rationale: '',
  evidence: [] as string[],
  author: '',
  time: '',
} as const;

const BAND: [number, number][] = Array.from({ length: 60 }, (_, at) => {
  const turn = (2 * Math.PI * at) / 60;
  const radius = 1 + 0.2 * Math.sin(7 * turn);
  return [-1.4 + 0.5 * radius * Math.cos(turn), 30 + 20 * radius * Math.sin(turn)];
});

const LASSO: Cut = {
  ...common,
  id: 'lasso',
  kind: 'lasso',
  parameters: { x: 'feh', y: 'r', xLog: false, yLog: false, polygon: BAND, action: 'drop' },
};

const PLANE: Extract<Cut, { kind: 'plane' }> = {
  ...common,
  id: 'plane',
  kind: 'plane',
  parameters: {
    preset: null,
    poleL: 273.75,
    poleB: -13.46,
    measure: 'orbital-pole',
    sense: 'with',
    angleMax: 20,
    action: 'drop',
  },
};

function ledger(fehMax: number): Cut[] {
  return [
    { ...common, id: 'metallicity', kind: 'metallicity', parameters: { min: null, max: fehMax } },
    { ...common, id: 'extinction', kind: 'extinction', parameters: { ebvMax: 0.3, avMax: null, absBMin: 15 } },
    {
      ...common,
      id: 'disc',
      kind: 'disc',
      parameters: { combine: 'all', absZMin: 4, cylRMin: null, vPhiMax: null, toomreMin: 210 },
    },
    PLANE,
    { ...common, id: 'range', kind: 'range', parameters: { quantity: 'r', min: 10, max: 60, absolute: false } },
    LASSO,
  ];
}

function timed(step: () => unknown): number {
  const start = performance.now();
  step();
  return performance.now() - start;
}

const objects = invented();
const cache = outcomeCache();
const judge = (cuts: readonly Cut[]): unknown => judgeLedger(cuts, objects, { margin: 1, cache });
const first = timed(() => judge(ledger(-1)));
const moved = Array.from({ length: STEPS }, (_, at) => timed(() => judge(ledger(-1.001 - 0.001 * at))));
const turned = Array.from({ length: 5 }, (_, at) => {
  const pole = { ...PLANE, parameters: { ...PLANE.parameters, poleL: 200 + at } };
  return timed(() => judge(ledger(-1).with(3, pole)));
});
const drawn = Array.from({ length: 5 }, (_, at) => {
  const shape = { ...LASSO, parameters: { ...LASSO.parameters, polygon: BAND.map(([x, y]) => [x + at / 100, y]) } };
  return timed(() => judge(ledger(-1).with(5, shape as Cut)));
});
const numpy = python('ledger_numpy.py', String(ROWS), String(STEPS));
const ms = (value: number): string => `${value.toFixed(1)} ms`;
const beside = numpy === undefined ? 'numpy not here' : `numpy ${ms(Number(numpy))}`;
show(`ledger of six cuts on ${ROWS.toLocaleString('en')} objects, milliseconds`, [
  ['', 'median', 'beside'],
  ['one limit moved: verdicts, counts, attrition', ms(median(moved)), beside],
  ['slowest of these moves', ms(Math.max(...moved)), ''],
  ['a new pole', ms(median(turned)), ''],
  ['a new lasso of 60 vertices, with errors', ms(median(drawn)), ''],
  ['whole ledger, first time', ms(first), ''],
]);
