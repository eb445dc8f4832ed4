import type { ObjectCard } from '../../../app/contract/messages';
import { beforeEach, expect, it } from 'vitest';
import { BenchState } from '../../../app/window/state/bench.svelte';
import { Latest } from '../../../app/window/state/latest';
import { DoubleEngine, settle, viewOf } from './doubles';

let engine: DoubleEngine;
let bench: BenchState;
let heard: [unknown, number][];
let cards: Latest<number, ObjectCard>;

beforeEach(async () => {
  engine = new DoubleEngine();
  bench = new BenchState(engine.link);
  heard = [];
  cards = new Latest(
    bench,
    (object) => bench.ask('object.card', { object }),
    (answer, object) => heard.push([answer, object]),
  );
  await engine.connect(viewOf(9));
});

it('has one question under way and asks only the newest of those that waited', async () => {
  [1, 2, 3, 4].forEach((object) => cards.put(object));
  expect(engine.open('object.card')).toBe(1);
  await engine.next('object.card').answer('one');
  expect(engine.next('object.card').params).toEqual({ object: 4 });
  expect(heard).toEqual([['one', 1]]);
});

it('does not hear an answer that was asked of another bench', async () => {
  cards.put(1);
  await engine.show(viewOf(9, { recipePath: '/other.halosieve.json' }));
  await engine.next('object.card').answer('of the first');
  expect(heard).toEqual([]);
});

it('goes on after a refusal and after a lost link', async () => {
  cards.put(1);
  await engine.next('object.card').refuse('There is no such object.');
  cards.put(2);
  await engine.lose();
  await engine.connect(viewOf(9));
  cards.put(3);
  await settle();
  await engine.next('object.card').answer('three');
  expect(heard).toEqual([['three', 3]]);
});
