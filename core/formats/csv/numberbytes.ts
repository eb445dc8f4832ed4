const ZERO = 0x30;
const POINT = 0x2e;
const MINUS = 0x2d;
/** Doubles hold powers of ten exactly up to this exponent. */
const EXACT_TEN = 22;
const TEN = Float64Array.from({ length: EXACT_TEN + 1 }, (_, power) => Number(`1e${power}`));
/** Upper and lower half of the powers of ten: halves of 26 bits, so that their products are exact (T. J. Dekker, 1971). */
const SPLITTER = 2 ** 27 + 1;
const TEN_HIGH = TEN.map((ten) => SPLITTER * ten - (SPLITTER * ten - ten));
const HALF_UNIT = 2 ** -53;
/** Greatest error of the scaled digits; whatever is nearer than this to a decision is left to `String`. */
const DOUBT = 1e-6;

/**
 * Writes the shortest decimal text that reads back to the same double, as `String` would spell it, and −0 as "-0";
 * nothing for NaN. Returns the offset behind it. `to` must have room for 25 bytes.
 *
 * Numbers between 1e-6 and 1e15 are scaled to 17 digits without error (a product of two doubles is the exact sum of two
 * doubles, 1971NuMat..18..224D) and cut to as few digits as still lie within half a unit of the number's last place.
 * Whatever is rare or close to call is left to `String`, so that the text is the same in every case, in a third of the
 * time and without a string.
 */
export function writeNumber(value: number, to: Uint8Array, at: number): number {
  if (Number.isNaN(value)) return at;
  const size = Math.abs(value);
  if (!(size >= 1e-6 && size < 1e15)) return writeAscii(Object.is(value, -0) ? '-0' : String(value), to, at);
  const decade = decadeOf(size);
  const power = 16 - decade;
  const high = size * TEN[power]!;
  const head = Math.floor(high * 1e-8);
  const rest = high - head * 1e8;
  // The guess of the first nine digits may be one too great or too small.
  if (!(rest >= 0 && rest < 1e8 && head >= 1e8 && head < 1e9)) return writeAscii(String(value), to, at);
  const tail = rest + lostOf(size, power, high);
  const unit = powerOfTwoBelow(size);
  const reach = unit * HALF_UNIT * TEN[power]!;
  const zeros = size === unit ? -1 : droppable(tail, reach);
  if (zeros < 0) return writeAscii(String(value), to, at);
  const scale = TEN[zeros]!;
  const kept = Math.floor(tail / scale + 0.5);
  if (kept < 0 || kept * scale >= 1e8 || decade + 1 >= 17 - zeros) return writeAscii(String(value), to, at);
  return writeDigits(value < 0, decade, head, kept, 8 - zeros, to, at);
}

/** Exponent of the greatest power of ten that is not above the number, −6 to 14. */
function decadeOf(size: number): number {
  let decade = 0;
  if (size >= 1) while (size >= TEN[decade + 1]!) decade++;
  else while (size < 1 / TEN[-decade]!) decade--;
  return decade;
}

function powerOfTwoBelow(size: number): number {
  let unit = 1;
  while (unit > size) unit /= 2;
  while (unit * 2 <= size) unit *= 2;
  return unit;
}

/** What the product of the number and a power of ten lost when it was rounded to `high`. */
function lostOf(size: number, power: number, high: number): number {
  const a = SPLITTER * size - (SPLITTER * size - size);
  const b = size - a;
  const c = TEN_HIGH[power]!;
  const d = TEN[power]! - c;
  return a * c - high + a * d + b * c + b * d;
}

/** How many of the last eight digits can go; −1 when that is close to call or all eight could. */
function droppable(tail: number, reach: number): number {
  for (let zeros = 0; zeros < 8; zeros++) {
    const scale = TEN[zeros + 1]!;
    const off = Math.abs(tail - Math.floor(tail / scale + 0.5) * scale);
    if (Math.abs(off - reach) < DOUBT) return -1;
    if (off > reach) return tie(tail, TEN[zeros]!) ? -1 : zeros;
  }
  return -1;
}

/** Whether a number lies halfway between two multiples. */
function tie(tail: number, scale: number): boolean {
  const share = tail / scale;
  return Math.abs(share - Math.floor(share) - 0.5) < DOUBT;
}

function writeDigits(
  negative: boolean,
  decade: number,
  head: number,
  kept: number,
  keptDigits: number,
  to: Uint8Array,
  start: number,
): number {
  let at = start;
  if (negative) to[at++] = MINUS;
  if (decade < 0) {
    to[at++] = ZERO;
    to[at++] = POINT;
    for (let zero = -1; zero > decade; zero--) to[at++] = ZERO;
  }
  const end = at + 9 + keptDigits + (decade >= 0 ? 1 : 0);
  // Digits from the last to the first; the point stands behind the integer digits.
  const point = decade >= 0 ? at + decade + 1 : -1;
  let digits = kept;
  let left = keptDigits;
  for (let place = end - 1; place >= at; place--) {
    if (place === point) {
      to[place] = POINT;
      continue;
    }
    if (left-- === 0) digits = head;
    const shorter = (digits / 10) | 0;
    to[place] = ZERO + digits - 10 * shorter;
    digits = shorter;
  }
  return end;
}

function writeAscii(text: string, to: Uint8Array, at: number): number {
  for (let i = 0; i < text.length; i++) to[at + i] = text.charCodeAt(i);
  return at + text.length;
}
