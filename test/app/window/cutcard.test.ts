import { fireEvent, render, screen, within } from '@testing-library/svelte';
import { beforeEach, describe, expect, it } from 'vitest';
import type { CutView } from '../../../app/contract/messages';
import CutCard from '../../../app/window/parts/CutCard.svelte';
import NamedFields from '../../../app/window/parts/NamedFields.svelte';
import { BenchState } from '../../../app/window/state/bench.svelte';
import { cutOf, DoubleEngine, settle, viewOf } from './doubles';

let engine: DoubleEngine;
let bench: BenchState;
beforeEach(async () => {
  engine = new DoubleEngine();
  bench = new BenchState(engine.link);
  await engine.connect(viewOf(3));
});
const show = (cut: CutView, at = 0, last = true): HTMLElement => {
  render(CutCard, { bench, cut, at, last });
  return screen.getByRole('article');
};
const change = (): unknown => engine.next('bench.change').params['change'];

describe('a card of a cut', () => {
  it('says what it removes, in turn, alone, only by it and unjudged', () => {
    const cut = cutOf('disc');
    const card = show({ ...cut, attrition: { ...cut.attrition, inTurn: 277647 } });
    expect(
      within(card)
        .getAllByRole('definition')
        .map(({ textContent }) => textContent),
    ).toEqual(['277,647', '2', '3', '4']);
  });

  it('asks for a rationale only while the cut is on and has none', () => {
    const alarm = /cannot be frozen/;
    const { rerender } = render(CutCard, { bench, cut: cutOf('disc', { rationale: ' ' }), at: 0, last: true });
    expect(screen.queryByText(alarm)).toBeTruthy();
    return rerender({ cut: cutOf('disc', { rationale: ' ', on: false }) }).then(() =>
      expect(screen.queryByText(alarm)).toBeNull(),
    );
  });

  it('cannot move beyond the ends of the ledger', async () => {
    const card = show(cutOf('disc'), 1, true);
    expect(within(card).getByRole<HTMLButtonElement>('button', { name: 'Move disc down' }).disabled).toBe(true);
    await fireEvent.click(within(card).getByRole('button', { name: 'Move disc up' }));
    expect(change()).toEqual({ type: 'move-cut', cut: 'disc', to: 0 });
  });

  it('says what the data lack and draws no histogram of it', async () => {
    const card = show({ ...cutOf('disc'), lacking: ['v_phi', 'z'] });
    await settle();
    expect(card.textContent).toContain('The data have no v_phi, z');
    expect(engine.open('cut.histogram')).toBe(0);
  });

  it('sends the evidence as a list', async () => {
    const card = show(cutOf('disc'));
    const field = within(card).getByLabelText(/^Evidence/);
    await fireEvent.input(field, { target: { value: '2011ApJ...737..103S; arXiv:1234.5678 ,' } });
    await fireEvent.blur(field);
    expect(change()).toMatchObject({ set: { evidence: ['2011ApJ...737..103S', 'arXiv:1234.5678'] } });
  });

  it('switches a limit off', async () => {
    const parameters = { ...(cutOf('metallicity').cut.parameters as object), max: -1 };
    const card = show(cutOf('metallicity', { parameters } as never));
    await fireEvent.click(within(card).getByRole('button', { name: 'Switch [Fe/H] at most off' }));
    expect(change()).toEqual({ type: 'set-cut', cut: 'metallicity', set: { parameters: { max: null } } });
  });

  it('takes the corners of a lasso from the keyboard, and marks what is no shape', async () => {
    const card = show(cutOf('lasso'));
    const field = within(card).getByLabelText<HTMLTextAreaElement>(/^Corners/);
    expect(field.value.split('\n')).toHaveLength(4);
    await fireEvent.input(field, { target: { value: '0 0\n1 0' } });
    await fireEvent.blur(field);
    expect(field.getAttribute('aria-invalid')).toBe('true');
    await fireEvent.input(field, { target: { value: '0 0\n1 0\n1 1' } });
    await fireEvent.blur(field);
    expect(change()).toMatchObject({
      set: {
        parameters: {
          polygon: [
            [0, 0],
            [1, 0],
            [1, 1],
          ],
        },
      },
    });
  });
});

describe('the list of named objects', () => {
  it('says how to begin', () => {
    render(NamedFields, { bench, objects: [] });
    expect(screen.getByRole('listitem').textContent).toMatch(/Choose an object in the roster/);
  });

  it('shows each with its reason and takes one off', async () => {
    const entry = { key: 'pal 5', name: 'Pal 5', action: 'drop', reason: 'In a stream' } as const;
    render(NamedFields, { bench, objects: [entry] });
    expect(screen.getByRole('listitem').textContent).toMatch(/drop Pal 5.*In a stream/);
    await fireEvent.click(screen.getByRole('button', { name: 'Take Pal 5 off the list' }));
    expect(change()).toEqual({ type: 'name-object', key: 'pal 5', action: 'clear', reason: '' });
  });
});
