import fc from 'fast-check';
import { expect, test } from 'vitest';
import { scanJson } from '../../../core/edition/jsonscan';
import { jsonText } from '../../../core/edition/jsontext';

test('whatever is JSON reads back as itself, and the scan finds no fault in it', () => {
  fc.assert(
    fc.property(fc.jsonValue({ stringUnit: 'binary' }), (value) => {
      const text = jsonText(value);
      expect(JSON.parse(text)).toEqual(JSON.parse(JSON.stringify(value)));
      expect(scanJson(text).fault).toBeUndefined();
    }),
  );
});

test('the scan refuses exactly what JSON.parse refuses', () => {
  const pieces = fc.constantFrom(
    '{',
    '}',
    '[',
    ']',
    ',',
    ':',
    '"a"',
    '"b"',
    '1',
    '-0.5e3',
    'null',
    ' ',
    '\n',
    '"',
    '\\',
    '01',
    '.',
  );
  fc.assert(
    fc.property(fc.array(pieces, { maxLength: 9 }), (parts) => {
      const text = parts.join('');
      const accepted = ((): boolean => {
        try {
          JSON.parse(text);
          return true;
        } catch {
          return false;
        }
      })();
      const { fault } = scanJson(text);
      expect(fault === undefined || fault.kind === 'repeated-key').toBe(accepted);
    }),
    { numRuns: 2000 },
  );
});

test('the line of every value is known', () => {
  const { lines } = scanJson('{\n "a": [\n  1,\n  {"b": 2}\n ]\n}');
  expect(Object.fromEntries(lines)).toEqual({ '': 1, a: 2, 'a[0]': 3, 'a[1]': 4, 'a[1].b': 4 });
});

test('small lists and objects stand on one line, others are spread', () => {
  expect(jsonText({ a: [1, 2], b: { c: null }, d: [[1], [2]], e: [], f: {} })).toBe(
    '{\n  "a": [1, 2],\n  "b": { "c": null },\n  "d": [\n    [1],\n    [2]\n  ],\n  "e": [],\n  "f": {}\n}\n',
  );
});
