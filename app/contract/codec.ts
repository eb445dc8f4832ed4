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
} as const;
type Kind = keyof typeof KINDS;
type Numbers = InstanceType<(typeof KINDS)[Kind]>;

/** Key that marks what JSON cannot hold: a NUL, which no name read from a text file can be. */
const MARK = '\u0000';
/** Typed arrays begin at multiples of this, as a Float64Array must. */
const ALIGN = 8;

/**
 * A packet as bytes: length of the head (4 bytes, little-endian), the head as JSON, then the typed arrays that it
 * speaks of. NaN, infinities, undefined and -0 survive.
 */
export function encodePacket(packet: Packet): Uint8Array {
  const arrays: { array: Numbers; offset: number }[] = [];
  let size = 0;
  const head = JSON.stringify(packet, function (this: Record<string, unknown>, key, value: unknown) {
    // `toJSON` and the like must not hide what stands there.
    const raw = key === '' ? value : this[key];
    const kind = kindOf(raw);
    if (kind) {
      const array = raw as Numbers;
      const offset = size;
      arrays.push({ array, offset });
      size += Math.ceil(array.byteLength / ALIGN) * ALIGN;
      return { [MARK]: kind, offset, length: array.length };
    }
    if (raw === undefined && !Array.isArray(this)) return undefined;
    if (raw === undefined) return { [MARK]: 'undefined' };
    if (typeof raw === 'number' && (!Number.isFinite(raw) || Object.is(raw, -0)))
      return { [MARK]: 'number', text: Object.is(raw, -0) ? '-0' : String(raw) };
    return raw;
  });
  const text = new TextEncoder().encode(head);
  const start = bodyStart(text.length);
  const bytes = new Uint8Array(start + size);
  new DataView(bytes.buffer).setUint32(0, text.length, true);
  bytes.set(text, 4);
  for (const { array, offset } of arrays) {
    bytes.set(new Uint8Array(array.buffer, array.byteOffset, array.byteLength), start + offset);
  }
  return bytes;
}

/** The packet that `encodePacket` wrote. Throws RangeError for bytes that are none. */
export function decodePacket(given: Uint8Array): Packet {
  // A copy at an even place, so that every array can be a view of it.
  const bytes = given.byteOffset % ALIGN === 0 ? given : given.slice();
  if (bytes.length < 4) throw new RangeError('a packet is too short');
  const length = new DataView(bytes.buffer, bytes.byteOffset).getUint32(0, true);
  if (4 + length > bytes.length) throw new RangeError('a packet breaks off in its head');
  const start = bodyStart(length);
  let packet: unknown;
  try {
    packet = JSON.parse(new TextDecoder().decode(bytes.subarray(4, 4 + length)), (_, value: unknown) =>
      revived(value, bytes, start),
    );
  } catch (error) {
    if (error instanceof RangeError) throw error;
    throw new RangeError('the head of a packet is not JSON');
  }
  if (typeof (packet as Packet | null)?.type !== 'string') throw new RangeError('a packet has no type');
  return packet as Packet;
}

function bodyStart(headLength: number): number {
  return Math.ceil((4 + headLength) / ALIGN) * ALIGN;
}

function kindOf(value: unknown): Kind | undefined {
  if (!ArrayBuffer.isView(value)) return undefined;
  return (Object.keys(KINDS) as Kind[]).find((kind) => value instanceof KINDS[kind]);
}

function revived(value: unknown, bytes: Uint8Array, start: number): unknown {
  const marked = value as { [MARK]?: string; offset?: number; length?: number; text?: string } | null;
  const mark = typeof marked === 'object' ? marked?.[MARK] : undefined;
  if (mark === undefined) return value;
  if (mark === 'number') return Number(marked!.text);
  if (mark === 'undefined') return undefined;
  const make = KINDS[mark as Kind];
  const from = bytes.byteOffset + start + (marked!.offset ?? -1);
  const size = (marked!.length ?? -1) * make.BYTES_PER_ELEMENT;
  if (size < 0 || from + size > bytes.byteOffset + bytes.length)
    throw new RangeError('a packet breaks off in its arrays');
  return new make(bytes.buffer as ArrayBuffer, from, marked!.length);
}
