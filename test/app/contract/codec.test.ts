import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decodePacket, encodePacket } from '../../../app/contract/codec';
import type { Packet } from '../../../app/contract/link';

const packet = (result: unknown): Packet => ({ type: 'answer', id: 1, result });
const there = (result: unknown): unknown => (decodePacket(encodePacket(packet(result))) as { result: unknown }).result;

/** A packet of a hand-written head and body, as someone who means ill would send it. */
function forged(head: unknown, bodyBytes = 16): Uint8Array {
  const text = new TextEncoder().encode(JSON.stringify({ type: 'answer', id: 1, result: head }));
  const start = Math.ceil((8 + text.length) / 8) * 8;
  const bytes = new Uint8Array(start + bodyBytes);
  new DataView(bytes.buffer).setUint32(0, text.length, true);
  new DataView(bytes.buffer).setUint32(4, bodyBytes, true);
  bytes.set(text, 8);
  return bytes;
}

/** Typed arrays of every kind, of any bits, also as views that begin anywhere. */
const typedArray = fc
  .tuple(
    fc.constantFrom(
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
    ),
    fc.uint8Array({ maxLength: 64 }),
    fc.nat({ max: 3 }),
  )
  .map(([make, bits, skip]) => {
    const length = Math.floor(bits.length / make.BYTES_PER_ELEMENT);
    const whole = new make(bits.slice(0, length * make.BYTES_PER_ELEMENT).buffer);
    return whole.subarray(Math.min(skip, length));
  });
const anything = fc.letrec((tie) => ({
  value: fc.oneof(
    { depthSize: 'small' },
    fc.double(),
    fc.string({ unit: 'binary' }),
    fc.constantFrom(null, undefined, true, -0, Number.NaN, Infinity, -Infinity),
    typedArray,
    fc.array(tie('value'), { maxLength: 4 }),
    fc.dictionary(fc.oneof(fc.string(), fc.constantFrom('\u0000', '__proto__', 'toJSON', 'length')), tie('value'), {
      maxKeys: 4,
      noNullPrototype: true,
    }),
  ),
})).value;

describe('what is sent arrives', () => {
  it('NaN, infinities, minus zero and gaps of lists', () => {
    expect(there({ a: [Number.NaN, -Infinity, -0, undefined, 'x'] })).toStrictEqual({
      a: [Number.NaN, -Infinity, -0, undefined, 'x'],
    });
  });

  it('undefined, alone and as a value of a record', () => {
    expect(there(undefined)).toBeUndefined();
    expect(there({ a: undefined })).toStrictEqual({ a: undefined });
  });

  it('empty typed arrays and views into larger ones', () => {
    const sent = {
      a: Float64Array.from([1, Number.NaN, 3]).subarray(1),
      b: new Uint8Array(),
      c: Int32Array.from([-1]),
    };
    expect(there(sent)).toStrictEqual(sent);
  });

  it('the bits of a NaN in a typed array are left as they are', () => {
    const odd = new BigUint64Array([0x7ff8_0000_dead_beefn]);
    const back = there(new Float64Array(odd.buffer)) as Float64Array;
    expect(new BigUint64Array(back.buffer, back.byteOffset, 1)).toStrictEqual(odd);
  });

  it('records whose keys are the ones that the form uses itself', () => {
    const sent = { '\u0000': 'number', text: 'NaN', inner: { '\u0000': 'object', entries: [Int8Array.of(1)] } };
    expect(there(sent)).toStrictEqual(sent);
  });

  it('anything made of numbers, texts, lists, records and typed arrays, wherever the bytes lie', () => {
    fc.assert(
      fc.property(anything, fc.nat({ max: 9 }), (value, shift) => {
        const bytes = encodePacket(packet(value));
        const moved = new Uint8Array(bytes.length + shift);
        moved.set(bytes, shift);
        expect(decodePacket(moved.subarray(shift))).toStrictEqual(packet(value));
      }),
      { numRuns: 500 },
    );
  });
});

describe('what is no packet is refused', () => {
  it('a forged one that holds what it speaks of is still one, so that those below fail for their own reason', () => {
    expect(decodePacket(forged({ '\u0000': 'Float64Array', offset: 8, length: 1 }))).toStrictEqual(
      packet(Float64Array.of(0)),
    );
  });

  it('one that breaks off, wherever it does, and one with something behind it', () => {
    for (const whole of [packet({ list: Float64Array.from([1, 2, 3]) }), packet('no arrays')].map(encodePacket)) {
      for (let length = 0; length < whole.length; length++)
        expect(() => decodePacket(whole.slice(0, length))).toThrow(RangeError);
      expect(() => decodePacket(Uint8Array.from([...whole, 0]))).toThrow(RangeError);
    }
  });

  it.each([
    [{ '\u0000': 'Float64Array', offset: 0, length: 3 }],
    [{ '\u0000': 'Float64Array', offset: 16, length: 1 }],
    [{ '\u0000': 'Float64Array', offset: 4, length: 1 }],
    [{ '\u0000': 'Float64Array', offset: -8, length: 1 }],
    [{ '\u0000': 'Float64Array', offset: 0, length: 0.5 }],
    [{ '\u0000': 'Float64Array', offset: '0', length: '1' }],
    [{ '\u0000': 'Float64Array' }],
    [{ '\u0000': 'constructor', offset: 0, length: 1 }],
    [{ '\u0000': 'number', text: '1e999' }],
    [{ '\u0000': 'object', entries: { a: 1 } }],
    [{ '\u0000': 'object', entries: [null] }],
    [{ '\u0000': 7 }],
  ])('one that speaks of what it does not hold: %j', (head) => {
    expect(() => decodePacket(forged(head))).toThrow(RangeError);
  });

  it('any other bytes, with an error of one kind', () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 80 }), (bytes) => {
        expect(() => decodePacket(bytes)).toThrow(RangeError);
      }),
    );
  });

  it('a head nested deeper than any of ours', () => {
    const deep = `${'['.repeat(2e5)}${']'.repeat(2e5)}`;
    const text = new TextEncoder().encode(`{"type":"ask","params":${deep}}`);
    const bytes = new Uint8Array(Math.ceil((8 + text.length) / 8) * 8);
    new DataView(bytes.buffer).setUint32(0, text.length, true);
    bytes.set(text, 8);
    expect(() => decodePacket(bytes)).toThrow(RangeError);
  });

  it('a view that is no typed array is not sent', () => {
    expect(() => encodePacket(packet(new DataView(new ArrayBuffer(8))))).toThrow(TypeError);
  });
});
