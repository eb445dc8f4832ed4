import { homedir } from 'node:os';
import { join } from 'node:path';

/** Where the program keeps unsaved work, by the custom of the system. */
export function defaultStateFolder(env: NodeJS.ProcessEnv = process.env, platform: string = process.platform): string {
  if (env['XDG_STATE_HOME']) return join(env['XDG_STATE_HOME'], 'halosieve');
  if (platform === 'win32') return join(env['LOCALAPPDATA'] ?? join(homedir(), 'AppData', 'Local'), 'Halosieve');
  if (platform === 'darwin') return join(homedir(), 'Library', 'Application Support', 'Halosieve');
  return join(homedir(), '.local', 'state', 'halosieve');
}
