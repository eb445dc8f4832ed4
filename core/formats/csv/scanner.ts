const QUOTE = 0x22;
const LF = 0x0a;
const CR = 0x0d;

/** The bytes of one record: cell i is `bytes[starts[i]…ends[i])`; quoted cells are already without quotes. */
export interface RawRecord {
  /** Valid until the next record. */
  readonly bytes: Uint8Array;
  readonly starts: Int32Array;
  readonly ends: Int32Array;
  readonly quoted: Uint8Array;
  cells: number;
  /** 1-based line where the record begins. */
  line: number;
}

/**
 * Splits bytes that arrive in chunks into records of RFC 4180: CRLF, LF or CR ends a record, quoted cells may hold
 * delimiters, line ends and doubled quotes. Chunk borders may fall anywhere.
 */
export class RecordScanner {
  readonly #delimiter: number;
  #rest: Uint8Array = new Uint8Array(0);
  #line: number;
  #starts = new Int32Array(256);
  #ends = new Int32Array(256);
  #quoted = new Uint8Array(256);

  constructor(delimiter: string, firstLine = 1) {
    this.#delimiter = delimiter.charCodeAt(0);
    this.#line = firstLine;
  }

  /** Line on which an unfinished record began, when bytes are left over at the end. */
  get line(): number {
    return this.#line;
  }

  /** Takes a chunk and gives every record that is complete; with `last`, the rest too. */
  push(chunk: Uint8Array, last: boolean, emit: (record: RawRecord) => void): { unclosedQuote: boolean } {
    const bytes = this.#rest.length === 0 ? chunk.slice() : concat(this.#rest, chunk);
    let at = 0;
    while (at < bytes.length) {
      const next = this.#record(bytes, at, last, emit);
      if (next < 0) {
        this.#rest = bytes.subarray(at);
        return { unclosedQuote: last };
      }
      at = next;
    }
    this.#rest = new Uint8Array(0);
    return { unclosedQuote: false };
  }

  /** Reads one record from `from`; returns where the next begins, or −1 when the bytes do not hold its end. */
  #record(bytes: Uint8Array, from: number, last: boolean, emit: (record: RawRecord) => void): number {
    const delimiter = this.#delimiter;
    const length = bytes.length;
    let at = from;
    let cell = 0;
    let newlines = 0;
    for (;;) {
      if (cell === this.#starts.length) this.#grow();
      if (bytes[at] === QUOTE) {
        const end = closeQuote(bytes, at + 1);
        // A closing quote as the very last byte may be the first half of a doubled one.
        if (end < 0 || (end + 1 >= length && !last)) return -1;
        for (let i = at; i < end; i++) if (bytes[i] === LF) newlines++;
        const open = at;
        at = end + 1;
        while (at < length && bytes[at] !== delimiter && bytes[at] !== LF && bytes[at] !== CR) at++;
        // Text after a closing quote breaks RFC 4180: the cell is then taken as it stands, quotes and all.
        const proper = at === end + 1;
        this.#starts[cell] = proper ? open + 1 : open;
        this.#ends[cell] = proper ? end : at;
        this.#quoted[cell] = proper ? 1 : 0;
      } else {
        const start = at;
        let byte = at < length ? bytes[at]! : -1;
        while (byte !== delimiter && byte !== LF && byte !== CR && byte !== -1) {
          at++;
          byte = at < length ? bytes[at]! : -1;
        }
        this.#starts[cell] = start;
        this.#ends[cell] = at;
        this.#quoted[cell] = 0;
      }
      cell++;
      if (at >= length) {
        if (!last) return -1;
        break;
      }
      if (bytes[at] !== delimiter) break;
      at++;
    }
    if (at < length && bytes[at] === CR) {
      if (at + 1 >= length && !last) return -1;
      at++;
    }
    if (at < length && bytes[at] === LF) at++;
    for (let i = 0; i < cell; i++) {
      // Only now, because an unfinished record is scanned again from its unchanged bytes.
      if (this.#quoted[i] === 1) this.#ends[i] = undouble(bytes, this.#starts[i]!, this.#ends[i]!);
    }
    emit({ bytes, starts: this.#starts, ends: this.#ends, quoted: this.#quoted, cells: cell, line: this.#line });
    this.#line += newlines + 1;
    return at;
  }

  #grow(): void {
    const grown = this.#starts.length * 2;
    const [starts, ends, quoted] = [new Int32Array(grown), new Int32Array(grown), new Uint8Array(grown)];
    starts.set(this.#starts);
    ends.set(this.#ends);
    quoted.set(this.#quoted);
    [this.#starts, this.#ends, this.#quoted] = [starts, ends, quoted];
  }
}

/** Place of the quote that closes a cell, or −1. */
function closeQuote(bytes: Uint8Array, from: number): number {
  let at = bytes.indexOf(QUOTE, from);
  while (at >= 0 && bytes[at + 1] === QUOTE) at = bytes.indexOf(QUOTE, at + 2);
  return at;
}

/** Turns doubled quotes into single ones in place and returns the new end. */
function undouble(bytes: Uint8Array, from: number, end: number): number {
  let to = bytes.indexOf(QUOTE, from);
  if (to < 0 || to >= end) return end;
  for (let at = to; at < end; at++) {
    bytes[to++] = bytes[at]!;
    if (bytes[at] === QUOTE) at++;
  }
  return to;
}

function concat(a: Uint8Array, b: Uint8Array): Uint8Array {
  const joined = new Uint8Array(a.length + b.length);
  joined.set(a);
  joined.set(b, a.length);
  return joined;
}
