import { type Column, numberText } from '../../table/column';
import type { Problem } from '../../table/problem';
import { textOf, trimEnd, trimStart } from './cells';
import type { MissingTest } from './missing';
import { type NumberCell, readNumber } from './number';

/** Words in at most this share of the cells are taken for slips among numbers. */
const SLIP_SHARE = 0.1;

/** Collects one column without knowing in advance whether it holds numbers or words. */
export class ColumnBuilder {
  readonly name: string;
  readonly #missing: MissingTest;
  readonly #cell: NumberCell = { value: 0, canonical: false, identifier: false };
  #rows = 0;
  #numbers: Float64Array | undefined;
  #canonical = true;
  /** Words met in a column of numbers, by row. */
  readonly #words = new Map<number, string>();
  #codes: Int32Array | undefined;
  readonly #dictionary: string[] = [];
  readonly #codeOf = new Map<string, number>();
  #present = 0;
  #identifiers = 0;
  #numeric = 0;

  constructor(name: string, missing: MissingTest) {
    this.name = name;
    this.#missing = missing;
  }

  /** Takes the next cell. */
  add(bytes: Uint8Array, from: number, to: number): void {
    const start = trimStart(bytes, from, to);
    const end = trimEnd(bytes, start, to);
    const row = this.#rows++;
    const isNumber = end > start && readNumber(bytes, start, end, this.#cell);
    if (isNumber ? this.#missing.number(this.#cell.value) : this.#missingText(bytes, start, end)) {
      this.#put(row, Number.NaN, undefined);
      return;
    }
    this.#present++;
    if (isNumber) this.#numeric++;
    if (isNumber && this.#cell.identifier) this.#identifiers++;
    const asNumber = isNumber && !(this.#cell.identifier && this.#canonical);
    if (this.#codes === undefined && this.#numbers === undefined) this.#begin(asNumber, row);
    if (this.#codes === undefined && isNumber && !asNumber) this.#turnToText();
    if (this.#codes !== undefined) this.#put(row, 0, textOf(bytes, start, end));
    else if (isNumber) {
      this.#canonical &&= this.#cell.canonical;
      this.#put(row, this.#cell.value, undefined);
    } else {
      this.#words.set(row, textOf(bytes, start, end));
      this.#put(row, Number.NaN, undefined);
    }
  }

  /** The finished column, and what was wrong in it; `lineOf` gives the file line of a row. */
  finish(fileName: string, lineOf: (row: number) => number): { column: Column; problem: Problem | undefined } {
    if (this.#codes === undefined && this.#words.size > SLIP_SHARE * this.#present) this.#turnToText();
    const slips = this.#codes !== undefined ? this.#slipsAmongText() : this.#words;
    const rows = this.#rows;
    if (this.#codes !== undefined) {
      const codes = this.#codes.subarray(0, rows);
      return { column: { type: 'text', name: this.name, codes, dictionary: this.#dictionary }, problem: undefined };
    }
    const values = (this.#numbers ?? new Float64Array(rows).fill(Number.NaN)).subarray(0, rows);
    const column: Column = { type: 'number', name: this.name, values };
    return { column, problem: slips.size === 0 ? undefined : this.#slipProblem(fileName, slips, lineOf) };
  }

  #missingText(bytes: Uint8Array, start: number, end: number): boolean {
    return this.#missing.possible(end - start) && this.#missing.text(textOf(bytes, start, end));
  }

  #begin(asNumber: boolean, rows: number): void {
    const room = Math.max(1024, 2 * rows);
    if (asNumber) this.#numbers = new Float64Array(room).fill(Number.NaN, 0, rows);
    else this.#codes = new Int32Array(room).fill(-1, 0, rows);
  }

  #put(row: number, value: number, text: string | undefined): void {
    if (this.#numbers !== undefined) {
      if (row >= this.#numbers.length) this.#numbers = grown(this.#numbers, new Float64Array(2 * row));
      this.#numbers[row] = value;
    } else if (this.#codes !== undefined) {
      if (row >= this.#codes.length) this.#codes = grown(this.#codes, new Int32Array(2 * row));
      this.#codes[row] = text === undefined ? -1 : this.#code(text);
    }
  }

  #code(text: string): number {
    let code = this.#codeOf.get(text);
    if (code === undefined) {
      code = this.#dictionary.push(text) - 1;
      this.#codeOf.set(text, code);
    }
    return code;
  }

  /** Turns collected numbers into their shortest texts, with the words that stood among them. */
  #turnToText(): void {
    const numbers = this.#numbers!;
    const codes = new Int32Array(numbers.length);
    for (let row = 0; row < this.#rows; row++) {
      const text = this.#words.get(row) ?? numberText(numbers[row]!);
      codes[row] = text === '' ? -1 : this.#code(text);
    }
    this.#numbers = undefined;
    this.#codes = codes;
  }

  /** A column that began with a word but holds numbers almost everywhere becomes one of numbers. */
  #slipsAmongText(): ReadonlyMap<number, string> {
    const slips = new Map<number, string>();
    const words = this.#present - this.#numeric;
    if (this.#identifiers > 0 || this.#numeric === 0 || words > SLIP_SHARE * this.#present) return slips;
    const codes = this.#codes!;
    const numbers = new Float64Array(codes.length);
    for (let row = 0; row < this.#rows; row++) {
      const text = codes[row]! < 0 ? '' : this.#dictionary[codes[row]!]!;
      numbers[row] = text === '' ? Number.NaN : Number(text.replace(/[dD]/, 'e'));
      if (text !== '' && Number.isNaN(numbers[row]!)) slips.set(row, text);
    }
    this.#codes = undefined;
    this.#numbers = numbers;
    return slips;
  }

  #slipProblem(fileName: string, slips: ReadonlyMap<number, string>, lineOf: (row: number) => number): Problem {
    const places = [...slips].slice(0, 5).map(([row, word]) => `"${word}" (line ${lineOf(row)})`);
    const [firstRow] = slips.keys();
    return {
      code: 'words-among-numbers',
      severity: 'warning',
      where: fileName,
      column: this.name,
      line: lineOf(firstRow!),
      count: slips.size,
      found: places.join(', ') + (slips.size > 5 ? ' …' : ''),
    };
  }
}

function grown<T extends Float64Array | Int32Array>(old: T, room: T): T {
  room.set(old);
  return room;
}
