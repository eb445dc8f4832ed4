import { EventEmitter } from 'node:events';
import { cpSync, existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import type { Worker } from 'node:worker_threads';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { BenchView } from '../../../app/contract/messages';
import type { Engine } from '../../../app/engine/engine';
import { startThread } from '../../../app/engine/spawn';
import { startEngineThread } from '../../../app/engine/thread';
import { refusal } from './workspace';

vi.mock('../../../app/engine/spawn', { spy: true });

const SAMPLES = resolve(import.meta.dirname, '../../../samples');
let folder: string;
let engine: Engine;
let views: BenchView[];
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'halosieve-thread-'));
  for (const name of ['wide.csv', 'deep.tsv', 'demo.halosieve.json']) cpSync(join(SAMPLES, name), join(folder, name));
  views = [];
});
afterEach(async () => {
  vi.useRealTimers();
  await engine.close();
  vi.mocked(startThread).mockReset();
  rmSync(folder, { recursive: true });
});

function begin(): void {
  engine = startEngineThread({ stateFolder: join(folder, 'state'), version: '0.0.0' });
  engine.listen((name, data) => {
    if (name === 'bench') views.push(data as BenchView);
  });
}

describe('when the thread dies', () => {
  const newest = (): Worker => vi.mocked(startThread).mock.results.at(-1)!.value as Worker;

  it.each(['wide.csv', 'demo.halosieve.json'])('the bench of %s comes back under greater numbers', async (name) => {
    begin();
    const { version } = await engine.handle('bench.open', { path: join(folder, name) });
    const before = await engine.handle('bench.change', { change: { type: 'set-borderline', sigma: 2 } });
    await expect
      .poll(() => existsSync(before.keptIn) && readFileSync(before.keptIn, 'utf8'))
      .toMatch(/"borderlineSigma":2/);
    const heard = views.length;
    await newest().terminate();
    await expect.poll(() => views.length).toBeGreaterThan(heard);
    const after = views.at(-1)!;
    expect(after.recipe).toEqual(before.recipe);
    expect(after.undo).toEqual(before.undo);
    expect(after.revision).toBeGreaterThan(before.revision);
    expect(after.version).toBeGreaterThan(version);
  });

  it('an unsaved bench without a step is begun again', async () => {
    begin();
    const before = await engine.handle('bench.new', {});
    await newest().terminate();
    await expect.poll(() => views.length).toBe(2);
    expect(views[1]!.recipe).toEqual(before.recipe);
  });

  it('one bench after another never shows the same version', async () => {
    begin();
    const first = await engine.handle('bench.open', { path: join(folder, 'wide.csv') });
    const second = await engine.handle('bench.open', { path: join(folder, 'demo.halosieve.json') });
    expect(second.version).toBeGreaterThan(first.version);
  });
});

describe('when the thread dies again and again', () => {
  class Dying extends EventEmitter {
    postMessage(): void {
      this.emit('error', new Error('out of memory'));
      this.emit('exit', 1);
    }
  }
  beforeEach(() => {
    vi.useFakeTimers({ toFake: ['Date'] });
    vi.mocked(startThread).mockImplementation(() => new Dying() as unknown as Worker);
    begin();
  });
  const ask = (): Promise<unknown> => engine.handle('bench.view', {});

  it('three times within a minute, it is left at that, and every request is refused with the reason', async () => {
    await expect(ask()).rejects.toThrow('out of memory');
    await expect(ask()).rejects.toThrow('out of memory');
    for (let times = 0; times < 3; times++) {
      expect(await refusal(ask())).toMatch(/^The engine stopped 3 times within a minute \(out of memory\).*start Halo/);
    }
    expect(startThread).toHaveBeenCalledTimes(3);
  });

  it('at long intervals, it is started every time', async () => {
    for (let times = 0; times < 6; times++) {
      await expect(ask()).rejects.toThrow('out of memory');
      vi.setSystemTime(Date.now() + 31_000);
    }
    expect(startThread).toHaveBeenCalledTimes(7);
    for (let times = 0; times < 3; times++) await ask().catch(() => undefined);
  });
});
