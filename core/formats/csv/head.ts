import { fail } from '../../table/problem';

const DELIMITERS = [',', '\t', ';', '|'] as const;
const MAGIC: readonly (readonly [name: string, bytes: string])[] = [
  ['a gzip file', '\x1f\x8b'],
  ['a FITS file', 'SIMPLE  ='],
  ['a Parquet file', 'PAR1'],
  ['a zip or spreadsheet file', 'PK\x03\x04'],
  ['an Arrow file', 'ARROW1'],
  ['a UTF-16 text', '\xff\xfe'],
  ['a UTF-16 text', '\xfe\xff'],
  ['a PDF', '%PDF'],
];

/** Refuses bytes that are no delimited text: other formats by their first bytes, and anything with a NUL in it. */
export function refuseBinary(head: Uint8Array, fileName: string): void {
  const begins = String.fromCharCode(...head.subarray(0, 16));
  const known = MAGIC.find(([, bytes]) => begins.startsWith(bytes));
  if (known) fail('not-text', { where: fileName, found: known[0] });
  const nul = head.indexOf(0);
  if (nul >= 0) fail('not-text', { where: fileName, found: `binary data (a NUL byte at offset ${nul})` });
  if (/^\s*<(\?xml|!doctype|html|votable)/i.test(begins)) fail('not-a-table', { where: fileName, found: 'markup' });
}

/** Length of a UTF-8 byte-order mark at the beginning. */
export function markLength(head: Uint8Array): number {
  return head[0] === 0xef && head[1] === 0xbb && head[2] === 0xbf ? 3 : 0;
}

/** The delimiter that stands most often outside quotes in the header; undefined when none does. */
export function delimiterOf(header: string): string | undefined {
  const bare = header.replace(/"(?:[^"]|"")*"/g, '');
  const counts = DELIMITERS.map((delimiter) => bare.split(delimiter).length - 1);
  const most = Math.max(...counts);
  return most === 0 ? undefined : DELIMITERS[counts.indexOf(most)];
}
