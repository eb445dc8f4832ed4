import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { hostname } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { parseRecipe } from '../../../core/edition/recipefile';
import { freeze } from '../../../app/engine/freeze';
import { prepare } from '../../../app/engine/pipeline';
import { verify } from '../../../app/engine/verify';
import { refusal, workspace } from './workspace';
import { blocksOf, fill, mountTiny, unmount } from './tinydisk';

const space = workspace();
const STAMP = { now: '2026-02-03T04:05:06.000Z', version: '0.0.0' };

it('two freezes of one program into one folder do not disturb each other', async () => {
  const prepared = await prepare(parseRecipe(readFileSync(space.recipe, 'utf8'), 'demo'), space.folder);
  const editions = join(space.folder, 'editions');
  mkdirSync(editions);
  const first = freeze(prepared, editions, STAMP);
  while (!readdirSync(editions).some((name) => name.startsWith('.'))) await new Promise(setImmediate);
  const frozen = await Promise.all([first, freeze(prepared, editions, STAMP)]);
  expect(frozen.map(({ number }) => number).sort()).toEqual([1, 2]);
  expect(readdirSync(editions).sort()).toEqual(['edition-1', 'edition-2', 'shelf.json']);
});

it('what a freeze that was killed left behind is removed; what others may be writing stays', async () => {
  const editions = join(space.folder, 'editions');
  const here = createHash('sha256').update(hostname()).digest('hex').slice(0, 8);
  const gone = spawnSync(process.execPath, ['--version']).pid;
  const name = (machine: string, pid: number): string => `.halosieve-freeze-${machine}-${pid}-0a1b2c`;
  const theirs = [name('00000000', gone), name(here, process.pid), name(here, process.ppid)];
  for (const folder of [name(here, gone), ...theirs]) {
    mkdirSync(join(editions, folder), { recursive: true });
    writeFileSync(join(editions, folder, 'members.csv'), 'x');
  }
  await space.engine.handle('bench.open', { path: space.recipe });
  await space.engine.handle('edition.freeze', {});
  expect(readdirSync(editions).sort()).toEqual([...theirs, 'edition-1', 'shelf.json'].sort());
});

describe('a full disk', () => {
  let disk: string | undefined;
  beforeEach(() => (disk = mountTiny(join(space.folder, 'tiny'))));
  afterEach(() => unmount(disk));

  it.for([
    ['hardly any room', () => 1],
    ['room for the documents alone', blocksOf],
  ] as const)('with %s is named, and leaves editions and bench as they were', async ([, free], { skip }) => {
    const tiny = disk ?? skip('it takes root to mount a small disk');
    const editions = join(tiny, 'editions');
    await space.engine.handle('bench.open', { path: space.recipe });
    const { folder } = await space.engine.handle('edition.freeze', { folder: editions });
    const before = await space.engine.handle('bench.view', {});
    fill(tiny, free(folder));
    const said = await refusal(space.engine.handle('edition.freeze', { folder: editions }));
    expect(said.startsWith(editions)).toBe(true);
    expect(said).toMatch(/: the disk is full; nothing was changed\. Make room and try again\.$/);
    expect(await space.engine.handle('bench.view', {})).toEqual(before);
    expect(readdirSync(editions).sort()).toEqual(['edition-1', 'shelf.json']);
    rmSync(join(tiny, 'filler'));
    expect((await verify(folder, { sourcesFolder: space.folder })).ok).toBe(true);
    expect((await space.engine.handle('edition.freeze', { folder: editions })).number).toBe(2);
  });
});
