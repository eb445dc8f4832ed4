const ZERO = 0x30;
const NINE = 0x39;
const PLUS = 0x2b;
const MINUS = 0x2d;
const DOT = 0x2e;

/** Powers of ten that a double holds exactly. */
const TEN = Float64Array.from({ length: 23 }, (_, power) => Number(`1e${power}`));
const NUMBER = /^[+-]?(\d+\.?\d*|\.\d+)([eEdD][+-]?\d+)?$/;
const INFINITE = /^([+-]?)inf(inity)?$/i;

/** What the bytes of a cell are, beside their value. */
export interface NumberCell {
  value: number;
  /** Whether `String(value)` gives the text back: only then can a column of numbers turn into text without loss. */
  canonical: boolean;
  /** An integer beyond 2⁵³ or with a leading zero: an identifier, which a double would spoil. */
  identifier: boolean;
}

/**
 * Reads a number from bytes to the last bit; false when the bytes are no number.
 *
 * Up to 15 digits with at most 22 decimals are exact by one division of exact doubles (1990, Clinger, PLDI '90);
 * everything else goes to `Number`.
 */
export function readNumber(bytes: Uint8Array, start: number, end: number, cell: NumberCell): boolean {
  let at = start;
  const first = bytes[at]!;
  const negative = first === MINUS;
  if (negative || first === PLUS) at++;
  const digitsFrom = at;
  let mantissa = 0;
  let decimals = -1;
  for (; at < end; at++) {
    const byte = bytes[at]!;
    if (byte >= ZERO && byte <= NINE) {
      mantissa = mantissa * 10 + (byte - ZERO);
      if (decimals >= 0) decimals++;
    } else if (byte === DOT && decimals < 0) decimals = 0;
    else return readSlowly(bytes, start, end, cell);
  }
  const digits = end - digitsFrom - (decimals >= 0 ? 1 : 0);
  if (digits === 0) return false;
  if (digits > 15) return readSlowly(bytes, start, end, cell);
  const size = decimals > 0 ? mantissa / TEN[decimals]! : mantissa;
  cell.value = negative ? -size : size;
  const leadingZero = decimals < 0 && digits > 1 && bytes[digitsFrom] === ZERO;
  cell.identifier = leadingZero;
  cell.canonical = decimals < 0 && !leadingZero && first !== PLUS && !(negative && mantissa === 0);
  return true;
}

function readSlowly(bytes: Uint8Array, start: number, end: number, cell: NumberCell): boolean {
  if (end - start > 400) return false;
  let text = '';
  for (let at = start; at < end; at++) text += String.fromCharCode(bytes[at]!);
  cell.identifier = false;
  cell.canonical = false;
  const infinite = INFINITE.exec(text);
  if (infinite) {
    cell.value = infinite[1] === '-' ? -Infinity : Infinity;
    return true;
  }
  if (!NUMBER.test(text)) return false;
  cell.value = Number(text.replace(/[dD]/, 'e'));
  cell.canonical = String(cell.value) === text;
  cell.identifier = /^[+-]?\d+$/.test(text) && !Number.isSafeInteger(cell.value);
  return true;
}
