import { describe, expect, test } from 'vitest';
import { portableUnit } from '../../../../core/formats/ecsv/unit';
import { type EcsvColumn, ecsvText } from '../../../../core/formats/ecsv/write';
import { numberColumn, textColumn } from '../../../../core/table/column';

const number = (name: string, values: number[], about = {}, more: Partial<EcsvColumn> = {}): EcsvColumn => ({
  column: numberColumn(name, Float64Array.from(values), about),
  ucd: '',
  integer: false,
  ...more,
});
const text = (name: string, cells: (string | undefined)[], description = ''): EcsvColumn => ({
  column: textColumn(name, cells, { description }),
  ucd: '',
  integer: false,
});
const written = (columns: EcsvColumn[], rows: number[], about = {}): string =>
  [...ecsvText(columns, rows, about)].join('');
const body = (ecsv: string): string[] => ecsv.split('\n').filter((line) => line !== '' && !line.startsWith('#'));

describe('the rows', () => {
  test('of no rows are a header line alone', () => {
    expect(body(written([number('x', [])], []))).toEqual(['"x"']);
  });

  test('missing values are empty, numbers have their shortest text, -0 and infinities survive', () => {
    const column = number('x', [Number.NaN, 0.1 + 0.2, -0, Infinity, -Infinity, 1e-300]);
    expect(body(written([column, number('y', [1, 2, 3, 4, 5, 6])], [0, 1, 2, 3, 4, 5])).slice(1)).toEqual([
      ',1',
      '0.30000000000000004,2',
      '-0,3',
      'inf,4',
      '-inf,5',
      '1e-300,6',
    ]);
  });

  test('only the chosen rows, in their order', () => {
    expect(body(written([number('x', [1, 2, 3])], [2, 0]))).toEqual(['"x"', '3', '1']);
  });

  test('texts are quoted, also one that begins like a comment, and line breaks become blanks', () => {
    expect(body(written([text('name', ['#1', 'a "b", c', 'two\r\nlines', undefined])], [0, 1, 2])).slice(1)).toEqual([
      '"#1"',
      '"a ""b"", c"',
      '"two lines"',
    ]);
  });
});

describe('the header', () => {
  const ecsv = written(
    [
      number('n', [1], { description: 'yes: a "name" # no', unit: 'kpc' }, { ucd: 'pos.distance', integer: true }),
      number('snr', [1], { description: 'ratio', unit: 'per pix^2' }),
      text('E(B−V) ☉ 𝜎', ['a']),
    ],
    [0],
    { title: 'null', invented: true },
  );
  test('is plain ASCII', () => {
    expect(
      ecsv
        .split('\n')
        .filter((line) => line.startsWith('#'))
        .join(''),
    ).toMatch(/^[\x20-\x7e]*$/);
  });

  test('declares the delimiter, and of each column name, unit, datatype, description and UCD', () => {
    expect(ecsv.split('\n').slice(0, 11)).toEqual([
      '# %ECSV 1.0',
      '# ---',
      "# delimiter: ','",
      '# datatype:',
      String.raw`# - {name: "n", unit: "kpc", datatype: int64, description: "yes: a \"name\" # no", meta: !!omap [{ucd: "pos.distance"}]}`,
      '# - {name: "snr", datatype: float64, description: "ratio; unit as the source writes it: per pix^2"}',
      String.raw`# - {name: "E(B\u2212V) \u2609 \U0001d70e", datatype: string}`,
      '# meta: !!omap',
      '# - {title: "null"}',
      '# - {invented: true}',
      '# schema: astropy-2.0',
    ]);
  });
});

test.each([
  ['km/s', 'km/s'],
  ['kpc.km/s', 'kpc.km/s'],
  ['km**2.s**-2', 'km**2.s**-2'],
  ['', undefined],
  ['km s^-1', undefined],
  ['mas/yr/pc', undefined],
  ['dex', undefined],
  ['[-]', undefined],
])('the unit %j is written as %j', (unit, expected) => {
  expect(portableUnit(unit)).toBe(expected);
});
