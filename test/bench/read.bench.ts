import { createWriteStream, mkdtempSync, rmSync } from 'node:fs';
import { once } from 'node:events';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { readSourceFile } from '../../app/engine/sourcefile';
import { RowBytes } from '../../core/formats/csv/rowbytes';
import { dice } from '../../core/mock/dice';
import { median, python, show, times } from './table';

const ROWS = 1_000_000;
const NUMBERS = 20;
const ROUNDS = 3;

const folder = mkdtempSync(join(tmpdir(), 'halosieve-read-'));
const path = join(folder, 'table.csv');
try {
  await write();
  const ours: number[] = [];
  for (let round = 0; round < ROUNDS; round++) {
    const begun = process.cpuUsage();
    const { file } = await readSourceFile(path, { fileName: 'table.csv' });
    const { user, system } = process.cpuUsage(begun);
    if (file.table.rows !== ROWS) throw new Error(`${file.table.rows} rows`);
    ours.push((user + system) / 1e6);
  }
  const peak = process.resourceUsage().maxRSS / 1024;
  const theirs = python('read_astropy.py', path)?.trim().split(' ').map(Number);
  show(`read: CSV of ${ROWS.toLocaleString('en')} rows, ${NUMBERS} numbers and 2 texts each, with its hash`, [
    ['', 'CPU', 'peak memory', ''],
    ['ours', `${median(ours).toFixed(1)} s`, `${peak.toFixed(0)} MB`, times(median(ours), theirs?.[0])],
    ['peer: astropy, fast reader', `${theirs?.[0]?.toFixed(1) ?? '–'} s`, `${theirs?.[1]?.toFixed(0) ?? '–'} MB`, ''],
  ]);
} finally {
  rmSync(folder, { recursive: true });
}

/** The numbers have all their digits, the texts are an identifier of 19 digits and a class of few letters. */
async function write(): Promise<void> {
  const d = dice(3);
  const file = createWriteStream(path);
  const rows = new RowBytes(1 << 21);
  for (const name of ['source', 'class', ...Array.from({ length: NUMBERS }, (_, at) => `q${at}`)]) rows.text(name);
  rows.endRow();
  for (let row = 0; row < ROWS; row++) {
    rows.text(`4611686${String(row).padStart(12, '0')}`);
    rows.text('KGM'[row % 3]!);
    for (let at = 0; at < NUMBERS; at++) rows.number(100 * d.normal());
    rows.endRow();
    if (rows.length > 1 << 20 && !file.write(rows.take())) await once(file, 'drain');
  }
  file.end(rows.take());
  await once(file, 'finish');
}
