import { expect, test } from 'vitest';
import { degreesText, hoursText } from '../../../core/mock/sexagesimal';
import { degreesFromSexagesimal } from '../../../core/table/sexagesimal';

test('zero, the pole and the end of the circle are written as they should be', () => {
  expect(hoursText(0)).toBe('00:00:00.000');
  expect(degreesText(0)).toBe('+00:00:00.00');
  expect(degreesText(-90)).toBe('-90:00:00.00');
  expect(hoursText(359.99999999)).toBe('00:00:00.000');
});

test('seconds that round up carry over instead of reading 60', () => {
  expect(hoursText((59 / 3600 + 0.9996 / 3600) * 15)).toBe('00:01:00.000');
  expect(degreesText(-(10 + 59 / 60 + 59.999 / 3600))).toBe('-11:00:00.00');
});

test('the sign of a small negative angle survives', () => {
  expect(degreesText(-0.5)).toBe('-00:30:00.00');
});

test('what is written reads back within the last digit', () => {
  for (let ra = 0.1234; ra < 360; ra += 17.77) {
    // Half of 0.001 s of time, and half of 0.01 arc seconds.
    expect(Math.abs(degreesFromSexagesimal(hoursText(ra), true) - ra)).toBeLessThanOrEqual((0.00051 * 15) / 3600);
    const dec = ra / 2 - 90;
    expect(Math.abs(degreesFromSexagesimal(degreesText(dec), false) - dec)).toBeLessThanOrEqual(0.0051 / 3600);
  }
});
