import { createServer, type IncomingMessage, type ServerResponse } from 'node:http';
import type { AddressInfo } from 'node:net';
import type { Duplex } from 'node:stream';
import { WebSocketServer } from 'ws';
import { decodePacket, encodePacket } from '../contract/codec';
import { CONTENT_SECURITY_POLICY } from '../contract/csp';
import { seatWindow, type Served } from '../contract/serve';
import { guard, type Guard } from './guard';
import { windowFile } from './windowfiles';

const HEADERS = {
  'Content-Security-Policy': CONTENT_SECURITY_POLICY,
  'X-Content-Type-Options': 'nosniff',
  'Referrer-Policy': 'no-referrer',
  'Cross-Origin-Opener-Policy': 'same-origin',
  'Cache-Control': 'no-store',
} as const;
/** A window's longest packet: a lasso of a hundred thousand vertices is far below. */
const LONGEST_PACKET = 16 << 20;

/** The window in a local browser. */
export interface WindowServer {
  /** Address with the one-time token. */
  readonly address: string;
  readonly port: number;
  close(): Promise<void>;
}

export interface ServeOptions {
  /** Folder of the built window. */
  readonly windowFolder: string;
  /** 0 for a port of the system's choice. */
  readonly port?: number | undefined;
  readonly bug?: (error: unknown) => void;
}

/** Serves the window on 127.0.0.1 to whoever holds the token. Rejects when the port is taken. */
export async function serveWindow(engine: Served, options: ServeOptions): Promise<WindowServer> {
  const server = createServer();
  await new Promise<void>((listening, failed) => {
    server.once('error', failed);
    server.listen(options.port ?? 0, '127.0.0.1', listening);
  });
  const { port } = server.address() as AddressInfo;
  const keeper = guard(port);
  server.on('request', (request, response) => void respond(request, response, keeper, options.windowFolder));

  const sockets = new WebSocketServer({ noServer: true, maxPayload: LONGEST_PACKET });
  server.on('upgrade', (request: IncomingMessage, socket: Duplex, head: Buffer) => {
    const allowed = keeper.fromHere(request) && request.headers.origin !== undefined && keeper.hasSession(request);
    if (!allowed || request.url !== '/engine') {
      socket.end('HTTP/1.1 403 Forbidden\r\nConnection: close\r\n\r\n');
      return;
    }
    sockets.handleUpgrade(request, socket, head, (opened) => sockets.emit('connection', opened));
  });
  sockets.on('connection', (socket) => {
    const seat = seatWindow(
      engine,
      (packet) => {
        if (socket.readyState === socket.OPEN) socket.send(encodePacket(packet));
      },
      (error) => options.bug?.(error),
    );
    socket.on('message', (data: Buffer, binary) => {
      try {
        if (binary) seat.take(decodePacket(new Uint8Array(data)));
      } catch {
        socket.close(1007, 'not a packet');
      }
    });
    socket.on('close', () => seat.leave());
    socket.on('error', () => seat.leave());
  });

  return {
    address: `http://127.0.0.1:${port}/?token=${keeper.token}`,
    port,
    async close() {
      for (const socket of sockets.clients) socket.terminate();
      server.closeAllConnections();
      await new Promise((closed) => server.close(closed));
    },
  };
}

async function respond(
  request: IncomingMessage,
  response: ServerResponse,
  keeper: Guard,
  folder: string,
): Promise<void> {
  const answer = (status: number, body: string | Buffer, headers: Record<string, string> = {}): void => {
    response.writeHead(status, { ...HEADERS, 'Content-Type': 'text/plain; charset=utf-8', ...headers });
    response.end(request.method === 'HEAD' ? undefined : body);
  };
  if (!keeper.fromHere(request)) {
    answer(403, 'This address belongs to a local program.\n');
    return;
  }
  if (request.method !== 'GET' && request.method !== 'HEAD') {
    answer(405, 'Only GET.\n');
    return;
  }
  const url = new URL(request.url ?? '/', 'http://127.0.0.1');
  const token = url.searchParams.get('token');
  if (token !== null && !keeper.hasSession(request)) {
    const cookie = keeper.exchange(token);
    if (cookie === undefined) {
      answer(403, 'This link was used already. Start Halosieve again for a new one.\n');
      return;
    }
    answer(303, '', { 'Set-Cookie': cookie, Location: '/' });
    return;
  }
  if (!keeper.hasSession(request)) {
    answer(403, 'Open the address that Halosieve printed.\n');
    return;
  }
  const file = await windowFile(folder, url.pathname);
  if (!file) {
    answer(404, 'There is no such page.\n');
    return;
  }
  answer(200, file.bytes, { 'Content-Type': file.type });
}
