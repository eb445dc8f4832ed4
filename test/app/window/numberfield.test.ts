import { fireEvent, render, screen } from '@testing-library/svelte';
import { expect, it, vi } from 'vitest';
import NumberField from '../../../app/window/parts/NumberField.svelte';
import { commitFields } from '../../../app/window/state/edits';
import { settle } from './doubles';

const field = (): HTMLInputElement => screen.getByRole('textbox');
async function type(text: string): Promise<void> {
  await fireEvent.focus(field());
  await fireEvent.input(field(), { target: { value: text } });
}

it.each([
  ['-1.25', -1.25],
  ['−1,25', -1.25],
  [' 3 ', 3],
  ['2e3', 2000],
])('reads %s', async (text, number) => {
  const onset = vi.fn(() => Promise.resolve(true));
  render(NumberField, { label: 'Limit', value: 0, onset });
  await type(text);
  await fireEvent.blur(field());
  expect(onset).toHaveBeenCalledExactlyOnceWith(number);
});

it('keeps what was typed when a view comes with the older number', async () => {
  const { rerender } = render(NumberField, { label: 'Limit', value: 1, onset: () => Promise.resolve(true) });
  await type('2.5');
  await rerender({ value: 1.1 });
  expect(field().value).toBe('2.5');
});

it('keeps what was sent until the engine answers, then shows the recipe’s number', async () => {
  let answer: (taken: boolean) => void = () => undefined;
  const onset = (): Promise<boolean> => new Promise((resolve) => (answer = resolve));
  const { rerender } = render(NumberField, { label: 'Limit', value: 1, onset });
  await type('2,50');
  await fireEvent.blur(field());
  await rerender({ value: 1.1 });
  expect(field().value).toBe('2,50');
  await rerender({ value: 2.5 });
  answer(true);
  await settle();
  expect(field().value).toBe('2.5');
});

it('marks what is no number, sends nothing, and Escape brings the number back', async () => {
  const onset = vi.fn(() => Promise.resolve(true));
  render(NumberField, { label: 'Limit', value: 4, onset });
  await type('about four');
  expect(commitFields()).toBe(false);
  await settle();
  expect(field().getAttribute('aria-invalid')).toBe('true');
  await fireEvent.keyDown(field(), { key: 'Escape' });
  expect(field().value).toBe('4');
  expect(field().getAttribute('aria-invalid')).toBe('false');
  expect(commitFields()).toBe(true);
  expect(onset).not.toHaveBeenCalled();
});

it('marks a number that the engine refused, and keeps it', async () => {
  render(NumberField, { label: 'Limit', value: 4, onset: () => Promise.resolve(false) });
  await type('-7');
  await fireEvent.blur(field());
  await settle();
  expect(field().value).toBe('-7');
  expect(field().getAttribute('aria-invalid')).toBe('true');
});

it('shows the number again when it is left empty', async () => {
  const onset = vi.fn(() => Promise.resolve(true));
  render(NumberField, { label: 'Limit', value: 4, onset });
  await type('');
  await fireEvent.blur(field());
  expect(field().value).toBe('4');
  expect(onset).not.toHaveBeenCalled();
});

it('sends what stands in the field when something else needs it, without leaving the field', async () => {
  const onset = vi.fn(() => new Promise<boolean>(() => undefined));
  render(NumberField, { label: 'Limit', value: 4, onset });
  await type('5');
  commitFields();
  commitFields();
  expect(onset).toHaveBeenCalledExactlyOnceWith(5);
});
