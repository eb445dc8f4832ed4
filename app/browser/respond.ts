import type { IncomingMessage, ServerResponse } from 'node:http';
import { CONTENT_SECURITY_POLICY } from '../contract/csp';
import type { Guard } from './guard';
import { windowFile } from './windowfiles';

const HEADERS = {
  'Content-Security-Policy': CONTENT_SECURITY_POLICY,
  'X-Content-Type-Options': 'nosniff',
  'Referrer-Policy': 'no-referrer',
  'Cross-Origin-Opener-Policy': 'same-origin',
  'Cross-Origin-Resource-Policy': 'same-origin',
  'Cache-Control': 'no-store',
  'Content-Type': 'text/plain; charset=utf-8',
} as const;

/** Answers one request: the token for a cookie, and the window's files for the cookie. Never rejects. */
export async function respond(
  request: IncomingMessage,
  response: ServerResponse,
  keeper: Guard,
  folder: string,
): Promise<void> {
  const answer = (status: number, body: string | Buffer, headers: Record<string, string> = {}): void => {
    response.writeHead(status, { ...HEADERS, ...headers });
    response.end(request.method === 'HEAD' ? undefined : body);
  };
  if (!keeper.fromHere(request)) {
    answer(403, 'This address belongs to a local program.\n');
    return;
  }
  if (request.method !== 'GET' && request.method !== 'HEAD') {
    answer(405, 'Only GET.\n', { Allow: 'GET, HEAD' });
    return;
  }
  // Not through URL: a target such as `//` is none, and must not be an error here.
  const [path = '/', query = ''] = (request.url ?? '/').split('?', 2);
  const token = new URLSearchParams(query).get('token');
  if (token !== null && request.method === 'GET') {
    answer(...welcome(request, keeper, token));
    return;
  }
  if (!keeper.hasSession(request)) {
    answer(403, 'Open the address that Halosieve printed.\n');
    return;
  }
  const file = await windowFile(folder, path);
  if (file) answer(200, file.bytes, { 'Content-Type': file.type });
  else answer(404, 'There is no such page.\n');
}

/** Takes the token out of the address, and gives the session to whoever brings it first. */
function welcome(request: IncomingMessage, keeper: Guard, token: string): [number, string, Record<string, string>] {
  if (keeper.hasSession(request)) return [303, '', { Location: '/' }];
  const cookie = keeper.exchange(token);
  if (cookie === undefined) {
    return [403, 'This link was used already. Start Halosieve again for a new one.\n', {}];
  }
  // A strict cookie does not travel with a redirect that another site's link began (a terminal in a web page, say);
  // it does when this page itself goes on.
  return request.headers['sec-fetch-site'] === 'cross-site'
    ? [200, 'Opening…\n', { 'Set-Cookie': cookie, Refresh: '0; url=/' }]
    : [303, '', { 'Set-Cookie': cookie, Location: '/' }];
}
