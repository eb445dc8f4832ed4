import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readDelimited } from '../../../../core/formats/csv/read';
import { csvText } from '../../../../core/formats/csv/write';
import { cellText, numberColumn, textColumn } from '../../../../core/table/column';
import type { ProblemError } from '../../../../core/table/problem';
import { columnNamed } from '../../../../core/table/table';
import type { DelimitedFile } from '../../../../core/formats/csv/file';

const bytes = (text: string): Uint8Array => new TextEncoder().encode(text);
/** Reads a text in chunks of a given size, so that every border falls somewhere. */
function read(text: string, options: { missing?: string[]; chunk?: number } = {}): Promise<DelimitedFile> {
  const all = bytes(text);
  const size = options.chunk ?? all.length;
  const chunks = Array.from({ length: Math.ceil(all.length / size) }, (_, at) =>
    all.subarray(at * size, (at + 1) * size),
  );
  return readDelimited(chunks, { fileName: 'a.csv', missing: options.missing });
}
const codes = async (text: string): Promise<string[]> =>
  read(text).then(
    () => [],
    (error: unknown) => (error as ProblemError).problems.map(({ code }) => code),
  );
const column = (file: DelimitedFile, name: string): string[] =>
  Array.from({ length: file.table.rows }, (_, row) => cellText(columnNamed(file.table, name)!, row));

describe('what is no table', () => {
  it.each([
    ['an empty file', '', 'empty-file'],
    ['blank lines', '\n\n', 'empty-file'],
    ['nothing but comments', '# a\n# b\n', 'empty-file'],
    ['a header without rows', 'a,b\n', 'empty-file'],
    ['one column', 'hello\nworld\n', 'not-a-table'],
    ['a page of the web', '<!doctype html>,x\n1,2\n', 'not-a-table'],
    ['a FITS file', `SIMPLE  =                    T,${' '.repeat(50)}\n`, 'not-text'],
    ['binary data', 'a,b\n1,\0\n', 'not-text'],
    ['a quote that is never closed', 'a,b\n1,"x\n2,y\n', 'unclosed-quote'],
    ['two columns of one name', 'a,a\n1,2\n', 'duplicate-column'],
  ])('%s is refused', async (_, text, code) => {
    expect(await codes(text)).toEqual([code]);
  });

  it('an unclosed quote names the line where it opened', async () => {
    await expect(read('a,b\n1,2\n3,"x\n')).rejects.toMatchObject({ problems: [{ line: 3 }] });
  });
});

describe('cells', () => {
  it('quotes hold delimiters, doubled quotes and line ends; lines still count', async () => {
    const file = await read('name,n\n"a, ""b""\nc",1\nd,2\n');
    expect(column(file, 'name')).toEqual(['a, "b"\nc', 'd']);
    expect([...file.lines]).toEqual([2, 4]);
  });

  it.each(['\n', '\r\n', '\r'])('line ends %j and a byte order mark are understood', async (end) => {
    const file = await read(`\uFEFFname,n${end}a,1${end}b,2${end}`);
    expect(column(file, 'n')).toEqual(['1', '2']);
  });

  it('the usual spellings of missing, and the named ones, are missing', async () => {
    const file = await read('a,b\n1,x\nNaN,null\n-,N/A\n-99.90,?\n', { missing: ['-99.9', '?'] });
    expect(column(file, 'a')).toEqual(['1', '', '', '']);
    expect(column(file, 'b')).toEqual(['x', '', '', '']);
  });

  it('64-bit identifiers and leading zeros stay exact, also when the first of them comes late', async () => {
    const file = await read('id,z\n5,001\n9223372036854775807,007\n9007199254740993,010\n');
    expect(column(file, 'id')).toEqual(['5', '9223372036854775807', '9007199254740993']);
    expect(column(file, 'z')).toEqual(['001', '007', '010']);
  });

  it('words among numbers are missing and reported with their lines', async () => {
    const rows = Array.from({ length: 30 }, (_, at) => (at === 7 ? 'bad' : String(at)));
    const file = await read(`a,b\n${rows.map((cell) => `${cell},x\n`).join('')}`);
    expect(columnNamed(file.table, 'a')!.type).toBe('number');
    expect(file.problems).toMatchObject([
      { code: 'words-among-numbers', column: 'a', line: 9, count: 1, found: '"bad" (line 9)' },
    ]);
  });

  it('ragged rows go to quarantine with line and text, and the counts add up', async () => {
    const file = await read('a,b\n1,2\n3\n4,5,6\n7,8\n');
    expect(file.quarantine).toMatchObject([
      { line: 3, text: '3', reason: { code: 'ragged-row', found: '1 cells', expected: '2 cells' } },
      { line: 4, text: '4,5,6' },
    ]);
    expect(file.rowsRead).toBe(file.table.rows + file.quarantine.length);
  });

  it.each([',', '\t', ';', '|'])('the delimiter %j is found', async (delimiter) => {
    const file = await read(['a', 'b'].join(delimiter) + '\n' + ['1', '2'].join(delimiter) + '\n');
    expect(file.delimiter).toBe(delimiter);
  });
});

describe('properties', () => {
  it('a number reads back to the last bit', async () => {
    await fc.assert(
      fc.asyncProperty(
        fc.array(fc.double({ noNaN: true, noDefaultInfinity: true }), { minLength: 1 }),
        async (numbers) => {
          const file = await read(
            [
              ...csvText(
                [
                  numberColumn('n', Float64Array.from(numbers)),
                  textColumn(
                    't',
                    numbers.map(() => 'x'),
                  ),
                ],
                numbers.keys(),
              ),
            ].join(''),
          );
          const found = columnNamed(file.table, 'n')!;
          // Integers beyond 2⁵³ stay text, exactly.
          const back = numbers.map((_, row) =>
            found.type === 'number' ? found.values[row]! : Number(cellText(found, row)),
          );
          expect(back.every((value, row) => Object.is(value, numbers[row]))).toBe(true);
        },
      ),
    );
  });

  it('where chunks end changes nothing', async () => {
    const text = '# made up\nname,n,"q ""x"""\r\n"a,\r\nb",1.5,é\r\nc,-2e-3,"d ""e"""\r\n"",,\r\n';
    const whole = await read(text);
    for (let chunk = 1; chunk <= 12; chunk++) expect(await read(text, { chunk })).toEqual(whole);
    expect(whole.table.rows).toBe(3);
  });
});
