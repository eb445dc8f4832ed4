import { expect, it } from 'vitest';
import { BenchState } from '../../../app/window/state/bench.svelte';
import { DoubleEngine, viewOf } from './doubles';

it('takes the first view after the link was lost, though the engine counts anew', async () => {
  const engine = new DoubleEngine();
  const bench = new BenchState(engine.link);
  await engine.connect(viewOf(3, { revision: 40 }));
  await engine.lose();
  expect(bench.connected).toBe(false);
  expect(bench.view?.verdicts).toHaveLength(3);
  await engine.connect(viewOf(5, { revision: 1 }));
  expect(bench.view?.verdicts).toHaveLength(5);
});

it('takes a lower revision also when only the engine behind the link was restarted', async () => {
  const engine = new DoubleEngine();
  const bench = new BenchState(engine.link);
  await engine.connect(viewOf(3, { revision: 40 }));
  await engine.show(viewOf(5, { revision: 1 }));
  expect(bench.view?.verdicts).toHaveLength(5);
});

it('does not go back to an answer that a newer view overtook', async () => {
  const engine = new DoubleEngine();
  const bench = new BenchState(engine.link);
  await engine.connect(viewOf(3));
  await engine.lose();
  engine.reach();
  const greeting = engine.next('bench.view');
  await engine.show(viewOf(5, { revision: 2 }));
  await greeting.answer(viewOf(4));
  expect(bench.view?.verdicts).toHaveLength(5);
});

it('ends the progress of an engine that is gone', async () => {
  const engine = new DoubleEngine();
  const bench = new BenchState(engine.link);
  await engine.connect(viewOf(1));
  bench.progress = { label: 'Reading', share: 0.5 };
  await engine.lose();
  expect(bench.progress).toBeUndefined();
});
