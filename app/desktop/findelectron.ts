import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';

/** Path of Electron's binary, if it was fetched; looking for it never starts a download. */
export function findElectron(packageFolder: string, env: NodeJS.ProcessEnv = process.env): string | undefined {
  const module = join(packageFolder, 'node_modules', 'electron');
  const note = join(module, 'path.txt');
  const executable = existsSync(note) ? readFileSync(note, 'utf8').trim() : defaultExecutable();
  const folder = env['ELECTRON_OVERRIDE_DIST_PATH'] ?? join(module, 'dist');
  const path = join(folder, executable);
  return existsSync(path) ? path : undefined;
}

function defaultExecutable(): string {
  if (process.platform === 'darwin') return 'Electron.app/Contents/MacOS/Electron';
  return process.platform === 'win32' ? 'electron.exe' : 'electron';
}

/** Whether a window can be shown here. */
export function hasDisplay(env: NodeJS.ProcessEnv = process.env, platform: string = process.platform): boolean {
  if (platform === 'darwin' || platform === 'win32') return true;
  return [env['DISPLAY'], env['WAYLAND_DISPLAY']].some((name) => name !== undefined && name !== '');
}
