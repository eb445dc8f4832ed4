// The reference is the language's own conversion (ECMA-262, StringToNumber), which rounds correctly.
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { type NumberCell, readNumber } from '../../../../core/formats/csv/number';

function read(text: string): number | undefined {
  const bytes = new TextEncoder().encode(`,${text},`);
  const cell: NumberCell = { value: 0, canonical: false, identifier: false };
  return readNumber(bytes, 1, bytes.length - 1, cell) ? cell.value : undefined;
}

test('reads decimals of any length as the language does', () => {
  const digits = fc.string({
    unit: fc.constantFrom('0', '1', '2', '3', '4', '5', '6', '7', '8', '9'),
    minLength: 1,
    maxLength: 24,
  });
  fc.assert(
    fc.property(fc.constantFrom('', '-', '+'), digits, digits, (sign, whole, part) => {
      const text = `${sign}${whole}.${part}`;
      expect(read(text), text).toBe(Number(text));
    }),
    { numRuns: 50_000 },
  );
});

test('reads the shortest and the longest text of every double as the language does', () => {
  fc.assert(
    fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
      for (const text of [String(value), value.toPrecision(17), value.toExponential(20)])
        expect(read(text), text).toBe(Number(text));
    }),
    { numRuns: 20_000 },
  );
});

test('reads numbers in the middle of two doubles, and beside it, as the language does', () => {
  // 2⁵³ + 1 lies between two doubles; its tenth parts, and what is next to them, are as close as 19 digits can come.
  for (const text of [
    '9007199254740993.0',
    '9007199254740993.1',
    '9007199254740992.9',
    '900719925474099.30',
    '4503599627370496.5',
    '4503599627370497.5',
    '1125899906842624.125',
    '1125899906842624.375',
    '0.5000000000000000555',
    '0.1000000000000000055',
    '1.000000000000000111',
    '1.000000000000000110',
    '1.000000000000000112',
  ]) {
    expect(read(text), text).toBe(Number(text));
    expect(read(`-${text}`), text).toBe(-Number(text));
  }
});

test.each(['', '.', '+', '-.', '1..2', '1.2.3', '1e', 'e5', '12a', '0x10', '1 2', '--1'])(
  '"%s" is no number',
  (text) => {
    expect(read(text)).toBeUndefined();
  },
);
