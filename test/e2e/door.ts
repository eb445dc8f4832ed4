import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, cpSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';

const root = resolve(import.meta.dirname, '../..');

/** A folder of its own with a copy of the invented samples and room for the engine's state. */
export interface Workplace {
  readonly folder: string;
  readonly recipe: string;
  readonly state: string;
  remove(): void;
}

/** Copies the samples so that a journey can change and break them. */
export function workplace(): Workplace {
  const folder = mkdtempSync(join(tmpdir(), 'halosieve-e2e-'));
  cpSync(join(root, 'samples'), join(folder, 'samples'), { recursive: true });
  return {
    folder,
    recipe: join(folder, 'samples/demo.halosieve.json'),
    state: join(folder, 'state'),
    remove: () => rmSync(folder, { recursive: true, force: true }),
  };
}

/** The product's browser door, run as a user runs it. */
export interface Door {
  readonly address: string;
  readonly process: ChildProcess;
  stop(signal?: NodeJS.Signals): Promise<void>;
}

/** Runs `halosieve open … --browser` and waits for the address that it prints. */
export async function openDoor(place: Workplace, ...words: string[]): Promise<Door> {
  const child = spawn(process.execPath, [join(root, 'out/main/halosieve.js'), 'open', ...words, '--browser'], {
    env: { ...process.env, XDG_STATE_HOME: place.state, DISPLAY: '', CI: '1' },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  const address = await new Promise<string>((found, failed) => {
    let said = '';
    const hear = (data: Buffer): void => {
      said += data.toString();
      const match = /http:\/\/127\.0\.0\.1:\d+\/\S*/.exec(said);
      if (match) found(match[0]);
    };
    child.stdout.on('data', hear);
    child.stderr.on('data', hear);
    child.once('exit', (code) => failed(new Error(`the door closed with ${code}: ${said}`)));
  });
  return {
    address,
    process: child,
    async stop(signal = 'SIGTERM') {
      if (child.exitCode !== null || child.signalCode !== null) return;
      const gone = once(child, 'exit');
      child.kill(signal);
      await gone;
    },
  };
}
