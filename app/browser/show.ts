import { spawn } from 'node:child_process';

/** Opens an address in the user's browser; where that fails the printed address is enough. */
export function showInBrowser(address: string): void {
  const [command, ...words] =
    process.platform === 'darwin' ? ['open'] : process.platform === 'win32' ? ['cmd', '/c', 'start', ''] : ['xdg-open'];
  const child = spawn(command, [...words, address], { stdio: 'ignore', detached: true });
  child.on('error', () => undefined);
  child.unref();
}
