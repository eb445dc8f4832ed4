import { mkdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, it } from 'vitest';
import { limit, refusal, workspace } from './workspace';

const space = workspace();

it.each([
  ['empty.csv', '', /empty\.csv: the file has no rows/],
  ['prose.csv', 'This is no table\nat all\n', /prose\.csv.*no table can be read here/],
  ['picture.csv', '\u0000\u0001\u0002\u0000', /picture\.csv: this is not a text table/],
  ['folder.csv', undefined, /folder\.csv: the file cannot be read \(it is a folder\)/],
  ['absent.csv', null, /absent\.csv: there is no such file/],
  ['recipe.json', '{ "halosieve": "recipe", ', /recipe\.json.*this is not JSON/],
  ['other.json', '{}', /other\.json: the recipe does not fit/],
])('opening %s is refused, and the bench that is open stays as it was', async (name, content, words) => {
  const path = join(space.folder, name);
  if (content === undefined) mkdirSync(path);
  else if (content !== null) writeFileSync(path, content);
  await space.engine.handle('bench.open', { path: space.recipe });
  const before = await space.change(limit(-1.2));
  const locks = space.kept('.lock');
  expect(await refusal(space.engine.handle('bench.open', { path }))).toMatch(words);
  expect(await space.engine.handle('bench.view', {})).toEqual(before);
  expect(space.kept('.lock')).toEqual(locks);
  expect((await space.engine.handle('bench.undo', {})).undo).toEqual([]);
});

it('a bad file opened first leaves no lock and no unsaved work behind', async () => {
  const path = join(space.folder, 'empty.csv');
  writeFileSync(path, '');
  expect(await refusal(space.engine.handle('bench.open', { path }))).toMatch(/no rows/);
  expect(space.kept('.lock')).toEqual([]);
  expect(space.kept('.bench.json')).toEqual([]);
});
