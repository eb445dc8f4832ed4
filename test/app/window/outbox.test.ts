import { beforeEach, expect, it } from 'vitest';
import type { Change } from '../../../app/contract/messages';
import { BenchState } from '../../../app/window/state/bench.svelte';
import { leaving } from '../../../app/window/state/leaving';
import { DoubleEngine, settle, viewOf } from './doubles';

let engine: DoubleEngine;
let bench: BenchState;

beforeEach(async () => {
  engine = new DoubleEngine();
  bench = new BenchState(engine.link);
  await engine.connect(viewOf(1));
});

const reason = (cut: string, rationale: string): Change => ({ type: 'set-cut', cut, set: { rationale } });
const sent = (): unknown => engine.next('bench.change');

it('has one change under way and lets the newest of a gesture win', async () => {
  for (const text of ['a', 'ab', 'abc']) void bench.gesture(reason('disc', text), 'typing');
  expect(engine.open('bench.change')).toBe(1);
  await engine.next('bench.change').answer(viewOf(1));
  const second = engine.next('bench.change');
  expect(second.params).toEqual({ change: reason('disc', 'abc'), gesture: 'typing' });
  await second.answer(viewOf(1));
  expect(engine.open('bench.change')).toBe(0);
});

it('loses nothing when two fields are typed in while one change is under way', async () => {
  void bench.gesture(reason('disc', 'a'), 'one');
  void bench.gesture(reason('disc', 'ab'), 'one');
  void bench.gesture(reason('plane', 'x'), 'two');
  await engine.next('bench.change').answer(viewOf(1));
  expect(engine.asked[0]?.params['change']).toEqual(reason('disc', 'ab'));
  await engine.next('bench.change').answer(viewOf(1));
  expect(sent()).toMatchObject({ params: { change: reason('plane', 'x') } });
});

it('sends again what the lost engine had not taken, once', async () => {
  void bench.gesture(reason('disc', 'a'), 'typing');
  await engine.lose();
  void bench.gesture(reason('disc', 'ab'), 'typing');
  expect(bench.outbox.waiting).toBe(1);
  await engine.connect(viewOf(1, { revision: 0 }));
  expect(sent()).toMatchObject({ params: { change: reason('disc', 'ab') } });
  expect(engine.open('bench.change')).toBe(0);
});

it('does not add a cut a second time after the link broke', async () => {
  const taken = bench.change({ type: 'add-cut', kind: 'range' });
  await engine.lose();
  expect(await taken).toBe(false);
  await engine.connect(viewOf(1));
  expect(engine.open('bench.change')).toBe(0);
  expect(bench.refusals.join()).toMatch(/cannot be reached/);
});

it('does not give the changes of one bench to another', async () => {
  await engine.lose();
  void bench.change(reason('disc', 'mine'));
  await engine.connect(viewOf(1, { recipePath: '/other.halosieve.json' }));
  expect(engine.open('bench.change')).toBe(0);
  expect(bench.refusals.join()).toMatch(/Another bench/);
});

it('makes a change from the view that is true when its turn comes', async () => {
  void bench.change(reason('disc', 'a'));
  void bench.change(({ revision }) => reason('disc', `of revision ${revision}`));
  await engine.show(viewOf(1, { revision: 7 }));
  await engine.next('bench.change').answer(viewOf(1));
  expect(sent()).toMatchObject({ params: { change: reason('disc', 'of revision 7') } });
});

it('saves only after the engine has every letter', async () => {
  for (const text of ['a', 'ab']) void bench.gesture(reason('disc', text), 'typing');
  void bench.act('bench.save', {});
  await settle();
  expect(engine.open('bench.save')).toBe(0);
  await engine.next('bench.change').answer(viewOf(1));
  await engine.next('bench.change').answer(viewOf(1));
  expect(engine.open('bench.save')).toBe(1);
});

it('does not freeze when the last edit was refused', async () => {
  void bench.change(reason('disc', 'a'));
  const frozen = bench.act('edition.freeze', {});
  await engine.next('bench.change').refuse('There is no such cut.');
  expect(await frozen).toBeUndefined();
  expect(engine.open('edition.freeze')).toBe(0);
});

it('says that nothing was saved while the engine cannot be reached', async () => {
  await engine.lose();
  expect(await bench.act('bench.save', {})).toBeUndefined();
  expect(bench.refusals).toEqual(['Not done: the engine cannot be reached. What you typed is kept.']);
});

it('sends everything at once when the window goes, and holds it back when it cannot', async () => {
  for (const text of ['a', 'ab']) void bench.gesture(reason('disc', text), 'typing');
  const gone = new Event('beforeunload', { cancelable: true });
  leaving(bench)(gone);
  expect(engine.open('bench.change')).toBe(2);
  expect(gone.defaultPrevented).toBe(false);
  await engine.lose();
  void bench.gesture(reason('disc', 'abc'), 'typing');
  const held = new Event('beforeunload', { cancelable: true });
  leaving(bench)(held);
  expect(held.defaultPrevented).toBe(true);
});
