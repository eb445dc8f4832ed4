import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { once } from 'node:events';
import { request } from 'node:http';
import { connect } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, it } from 'vitest';
import WebSocket from 'ws';
import { serveWindow, type WindowServer } from '../../../app/browser/server';
import { decodePacket, encodePacket } from '../../../app/contract/codec';
import type { Packet } from '../../../app/contract/link';
import type { Served } from '../../../app/contract/serve';

let folder: string;
let server: WindowServer;
const listeners = new Set<(name: never, data: never) => void>();
const tell = (name: string, data: unknown): void => listeners.forEach((heard) => heard(name as never, data as never));
const engine: Served = {
  handle: (name) => Promise.resolve({ asked: name } as never),
  listen(heard) {
    listeners.add(heard);
    return () => listeners.delete(heard);
  },
};

beforeEach(async () => {
  folder = mkdtempSync(join(tmpdir(), 'halosieve-window-'));
  writeFileSync(join(folder, 'index.html'), '<p>window</p>');
  server = await serveWindow(engine, { windowFolder: folder });
});
afterEach(async () => {
  await server.close();
  rmSync(folder, { recursive: true });
});

interface Answer {
  readonly status: number;
  readonly headers: NodeJS.Dict<string | string[]>;
  readonly body: string;
}

function get(path: string, headers: Record<string, string> = {}, method = 'GET'): Promise<Answer> {
  return new Promise((resolve, reject) => {
    const asked = request({ host: '127.0.0.1', port: server.port, path, headers, method }, (response) => {
      let body = '';
      response.on('data', (data: Buffer) => (body += data.toString()));
      response.on('end', () => resolve({ status: response.statusCode ?? 0, headers: response.headers, body }));
    });
    asked.on('error', reject);
    asked.end();
  });
}

async function session(): Promise<string> {
  const { headers } = await get(new URL(server.address).pathname + new URL(server.address).search);
  return headers['set-cookie']![0]!.split(';')[0]!;
}

it('the token opens the window once and is worth nothing afterwards', async () => {
  const path = `/${new URL(server.address).search}`;
  expect((await get('/')).status).toBe(403);
  const first = await get(path);
  expect(first).toMatchObject({ status: 303, headers: { location: '/' } });
  expect(first.headers['set-cookie']![0]).toMatch(/HttpOnly; SameSite=Strict/);
  expect((await get(path)).status).toBe(403);
});

it('a session sees the window under a strict policy, and nothing outside its folder', async () => {
  const cookie = await session();
  const page = await get('/', { cookie });
  expect(page).toMatchObject({ status: 200, body: '<p>window</p>' });
  expect(page.headers['content-security-policy']).toContain("script-src 'self'");
  expect(page.headers['content-security-policy']).not.toMatch(/unsafe|https?:/);
  expect((await get('/..%2f..%2fetc%2fpasswd.html', { cookie })).status).toBe(404);
});

it('a session with the used token in its address is sent on to the address without it', async () => {
  const cookie = await session();
  expect(await get(`/${new URL(server.address).search}`, { cookie })).toMatchObject({
    status: 303,
    headers: { location: '/' },
  });
});

it('only GET takes the token, and a wrong one does not use it up', async () => {
  const { search } = new URL(server.address);
  expect((await get(`/${search}`, {}, 'HEAD')).status).toBe(403);
  expect((await get(`/${search}`, {}, 'POST')).status).toBe(405);
  expect((await get(`/${search}x`)).status).toBe(403);
  expect((await get('/?token=')).status).toBe(403);
  expect((await get(`/${search}`)).status).toBe(303);
});

it("a link on another site's page gets a page that goes on, because a strict cookie does not follow its redirect", async () => {
  const answer = await get(`/${new URL(server.address).search}`, { 'sec-fetch-site': 'cross-site' });
  expect(answer).toMatchObject({ status: 200, headers: { refresh: '0; url=/' } });
  const cookie = answer.headers['set-cookie']![0]!.split(';')[0]!;
  expect((await get('/', { cookie })).status).toBe(200);
});

it.each([
  '//',
  '///x',
  '/%',
  '/%00.html',
  '/..%2f..%2fetc%2fpasswd',
  '/%2e%2e/package.json',
  'http://evil.example/',
  '*',
])('the odd target %s is no page, and the server stays', async (path) => {
  const cookie = await session();
  expect((await get(path)).status).toBe(403);
  expect((await get(path, { cookie })).status).toBe(404);
  expect((await get('/', { cookie })).status).toBe(200);
});

it('every answer carries the policy, refusals too', async () => {
  const cookie = await session();
  for (const answer of [await get('/'), await get('/none.html', { cookie }), await get('/', { cookie })]) {
    expect(answer.headers).toMatchObject({
      'content-security-policy':
        "default-src 'none'; script-src 'self'; style-src 'self'; img-src 'self' data: blob:; connect-src 'self'; font-src 'self'; base-uri 'none'; form-action 'none'; frame-ancestors 'none'",
      'x-content-type-options': 'nosniff',
      'referrer-policy': 'no-referrer',
      'cache-control': 'no-store',
    });
  }
});

