import { fireEvent, render, screen } from '@testing-library/svelte';
import { beforeEach, expect, it } from 'vitest';
import Histogram from '../../../app/window/parts/Histogram.svelte';
import { BenchState } from '../../../app/window/state/bench.svelte';
import type { BenchView } from '../../../app/contract/messages';
import { cutOf, DoubleEngine, settle, viewOf } from './doubles';

let engine: DoubleEngine;
let bench: BenchState;
const first = cutOf('range', { id: 'first' });
const second = cutOf('range', { id: 'second' });
const limit = {
  parameter: 'max',
  label: '[Fe/H]',
  quantity: 'feh',
  unit: 'dex',
  value: -1,
  keeps: 'below',
  absolute: false,
} as const;
const bins = { min: -3, max: 0, all: new Float64Array(60), reaching: new Float64Array(60), missing: 0 };

function ledger(...cuts: { cut: object }[]): BenchView {
  const bare = viewOf(3);
  return { ...bare, recipe: { ...bare.recipe, ledger: cuts.map(({ cut }) => cut) } as BenchView['recipe'] };
}

beforeEach(async () => {
  engine = new DoubleEngine();
  bench = new BenchState(engine.link);
  await engine.connect(ledger(first, second));
  render(Histogram, { bench, cut: 'first', limit, proposals: [] });
  await settle();
  await engine.next('cut.histogram').answer(bins);
});

it('is not asked for again when only a later cut changed', async () => {
  await engine.show(ledger(first, { cut: { ...second.cut, on: false } }));
  expect(engine.open('cut.histogram')).toBe(0);
  await engine.show(ledger({ cut: { ...first.cut, on: false } }, second));
  expect(engine.open('cut.histogram')).toBe(1);
});

it('moves step by step from where the limit is to be, not from where the engine still has it', async () => {
  const handle = screen.getByRole('slider');
  await fireEvent.keyDown(handle, { key: 'ArrowRight' });
  await fireEvent.keyDown(handle, { key: 'ArrowRight', repeat: true });
  await fireEvent.keyDown(handle, { key: 'ArrowRight', repeat: true });
  expect(Number(handle.getAttribute('aria-valuenow'))).toBeCloseTo(-0.85, 10);
  await engine.next('bench.change').answer(viewOf(3));
  const { change } = engine.next('bench.change').params;
  expect(change).toMatchObject({ cut: 'first', set: { parameters: { max: -0.85 } } });
});
