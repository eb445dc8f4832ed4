import type { Packet } from './link';

const KINDS = {
  Float64Array,
  Float32Array,
  Int32Array,
  Uint32Array,
  Int16Array,
  Uint16Array,
  Int8Array,
  Uint8Array,
  Uint8ClampedArray,
  BigInt64Array,
  BigUint64Array,
} as const;
type Kind = keyof typeof KINDS;
type Numbers = InstanceType<(typeof KINDS)[Kind]>;

/** Key of the objects that stand for what JSON cannot hold. An object that has the key itself is wrapped. */
const MARK = '\u0000';
/** Numbers that JSON cannot hold. */
const ODD_NUMBERS: ReadonlyMap<unknown, number> = new Map(
  [Number.NaN, Infinity, -Infinity, -0].map((value) => [Object.is(value, -0) ? '-0' : String(value), value]),
);
/** Typed arrays begin at multiples of this, as a Float64Array must. */
const ALIGN = 8;
/** Lengths of head and body, 4 bytes each, little-endian. */
const PREFIX = 8;

/**
 * A packet as bytes: the lengths of head and body, the head as JSON, then the typed arrays that it speaks of. NaN,
 * infinities, -0 and undefined survive. Throws TypeError for a view that is no typed array, and for a bigint.
 */
export function encodePacket(packet: Packet): Uint8Array {
  const placed: { readonly array: Numbers; readonly offset: number }[] = [];
  let size = 0;
  const place = (array: Numbers): number => {
    const offset = size;
    placed.push({ array, offset });
    size += aligned(array.byteLength);
    return offset;
  };
  const head = new TextEncoder().encode(JSON.stringify(packed(packet, place)));
  const start = aligned(PREFIX + head.length);
  const bytes = new Uint8Array(start + size);
  const prefix = new DataView(bytes.buffer);
  prefix.setUint32(0, head.length, true);
  prefix.setUint32(4, size, true);
  bytes.set(head, PREFIX);
  for (const { array, offset } of placed) {
    bytes.set(new Uint8Array(array.buffer, array.byteOffset, array.byteLength), start + offset);
  }
  return bytes;
}

/** The packet that `encodePacket` wrote. Throws RangeError for bytes that are none, also where they break off. */
export function decodePacket(given: Uint8Array): Packet {
  // A copy at an even place, so that every array can be a view of it.
  const bytes = given.byteOffset % ALIGN === 0 ? given : new Uint8Array(given);
  if (bytes.length < PREFIX) throw new RangeError('a packet is too short');
  const prefix = new DataView(bytes.buffer, bytes.byteOffset);
  const headEnd = PREFIX + prefix.getUint32(0, true);
  const start = aligned(headEnd);
  if (start + prefix.getUint32(4, true) !== bytes.length) throw new RangeError('a packet has not the length it states');
  const packet = unpacked(parsed(bytes.subarray(PREFIX, headEnd)), bytes.subarray(start));
  if (typeof (packet as Packet | null)?.type !== 'string') throw new RangeError('a packet has no type');
  return packet as Packet;
}

function aligned(length: number): number {
  return Math.ceil(length / ALIGN) * ALIGN;
}

function parsed(head: Uint8Array): unknown {
  try {
    return JSON.parse(new TextDecoder().decode(head));
  } catch {
    throw new RangeError('the head of a packet is not JSON');
  }
}

function packed(value: unknown, place: (array: Numbers) => number): unknown {
  if (value === undefined) return { [MARK]: 'undefined' };
  if (typeof value === 'number') {
    if (Object.is(value, -0)) return { [MARK]: 'number', text: '-0' };
    return Number.isFinite(value) ? value : { [MARK]: 'number', text: String(value) };
  }
  if (typeof value !== 'object' || value === null) return value;
  if (Array.isArray(value)) return Array.from(value, (item) => packed(item, place));
  if (ArrayBuffer.isView(value)) {
    const kind = (value as Partial<Numbers>)[Symbol.toStringTag];
    if (kind === undefined || !Object.hasOwn(KINDS, kind)) throw new TypeError('a packet holds only typed arrays');
    const array = value as Numbers;
    return { [MARK]: kind, offset: place(array), length: array.length };
  }
  const entries = Object.entries(value).map(([key, inner]): [string, unknown] => [key, packed(inner, place)]);
  return Object.hasOwn(value, MARK) ? { [MARK]: 'object', entries } : Object.fromEntries(entries);
}

function unpacked(value: unknown, body: Uint8Array): unknown {
  if (typeof value !== 'object' || value === null) return value;
  if (Array.isArray(value)) return value.map((item) => unpacked(item, body));
  const { [MARK]: mark, ...rest } = value as { [MARK]?: unknown } & Record<string, unknown>;
  if (mark === undefined) {
    return Object.fromEntries(Object.entries(value).map(([key, inner]) => [key, unpacked(inner, body)]));
  }
  if (mark === 'undefined') return undefined;
  if (mark === 'number') return ODD_NUMBERS.get(rest['text']) ?? broken();
  if (mark === 'object') {
    const { entries } = rest;
    if (!Array.isArray(entries) || !entries.every(isEntry)) broken();
    return Object.fromEntries(entries.map(([key, inner]) => [key, unpacked(inner, body)]));
  }
  return arrayIn(body, mark, rest['offset'], rest['length']);
}

function arrayIn(body: Uint8Array, mark: unknown, offset: unknown, length: unknown): Numbers {
  if (typeof mark !== 'string' || !Object.hasOwn(KINDS, mark)) broken();
  const make = KINDS[mark as Kind];
  if (!isCount(offset) || !isCount(length) || offset % ALIGN !== 0) broken();
  if (offset + length * make.BYTES_PER_ELEMENT > body.length) broken();
  return new make(body.buffer as ArrayBuffer, body.byteOffset + offset, length);
}

function isEntry(value: unknown): value is [string, unknown] {
  return Array.isArray(value) && value.length === 2 && typeof value[0] === 'string';
}

function isCount(value: unknown): value is number {
  return Number.isSafeInteger(value) && (value as number) >= 0;
}

function broken(): never {
  throw new RangeError('a packet speaks of what it does not hold');
}
