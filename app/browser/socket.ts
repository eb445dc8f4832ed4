import type { IncomingMessage } from 'node:http';
import type { Duplex } from 'node:stream';
import { WebSocketServer, type WebSocket } from 'ws';
import { decodePacket, encodePacket } from '../contract/codec';
import { seatWindow, type Served } from '../contract/serve';
import type { Guard } from './guard';

/** A window's longest packet: a lasso of a hundred thousand vertices is far below. */
const LONGEST_PACKET = 16 << 20;
/** Close code for data that are not what they should be. */
const NOT_A_PACKET = 1007;

/** The sockets of all windows. */
export interface WindowSockets {
  /** Opens a socket for a request that the guard lets in; anything else is refused and hung up. */
  upgrade(request: IncomingMessage, socket: Duplex, head: Buffer): void;
  close(): void;
}

/** Seats a window at the engine for every socket that is opened. */
export function windowSockets(engine: Served, keeper: Guard, bug: (error: unknown) => void): WindowSockets {
  const sockets = new WebSocketServer({ noServer: true, maxPayload: LONGEST_PACKET });
  return {
    upgrade(request, socket, head) {
      // Once upgraded, a broken line is nobody's to hear but ours.
      socket.on('error', () => socket.destroy());
      const allowed = keeper.fromHere(request) && request.headers.origin !== undefined && keeper.hasSession(request);
      if (allowed && request.url === '/engine') {
        sockets.handleUpgrade(request, socket, head, (opened) => seat(opened, engine, bug));
      } else {
        socket.end('HTTP/1.1 403 Forbidden\r\nConnection: close\r\nContent-Length: 0\r\n\r\n');
      }
    },
    close: () => sockets.clients.forEach((socket) => socket.terminate()),
  };
}

function seat(socket: WebSocket, engine: Served, bug: (error: unknown) => void): void {
  const window = seatWindow(
    engine,
    (packet) => {
      if (socket.readyState === socket.OPEN) socket.send(encodePacket(packet));
    },
    bug,
  );
  socket.on('message', (data: Buffer, binary) => {
    if (!binary || !window.take(decoded(data))) socket.close(NOT_A_PACKET, 'not a packet');
  });
  socket.on('close', () => window.leave());
  socket.on('error', () => window.leave());
}

function decoded(data: Buffer): unknown {
  try {
    return decodePacket(new Uint8Array(data));
  } catch {
    return undefined;
  }
}
