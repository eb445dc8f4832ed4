import { describe, expect, test } from 'vitest';
import { measuredText, plainText } from '../../../core/edition/rounded';

describe('a value rounded by its error', () => {
  test.each([
    [Number.NaN, 0.1, ''],
    [-1.5234, Number.NaN, '−1.523'],
    [-1.5234, 0, '−1.523'],
    [-1.5234, 0.13, '−1.52 ± 0.13'],
    [-1.5234, 0.031, '−1.52 ± 0.03'],
    [8.12249, 0.0296, '8.12 ± 0.03'],
    [8.12249, 0.0294, '8.122 ± 0.029'],
    [208.96, 5.6, '209 ± 6'],
    [1234.5, 12, '1235 ± 12'],
    [123456, 350, '123500 ± 400'],
    [-0.04, 0.9, '0.0 ± 0.9'],
    [5, 9.7, '5 ± 10'],
  ])('%d ± %d is %j', (value, sigma, text) => {
    expect(measuredText(value, sigma)).toBe(text);
  });

  test.each([
    [0, '0'],
    [-0, '0'],
    [12345, '12345'],
    [0.000123456, '0.0001235'],
    [98.76543, '98.77'],
  ])('without an error %d is %j', (value, text) => {
    expect(plainText(value)).toBe(text);
  });
});
