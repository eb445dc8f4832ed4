import { fireEvent, render, screen } from '@testing-library/svelte';
import { beforeAll, describe, expect, it, vi } from 'vitest';
import FreezeDialog from '../../../app/window/parts/FreezeDialog.svelte';
import Notices from '../../../app/window/parts/Notices.svelte';
import NumberField from '../../../app/window/parts/NumberField.svelte';
import { BenchState } from '../../../app/window/state/bench.svelte';
import { FakeLink, settle, viewOf } from './fakelink';

beforeAll(() => {
  // jsdom knows the element and not how to show it.
  HTMLDialogElement.prototype.showModal = function () {
    this.open = true;
  };
});

describe('a number field', () => {
  const field = (): HTMLInputElement => screen.getByLabelText<HTMLInputElement>(/R_V/);

  it.each([
    ['3.2', 3.2],
    ['−1,5', -1.5],
    [' 2e-3 ', 0.002],
  ])('takes %s as a number', async (text, number) => {
    const onset = vi.fn();
    render(NumberField, { label: 'R_V', value: 3.1, onset });
    await fireEvent.change(field(), { target: { value: text } });
    expect(onset).toHaveBeenCalledExactlyOnceWith(number);
  });

  it.each(['three', '', 'Infinity', '3.1'])('does not change for "%s"', async (text) => {
    const onset = vi.fn();
    render(NumberField, { label: 'R_V', value: 3.1, onset });
    await fireEvent.change(field(), { target: { value: text } });
    expect(onset).not.toHaveBeenCalled();
    expect(field().value).toBe('3.1');
  });
});

async function benchWith(more: Parameters<typeof viewOf>[0]): Promise<{ link: FakeLink; bench: BenchState }> {
  const link = new FakeLink();
  const bench = new BenchState(link);
  await link.connect(viewOf(more));
  return { link, bench };
}

describe('notices', () => {
  it('offer unsaved work that was left, until they are put away', async () => {
    const notice = {
      code: 'unsaved-left',
      severity: 'note',
      where: '/state/x.bench.json',
      text: 'Left: “Halo”.',
    } as const;
    const { link, bench } = await benchWith({ notices: [notice] });
    render(Notices, { bench });
    await fireEvent.click(screen.getByText('Bring it back'));
    await settle();
    expect(link.last('bench.open').params).toEqual({ path: '/state/x.bench.json' });
    await fireEvent.click(screen.getByText('Put away'));
    expect(screen.queryByText('Left: “Halo”.')).toBeNull();
  });

  it('show how far long work is, and can stop it', async () => {
    const { link, bench } = await benchWith({});
    render(Notices, { bench });
    link.tell('progress', { label: 'Reading wide.csv', share: 0.4 });
    const bar = await screen.findByLabelText<HTMLProgressElement>('Reading wide.csv');
    expect(bar.value).toBeCloseTo(0.4);
    await fireEvent.click(screen.getByText('Stop'));
    expect(link.count('work.stop')).toBe(1);
  });
});

describe('freezing', () => {
  it('waits for a rationale on every cut', async () => {
    const { bench } = await benchWith({ withoutRationale: ['dust'] });
    render(FreezeDialog, { bench, onclose: vi.fn() });
    expect(screen.getByText<HTMLButtonElement>('Freeze').disabled).toBe(true);
    expect(screen.getByText('Write the rationale of dust')).toBeTruthy();
  });

  it('writes title and note first, and says where the edition is', async () => {
    const { link, bench } = await benchWith({});
    render(FreezeDialog, { bench, onclose: vi.fn() });
    await fireEvent.input(screen.getByLabelText('Title'), { target: { value: 'Halo clusters' } });
    await fireEvent.click(screen.getByText('Freeze'));
    await settle();
    expect(link.last('bench.change').params).toMatchObject({ change: { type: 'set-title', title: 'Halo clusters' } });
    expect(link.count('edition.freeze')).toBe(0);
    link.last('bench.change').answer(viewOf());
    await settle();
    link.last('edition.freeze').answer({ folder: '/x/editions/edition-1', number: 1, sample: 69, dropped: 111 });
    expect(await screen.findByText('/x/editions/edition-1')).toBeTruthy();
  });

  it('says in the dialog what was refused', async () => {
    const { link, bench } = await benchWith({});
    render(FreezeDialog, { bench, onclose: vi.fn() });
    await fireEvent.click(screen.getByText('Freeze'));
    await settle();
    const { RefusedError } = await import('../../../app/contract/link');
    link
      .last('edition.freeze')
      .refuse(new RefusedError([{ code: 'disk-full', severity: 'error', text: 'The disk is full.' }]));
    expect((await screen.findByRole('alert')).textContent).toMatch(/disk is full/);
    expect(screen.getByText<HTMLButtonElement>('Freeze').disabled).toBe(false);
  });
});
