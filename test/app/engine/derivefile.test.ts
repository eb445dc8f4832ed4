import { mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, it } from 'vitest';
import { deriveFile } from '../../../app/engine/derivefile';
import { solarFrame } from '../../../core/frame/solarframes';
import { fill, mountTiny, unmount } from './tinydisk';
import { refusal } from './workspace';

const OPTIONS = { frame: solarFrame('G18')!, rv: 3.1, recalibration: 1 };
const HEAD = 'name,ra,dec,distance_kpc\n';
const ROW = 'a,10.5,-20.25,31\n';
let folder: string;
let catalogue: string;
let disk: string | undefined;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'halosieve-derive-'));
  catalogue = join(folder, 'in.csv');
  writeFileSync(catalogue, HEAD + ROW.repeat(2000));
  disk = mountTiny(join(folder, 'tiny'));
});
afterEach(() => {
  unmount(disk);
  rmSync(folder, { recursive: true });
});

it.for([
  ['at once', 2000, 0],
  ['while the input is still being read', 5, 100_000],
] as const)(
  'a disk that fills %s is named, the table of an earlier run stays, and nothing new is left',
  async ([, rows, comments], { skip }) => {
    writeFileSync(catalogue, HEAD + ROW.repeat(rows) + '# a line that only takes time to read\n'.repeat(comments));
    const tiny = disk ?? skip('it takes root to mount a small disk');
    const out = join(tiny, 'out.csv');
    writeFileSync(out, 'of before');
    fill(tiny, 0);
    expect(await refusal(deriveFile(catalogue, out, OPTIONS))).toBe(
      `${out}: the disk is full; nothing was changed. Make room and try again.`,
    );
    expect(readFileSync(out, 'utf8')).toBe('of before');
    expect(readdirSync(tiny).sort()).toEqual(['filler', 'out.csv']);
  },
);

it.each([
  ['absent/out.csv', /absent\/out\.csv: there is no folder to write it to/],
  ['in.csv/out.csv', /in\.csv\/out\.csv: there is no folder to write it to/],
  ['taken', /taken: nothing can be written here \(it is a folder\)/],
])('the output %s, which cannot be, is refused by its name, and nothing is left behind', async (name, words) => {
  mkdirSync(join(folder, 'taken'));
  const before = readdirSync(folder);
  expect(await refusal(deriveFile(catalogue, join(folder, name), OPTIONS))).toMatch(words);
  expect(readdirSync(folder)).toEqual(before);
});

it('a finished table replaces that of before', async () => {
  const out = join(folder, 'out.csv');
  writeFileSync(out, 'of before');
  expect(await deriveFile(catalogue, out, OPTIONS)).toMatchObject({ rows: 2000, rowsWithoutPosition: 0 });
  expect(readFileSync(out, 'utf8').trimEnd().split('\n')).toHaveLength(2001);
});
