const SPACE = 0x20;
const TAB = 0x09;
const decoder = new TextDecoder('utf-8');

/** Text of a range of UTF-8 bytes; bytes that are no UTF-8 become U+FFFD. */
export function textOf(bytes: Uint8Array, start: number, end: number): string {
  let ascii = end - start < 64;
  let text = '';
  for (let at = start; ascii && at < end; at++) {
    const byte = bytes[at]!;
    ascii = byte < 0x80;
    text += String.fromCharCode(byte);
  }
  return ascii ? text : decoder.decode(bytes.subarray(start, end));
}

/** First byte that is no blank. */
export function trimStart(bytes: Uint8Array, start: number, end: number): number {
  let at = start;
  while (at < end && (bytes[at] === SPACE || bytes[at] === TAB)) at++;
  return at;
}

/** End without trailing blanks. */
export function trimEnd(bytes: Uint8Array, start: number, end: number): number {
  let at = end;
  while (at > start && (bytes[at - 1] === SPACE || bytes[at - 1] === TAB)) at--;
  return at;
}
