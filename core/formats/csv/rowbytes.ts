import { textOf } from './cells';
import { writeNumber } from './numberbytes';
import type { RawRecord } from './scanner';
import { csvCell } from './write';

const COMMA = 0x2c;
const LF = 0x0a;
const QUOTE = 0x22;
const CR = 0x0d;
const SPACE = 0x20;
/** No number is longer. */
const NUMBER = 32;

/** Rows of comma-separated text (RFC 4180 with LF) as bytes, for tables too large to be put together as strings. */
export class RowBytes {
  #bytes: Uint8Array;
  #at = 0;
  #first = true;
  readonly #encoder = new TextEncoder();

  /** @param size bytes to begin with; the buffer grows when it must */
  constructor(size = 1 << 16) {
    this.#bytes = new Uint8Array(size);
  }

  get length(): number {
    return this.#at;
  }

  /** A cell of the row; quoted where it must be. */
  text(cell: string): void {
    const quoted = csvCell(cell);
    this.#begin(3 * quoted.length);
    this.#at += this.#encoder.encodeInto(quoted, this.#bytes.subarray(this.#at)).written;
  }

  /** A cell with the shortest text that reads back to the same double; empty for NaN. */
  number(value: number): void {
    this.#begin(NUMBER);
    this.#at = writeNumber(value, this.#bytes, this.#at);
  }

  /** A cell of another delimited text, byte for byte where it needs no quotes. */
  raw(record: RawRecord, cell: number): void {
    const [start, end] = [record.starts[cell]!, record.ends[cell]!];
    if (!isPlain(record.bytes, start, end)) {
      this.text(textOf(record.bytes, start, end));
      return;
    }
    this.#begin(end - start);
    for (let from = start; from < end; from++) this.#bytes[this.#at++] = record.bytes[from]!;
  }

  endRow(): void {
    this.#room(1);
    this.#bytes[this.#at++] = LF;
    this.#first = true;
  }

  /** The bytes so far, which are then no longer held. */
  take(): Uint8Array {
    const taken = this.#bytes.slice(0, this.#at);
    this.#at = 0;
    return taken;
  }

  #begin(length: number): void {
    this.#room(length + 1);
    if (!this.#first) this.#bytes[this.#at++] = COMMA;
    this.#first = false;
  }

  #room(length: number): void {
    if (this.#at + length <= this.#bytes.length) return;
    const larger = new Uint8Array(Math.max(2 * this.#bytes.length, this.#at + length));
    larger.set(this.#bytes.subarray(0, this.#at));
    this.#bytes = larger;
  }
}

/** Whether a cell can stand without quotes and is plain text: no blank at either end, no delimiter, quote or line end. */
function isPlain(bytes: Uint8Array, start: number, end: number): boolean {
  if (end > start && (bytes[start]! <= SPACE || bytes[end - 1]! <= SPACE)) return false;
  for (let at = start; at < end; at++) {
    const byte = bytes[at]!;
    if (byte === COMMA || byte === QUOTE || byte === LF || byte === CR || byte >= 0x80) return false;
  }
  return true;
}
