import { readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, it } from 'vitest';
import { limit, refusal, workspace } from './workspace';

const space = workspace();
const edit = (): string => {
  const text = readFileSync(space.recipe, 'utf8').replace(/"note": ".*"/, '"note": "edited elsewhere"');
  writeFileSync(space.recipe, text);
  return text;
};

it('unsaved work on a recipe that another program edited is told of, and undo and redo reach both', async () => {
  await space.engine.handle('bench.open', { path: space.recipe });
  const work = await space.change(limit(-1.2));
  edit();
  const view = await space.engine.handle('bench.open', { path: space.recipe });
  expect(view.notices).toMatchObject([{ code: 'work-beside-edit', where: space.recipe }]);
  expect(view.recipe.note).toBe('edited elsewhere');
  expect(view.saved).toBe(true);
  const undone = await space.engine.handle('bench.undo', {});
  expect(undone.recipe).toEqual(work.recipe);
  expect(undone).toMatchObject({ saved: false, undo: work.undo });
  expect((await space.engine.handle('bench.redo', {})).recipe).toEqual(view.recipe);
});

it('both are still reached after one more start', async () => {
  await space.engine.handle('bench.open', { path: space.recipe });
  const work = await space.change(limit(-1.2));
  edit();
  await space.engine.handle('bench.open', { path: space.recipe });
  await space.engine.close();
  const next = space.start();
  await next.handle('bench.open', { path: space.recipe });
  expect((await next.handle('bench.undo', {})).recipe).toEqual(work.recipe);
});

it('an edit of a recipe that had been saved is only one more step', async () => {
  await space.engine.handle('bench.open', { path: space.recipe });
  await space.change(limit(-1.2));
  await space.engine.handle('bench.save', {});
  edit();
  const view = await space.start().handle('bench.open', { path: space.recipe });
  expect(view).toMatchObject({ saved: true, restored: false, notices: [] });
  expect(view.recipe.note).toBe('edited elsewhere');
  expect(view.undo).toHaveLength(2);
});

it('saving does not write over an edit, and opening the file again makes room for both', async () => {
  await space.engine.handle('bench.open', { path: space.recipe });
  const work = await space.change(limit(-1.2));
  const edited = edit();
  expect(await refusal(space.engine.handle('bench.save', {}))).toMatch(/demo\.halosieve\.json: another program edited/);
  expect(readFileSync(space.recipe, 'utf8')).toBe(edited);
  await space.engine.handle('bench.open', { path: space.recipe });
  await space.engine.handle('bench.undo', {});
  await space.engine.handle('bench.save', {});
  const view = await space.engine.handle('bench.view', {});
  expect(view).toMatchObject({ saved: true, notices: [] });
  expect(view.recipe).toEqual(work.recipe);
  expect((await space.engine.handle('bench.redo', {})).recipe.note).toBe('edited elsewhere');
});

it('work on a recipe whose edit is the very same recipe, or that is gone, is saved without a word', async () => {
  await space.engine.handle('bench.open', { path: space.recipe });
  await space.change(limit(-1.2));
  await space.engine.handle('bench.save', { path: join(space.folder, 'copy.halosieve.json') });
  writeFileSync(space.recipe, readFileSync(join(space.folder, 'copy.halosieve.json')));
  await space.engine.handle('bench.open', { path: space.recipe });
  rmSync(space.recipe);
  await space.engine.handle('bench.save', {});
  expect(readFileSync(space.recipe, 'utf8')).toContain('-1.2');
});
