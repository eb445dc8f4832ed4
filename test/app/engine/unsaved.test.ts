import { spawnSync } from 'node:child_process';
import { existsSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, it } from 'vitest';
import type { BenchView } from '../../../app/contract/messages';
import { refusal, workspace } from './workspace';

const space = workspace();

/** A bench without a recipe file and with two steps, as a program that crashed leaves it. */
async function crashed(): Promise<BenchView> {
  await space.engine.handle('bench.open', { path: join(space.folder, 'wide.csv') });
  const view = await space.change({ type: 'set-borderline', sigma: 2 });
  await expect.poll(() => existsSync(view.keptIn)).toBe(true);
  const gone = spawnSync(process.execPath, ['--version']).pid;
  for (const lock of space.kept('.lock')) writeFileSync(lock, String(gone));
  return view;
}

it('unsaved work of a program that is gone is told of at the next start and comes back with its history', async () => {
  const before = await crashed();
  const next = space.start();
  const { notices } = await next.handle('bench.open', { path: space.recipe });
  expect(notices).toMatchObject([
    { code: 'unsaved-left', where: before.keptIn, text: expect.stringContaining('wide.csv') },
  ]);
  const back = await next.handle('bench.open', { path: notices[0]!.where! });
  expect(back).toMatchObject({ restored: true, saved: false, recipePath: undefined, notices: [] });
  expect(back.recipe).toEqual(before.recipe);
  expect(back.undo).toEqual(before.undo);
  expect((await next.handle('bench.undo', {})).recipe.borderlineSigma).toBe(1);
});

it('what a running program has open is neither offered nor given away', async () => {
  const { keptIn } = await crashed();
  for (const lock of space.kept('.lock')) writeFileSync(lock, String(process.ppid));
  const next = space.start();
  expect((await next.handle('bench.new', {})).notices).toEqual([]);
  expect(await refusal(next.handle('bench.open', { path: keptIn }))).toContain(`process ${process.ppid}`);
});

it('two unsaved benches of one program are kept apart, and the one that is left is told of', async () => {
  const first = await space.engine.handle('bench.open', { path: join(space.folder, 'wide.csv') });
  const second = await space.engine.handle('bench.open', { path: join(space.folder, 'deep.tsv') });
  expect(second.notices.map(({ where }) => where)).toEqual([first.keptIn]);
  const back = await space.engine.handle('bench.open', { path: first.keptIn });
  expect(back.sources.map(({ source }) => source.id)).toEqual(['wide']);
  expect(back.notices.map(({ where }) => where)).toEqual([second.keptIn]);
});

it.each(['saved', 'reverted'])('a bench that was %s is not offered again', async (how) => {
  const { keptIn } = await space.engine.handle('bench.open', { path: join(space.folder, 'wide.csv') });
  if (how === 'saved') await space.engine.handle('bench.save', { path: join(space.folder, 'mine') });
  else await space.engine.handle('bench.revert', {});
  expect((await space.start().handle('bench.new', {})).notices).toEqual([]);
  expect(await refusal(space.start().handle('bench.open', { path: keptIn }))).toContain('no unsaved work');
});
