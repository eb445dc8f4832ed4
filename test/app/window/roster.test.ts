import { fireEvent, render, screen } from '@testing-library/svelte';
import { beforeAll, beforeEach, expect, it } from 'vitest';
import type { RosterAsk, RosterPage } from '../../../app/contract/messages';
import Roster from '../../../app/window/parts/Roster.svelte';
import { BenchState } from '../../../app/window/state/bench.svelte';
import { DoubleEngine, settle, viewOf } from './doubles';

let engine: DoubleEngine;
let bench: BenchState;

const pageOf = (first: number, rows: number, total: number): RosterPage => ({
  total,
  objects: Int32Array.from({ length: rows }, (_, at) => first + at),
  names: Array.from({ length: rows }, (_, at) => `Star ${first + at}`),
  keys: Array.from({ length: rows }, (_, at) => `star ${first + at}`),
  verdicts: new Uint8Array(rows),
  values: {},
});
const asked = (): RosterAsk => engine.asked.find(({ name }) => name === 'roster.rows')!.params as unknown as RosterAsk;
const answer = async (page: RosterPage): Promise<void> => {
  await settle();
  await engine.next('roster.rows').answer(page);
};
const names = (): (string | null)[] => screen.getAllByRole('rowheader').map(({ textContent }) => textContent);
const spaces = (): number[] =>
  Array.from(document.querySelectorAll<HTMLElement>('tr.space'), ({ style }) => Number.parseInt(style.height));

beforeAll(() => {
  // jsdom lays nothing out and watches no size.
  globalThis.ResizeObserver = class {
    observe(): void {}
    unobserve(): void {}
    disconnect(): void {}
  };
});
beforeEach(async () => {
  engine = new DoubleEngine();
  bench = new BenchState(engine.link);
  await engine.connect(viewOf(1000));
  render(Roster, { bench });
  await settle();
});

it('asks for the rows about the place that is scrolled to, and keeps their place in the whole', async () => {
  await answer(pageOf(0, 30, 1000));
  expect(spaces()).toEqual([0, 970 * 22]);
  const scroller = screen.getByRole('region', { name: 'Rows of the roster' });
  scroller.scrollTop = 500 * 22;
  await fireEvent.scroll(scroller);
  await settle();
  expect(asked().offset).toBe(490);
  expect(spaces()).toEqual([0, 970 * 22]);
  await answer(pageOf(490, 30, 1000));
  expect(spaces()).toEqual([490 * 22, 480 * 22]);
  expect(names()[0]).toBe('Star 490');
});

it('keeps its rows while the engine is lost', async () => {
  await answer(pageOf(0, 3, 3));
  await engine.lose();
  expect(names()).toEqual(['Star 0', 'Star 1', 'Star 2']);
});

it('turns the order when the same column is chosen again', async () => {
  await answer(pageOf(0, 3, 3));
  await fireEvent.click(screen.getByRole('button', { name: /^name/ }));
  await settle();
  expect(asked()).toMatchObject({ sort: 'name', descending: true });
});

it('shows only the verdicts that are chosen', async () => {
  await answer(pageOf(0, 3, 3));
  await fireEvent.click(screen.getByRole('button', { name: 'borderline' }));
  await settle();
  expect(asked().verdicts).toEqual(['borderline']);
});

it('is one stop of the Tab key; the arrows go from row to row and Enter chooses', async () => {
  await answer(pageOf(0, 3, 3));
  const rows = screen.getAllByRole('row').filter((row) => row.hasAttribute('tabindex'));
  expect(rows.map((row) => row.tabIndex)).toEqual([0, -1, -1]);
  rows[0]!.focus();
  await fireEvent.keyDown(rows[0]!, { key: 'ArrowDown' });
  expect(document.activeElement).toBe(rows[1]);
  expect(rows.map((row) => row.tabIndex)).toEqual([-1, 0, -1]);
  await fireEvent.keyDown(rows[1]!, { key: 'Enter' });
  expect(bench.chosen).toBe(1);
});

it('says why there is nothing to show', async () => {
  await answer(pageOf(0, 0, 0));
  expect(screen.getByText(/No object has this name/)).toBeTruthy();
});
