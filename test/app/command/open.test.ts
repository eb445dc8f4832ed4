import { type ChildProcess, spawn, spawnSync } from 'node:child_process';
import { once } from 'node:events';
import { createWriteStream, existsSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { createServer, type Server } from 'node:http';
import { tmpdir } from 'node:os';
import type { AddressInfo } from 'node:net';
import { join, resolve } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { findElectron } from '../../../app/desktop/findelectron';

const ROOT = resolve(import.meta.dirname, '../../..');
const PROGRAM = join(ROOT, 'out/main/halosieve.js');
let folder: string;
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'halosieve-open-'));
});
afterAll(() => rmSync(folder, { recursive: true }));

interface Run {
  readonly child: ChildProcess;
  said(): { out: string; err: string };
  readonly ended: Promise<{ code: number | null; out: string; err: string }>;
}

function start(words: string[], env: NodeJS.ProcessEnv = {}): Run {
  const child = spawn(process.execPath, [PROGRAM, ...words], {
    env: { ...process.env, XDG_STATE_HOME: folder, DISPLAY: '', WAYLAND_DISPLAY: '', CI: '1', ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let [out, err] = ['', ''];
  child.stdout.on('data', (data: Buffer) => (out += data.toString()));
  child.stderr.on('data', (data: Buffer) => (err += data.toString()));
  const ended = once(child, 'close').then(([code]) => ({ code: code as number | null, out, err }));
  return { child, said: () => ({ out, err }), ended };
}

const locks = (): string[] => {
  const state = join(folder, 'halosieve');
  return existsSync(state) ? readdirSync(state).filter((name) => name.endsWith('.lock')) : [];
};

describe('open in the browser', () => {
  it('prints one line for programs, serves, and leaves no lock when it is stopped, however often', async () => {
    const run = start(['open', '--browser', '--json']);
    await expect.poll(() => run.said().out).toContain('\n');
    const said = JSON.parse(run.said().out) as { address: string; port: number; recipe: string };
    expect(said.recipe).toBe(join(ROOT, 'samples/demo.halosieve.json'));
    expect(new URL(said.address)).toMatchObject({ hostname: '127.0.0.1', port: String(said.port) });
    expect((await fetch(said.address, { redirect: 'manual' })).status).toBe(303);
    expect(locks()).toHaveLength(1);
    for (let times = 0; times < 3; times++) run.child.kill('SIGINT');
    expect(await run.ended).toMatchObject({ code: 0, err: '' });
    expect(locks()).toEqual([]);
  });

  it('names the tunnel over ssh', async () => {
    const run = start(['open', '--browser'], { SSH_CONNECTION: '192.0.2.1 1 192.0.2.2 22' });
    await expect.poll(() => run.said().out).toMatch(/ssh -L (\d+):127\.0\.0\.1:\1 /);
    run.child.kill('SIGTERM');
    expect((await run.ended).code).toBe(0);
  });

  it('says which port is taken, and what to do', async () => {
    const other: Server = createServer().listen(0, '127.0.0.1');
    await once(other, 'listening');
    const { port } = other.address() as AddressInfo;
    const { code, err } = await start(['open', '--browser', '--port', String(port)]).ended;
    expect({ code, err }).toMatchObject({ code: 2, err: expect.stringMatching(`port ${port} is taken.*--port`) });
    other.close();
    expect(locks()).toEqual([]);
  });

  it.each(['0', '65536', '80x', '-1'])('refuses the port %s before it opens anything', async (port) => {
    expect(await start(['open', '--browser', '--port', port]).ended).toMatchObject({ code: 2, out: '' });
  });

  it.skipIf(findElectron(ROOT) !== undefined)('says why the browser serves where Electron is not here', async () => {
    const run = start(['open']);
    await expect.poll(() => run.said().out).toContain('Halosieve is open at');
    expect(run.said().err).toMatch(/Electron.* is not here: using the local browser/);
    run.child.kill('SIGTERM');
    await run.ended;
  });
});

describe.skipIf(process.platform === 'win32')('Ctrl-C', () => {
  it.each([
    ['inspect', []],
    ['derive', ['--out', 'derived.csv']],
    ['open', ['--browser']],
  ])('stops %s while it reads, with exit code 130 and one line', async (command, words) => {
    // A pipe lasts as long as the test wants, and opens for writing only when the program reads.
    const pipe = join(folder, `${command}.csv`);
    spawnSync('sh', ['-c', 'mkfifo "$0"', pipe]);
    const run = start([command, pipe, ...words.map((word) => (word.startsWith('-') ? word : join(folder, word)))]);
    const writer = createWriteStream(pipe);
    writer.on('error', () => undefined);
    await once(writer, 'open');
    writer.write('name,ra,dec,distance\n');
    run.child.kill('SIGINT');
    const row = `T,1,2,20.5\n`.repeat(10_000);
    const feeding = setInterval(() => writer.write(row), 100);
    const { code, out, err } = await run.ended;
    clearInterval(feeding);
    writer.destroy();
    expect({ code, out }).toEqual({ code: 130, out: '' });
    expect(err).toMatch(/stopped before it was done/);
    expect(err).not.toMatch(/^\s+at /m);
    expect(readdirSync(folder).filter((name) => name.includes('derived'))).toEqual([]);
    expect(locks()).toEqual([]);
  });
});

describe('streams', () => {
  it('a reader that goes away early is no failure', async () => {
    const run = start(['inspect', join(ROOT, 'samples/wide.csv'), '--json']);
    run.child.stdout!.destroy();
    expect(await run.ended).toMatchObject({ code: 0, err: '' });
  });

  it.skipIf(!existsSync('/dev/full'))('a full disk behind the answer is a line and exit code 1', async () => {
    const child = spawn('sh', [
      '-c',
      '"$0" "$1" inspect "$2" > /dev/full',
      process.execPath,
      PROGRAM,
      join(ROOT, 'samples/wide.csv'),
    ]);
    let err = '';
    child.stderr.on('data', (data: Buffer) => (err += data.toString()));
    const [code] = (await once(child, 'close')) as [number];
    expect({ code, err }).toEqual({ code: 1, err: 'The answer could not be written (ENOSPC).\n' });
  });
});

describe('files', () => {
  it('derive does not write over its own input, by whatever name', async () => {
    const input = join(folder, 'in.csv');
    writeFileSync(input, 'name,ra,dec,distance\nA,1,2,3\n');
    const run = start(['derive', input, '--out', join(folder, '.', 'x', '..', 'in.csv')]);
    expect(await run.ended).toMatchObject({ code: 2, err: expect.stringMatching(/the input itself/) });
    expect(readFileSync(input, 'utf8')).toBe('name,ra,dec,distance\nA,1,2,3\n');
  });

  it.each(['1', 'yesterday', '2026-13-01'])('freeze refuses the time %s', async (time) => {
    const words = ['freeze', join(ROOT, 'samples/demo.halosieve.json'), '--out', join(folder, 'editions')];
    expect(await start([...words, '--time', time]).ended).toMatchObject({ code: 2 });
    expect(await start(words, { SOURCE_DATE_EPOCH: time === '1' ? 'x' : time }).ended).toMatchObject({ code: 2 });
    expect(existsSync(join(folder, 'editions'))).toBe(false);
  });
});
