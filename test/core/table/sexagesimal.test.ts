import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { degreesFromSexagesimal } from '../../../core/table/sexagesimal';

describe('degrees', () => {
  it.each([
    ['12:30:00', 12.5],
    ['+12 30 36', 12.51],
    ['-00 30 00', -0.5],
    ['−00:00:36', -0.01],
    ['-47d28m46.1s', -(47 + 28 / 60 + 46.1 / 3600)],
    ['89°59′59.5″', 89 + 59 / 60 + 59.5 / 3600],
    ['10:30', 10.5],
    ['  7 06 00 ', 7.1],
  ])('%s is %d', (text, degrees) => {
    expect(degreesFromSexagesimal(text, false)).toBeCloseTo(degrees, 12);
  });
});

describe('hours', () => {
  it.each([
    ['06:00:00', 90],
    ['13h 26m 47.28s', 15 * (13 + 26 / 60 + 47.28 / 3600)],
    ['00 00 01', 15 / 3600],
    ['23:59:59.999', 15 * (23 + 59 / 60 + 59.999 / 3600)],
  ])('%s is %d degrees', (text, degrees) => {
    expect(degreesFromSexagesimal(text, true)).toBeCloseTo(degrees, 11);
  });
});

it.each([
  '',
  'abc',
  '12',
  '12.5',
  '12:60:00',
  '12:00:60',
  '12:00:75.2',
  '12:3a:00',
  '1:2:3:4',
  '--1:00:00',
  '1234:00:00',
  '12:00:00x',
])('"%s" is no angle', (text) => {
  for (const hours of [false, true]) expect(degreesFromSexagesimal(text, hours)).toBeNaN();
});

it('an angle written to a thousandth of a second reads back to within half of that, with its sign', () => {
  const parts = fc.tuple(fc.boolean(), fc.nat(89), fc.nat(59), fc.integer({ min: 0, max: 59_999 }));
  fc.assert(
    fc.property(parts, fc.constantFrom(':', ' '), ([negative, whole, minutes, thousandths], mark) => {
      const two = (value: number): string => String(value).padStart(2, '0');
      const seconds = (thousandths / 1000).toFixed(3).padStart(6, '0');
      const text = `${negative ? '-' : '+'}${two(whole)}${mark}${two(minutes)}${mark}${seconds}`;
      const size = (whole * 3_600_000 + minutes * 60_000 + thousandths) / 3_600_000;
      const read = degreesFromSexagesimal(text, false);
      expect(Math.abs(Math.abs(read) - size)).toBeLessThan(1e-12);
      expect(Object.is(Math.sign(read), negative ? -Math.sign(size) : Math.sign(size))).toBe(true);
    }),
  );
});
