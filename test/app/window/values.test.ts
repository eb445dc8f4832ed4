import { expect, it } from 'vitest';
import { BenchState } from '../../../app/window/state/bench.svelte';
import { Values } from '../../../app/window/state/values.svelte';
import { DoubleEngine, settle, viewOf } from './doubles';

async function bench(): Promise<{ engine: DoubleEngine; values: Values }> {
  const engine = new DoubleEngine();
  const state = new BenchState(engine.link);
  await engine.connect(viewOf(2));
  return { engine, values: new Values(state) };
}
const column = (...values: number[]): object => ({ version: 1, values: { r: Float64Array.from(values) } });

it('asks once for a column and then has it', async () => {
  const { engine, values } = await bench();
  expect(values.column('r')).toBeUndefined();
  expect(values.column('r')).toBeUndefined();
  await engine.next('quantity.values').answer(column(1, 2));
  expect(values.column('r')).toEqual(Float64Array.of(1, 2));
  expect(engine.open('quantity.values')).toBe(0);
});

it('shows nothing of the bench before once another recipe of the same version is open', async () => {
  const { engine, values } = await bench();
  values.column('r');
  await engine.next('quantity.values').answer(column(1, 2));
  await engine.show(viewOf(2, { recipePath: '/other.halosieve.json', revision: 2 }));
  expect(values.column('r')).toBeUndefined();
  await engine.next('quantity.values').answer(column(8, 9));
  expect(values.column('r')).toEqual(Float64Array.of(8, 9));
});

it('drops an answer that was asked for the bench before', async () => {
  const { engine, values } = await bench();
  values.column('r');
  const late = engine.next('quantity.values');
  await engine.show(viewOf(2, { recipePath: '/other.halosieve.json', revision: 2 }));
  values.column('r');
  await late.answer(column(1, 2));
  expect(values.column('r')).toBeUndefined();
});

it('asks again for what was lost with the link', async () => {
  const { engine, values } = await bench();
  values.column('r');
  await engine.lose();
  expect(values.column('r')).toBeUndefined();
  expect(engine.open('quantity.values')).toBe(0);
  await engine.connect(viewOf(2));
  values.column('r');
  await settle();
  await engine.next('quantity.values').answer(column(1, 2));
  expect(values.column('r')).toEqual(Float64Array.of(1, 2));
});
