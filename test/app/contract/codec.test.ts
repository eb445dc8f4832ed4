import fc from 'fast-check';
import { expect, it } from 'vitest';
import { decodePacket, encodePacket } from '../../../app/contract/codec';
import type { Packet } from '../../../app/contract/link';

const packet = (result: unknown): Packet => ({ type: 'answer', id: 1, result });
const there = (result: unknown): unknown => (decodePacket(encodePacket(packet(result))) as { result: unknown }).result;

it('NaN, infinities, minus zero and gaps of lists survive', () => {
  expect(there({ a: [Number.NaN, -Infinity, -0, undefined, 'x'] })).toEqual({
    a: [Number.NaN, -Infinity, -0, undefined, 'x'],
  });
});

it('typed arrays arrive as they left, of every kind, empty ones and views too', () => {
  const whole = Float64Array.from([1, Number.NaN, 3]);
  const sent = {
    a: whole.subarray(1),
    b: new Uint8Array(),
    c: Int32Array.from([-1, 2]),
    d: Uint8Array.from([7]),
    e: Int16Array.from([-3]),
  };
  expect(there(sent)).toEqual(sent);
});

it('whatever JSON can hold comes back', () => {
  fc.assert(
    fc.property(fc.jsonValue(), (value) => {
      expect(there(value)).toEqual(value);
    }),
  );
});

it('a packet that breaks off is refused wherever it does', () => {
  const whole = encodePacket(packet({ list: Float64Array.from([1, 2, 3]) }));
  for (let length = 0; length < whole.length; length++)
    expect(() => decodePacket(whole.slice(0, length))).toThrow(RangeError);
});
