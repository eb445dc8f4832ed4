import { randomBytes, timingSafeEqual } from 'node:crypto';
import type { IncomingMessage } from 'node:http';

/** Decides who may talk to the loopback server: one token, once, for a session cookie; only from this very address. */
export interface Guard {
  /** Token for the address that is printed. */
  readonly token: string;
  /** Whether host, and origin where there is one, are this server: keeps other sites and rebound names out. */
  fromHere(request: IncomingMessage): boolean;
  hasSession(request: IncomingMessage): boolean;
  /** The Set-Cookie value for the right token, which is used up by it; undefined for any other. */
  exchange(token: string): string | undefined;
}

/** A guard for the server on a port. */
export function guard(port: number): Guard {
  const token = randomBytes(24).toString('base64url');
  const session = randomBytes(24).toString('base64url');
  const hosts = new Set([`127.0.0.1:${port}`, `localhost:${port}`]);
  // Cookies are shared by all ports of a host: the name keeps two servers apart.
  const cookie = `halosieve-${port}`;
  let spent = false;
  return {
    token,
    fromHere({ headers }) {
      const { host = '', origin } = headers;
      return hosts.has(host) && (origin === undefined || origin === `http://${host}`);
    },
    hasSession: ({ headers }) => same(cookieOf(headers.cookie, cookie), session),
    exchange(given) {
      if (spent || !same(given, token)) return undefined;
      spent = true;
      return `${cookie}=${session}; HttpOnly; SameSite=Strict; Path=/`;
    },
  };
}

function cookieOf(header: string | undefined, cookie: string): string {
  const pair = header
    ?.split(';')
    .map((part) => part.trim().split('='))
    .find(([name]) => name === cookie);
  return pair?.[1] ?? '';
}

/** Compares in a time that does not tell where the texts differ. */
function same(a: string, b: string): boolean {
  const [left, right] = [Buffer.from(a), Buffer.from(b)];
  return left.length === right.length && timingSafeEqual(left, right);
}
