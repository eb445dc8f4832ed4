import { execFileSync } from 'node:child_process';
import { join } from 'node:path';
import { solarFrame } from '../../core/frame/solarframes';
import { dice } from '../../core/mock/dice';
import { deriveQuantities } from '../../core/quantities/derive';
import { DERIVED } from '../../core/quantities/registry';
import { measuredTable } from '../core/quantities/measuredtable';

const ROWS = 1_000_000;
const ROUNDS = 3;

export const name = `derive: every quantity of ${ROWS.toLocaleString('en')} rows, CPU seconds, median of ${ROUNDS} alternating rounds`;

/** Ours without and with errors, and astropy (values only), in turn. */
export async function run(): Promise<string[][]> {
  const d = dice(1);
  const fill = (make: () => number): number[] => Array.from({ length: ROWS }, make);
  const values = {
    ra: fill(() => 360 * d.uniform()),
    dec: fill(() => (Math.asin(2 * d.uniform() - 1) * 180) / Math.PI),
    distance: fill(() => 1 + 99 * d.uniform()),
    pm_ra: fill(() => 3 * d.normal()),
    pm_dec: fill(() => 3 * d.normal()),
    v_los: fill(() => 150 * d.normal()),
  };
  const errors = Object.fromEntries(Object.entries(values).map(([id, list]) => [id, [list, list.map(() => 0.1)]]));
  const [plain, withErrors] = [measuredTable(values), measuredTable(errors)];
  const [bare, full, theirs]: number[][] = [[], [], []];
  for (let round = 0; round < ROUNDS; round++) {
    bare!.push(cpuSeconds(plain));
    full!.push(cpuSeconds(withErrors));
    theirs!.push(
      Number(execFileSync('/usr/bin/python3', [join(import.meta.dirname, 'derive_astropy.py'), String(ROWS)])),
    );
  }
  const [a, b, c] = [median(bare!), median(full!), median(theirs!)];
  return Promise.resolve([
    ['ours, values', `${a.toFixed(2)} s`, `${(c / a).toFixed(1)} times as fast as astropy`],
    ['ours, values and errors', `${b.toFixed(2)} s`, `${(c / b).toFixed(1)} times as fast as astropy without errors`],
    ['astropy, values', `${c.toFixed(2)} s`, ''],
  ]);
}

function cpuSeconds(table: ReturnType<typeof measuredTable>): number {
  const begun = process.cpuUsage();
  const quantities = deriveQuantities(table, { frame: solarFrame('G18')!, rv: 3.1, recalibration: 1 });
  for (const { id } of DERIVED) quantities.column(id);
  const { user, system } = process.cpuUsage(begun);
  return (user + system) / 1e6;
}

function median(list: readonly number[]): number {
  return list.toSorted((p, q) => p - q)[Math.floor(list.length / 2)]!;
}
