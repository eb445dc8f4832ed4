import { expect, test } from 'vitest';
import { cleanName } from '../../../core/roster/cleanname';

test('nothing, blanks and bare punctuation have the empty key', () => {
  for (const name of ['', '   ', '***', '-', '( )']) expect(cleanName(name)).toBe('');
});

test('spellings of one name that differ in case, blanks, punctuation or leading zeros meet', () => {
  for (const name of ['Tarnow 7', 'TARNOW-07', 'tarnow  007', 'Tarnow_7', 'Tarnow\u00a07', '(Tarnow) 7', 'Tarnow–7']) {
    expect(cleanName(name)).toBe('tarnow7');
  }
});

test('diacritics do not tell names apart', () => {
  expect(cleanName('Brévane 12')).toBe(cleanName('BREVANE-012'));
  expect(cleanName('Bre\u0301vane 12')).toBe(cleanName('Brévane 12'));
});

test('zeros that are part of a number stay', () => {
  expect(cleanName('Tarnow 70')).not.toBe(cleanName('Tarnow 7'));
  expect(cleanName('Tarnow 100')).toBe('tarnow100');
  expect(cleanName('Tarnow 0')).toBe('tarnow0');
});

test('the sign of a declination in a name made of coordinates stays, whatever dash it was written with', () => {
  expect(cleanName('J1234-5678')).not.toBe(cleanName('J1234+5678'));
  expect(cleanName('J1234−5678')).toBe(cleanName('J1234 - 5678'));
  expect(cleanName('J1234-0056')).not.toBe(cleanName('J1234-56'));
});

test('a 19-digit identifier keeps every digit', () => {
  expect(cleanName('8242371147085522457')).toBe('8242371147085522457');
});
