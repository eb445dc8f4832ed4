import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, it } from 'vitest';
import type { Progress } from '../../../app/contract/messages';
import { assemble, prepare } from '../../../app/engine/pipeline';
import { parseRecipe } from '../../../core/edition/recipefile';
import { limit, refusal, workspace } from './workspace';

const space = workspace();
const rows = (count: number): string => Array.from({ length: count }, (_, at) => `S${at},10.5,-20.5\n`).join('');

it('other work gets its turn between the steps of merging', async () => {
  const { recipe, folder, files, roster } = await prepare(
    parseRecipe(readFileSync(space.recipe, 'utf8'), 'demo'),
    space.folder,
  );
  let [turns, merging] = [0, true];
  const take = (): void => {
    turns++;
    if (merging) setImmediate(take);
  };
  setImmediate(take);
  const again = await assemble(recipe, folder, files, {});
  merging = false;
  // Two sources are understood, and each is matched in steps.
  expect(turns).toBeGreaterThan(6);
  expect(again.roster).toEqual(roster);
});

it('merging many rows is announced and can be stopped, and the bench stays as it was', async () => {
  await space.engine.handle('bench.open', { path: space.recipe });
  const before = await space.change(limit(-1.2));
  const many = join(space.folder, 'many.csv');
  writeFileSync(many, `name,ra,dec\n${rows(100_001)}`);
  let stopped: Promise<unknown> = Promise.resolve('nothing was announced');
  space.engine.listen((name, data) => {
    if (name === 'progress' && (data as Progress | undefined)?.label === 'Merging the sources')
      stopped = space.engine.handle('work.stop', {});
  });
  expect(await refusal(space.change({ type: 'add-source', path: many }))).toMatch(/stopped before it was done/i);
  expect(await stopped).toEqual({ stopped: true });
  expect(await space.engine.handle('bench.view', {})).toEqual(before);
});
