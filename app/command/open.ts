import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { existsSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { serveWindow } from '../browser/server';
import { showInBrowser } from '../browser/show';
import { findElectron, hasDisplay } from '../desktop/findelectron';
import { defaultStateFolder } from '../engine/statefolder';
import { startEngineThread } from '../engine/thread';
import { fail } from '../../core/table/problem';
import { type Command, type Invocation, text, UsageError } from './command';
import { PACKAGE_FOLDER } from './package';
import { VERSION } from './version';

/** halosieve open */
export const open: Command = {
  name: 'open',
  usage: 'halosieve open [RECIPE] [--browser] [--port N]',
  summary: 'Opens a recipe, or a catalogue as a new bench, in a window; the demo when nothing is named.',
  options: { browser: { type: 'boolean' }, port: { type: 'string' } },
  details: [
    '--browser  use the local browser, also where Electron could open a window (for a login node over ssh)',
    '--port N   port of the browser door; one of the system’s choice when left out',
    'JSON keys (one line, when the browser door is open): address, port, recipe',
  ],
  words: [0, 1],
  async run(invocation) {
    const { words, values, note } = invocation;
    const path = resolve(words[0] ?? join(PACKAGE_FOLDER, 'samples', 'demo.halosieve.json'));
    if (!existsSync(path)) fail('file-missing', { where: path });
    const electron = findElectron(PACKAGE_FOLDER);
    if (values['browser'] !== true && electron !== undefined && hasDisplay())
      return inElectron(electron, path, invocation.signal);
    if (values['browser'] !== true) {
      note(
        electron === undefined
          ? 'Electron’s binary is not here: using the local browser.'
          : 'There is no display: using the local browser.',
      );
    }
    return inBrowser(path, portOf(text(values, 'port')), invocation);
  },
};

async function inElectron(binary: string, path: string, signal: AbortSignal): Promise<number> {
  const child = spawn(binary, [join(PACKAGE_FOLDER, 'out/main/desktop.js'), path], { stdio: 'inherit' });
  signal.addEventListener('abort', () => child.kill());
  const [code] = (await once(child, 'exit')) as [number | null];
  return code ?? 0;
}

async function inBrowser(
  path: string,
  port: number | undefined,
  { signal, values, print, note }: Invocation,
): Promise<number> {
  const engine = startEngineThread({ stateFolder: defaultStateFolder(), version: VERSION });
  try {
    await engine.handle('bench.open', { path });
    const server = await serveWindow(engine, {
      windowFolder: join(PACKAGE_FOLDER, 'out/window'),
      port,
      bug: (error) => note(`The engine failed: ${error instanceof Error ? error.message : String(error)}`),
    }).catch((error: unknown) => {
      if ((error as NodeJS.ErrnoException).code === 'EADDRINUSE')
        throw new UsageError(`port ${port ?? 0} is taken; choose another with --port`);
      throw error;
    });
    if (values['json'] === true) print(JSON.stringify({ address: server.address, port: server.port, recipe: path }));
    else {
      print(`Halosieve is open at ${server.address}`);
      print(
        'The link works once; a second window needs the same browser. Ctrl-C closes the bench; unsaved work is kept.',
      );
      if (process.env['SSH_CONNECTION'] !== undefined) {
        print(
          `From your own machine: ssh -L ${server.port}:127.0.0.1:${server.port} THIS-HOST, then open the link there.`,
        );
      }
    }
    if (hasDisplay() && process.env['CI'] === undefined) showInBrowser(server.address);
    if (!signal.aborted) await once(signal, 'abort');
    await server.close();
    return 0;
  } finally {
    await engine.close();
  }
}

function portOf(given: string | undefined): number | undefined {
  if (given === undefined) return undefined;
  const port = Number(given);
  if (!Number.isInteger(port) || port < 1 || port > 65535)
    throw new UsageError(`--port wants a number from 1 to 65535, not "${given}"`);
  return port;
}
