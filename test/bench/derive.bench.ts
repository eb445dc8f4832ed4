import { createWriteStream, mkdtempSync, rmSync } from 'node:fs';
import { once } from 'node:events';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { deriveFile } from '../../app/engine/derivefile';
import { ROWS_AT_ONCE } from '../../app/engine/derivedrows';
import { RowBytes } from '../../core/formats/csv/rowbytes';
import { solarFrame } from '../../core/frame/solarframes';
import { dice } from '../../core/mock/dice';
import { deriveQuantities } from '../../core/quantities/derive';
import { DERIVED } from '../../core/quantities/registry';
import { columnPool, type MakeColumn } from '../../core/table/columnpool';
import { type MeasuredTable, measuredRows } from '../../core/table/measured';
import { measuredTable } from '../core/quantities/measuredtable';
import { cpuSeconds, median, python, show, times } from './table';

const ROWS = 1_000_000;
const ROUNDS = 7;
const OPTIONS = { frame: solarFrame('G18')!, rv: 3.1, recalibration: 1 };

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
const errors = fill(() => 0.1);
const plain = measuredTable(values);
const full = measuredTable(Object.fromEntries(Object.entries(values).map(([id, list]) => [id, [list, errors]])));

function everything(table: MeasuredTable, make?: MakeColumn): void {
  const quantities = deriveQuantities(table, make ? { ...OPTIONS, make } : OPTIONS);
  for (const { id } of DERIVED) quantities.column(id);
}

function byBlocks(table: MeasuredTable): void {
  const pool = columnPool();
  for (let from = 0; from < ROWS; from += ROWS_AT_ONCE) {
    pool.reset();
    everything(measuredRows(table, from, Math.min(ROWS, from + ROWS_AT_ONCE)), pool.make);
  }
}

function rounds(work: () => void): { first: number; later: number } {
  const [first, ...later] = Array.from({ length: ROUNDS }, () => cpuSeconds(work));
  return { first: first!, later: median(later) };
}

async function wholeCommand(): Promise<{ ours: number; theirs: number | undefined }> {
  const folder = mkdtempSync(join(tmpdir(), 'halosieve-derive-'));
  const [input, output] = [join(folder, 'in.csv'), join(folder, 'out.csv')];
  try {
    const file = createWriteStream(input);
    const rows = new RowBytes(1 << 24);
    for (const name of ['id', 'ra', 'dec', 'distance', 'pmra', 'pmdec', 'rv']) rows.text(name);
    rows.endRow();
    for (let row = 0; row < ROWS; row++) {
      rows.text(`S${row}`);
      for (const list of Object.values(values)) rows.number(Number(list[row]!.toFixed(8)));
      rows.endRow();
    }
    file.end(rows.take());
    await once(file, 'finish');
    const begun = process.cpuUsage();
    await deriveFile(input, output, OPTIONS);
    const { user, system } = process.cpuUsage(begun);
    const theirs = python('derive_astropy_file.py', input, output);
    return { ours: (user + system) / 1e6, theirs: theirs === undefined ? undefined : Number(theirs) };
  } finally {
    rmSync(folder, { recursive: true });
  }
}

const peer = python('derive_astropy.py', String(ROWS), String(ROUNDS))?.trim().split('\n').map(Number);
const theirs = peer && { first: peer[0]!, later: median(peer.slice(1)) };
const [blocks, whole, wholeFull] = [
  rounds(() => byBlocks(plain)),
  rounds(() => everything(plain)),
  rounds(() => everything(full)),
];
const command = await wholeCommand();
const s = (seconds: number | undefined): string => (seconds === undefined ? '–' : `${seconds.toFixed(2)} s`);
show(
  `derive: all quantities of ${ROWS.toLocaleString('en')} rows, CPU seconds, first round and median of the later ones`,
  [
    ['', 'first', 'later', ''],
    ['block by block, as the command does', s(blocks.first), s(blocks.later), times(blocks.later, theirs?.later)],
    ['whole columns, as the window does', s(whole.first), s(whole.later), times(whole.later, theirs?.later)],
    ['whole columns with every error', s(wholeFull.first), s(wholeFull.later), 'the peer gives no errors'],
    ['peer: astropy, values only', s(theirs?.first), s(theirs?.later), ''],
    ['command: read, derive, write', s(command.ours), '', times(command.ours, command.theirs)],
    ['peer: astropy reads, derives, writes', s(command.theirs), '', ''],
  ],
);
