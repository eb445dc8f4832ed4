import { describe, expect, it } from 'vitest';
import { cutSchema } from '../../../core/cuts/cut';
import { CUT_KINDS, cutKind } from '../../../core/cuts/kinds';
import { cutOf } from './objects';

it('the schema of a cut has one variant for each kind of the list, in its order', () => {
  const variants = cutSchema.options.map(({ shape }) => shape.kind.value);
  expect(variants).toEqual(CUT_KINDS.map(({ kind }) => kind));
});

describe.each(CUT_KINDS.map(({ kind }) => kind))('%s', (kind) => {
  it('accepts its own defaults and finds itself by name', () => {
    const { defaults } = cutKind(kind);
    expect(cutOf(kind, defaults as object).parameters).toEqual(defaults);
    expect(cutKind(kind).kind).toBe(kind);
  });

  it('proposes limits that its parameters have, each with a reason and a source', () => {
    for (const { parameter, reason, source } of cutKind(kind).proposals) {
      expect(Object.keys(cutKind(kind).defaults as object)).toContain(parameter);
      expect(reason).not.toBe('');
      expect(source).not.toBe('');
    }
  });
});

it('a kind that is not there throws', () => {
  expect(() => cutKind('sieve')).toThrow(RangeError);
});
