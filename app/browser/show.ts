import { spawn } from 'node:child_process';

/**
 * Whether a browser may be opened by itself: not without a display, not under CI, and not over ssh, where it would run
 * on the wrong machine and show the token in a process list that others can read.
 */
export function mayShowBrowser(display: boolean, env: NodeJS.ProcessEnv = process.env): boolean {
  return display && !env['CI'] && !env['SSH_CONNECTION'];
}

/** Opens an address in the user's browser; where that fails the printed address is enough. */
export function showInBrowser(address: string): void {
  const [command, ...words] =
    process.platform === 'darwin' ? ['open'] : process.platform === 'win32' ? ['cmd', '/c', 'start', ''] : ['xdg-open'];
  const child = spawn(command, [...words, address], { stdio: 'ignore', detached: true });
  child.on('error', () => undefined);
  child.unref();
}
