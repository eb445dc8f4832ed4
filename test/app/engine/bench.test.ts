import {
  appendFileSync,
  cpSync,
  existsSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  renameSync,
  rmSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { createEngine, type Engine } from '../../../app/engine/engine';
import { verify } from '../../../app/engine/verify';
import type { BenchView, Change } from '../../../app/contract/messages';
import { problemText } from '../../../core/table/wording';
import type { ProblemError } from '../../../core/table/problem';

const SAMPLES = resolve(import.meta.dirname, '../../../samples');
let folder: string;
let recipe: string;
let engine: Engine;
const start = (): Engine =>
  createEngine({ stateFolder: join(folder, 'state'), version: '0.0.0', now: () => '2026-02-03T04:05:06.000Z' });
const change = (what: Change, gesture?: string): Promise<BenchView> =>
  engine.handle('bench.change', gesture === undefined ? { change: what } : { change: what, gesture });
const limit = (max: number): Change => ({ type: 'set-cut', cut: 'metals', set: { parameters: { max } } });
const refusal = async (work: Promise<unknown>): Promise<string> =>
  work.then(
    () => 'it was not refused',
    (error: unknown) => (error as ProblemError).problems.map(problemText).join(' '),
  );

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'halosieve-engine-'));
  for (const name of ['wide.csv', 'deep.tsv', 'demo.halosieve.json']) cpSync(join(SAMPLES, name), join(folder, name));
  recipe = join(folder, 'demo.halosieve.json');
  engine = start();
});
afterEach(async () => {
  await engine.close();
  rmSync(folder, { recursive: true, force: true });
});

describe('a bench', () => {
  it('judges the demo, and counts add up per source', async () => {
    const view = await engine.handle('bench.open', { path: recipe });
    expect(view.counts.objects).toBe(180);
    expect(view.invented).toBe(true);
    for (const { count } of view.sources) {
      expect(count!.objectRows + count!.duplicates + count!.quarantine).toBe(count!.rowsRead);
    }
  });

  it('undoes to the start and redoes to the end with the same recipe, a gesture being one step', async () => {
    const first = await engine.handle('bench.open', { path: recipe });
    await change(limit(-0.9), 'drag');
    await change(limit(-1.1), 'drag');
    const last = await change({ type: 'name-object', key: 'tarnow1', action: 'drop', reason: 'by eye' });
    expect(last.undo).toHaveLength(2);
    await engine.handle('bench.undo', {});
    const undone = await engine.handle('bench.undo', {});
    expect(undone.recipe).toEqual(first.recipe);
    await engine.handle('bench.redo', {});
    expect((await engine.handle('bench.redo', {})).recipe).toEqual(last.recipe);
  });

  it('comes back with its history when another engine opens it after a crash', async () => {
    await engine.handle('bench.open', { path: recipe });
    await change(limit(-1.5));
    await expect.poll(() => readdirSync(join(folder, 'state')).some((name) => name.endsWith('.bench.json'))).toBe(true);
    // No close: the engine before is as good as dead. Its lock is of this very process, which counts as left over.
    const other = start();
    const view = await other.handle('bench.open', { path: recipe });
    expect(view).toMatchObject({ restored: true, saved: false, undo: ['limits of metals'] });
    await other.close();
  });

  it('refuses a bench that a running process holds, and names it', async () => {
    await engine.handle('bench.open', { path: recipe });
    const lock = join(
      folder,
      'state',
      readdirSync(join(folder, 'state')).find((name) => name.endsWith('.lock'))!,
    );
    writeFileSync(lock, String(process.ppid));
    expect(await refusal(start().handle('bench.open', { path: recipe }))).toContain(`process ${process.ppid}`);
  });

  it('refuses a change that would not be a recipe, and stays as it was', async () => {
    const { revision } = await engine.handle('bench.open', { path: recipe });
    const bad = { type: 'set-cut', cut: 'dust', set: { parameters: { absBMin: 100 } } } as const;
    expect(await refusal(change(bad))).toMatch(/absBMin/);
    expect((await engine.handle('bench.view', {})).revision).toBe(revision);
  });
});

