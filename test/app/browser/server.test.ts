import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { request } from 'node:http';
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
const engine: Served = { handle: (name) => Promise.resolve({ asked: name } as never), listen: () => () => undefined };

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

function get(path: string, headers: Record<string, string> = {}): Promise<Answer> {
  return new Promise((resolve, reject) => {
    const asked = request({ host: '127.0.0.1', port: server.port, path, headers }, (response) => {
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

it('another host name or origin is refused, session or not', async () => {
  const cookie = await session();
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

it('answers requests, refuses unknown ones, and hangs up on what is no packet', async () => {
  const cookie = await session();
  const line = socket({ cookie, origin: `http://127.0.0.1:${server.port}` });
  await new Promise((open) => line.on('open', open));
  const heard: Packet[] = [];
  line.on('message', (data: Buffer) => heard.push(decodePacket(new Uint8Array(data))));
  line.send(encodePacket({ type: 'ask', id: 1, name: 'bench.view', params: {} }));
  line.send(encodePacket({ type: 'ask', id: 2, name: 'constructor' as never, params: {} }));
  await expect.poll(() => heard.length).toBe(2);
  expect(heard.find((packet) => packet.type === 'answer')).toMatchObject({ id: 1, result: { asked: 'bench.view' } });
  expect(heard.find((packet) => packet.type === 'refusal')).toMatchObject({ id: 2 });
  const closed = new Promise((code) => line.on('close', code));
  line.send(Buffer.from('rubbish'));
  line.send(new Uint8Array([1, 2]));
  expect(await closed).toBe(1007);
});
