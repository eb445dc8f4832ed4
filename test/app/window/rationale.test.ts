import { fireEvent, render, screen } from '@testing-library/svelte';
import { expect, it, vi } from 'vitest';
import RationaleField from '../../../app/window/parts/RationaleField.svelte';

it('an answer that comes late does not undo letters that were typed meanwhile', async () => {
  const ontype = vi.fn();
  const { rerender } = render(RationaleField, { value: '', wanting: true, ontype });
  const field = screen.getByLabelText<HTMLTextAreaElement>('Rationale');
  await fireEvent.focus(field);
  await fireEvent.input(field, { target: { value: 'Becau' } });
  await rerender({ value: 'Be' });
  expect(field.value).toBe('Becau');
  const [[text, gesture]] = ontype.mock.calls as [[string, string]];
  expect(text).toBe('Becau');
  await fireEvent.input(field, { target: { value: 'Because' } });
  expect(ontype.mock.lastCall).toEqual(['Because', gesture]);
});

it('an undo while the field is left shows the recipe’s text', async () => {
  const { rerender } = render(RationaleField, { value: 'Old', wanting: false, ontype: vi.fn() });
  await rerender({ value: 'Older' });
  expect(screen.getByLabelText<HTMLTextAreaElement>('Rationale').value).toBe('Older');
});