it('another host name or origin is refused, session or not', async () => {
  const cookie = await session();
  const here = `127.0.0.1:${server.port}`;
  for (const host of ['evil.example', '127.0.0.1', `evil.example:${server.port}`]) {
    expect((await get('/', { cookie, host })).status).toBe(403);
  }
  for (const origin of ['null', here, `https://${here}`, 'http://127.0.0.1', `http://${here}.evil.example`]) {
    expect((await get('/', { cookie, origin })).status).toBe(403);
  }
  expect((await get('/', { cookie, origin: `http://${here}` })).status).toBe(200);
  expect((await get('/', { cookie, host: 'evil.example' })).status).toBe(403);
  expect((await get('/', { cookie, origin: 'http://evil.example' })).status).toBe(403);
});

const socket = (headers: Record<string, string>): WebSocket =>
  new WebSocket(`ws://127.0.0.1:${server.port}/engine`, { headers });
const opens = (headers: Record<string, string>): Promise<boolean> =>
  new Promise((resolve) => {
    const opened = socket(headers);
    opened.on('open', () => {
      opened.close();
      resolve(true);
    });
    opened.on('error', () => resolve(false));
  });

it('the socket wants session and origin', async () => {
  const cookie = await session();
  const origin = `http://127.0.0.1:${server.port}`;
  expect(await opens({ cookie, origin })).toBe(true);
  expect(await opens({ origin })).toBe(false);
  expect(await opens({ cookie })).toBe(false);
  expect(await opens({ cookie, origin: 'http://evil.example' })).toBe(false);
});

async function opened(): Promise<WebSocket> {
  const line = socket({ cookie: await session(), origin: `http://127.0.0.1:${server.port}` });
  await once(line, 'open');
  return line;
}

it('answers requests and refuses unknown ones', async () => {
  const line = await opened();
  const heard: Packet[] = [];
  line.on('message', (data: Buffer) => heard.push(decodePacket(new Uint8Array(data))));
  line.send(encodePacket({ type: 'ask', id: 1, name: 'bench.view', params: {} }));
  line.send(encodePacket({ type: 'ask', id: 2, name: 'constructor' as never, params: {} }));
  await expect.poll(() => heard.length).toBe(2);
  expect(heard.find((packet) => packet.type === 'answer')).toMatchObject({ id: 1, result: { asked: 'bench.view' } });
  expect(heard.find((packet) => packet.type === 'refusal')).toMatchObject({ id: 2 });
});

it.each([
  ['two bytes', new Uint8Array([1, 2]), 1007],
  ['a text', 'bench.view', 1007],
  ['a packet that is no question', encodePacket({ type: 'event', name: 'progress', data: undefined }), 1007],
  ['more than a window ever sends', new Uint8Array((16 << 20) + 1), 1009],
])('hangs up on %s, and serves the next window', async (_, sent, code) => {
  const line = await opened();
  line.send(sent);
  expect((await once(line, 'close'))[0]).toBe(code);
  expect((await get('/')).status).toBe(403);
});

it('a line that breaks while it is refused harms nobody', async () => {
  const head = `GET /engine HTTP/1.1\r\nHost: 127.0.0.1:${server.port}\r\nUpgrade: websocket\r\nConnection: Upgrade\r\n\r\n`;
  for (let times = 0; times < 20; times++) {
    const line = connect(server.port, '127.0.0.1', () => {
      line.write(head);
      line.resetAndDestroy();
    });
    line.on('error', () => undefined);
    await once(line, 'close');
  }
  expect((await get('/')).status).toBe(403);
});

it('two windows of one session hear the same engine, and closing the server closes both', async () => {
  const cookie = await session();
  const headers = { cookie, origin: `http://127.0.0.1:${server.port}` };
  const lines = [socket(headers), socket(headers)];
  await Promise.all(lines.map((line) => once(line, 'open')));
  const heard = lines.map((line) => once(line, 'message'));
  tell('progress', { label: 'Reading', share: 0.5 });
  for (const [data] of await Promise.all(heard)) {
    expect(decodePacket(new Uint8Array(data as Buffer))).toMatchObject({ name: 'progress', data: { share: 0.5 } });
  }
  const closed = lines.map((line) => once(line, 'close'));
  await server.close();
  await Promise.all(closed);
  await expect(get('/')).rejects.toThrow(/ECONNREFUSED/);
  server = await serveWindow(engine, { windowFolder: folder });
});

it('a port that is taken is a rejection', async () => {
  await expect(serveWindow(engine, { windowFolder: folder, port: server.port })).rejects.toMatchObject({
    code: 'EADDRINUSE',
  });
});
