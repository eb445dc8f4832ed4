import { expect, it } from 'vitest';
import { shared } from '../../../app/window/state/shared';

const older = {
  recipe: {
    title: 'A',
    ledger: [
      { id: 'disc', parameters: { max: 1 } },
      { id: 'plane', parameters: { max: 2 } },
    ],
  },
  verdicts: Uint8Array.of(0, 1),
  gone: 1,
};

it('is the older value itself when nothing differs, missing numbers included', () => {
  const make = (): object => ({ list: [1, Number.NaN], none: undefined, numbers: Float64Array.of(Number.NaN, -0) });
  const value = make();
  expect(shared(value, make())).toBe(value);
});

it('takes the parts that stayed the same and only those', () => {
  const newer = { ...structuredClone({ ...older, verdicts: 0 }), verdicts: Uint8Array.of(0, 1) };
  newer.recipe.ledger[0]!.parameters.max = 7;
  const both = shared(older, newer);
  expect(both).toEqual(newer);
  expect(both.recipe.ledger[1]).toBe(older.recipe.ledger[1]);
  expect(both.recipe.ledger[0]).not.toBe(older.recipe.ledger[0]);
  expect(both.verdicts).toBe(older.verdicts);
});

it.each([
  ['a longer list', [1], [1, 2]],
  ['a shorter list', [1, 2], [1]],
  ['a key that came with undefined', { a: 1 }, { a: 1, b: undefined }],
  ['a key that went', { a: 1, b: 2 }, { a: 1 }],
  ['another type of numbers', Uint8Array.of(1), Float64Array.of(1)],
  ['a list for an object', { 0: 1 }, [1]],
  ['nothing', { a: 1 }, null],
  ['a sign of zero', { a: 0 }, { a: -0 }],
])('sees %s as a difference', (_, from, to) => {
  const result = shared<unknown>(from, to);
  expect(result).toEqual(to);
  expect(result).not.toBe(from);
});
