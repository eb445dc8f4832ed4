import { expect, test } from 'vitest';
import { RowBytes } from '../../../../core/formats/csv/rowbytes';
import { RecordScanner } from '../../../../core/formats/csv/scanner';

const decode = (rows: RowBytes): string => new TextDecoder().decode(rows.take());

test('rows of texts and numbers, quoted where they must be, from a buffer that grows', () => {
  const rows = new RowBytes(4);
  for (const cell of ['ω Cen', 'a,b', 'say "so"', ' blank', '']) rows.text(cell);
  rows.endRow();
  for (const value of [1.5, Number.NaN, -0, 1e-300]) rows.number(value);
  rows.endRow();
  expect(decode(rows)).toBe('ω Cen,"a,b","say ""so""", blank",\n'.replace(' blank"', '" blank"') + '1.5,,-0,1e-300\n');
  expect(rows.length).toBe(0);
});

test('cells of another text pass byte for byte, and get the quotes that commas need', () => {
  const rows = new RowBytes();
  const bytes = new TextEncoder().encode('001\t1.50\tNGC 1, north\t"two\nlines"\tβ\t x\n');
  new RecordScanner('\t').push(bytes, true, (record) => {
    for (let cell = 0; cell < record.cells; cell++) rows.raw(record, cell);
    rows.endRow();
  });
  expect(decode(rows)).toBe('001,1.50,"NGC 1, north","two\nlines",β," x"\n');
});
