import { once } from 'node:events';
import { existsSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { serveWindow, type WindowServer } from '../browser/server';
import { mayShowBrowser, showInBrowser } from '../browser/show';
import type { Progress } from '../contract/messages';
import { findElectron, hasDisplay } from '../desktop/findelectron';
import { runElectron } from '../desktop/runelectron';
import { defaultStateFolder } from '../engine/statefolder';
import { startEngineThread } from '../engine/thread';
import { fail } from '../../core/table/problem';
import { type Command, type Invocation, text, UsageError } from './command';
import { faultLines } from './fault';
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
    const { words, values, note, signal } = invocation;
    const port = portOf(text(values, 'port'));
    const asked = words[0] === undefined ? undefined : resolve(words[0]);
    const path = asked ?? join(PACKAGE_FOLDER, 'samples', 'demo.halosieve.json');
    if (!existsSync(path)) fail('file-missing', { where: path });
    if (values['browser'] !== true) {
      const electron = findElectron(PACKAGE_FOLDER);
      const why =
        electron === undefined
          ? 'Electron’s binary is not here'
          : hasDisplay()
            ? await runElectron(electron, PACKAGE_FOLDER, asked, signal)
            : 'There is no display';
      if (why === undefined) return 0;
      note(`${why}: using the local browser.`);
    }
    return inBrowser(path, port, invocation);
  },
};

async function inBrowser(
  path: string,
  port: number | undefined,
  { signal, values, onProgress, print, note }: Invocation,
): Promise<number> {
  const engine = startEngineThread({ stateFolder: defaultStateFolder(), version: VERSION });
  const stopWork = (): void => void engine.handle('work.stop', {}).catch(() => undefined);
  signal.addEventListener('abort', stopWork);
  try {
    const deafen = engine.listen((name, data) => {
      if (name === 'progress' && data) onProgress(data as Progress);
    });
    await engine.handle('bench.open', { path });
    deafen();
    if (signal.aborted) fail('cancelled', { where: path });
    const server = await serveWindow(engine, {
      windowFolder: join(PACKAGE_FOLDER, 'out/window'),
      port,
      bug: (error) => faultLines(error).forEach(note),
    }).catch((error: unknown) => {
      if ((error as NodeJS.ErrnoException).code === 'EADDRINUSE')
        throw new UsageError(`port ${port ?? 0} is taken; choose another with --port`);
      throw error;
    });
    if (values['json'] === true) print(JSON.stringify({ address: server.address, port: server.port, recipe: path }));
    else for (const line of welcome(server)) print(line);
    if (mayShowBrowser(hasDisplay())) showInBrowser(server.address);
    await aborted(signal);
    await server.close();
    return 0;
  } finally {
    await engine.close();
  }
}

async function aborted(signal: AbortSignal): Promise<void> {
  if (!signal.aborted) await once(signal, 'abort');
}

function welcome({ address, port }: WindowServer): string[] {
  return [
    `Halosieve is open at ${address}`,
    'The link works once; a second window needs the same browser. Ctrl-C closes the bench; unsaved work is kept.',
    ...(process.env['SSH_CONNECTION']
      ? [`From your own machine: ssh -L ${port}:127.0.0.1:${port} THIS-HOST, then open the link there.`]
      : []),
  ];
}

function portOf(given: string | undefined): number | undefined {
  if (given === undefined) return undefined;
  const port = Number(given);
  if (!Number.isInteger(port) || port < 1 || port > 65535)
    throw new UsageError(`--port wants a number from 1 to 65535, not "${given}"`);
  return port;
}
