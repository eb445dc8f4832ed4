import { expect, it } from 'vitest';
import { cornersIn, cornersText } from '../../../app/window/state/corners';
import { stepsOf } from '../../../app/window/state/steps';
import { counted } from '../../../app/window/state/words';
import type { BenchView } from '../../../app/contract/messages';
import { cutOf, viewOf } from './doubles';

it.each([
  [
    '1, 2\n3, 4\n5, 6',
    [
      [1, 2],
      [3, 4],
      [5, 6],
    ],
  ],
  [
    '  −1.5 2e1\n\n3;4\n5,6\n',
    [
      [-1.5, 20],
      [3, 4],
      [5, 6],
    ],
  ],
  ['1, 2\n3, 4', undefined],
  ['1, 2\n3, 4\n5', undefined],
  ['1, 2\n3, 4\n5, 6, 7', undefined],
  ['1, 2\n3, 4\n5, x', undefined],
  ['', undefined],
])('reads the corners %j', (text, corners) => {
  expect(cornersIn(text)).toEqual(corners);
});

it('reads back the corners that it writes', () => {
  const polygon: [number, number][] = [
    [0, -10.25],
    [359.5, -10],
    [1e-7, 3],
  ];
  expect(cornersIn(cornersText(polygon))).toEqual(polygon);
});

it('counts with separators and with the right noun', () => {
  expect([counted(1, 'row'), counted(0, 'row'), counted(1234567, 'object')]).toEqual([
    '1 row',
    '0 rows',
    '1,234,567 objects',
  ]);
});

const says = (view: BenchView): string[] =>
  stepsOf(view).map(({ name, says, state }) => `${name} ${says}${state === 'wanting' ? ' !' : ''}`);

it('leads an empty bench to its first catalogue', () => {
  expect(says(viewOf(0))).toEqual([
    'Sources add a catalogue !',
    'Roster no objects yet !',
    'Ledger no cuts: everything is kept',
    'Freeze the sample is empty !',
  ]);
});

it('holds the freeze back while a rationale is missing, and says so', () => {
  const sources = [{ state: 'read' }] as unknown as BenchView['sources'];
  const view = viewOf(2, { sources, cuts: [cutOf('disc')], withoutRationale: ['disc'], quarantine: ['a', 'b'] });
  expect(says(view)).toEqual([
    'Sources 1 source',
    'Roster 2 objects; look at 2 rows in quarantine',
    'Ledger 1 cut; 1 without a rationale !',
    'Freeze waits for the rationale !',
  ]);
  expect(says({ ...view, withoutRationale: [], lastEdition: '/e/edition-3' }).slice(2)).toEqual([
    'Ledger 1 cut, each with its rationale',
    'Freeze written: edition-3',
  ]);
});
