// The reference is the language's own conversion (ECMA-262, Number::toString): shortest digits, nearest of those.
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { writeNumber } from '../../../../core/formats/csv/numberbytes';

function text(value: number): string {
  const bytes = new Uint8Array(40).fill(0x3f);
  const end = writeNumber(value, bytes, 3);
  expect(bytes.subarray(end).every((byte) => byte === 0x3f)).toBe(true);
  return new TextDecoder().decode(bytes.subarray(3, end));
}

const spelt = (value: number): string => (Object.is(value, -0) ? '-0' : Number.isNaN(value) ? '' : String(value));

test('spells every double as the language does', () => {
  fc.assert(
    fc.property(fc.double(), (value) => {
      expect(text(value)).toBe(spelt(value));
    }),
    { numRuns: 20_000 },
  );
});

test('spells numbers of every size as the language does', () => {
  const size = fc.double({ min: -8, max: 17, noNaN: true });
  const share = fc.double({ min: -1, max: 1, noNaN: true });
  fc.assert(
    fc.property(size, share, (decade, part) => {
      expect(text(part * 10 ** decade)).toBe(spelt(part * 10 ** decade));
    }),
    { numRuns: 50_000 },
  );
});

test('spells decimals of few digits, and their neighbours, as the language does', () => {
  fc.assert(
    fc.property(fc.integer({ min: -1e9, max: 1e9 }), fc.integer({ min: 0, max: 12 }), (digits, places) => {
      const value = Number(`${digits}e-${places}`);
      for (const near of [value, value * (1 + 2 ** -52), value * (1 - 2 ** -53)]) expect(text(near)).toBe(spelt(near));
    }),
    { numRuns: 20_000 },
  );
});

test('powers of two and ten, and the ends of the range', () => {
  const powers = Array.from({ length: 160 }, (_, at) => 2 ** (at - 80));
  const tens = Array.from({ length: 40 }, (_, at) => Number(`1e${at - 15}`));
  const ends = [1e-6, 9.999999999999999e-7, 999999999999999.9, 1e15, 0, -0, Infinity, -Infinity, 5e-324, 1.7e308];
  for (const value of [...powers, ...tens, ...ends]) {
    expect(text(value)).toBe(spelt(value));
    expect(text(-value)).toBe(spelt(-value));
  }
});
