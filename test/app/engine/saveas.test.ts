import { existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeEach, expect, it } from 'vitest';
import type { BenchView } from '../../../app/contract/messages';
import { limit, refusal, workspace } from './workspace';

const space = workspace();
let before: BenchView;
let elsewhere: string;
beforeEach(async () => {
  await space.engine.handle('bench.open', { path: space.recipe });
  before = await space.change(limit(-1.2));
  mkdirSync(join(space.folder, 'sub'));
  elsewhere = join(space.folder, 'sub', 'other.halosieve.json');
});

async function unchanged(): Promise<void> {
  expect(await space.engine.handle('bench.view', {})).toEqual(before);
  expect(space.kept('.lock')).toHaveLength(1);
}

it('a recipe that another program has open is not written over', async () => {
  writeFileSync(elsewhere, 'theirs');
  const next = space.start();
  await next.handle('bench.open', { path: join(space.folder, 'wide.csv') });
  await next.handle('bench.save', { path: elsewhere });
  const theirs = readFileSync(elsewhere, 'utf8');
  const lock = space.kept('.lock').find((path) => !path.startsWith(before.keptIn.replace('.bench.json', '')))!;
  writeFileSync(lock, String(process.ppid));
  expect(await refusal(space.engine.handle('bench.save', { path: elsewhere }))).toContain(`process ${process.ppid}`);
  expect(readFileSync(elsewhere, 'utf8')).toBe(theirs);
  expect(await space.engine.handle('bench.view', {})).toEqual(before);
});

it('a place that cannot be written leaves the bench, its work and its lock as they were', async () => {
  const path = join(space.folder, 'wide.csv', 'other.halosieve.json');
  expect(await refusal(space.engine.handle('bench.save', { path }))).toContain(path);
  await unchanged();
  expect((await space.engine.handle('bench.undo', {})).undo).toEqual([]);
});

it('a bench that is saved in another folder finds its sources there after an undo too, without reading them again', async () => {
  for (const name of ['wide.csv', 'deep.tsv']) renameSync(join(space.folder, name), join(space.folder, `${name}.gone`));
  await space.engine.handle('bench.save', { path: elsewhere });
  expect(existsSync(elsewhere)).toBe(true);
  const undone = await space.engine.handle('bench.undo', {});
  expect(undone.recipe.sources.map(({ path }) => path)).toEqual(['../wide.csv', '../deep.tsv']);
  expect(undone.counts.objects).toBe(before.counts.objects);
  expect(space.kept('.lock')).toHaveLength(1);
});
