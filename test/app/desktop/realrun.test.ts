import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { expect, it } from 'vitest';
import { findElectron, hasDisplay } from '../../../app/desktop/findelectron';

const ROOT = resolve(import.meta.dirname, '../../..');
const electron = findElectron(ROOT);

it.skipIf(electron === undefined || !hasDisplay())(
  'the real application starts and stays (skipped without binary or display)',
  async () => {
    const state = mkdtempSync(join(tmpdir(), 'halosieve-electron-'));
    const child = spawn(electron!, [ROOT, join(ROOT, 'samples/demo.halosieve.json'), '--no-sandbox'], {
      env: { ...process.env, XDG_STATE_HOME: state },
    });
    await new Promise((later) => setTimeout(later, 8000));
    expect(child.exitCode).toBeNull();
    const gone = once(child, 'exit');
    child.kill();
    await gone;
    rmSync(state, { recursive: true });
  },
);
