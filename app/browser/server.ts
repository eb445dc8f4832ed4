import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import type { Served } from '../contract/serve';
import { guard } from './guard';
import { respond } from './respond';
import { windowSockets } from './socket';

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
  const sockets = windowSockets(engine, keeper, (error) => options.bug?.(error));
  server.on('request', (request, response) => void respond(request, response, keeper, options.windowFolder));
  server.on('upgrade', (request, socket, head) => sockets.upgrade(request, socket, head));
  return {
    address: `http://127.0.0.1:${port}/?token=${keeper.token}`,
    port,
    async close() {
      const closed = new Promise((done) => server.close(done));
      sockets.close();
      server.closeAllConnections();
      await closed;
    },
  };
}
