import { chmodSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { findElectron, hasDisplay } from '../../../app/desktop/findelectron';
import { runElectron } from '../../../app/desktop/runelectron';

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'halosieve-electron-'));
});
afterEach(() => rmSync(folder, { recursive: true }));

/** A program that stands in for Electron's binary. */
function binary(script: string): string {
  const path = join(folder, 'electron');
  writeFileSync(path, `#!/bin/sh\n${script}\n`);
  chmodSync(path, 0o755);
  return path;
}
const never = new AbortController().signal;

describe.skipIf(process.platform === 'win32')('the application as a process', () => {
  it('is given the package, the path and no Node mode, and its end is waited for', async () => {
    process.env['ELECTRON_RUN_AS_NODE'] = '1';
    const said = join(folder, 'said');
    const path = binary(`echo "$1|$2|$#|\${ELECTRON_RUN_AS_NODE-none}" > ${said}`);
    expect(await runElectron(path, '/package', '/data/a b.csv', never)).toBeUndefined();
    expect(readFileSync(said, 'utf8')).toBe('/package|/data/a b.csv|2|none\n');
    expect(await runElectron(path, '/package', undefined, never)).toBeUndefined();
    expect(readFileSync(said, 'utf8')).toBe('/package||1|none\n');
    delete process.env['ELECTRON_RUN_AS_NODE'];
  });

  it('that ends at once with an error gives the reason, so that the browser can serve instead', async () => {
    expect(await runElectron(binary('exit 127'), '/package', undefined, never)).toMatch(/127/);
    expect(await runElectron(binary('kill -SEGV $$'), '/package', undefined, never)).toMatch(/SIGSEGV/);
    expect(await runElectron(join(folder, 'none'), '/package', undefined, never)).toMatch(/ENOENT/);
  });

  it('that breaks down later is a failure', async () => {
    await expect(runElectron(binary('exit 9'), '/package', undefined, never, 0)).rejects.toThrow(/ended with 9/);
  });

  it('ends when the command is stopped', async () => {
    const stop = new AbortController();
    setTimeout(() => stop.abort(), 100);
    expect(await runElectron(binary('exec sleep 60'), '/package', undefined, stop.signal)).toBeUndefined();
  });
});

describe('finding the binary', () => {
  it('looks where the package says and where the environment says, and finds nothing where nothing is', () => {
    expect(findElectron(folder, {})).toBeUndefined();
    const module = join(folder, 'node_modules/electron');
    mkdirSync(join(module, 'dist'), { recursive: true });
    writeFileSync(join(module, 'path.txt'), 'here/electron');
    expect(findElectron(folder, {})).toBeUndefined();
    mkdirSync(join(module, 'dist/here'));
    writeFileSync(join(module, 'dist/here/electron'), '');
    expect(findElectron(folder, {})).toBe(join(module, 'dist/here/electron'));
    mkdirSync(join(folder, 'own/here'), { recursive: true });
    writeFileSync(join(folder, 'own/here/electron'), '');
    expect(findElectron(folder, { ELECTRON_OVERRIDE_DIST_PATH: join(folder, 'own') })).toBe(
      join(folder, 'own/here/electron'),
    );
  });

  it('knows a display by the variables of X and Wayland, and takes it for granted elsewhere', () => {
    expect(hasDisplay({}, 'linux')).toBe(false);
    expect(hasDisplay({ DISPLAY: '' }, 'linux')).toBe(false);
    expect(hasDisplay({ DISPLAY: ':0' }, 'linux')).toBe(true);
    expect(hasDisplay({ WAYLAND_DISPLAY: 'wayland-0' }, 'freebsd')).toBe(true);
    expect(hasDisplay({}, 'darwin')).toBe(true);
    expect(hasDisplay({}, 'win32')).toBe(true);
  });
});
