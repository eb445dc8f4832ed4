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

/** Digits whose number a double holds exactly, whatever they are. */
const EXACT_DIGITS = 15;

/**
 * Reads a number from bytes to the last bit; false when the bytes are no number.
 *
 * Up to 15 digits with at most 22 decimals are exact by one division of exact doubles (1990, Clinger, PLDI '90). Up to 19
 * digits are divided as the exact sum of two doubles; a quotient too close to the middle of two doubles goes to `Number`,
 * as everything else does.
 */
export function readNumber(bytes: Uint8Array, start: number, end: number, cell: NumberCell): boolean {
  let at = start;
  const first = bytes[at]!;
  const negative = first === MINUS;
  if (negative || first === PLUS) at++;
  const digitsFrom = at;
  let mantissa = 0;
  let tail = 0;
  let significant = 0;
  let decimals = -1;
  for (; at < end; at++) {
    const byte = bytes[at]!;
    if (byte >= ZERO && byte <= NINE) {
      if (significant > 0 || byte !== ZERO) significant++;
      if (significant <= EXACT_DIGITS) mantissa = mantissa * 10 + (byte - ZERO);
      else tail = tail * 10 + (byte - ZERO);
      if (decimals >= 0) decimals++;
    } else if (byte === DOT && decimals < 0) decimals = 0;
    else return readSlowly(bytes, start, end, cell);
  }
  const digits = end - digitsFrom - (decimals >= 0 ? 1 : 0);
  if (digits === 0) return false;
  const long = significant > EXACT_DIGITS;
  if (decimals > 22 || (long && (decimals <= 0 || significant > EXACT_DIGITS + 4)))
    return readSlowly(bytes, start, end, cell);
  const size = long
    ? quotient(mantissa, TEN[significant - EXACT_DIGITS]!, tail, TEN[decimals]!)
    : decimals > 0
      ? mantissa / TEN[decimals]!
      : mantissa;
  if (Number.isNaN(size)) return readSlowly(bytes, start, end, cell);
  cell.value = negative ? -size : size;
  const leadingZero = decimals < 0 && digits > 1 && bytes[digitsFrom] === ZERO;
  cell.identifier = leadingZero;
  cell.canonical = decimals < 0 && !leadingZero && first !== PLUS && !(negative && mantissa === 0);
  return true;
}

/** Makes the upper half of a double, so that products of halves are exact (1971NuMat..18..224D). */
const SPLITTER = 2 ** 27 + 1;

/** What the product a·b lost when it was rounded. */
function lostOf(a: number, b: number, product: number): number {
  const aHigh = SPLITTER * a - (SPLITTER * a - a);
  const bHigh = SPLITTER * b - (SPLITTER * b - b);
  const aLow = a - aHigh;
  const bLow = b - bHigh;
  return aHigh * bHigh - product + aHigh * bLow + aLow * bHigh + aLow * bLow;
}

/** (head × scale + tail) / divisor, correctly rounded; NaN when that cannot be told for sure. */
function quotient(head: number, scale: number, tail: number, divisor: number): number {
  const high = head * scale;
  const low = lostOf(head, scale, high) + tail;
  const first = high / divisor;
  const back = first * divisor;
  const second = (high - back - lostOf(first, divisor, back) + low) / divisor;
  const doubt = first * 1e-28;
  const size = first + (second + doubt);
  return size === first + (second - doubt) ? size : Number.NaN;
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
