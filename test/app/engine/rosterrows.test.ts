import { expect, it } from 'vitest';
import type { RosterAsk } from '../../../app/contract/messages';
import { limit, workspace } from './workspace';

const space = workspace();

const ask = (more: Partial<RosterAsk> = {}): RosterAsk => ({
  offset: 0,
  count: 500,
  columns: ['r'],
  sort: 'name',
  descending: false,
  search: '',
  verdicts: [],
  ...more,
});
const rows = (more?: Partial<RosterAsk>) => space.engine.handle('roster.rows', ask(more));

it('names are found however they are spelled, and numbers stand in their order', async () => {
  await space.engine.handle('bench.open', { path: space.recipe });
  for (const search of ['brevane 12', 'Brévane 12', 'BREVANE-12', 'brévane12']) {
    expect((await rows({ search })).total, search).toBe(1);
  }
  expect((await rows({ search: 'no such name' })).total).toBe(0);
  const { keys } = await rows({ search: 'brevane' });
  const numbers = keys.map((key) => Number(/\d+/.exec(key)![0]));
  expect(numbers.length).toBeGreaterThan(20);
  expect(numbers).toEqual(numbers.toSorted((a, b) => a - b));
  expect((await rows({ search: 'brevane', descending: true })).keys).toEqual(keys.toReversed());
});

it('values are sorted with what is missing last, either way', async () => {
  await space.engine.handle('bench.open', { path: space.recipe });
  for (const descending of [false, true]) {
    const { values } = await rows({ sort: 'v_r', columns: ['v_r'], descending });
    const column = [...values['v_r']!];
    const known = column.filter((value) => !Number.isNaN(value));
    expect(known.length).toBeLessThan(column.length);
    expect(column.slice(known.length).every(Number.isNaN)).toBe(true);
    expect(known).toEqual(known.toSorted((a, b) => (descending ? b - a : a - b)));
  }
});

it('verdicts are sorted anew when a limit moves', async () => {
  await space.engine.handle('bench.open', { path: space.recipe });
  const sorted = async (): Promise<number[]> => [...(await rows({ sort: 'verdict' })).verdicts];
  const before = await sorted();
  await space.change(limit(-2));
  const after = await sorted();
  expect(after).toEqual(after.toSorted((a, b) => a - b));
  expect(after).not.toEqual(before);
});
