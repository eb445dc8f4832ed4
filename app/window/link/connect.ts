import { decodePacket, encodePacket } from '../../contract/codec';
import type { EngineLink, Packet } from '../../contract/link';
import { PendingAsks } from './pending';

/** What Electron's preload puts into the page. */
interface Bridge {
  send(packet: Packet): void;
  onPacket(heard: (packet: Packet) => void): () => void;
}

const RETRY_MS = 800;

/** The link that this page has: Electron's bridge where there is one, else a socket to the server that sent the page. */
export function connectEngine(): EngineLink {
  const bridge = (globalThis as { halosieve?: Bridge }).halosieve;
  return bridge ? overBridge(bridge) : overSocket();
}

function overBridge(bridge: Bridge): EngineLink {
  const asks = new PendingAsks((packet) => bridge.send(packet));
  bridge.onPacket((packet) => asks.take(packet));
  queueMicrotask(() => asks.tell(true));
  return asks;
}

function overSocket(): EngineLink {
  let socket: WebSocket | undefined;
  let unsent: Packet[] = [];
  const asks = new PendingAsks((packet) => {
    if (socket?.readyState === WebSocket.OPEN) socket.send(encodePacket(packet) as Uint8Array<ArrayBuffer>);
    else unsent.push(packet);
  });
  const open = (): void => {
    const address = new URL('/engine', location.href);
    address.protocol = address.protocol === 'https:' ? 'wss:' : 'ws:';
    socket = new WebSocket(address);
    socket.binaryType = 'arraybuffer';
    socket.onopen = () => {
      asks.tell(true);
      for (const packet of unsent) socket?.send(encodePacket(packet) as Uint8Array<ArrayBuffer>);
      unsent = [];
    };
    socket.onmessage = (event: MessageEvent<ArrayBuffer>) => asks.take(decodePacket(new Uint8Array(event.data)));
    socket.onclose = () => {
      unsent = [];
      asks.tell(false);
      setTimeout(open, RETRY_MS);
    };
  };
  open();
  return asks;
}
