import { fireEvent, render, screen } from '@testing-library/svelte';
import { expect, it, vi } from 'vitest';
import RationaleField from '../../../app/window/parts/RationaleField.svelte';

it('an answer that comes late does not undo letters that were typed meanwhile', async () => {
  const ontype = vi.fn(() => new Promise<boolean>(() => undefined));
  const { rerender } = render(RationaleField, { value: '', wanting: true, ontype });
  const field = screen.getByLabelText<HTMLTextAreaElement>('Rationale');
  await fireEvent.focus(field);
  await fireEvent.input(field, { target: { value: 'Becau' } });
  await rerender({ value: 'Be' });
  expect(field.value).toBe('Becau');
  const [[text, gesture]] = ontype.mock.calls as unknown as [[string, string]];
  expect(text).toBe('Becau');
  await fireEvent.input(field, { target: { value: 'Because' } });
  expect(ontype.mock.lastCall).toEqual(['Because', gesture]);
});

it('an undo while the field is left shows the recipe’s text', async () => {
  const { rerender } = render(RationaleField, { value: 'Old', wanting: false, ontype: () => Promise.resolve(true) });
  await rerender({ value: 'Older' });
  expect(screen.getByLabelText<HTMLTextAreaElement>('Rationale').value).toBe('Older');
});

it('sends also the taking back of a letter whose answer is still out', async () => {
  const ontype = vi.fn(() => new Promise<boolean>(() => undefined));
  render(RationaleField, { value: '', wanting: true, ontype });
  const field = screen.getByLabelText<HTMLTextAreaElement>('Rationale');
  await fireEvent.input(field, { target: { value: 'x' } });
  await fireEvent.input(field, { target: { value: '' } });
  expect((ontype.mock.calls as unknown[][]).map(([text]) => text)).toEqual(['x', '']);
});

it('keeps a text that the engine could not take, also after the field is left', async () => {
  const { rerender } = render(RationaleField, {
    value: 'Old',
    wanting: false,
    ontype: () => new Promise(() => undefined),
  });
  const field = screen.getByLabelText<HTMLTextAreaElement>('Rationale');
  await fireEvent.focus(field);
  await fireEvent.input(field, { target: { value: 'New' } });
  await fireEvent.blur(field);
  await rerender({ value: 'Older' });
  expect(field.value).toBe('New');
});
