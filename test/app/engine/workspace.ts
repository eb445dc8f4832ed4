import { cpSync, mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { afterEach, beforeEach } from 'vitest';
import type { BenchView, Change } from '../../../app/contract/messages';
import { createEngine, type Engine } from '../../../app/engine/engine';
import type { ProblemError } from '../../../core/table/problem';
import { problemText } from '../../../core/table/wording';

const SAMPLES = resolve(import.meta.dirname, '../../../samples');

/** A folder with the demo and an engine on it, both new for every test. */
export interface Workspace {
  folder: string;
  recipe: string;
  engine: Engine;
  /** Starts one more engine on the same state folder, as another run of the program would. */
  readonly start: () => Engine;
  readonly change: (change: Change) => Promise<BenchView>;
  /** Paths of the files in the state folder that end so. */
  readonly kept: (ending: string) => string[];
}

/** Sets a workspace up before each test of a file and takes it away after it. */
export function workspace(): Workspace {
  const state = (): string => join(space.folder, 'state');
  const engines: Engine[] = [];
  const space: Workspace = {
    folder: '',
    recipe: '',
    engine: undefined as unknown as Engine,
    start() {
      const engine = createEngine({ stateFolder: state(), version: '0.0.0', now: () => '2026-02-03T04:05:06.000Z' });
      engines.push(engine);
      return engine;
    },
    change: (change) => space.engine.handle('bench.change', { change }),
    kept: (ending) =>
      readdirSync(state())
        .filter((name) => name.endsWith(ending))
        .map((name) => join(state(), name)),
  };
  beforeEach(() => {
    space.folder = mkdtempSync(join(tmpdir(), 'halosieve-engine-'));
    for (const name of ['wide.csv', 'deep.tsv', 'demo.halosieve.json'])
      cpSync(join(SAMPLES, name), join(space.folder, name));
    space.recipe = join(space.folder, 'demo.halosieve.json');
    space.engine = space.start();
  });
  afterEach(async () => {
    for (const engine of engines.splice(0)) await engine.close();
    rmSync(space.folder, { recursive: true, force: true });
  });
  return space;
}

/** A change that moves a limit of the demo. */
export function limit(max: number): Change {
  return { type: 'set-cut', cut: 'metals', set: { parameters: { max } } };
}

/** The sentences with which work is refused. */
export function refusal(work: Promise<unknown>): Promise<string> {
  return work.then(
    () => 'it was not refused',
    (error: unknown) => (error as ProblemError).problems.map(problemText).join(' '),
  );
}
