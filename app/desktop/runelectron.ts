import { spawn } from 'node:child_process';

/** An application that ends by itself sooner than this never showed its window. */
const TOO_SOON_MS = 5000;

/**
 * Runs the application and waits for its end. Resolves to undefined when it ran, and to the reason when it could not:
 * a library or a sandbox that the system lacks ends it at once. Throws when it broke down later.
 */
export async function runElectron(
  binary: string,
  packageFolder: string,
  path: string | undefined,
  signal: AbortSignal,
  tooSoonMs = TOO_SOON_MS,
): Promise<string | undefined> {
  const begun = performance.now();
  // The folder, not the file: from its package.json the application has its name, and so a lock and a state of its own.
  const words = [packageFolder, ...(path === undefined ? [] : [path])];
  // Electron run from an editor's terminal may inherit this, and would then be nothing but Node.
  const env = { ...process.env, ELECTRON_RUN_AS_NODE: undefined };
  const child = spawn(binary, words, { stdio: 'inherit', env });
  signal.addEventListener('abort', () => child.kill());
  const end = await new Promise<string | undefined>((ended) => {
    child.once('error', (error) => ended(error.message));
    child.once('exit', (code, killed) =>
      ended(code === 0 ? undefined : `it ended with ${killed ?? code ?? 'nothing'}`),
    );
  });
  if (end === undefined || signal.aborted) return undefined;
  if (performance.now() - begun > tooSoonMs) throw new Error(`Electron broke down: ${end}`);
  return `Electron could not show a window (${end})`;
}
