import { execFileSync } from 'node:child_process';
import { cpus } from 'node:os';
import type { Judged } from '../../core/cuts/contract';
import type { Cut } from '../../core/cuts/cut';
import { judgedObjects } from '../../core/cuts/judged';
import { judgeLedger } from '../../core/cuts/ledger';
import { outcomeCache } from '../../core/cuts/outcomecache';
import type { QuantityColumn } from '../../core/quantities/quantity';

export const name = 'ledger of six cuts, one limit moved';

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

function median(times: readonly number[]): number {
  return [...times].sort((a, b) => a - b)[times.length >> 1] ?? Number.NaN;
}

function timed(step: () => unknown): number {
  const start = performance.now();
  step();
  return performance.now() - start;
}

/** The same limit, moved, and the combination of six masks with counts, in numpy; undefined where there is none. */
function numpyMs(): number | undefined {
  const script = `
import time, numpy as np
rng = np.random.default_rng(1)
n = ${ROWS}
feh, sigma = rng.normal(-1.4, 0.5, n), np.full(n, 0.1)
others = [rng.random(n) < 0.7 for _ in range(5)]
def step(limit):
    sure, passes, possible = feh + sigma <= limit, feh <= limit, feh - sigma <= limit
    unknown = np.isnan(feh)
    for mask in others:
        sure, passes, possible = sure & mask, passes & mask, possible & mask
    verdict = np.where(sure, 0, np.where(~possible, 2, np.where(unknown, 3, 1))).astype(np.uint8)
    masks = [feh <= limit] + others
    fails = np.zeros(n, np.uint8)
    for mask in masks:
        fails += ~mask
    left, table = np.ones(n, bool), []
    for mask in masks:
        left = left & mask
        table.append((left.sum(), (~mask).sum(), (~mask & (fails == 1)).sum()))
    return verdict, np.bincount(verdict, minlength=4), table
times = []
for i in range(${STEPS}):
    start = time.perf_counter(); step(-1 - 0.001 * i); times.append(time.perf_counter() - start)
print(sorted(times)[${STEPS >> 1}] * 1000)`;
  try {
    return Number(
      execFileSync('/usr/bin/python3', ['-c', script], { encoding: 'utf8', stdio: ['ignore', 'pipe', 'ignore'] }),
    );
  } catch {
    return undefined;
  }
}

/** Rows of a table: what was done, milliseconds (median), beside. */
export function run(): Promise<string[][]> {
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
  const numpy = numpyMs();
  const ms = (value: number): string => `${value.toFixed(1)} ms`;
  const beside = numpy === undefined ? 'numpy not here' : `numpy ${ms(numpy)}`;
  return Promise.resolve([
    [`${ROWS.toLocaleString('en')} objects, ${cpus()[0]?.model ?? ''}`, 'median', 'beside'],
    ['one limit moved: verdicts, counts, attrition', ms(median(moved)), beside],
    ['slowest of these moves', ms(Math.max(...moved)), ''],
    ['a new pole', ms(median(turned)), ''],
    ['a new lasso of 60 vertices, with errors', ms(median(drawn)), ''],
    ['whole ledger, first time', ms(first), ''],
  ]);
}
