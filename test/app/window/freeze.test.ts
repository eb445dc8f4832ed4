import { fireEvent, render, screen } from '@testing-library/svelte';
import { beforeAll, beforeEach, expect, it, vi } from 'vitest';
import FreezeDialog from '../../../app/window/parts/FreezeDialog.svelte';
import { BenchState } from '../../../app/window/state/bench.svelte';
import { DoubleEngine, settle, viewOf } from './doubles';

let engine: DoubleEngine;
let bench: BenchState;

beforeAll(() => {
  // jsdom has no modal dialogs.
  HTMLDialogElement.prototype.showModal = function () {
    this.open = true;
  };
});
beforeEach(async () => {
  engine = new DoubleEngine();
  bench = new BenchState(engine.link);
  await engine.connect(viewOf(4));
});
const freeze = (): HTMLButtonElement => screen.getByRole('button', { name: 'Freeze' });

it('writes title and note into the recipe before it freezes', async () => {
  render(FreezeDialog, { bench, onclose: vi.fn() });
  await fireEvent.input(screen.getByLabelText('Title'), { target: { value: 'Clusters beyond 20 kpc' } });
  await fireEvent.click(freeze());
  expect(engine.open('edition.freeze')).toBe(0);
  const change = engine.next('bench.change');
  expect(change.params['change']).toMatchObject({ type: 'set-title', title: 'Clusters beyond 20 kpc' });
  await change.answer(viewOf(4));
  await engine.next('edition.freeze').answer({ folder: '/e/edition-1', number: 1, sample: 3, dropped: 1 });
  expect(screen.getByRole('status').textContent).toMatch(/Edition 1 is written/);
});

it('refuses an empty title and freezes nothing', async () => {
  render(FreezeDialog, { bench, onclose: vi.fn() });
  await fireEvent.input(screen.getByLabelText('Title'), { target: { value: '  ' } });
  await fireEvent.click(freeze());
  await settle();
  expect(engine.asked).toEqual([]);
  expect(screen.getByRole('alert').textContent).toMatch(/Not done/);
});

it('keeps a note that was typed when the dialog is left without freezing', async () => {
  const { unmount } = render(FreezeDialog, { bench, onclose: vi.fn() });
  await fireEvent.input(screen.getByLabelText('What the sample is for'), { target: { value: 'Mass profile' } });
  unmount();
  expect(engine.next('bench.change').params['change']).toMatchObject({ note: 'Mass profile' });
});

it('cannot freeze while a cut stands without a rationale, and leads to it', async () => {
  await engine.show(viewOf(4, { withoutRationale: ['disc'] }));
  render(FreezeDialog, { bench, onclose: vi.fn() });
  expect(freeze().disabled).toBe(true);
  expect(screen.getByRole('button', { name: 'Write the rationale of disc' })).toBeTruthy();
});

it('says in the dialog why the engine refused', async () => {
  render(FreezeDialog, { bench, onclose: vi.fn() });
  await fireEvent.click(freeze());
  await settle();
  await engine.next('edition.freeze').refuse('The folder cannot be written.');
  expect(screen.getByRole('alert').textContent).toBe('The folder cannot be written.');
  expect(bench.refusals).toEqual([]);
  expect(freeze().disabled).toBe(false);
});