describe('sources that are not as they were', () => {
  it('a changed file is not used until it is accepted', async () => {
    appendFileSync(join(folder, 'wide.csv'), 'Tarnow 999,10,10,16,0.1,0,0.1,0,0.1,10,1,-2,0.1,0.1,0.1\n');
    const view = await engine.handle('bench.open', { path: recipe });
    expect(view.sources[0]).toMatchObject({ state: 'changed', problems: [{ code: 'source-changed' }] });
    expect(await refusal(engine.handle('edition.freeze', {}))).toMatch(/wide\.csv: the file is not the one/);
    const accepted = await change({ type: 'accept-source', source: 'wide' });
    expect(accepted.counts.objects).toBe(181);
  });

  it('a file that moved leaves the rest of the bench usable and is named', async () => {
    renameSync(join(folder, 'deep.tsv'), join(folder, 'elsewhere.tsv'));
    const view = await engine.handle('bench.open', { path: recipe });
    expect(view.sources.map(({ state }) => state)).toEqual(['read', 'missing']);
    expect(view.sources[1]!.problems[0]!.text).toMatch(/deep\.tsv: there is no such file/);
    expect(view.counts.objects).toBe(153);
  });

  it('a recipe from the future is refused and left alone', async () => {
    const future = readFileSync(recipe, 'utf8').replace('"version": 1', '"version": 9');
    writeFileSync(recipe, future);
    expect(await refusal(engine.handle('bench.open', { path: recipe }))).toMatch(/version 9.*Update the program/);
    expect(readFileSync(recipe, 'utf8')).toBe(future);
  });

  it('a file that is no table is refused and the bench stays', async () => {
    await engine.handle('bench.open', { path: recipe });
    expect(await refusal(change({ type: 'add-source', path: process.execPath }))).toMatch(/not a text table/);
    expect((await engine.handle('bench.view', {})).sources).toHaveLength(2);
  });
});

describe('freezing', () => {
  const read = (edition: string): Map<string, string> =>
    new Map(readdirSync(edition).map((name) => [name, readFileSync(join(edition, name), 'utf8')]));

  it('twice without a change gives the same bytes, but for number and time', async () => {
    await engine.handle('bench.open', { path: recipe });
    const [first, second] = [await engine.handle('edition.freeze', {}), await engine.handle('edition.freeze', {})];
    expect([first.number, second.number]).toEqual([1, 2]);
    const [one, two] = [read(first.folder), read(second.folder)];
    const differ = [...one.keys()].filter((name) => one.get(name) !== two.get(name));
    expect(differ.sort()).toEqual(['README.md', 'SHA256SUMS', 'edition.json', 'report.html']);
    expect(one.get('edition.json')).toContain('2026-02-03T04:05:06.000Z');
  });

  it('is refused while an enabled cut has no rationale, naming the cut, and writes nothing', async () => {
    await engine.handle('bench.open', { path: recipe });
    await change({ type: 'set-cut', cut: 'dust', set: { rationale: '  ' } });
    expect(await refusal(engine.handle('edition.freeze', {}))).toMatch(/"dust" is switched on without a rationale/);
    expect(existsSync(join(folder, 'editions'))).toBe(false);
  });

  it('into a place that is no folder says so and leaves nothing behind', async () => {
    await engine.handle('bench.open', { path: recipe });
    expect(await refusal(engine.handle('edition.freeze', { folder: 'wide.csv/editions' }))).toMatch(/wide\.csv/);
    expect(readdirSync(folder).filter((name) => name.startsWith('.halosieve'))).toEqual([]);
  });

  it('verifies, and one changed byte, a missing file, a file too many and a missing source are named', async () => {
    await engine.handle('bench.open', { path: recipe });
    const { folder: edition } = await engine.handle('edition.freeze', {});
    expect(await verify(edition)).toMatchObject({ ok: true, differences: [] });
    for (const name of readdirSync(edition).filter((file) => file !== 'SHA256SUMS')) {
      const whole = readFileSync(join(edition, name));
      const touched = Buffer.from(whole);
      touched[Math.floor(whole.length / 2)]! ^= 1;
      writeFileSync(join(edition, name), touched);
      const report = await verify(edition);
      expect(report.ok).toBe(false);
      expect(report.checks.filter(({ ok }) => !ok).map((check) => check.name)).toContain(name);
      writeFileSync(join(edition, name), whole);
    }
    writeFileSync(join(edition, 'extra.txt'), 'x');
    expect((await verify(edition)).checks).toContainEqual(expect.objectContaining({ name: 'extra.txt', ok: false }));
    rmSync(join(edition, 'extra.txt'));
    renameSync(join(folder, 'deep.tsv'), join(folder, 'deep.moved'));
    const lost = await verify(edition);
    expect(lost.checks.find(({ name }) => name === 'source deep')).toMatchObject({ ok: false });
  });
});

it('stopping a reading leaves the bench as it was', async () => {
  await engine.handle('bench.open', { path: recipe });
  const big = join(folder, 'big.csv');
  writeFileSync(big, `name,ra,dec\n${'a,1,2\n'.repeat(2_000_000)}`);
  const reading = refusal(change({ type: 'add-source', path: big }));
  await new Promise((later) => setTimeout(later, 150));
  expect(await engine.handle('work.stop', {})).toEqual({ stopped: true });
  expect(await reading).toMatch(/stopped before it was done/i);
  expect((await engine.handle('bench.view', {})).sources).toHaveLength(2);
});
