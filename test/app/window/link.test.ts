import { afterEach, beforeEach, expect, it, vi } from 'vitest';
import { decodePacket, encodePacket } from '../../../app/contract/codec';
import { LostError, type Packet, RefusedError } from '../../../app/contract/link';
import { connectEngine } from '../../../app/window/link/connect';
import { PendingAsks } from '../../../app/window/link/pending';

it('matches answers to questions by their number, in whatever order they come', async () => {
  const sent: Packet[] = [];
  const asks = new PendingAsks((packet) => sent.push(packet));
  const first = asks.ask('bench.view', {});
  const second = asks.ask('work.stop', {});
  const [one, two] = sent as { id: number }[];
  asks.take({ type: 'answer', id: two!.id, result: { stopped: true } });
  asks.take({
    type: 'refusal',
    id: one!.id,
    problems: [{ code: 'file-missing', severity: 'error', text: 'No bench is open.' }],
  });
  expect(await second).toEqual({ stopped: true });
  await expect(first).rejects.toBeInstanceOf(RefusedError);
  await expect(first).rejects.toThrow('No bench is open.');
});

it('rejects what was asked of an engine that is lost, and hears its late answers no more', async () => {
  const asks = new PendingAsks(() => undefined);
  const asked = asks.ask('bench.view', {});
  asks.tell(false);
  await expect(asked).rejects.toBeInstanceOf(LostError);
  asks.take({ type: 'answer', id: 1, result: {} });
});

it('hands events to those who listen, until they stop', () => {
  const asks = new PendingAsks(() => undefined);
  const heard = vi.fn();
  const stop = asks.listen('progress', heard);
  asks.take({ type: 'event', name: 'progress', data: { label: 'Reading', share: 0.5 } });
  stop();
  asks.take({ type: 'event', name: 'progress', data: undefined });
  expect(heard.mock.calls).toEqual([[{ label: 'Reading', share: 0.5 }]]);
});

class DoubleSocket {
  static readonly OPEN = 1;
  static readonly all: DoubleSocket[] = [];
  readyState = 0;
  binaryType = '';
  readonly sent: Packet[] = [];
  onopen: () => void = () => undefined;
  onclose: () => void = () => undefined;
  onmessage: (event: { data: ArrayBuffer }) => void = () => undefined;
  readonly address: URL;
  constructor(address: URL) {
    this.address = address;
    DoubleSocket.all.push(this);
  }
  send(bytes: Uint8Array): void {
    this.sent.push(decodePacket(Uint8Array.from(bytes)));
  }
  open(): void {
    this.readyState = 1;
    this.onopen();
  }
  close(): void {
    this.readyState = 3;
    this.onclose();
  }
}

beforeEach(() => {
  DoubleSocket.all.length = 0;
  vi.stubGlobal('WebSocket', DoubleSocket);
  vi.useFakeTimers();
});
afterEach(() => {
  vi.useRealTimers();
  vi.unstubAllGlobals();
});

it('sends what was asked before the socket was open, and answers come back', async () => {
  const link = connectEngine();
  const asked = link.ask('work.stop', {});
  const [socket] = DoubleSocket.all;
  expect(socket!.address.href).toMatch(/^ws:.*\/engine$/);
  expect(socket!.sent).toEqual([]);
  socket!.open();
  const { id } = socket!.sent[0] as { id: number };
  const bytes = encodePacket({ type: 'answer', id, result: { stopped: false } });
  socket!.onmessage({ data: bytes.slice().buffer });
  expect(await asked).toEqual({ stopped: false });
});

it('tries again after the socket closed, and tells of the loss and of the return', async () => {
  const link = connectEngine();
  const states: boolean[] = [];
  link.onState((connected) => states.push(connected));
  DoubleSocket.all[0]!.open();
  const lost = link.ask('bench.view', {});
  DoubleSocket.all[0]!.close();
  await expect(lost).rejects.toBeInstanceOf(LostError);
  vi.advanceTimersByTime(60_000);
  expect(DoubleSocket.all).toHaveLength(2);
  DoubleSocket.all[1]!.open();
  expect(DoubleSocket.all[1]!.sent).toEqual([]);
  expect(states).toEqual([true, false, true]);
});
