import { fail } from '../../table/problem';
import { textOf } from './cells';
import type { Chunks, ReadOptions } from './file';
import { delimiterOf, markLength, refuseBinary } from './head';
import { type RawRecord, RecordScanner } from './scanner';

const LF = 0x0a;
const HASH = 0x23;
/** A line without an end in this many bytes is no line of a table. */
const LONGEST_HEADER = 1 << 22;

/** What stands before the first row. */
export interface Heading {
  readonly delimiter: string;
  readonly header: readonly string[];
  readonly comments: readonly string[];
}

export interface RecordSink {
  heading(heading: Heading): void;
  /** A record that is neither blank nor a comment. */
  record(record: RawRecord): void;
  /** A comment line after the header. */
  comment?(line: number): void;
}

/**
 * Feeds every record of a delimited text to a sink.
 *
 * Errors: empty-file; not-text and not-a-table for other content; unclosed-quote with the line where it opened;
 * cancelled.
 */
export async function eachRecord(chunks: Chunks, options: ReadOptions, sink: RecordSink): Promise<void> {
  const where = options.fileName;
  let head: Uint8Array = new Uint8Array(0);
  let scanner: RecordScanner | undefined;
  let soFar = 0;
  const emit = (record: RawRecord): void => {
    if (record.cells === 1 && record.starts[0] === record.ends[0] && record.quoted[0] === 0) return;
    if (record.bytes[record.starts[0]!] === HASH && record.quoted[0] === 0) sink.comment?.(record.line);
    else sink.record(record);
  };
  const take = (chunk: Uint8Array, last: boolean): void => {
    let bytes = chunk;
    if (scanner === undefined) {
      head = join(head, chunk);
      refuseBinary(head, where);
      const begun = readHeading(head, last, where);
      if (begun === undefined) return;
      sink.heading(begun.heading);
      scanner = new RecordScanner(begun.heading.delimiter, begun.line);
      bytes = head.subarray(begun.end);
      head = new Uint8Array(0);
    }
    if (scanner.push(bytes, last, emit).unclosedQuote) fail('unclosed-quote', { where, line: scanner.line });
  };
  for await (const chunk of chunks) {
    if (options.cancelled?.() === true) fail('cancelled', { where });
    if (chunk.includes(0)) refuseBinary(chunk, where);
    take(chunk, false);
    soFar += chunk.length;
    options.onBytes?.(soFar);
  }
  if (soFar === 0) fail('empty-file', { where });
  take(new Uint8Array(0), true);
}

/** Cells of a record as text, blanks kept. */
export function cellTexts(record: RawRecord): string[] {
  return Array.from({ length: record.cells }, (_, cell) =>
    textOf(record.bytes, record.starts[cell]!, record.ends[cell]!),
  );
}

interface Begun {
  readonly heading: Heading;
  /** Offset and line where the rows begin. */
  readonly end: number;
  readonly line: number;
}

/** Reads comments and header from the beginning of a file; undefined when more bytes are needed. */
function readHeading(head: Uint8Array, last: boolean, where: string): Begun | undefined {
  const comments: string[] = [];
  let at = markLength(head);
  for (let line = 1; ; line++) {
    const newline = lineEnd(head, at);
    if (newline < 0 && !last) {
      if (head.length - at > LONGEST_HEADER) fail('not-a-table', { where, found: 'a first line of over 4 MB' });
      return undefined;
    }
    const end = newline < 0 ? head.length : newline;
    const text = textOf(head, at, end).replace(/\r$/, '');
    if (text.startsWith('#')) comments.push(text.slice(1).trim());
    else if (text.trim() !== '') {
      return headerAt(head, at, line, comments, last, where);
    }
    if (newline < 0) fail('empty-file', { where, found: comments.length > 0 ? 'nothing but comments' : 'blank lines' });
    at = newline + 1;
  }
}

/** Reads the header record, which quotes may spread over several lines; undefined when more bytes are needed. */
function headerAt(
  head: Uint8Array,
  at: number,
  line: number,
  comments: string[],
  last: boolean,
  where: string,
): Begun | undefined {
  const end = lineEnd(head, at);
  const text = textOf(head, at, end < 0 ? head.length : end);
  const delimiter = delimiterOf(text);
  if (delimiter === undefined) fail('not-a-table', { where, line, found: shorten(text) });
  const bytes = head.subarray(at);
  for (let stop = lineEnd(bytes, 0); ; stop = lineEnd(bytes, stop + 1)) {
    const length = stop < 0 ? bytes.length : stop + 1;
    let header: string[] | undefined;
    new RecordScanner(delimiter).push(bytes.slice(0, length), true, (record) => {
      header ??= cellTexts(record).map((cell) => cell.trim());
    });
    if (header) {
      const lines = textOf(bytes, 0, length).split('\n').length - (stop < 0 ? 0 : 1);
      return { heading: { delimiter, header, comments }, end: at + length, line: line + lines };
    }
    if (stop < 0) return last ? fail('unclosed-quote', { where, line }) : undefined;
  }
}

/** Offset of the end of a line: LF, or a lone CR. */
function lineEnd(bytes: Uint8Array, from: number): number {
  const newline = bytes.indexOf(LF, from);
  if (newline >= 0) return newline;
  // Old spreadsheets end lines with CR alone; a CR as the last byte may be half of a CRLF.
  const cr = bytes.indexOf(0x0d, from);
  return cr >= 0 && cr < bytes.length - 1 ? cr : -1;
}

function shorten(text: string): string {
  return text.length > 60 ? `${text.slice(0, 60)}…` : text;
}

function join(a: Uint8Array, b: Uint8Array): Uint8Array {
  const joined = new Uint8Array(a.length + b.length);
  joined.set(a);
  joined.set(b, a.length);
  return joined;
}
