import { join } from 'node:path';
import { app, BrowserWindow, ipcMain, Menu, protocol, session } from 'electron';
import { ProblemError } from '../../core/table/problem';
import { problemText } from '../../core/table/wording';
import about from '../../package.json';
import { defaultStateFolder } from '../engine/statefolder';
import { startEngineThread } from '../engine/thread';
import { runApplication } from './application';
import { SCHEME } from './pages';

const root = join(import.meta.dirname, '../..');
protocol.registerSchemesAsPrivileged([SCHEME]);

const engine = startEngineThread({ stateFolder: defaultStateFolder(), version: about.version });
const parts = {
  app,
  ipc: ipcMain,
  menu: Menu,
  protocol,
  session: () => session.defaultSession,
  createWindow: (options: ConstructorParameters<typeof BrowserWindow>[0]) => new BrowserWindow(options),
};
const places = {
  windowFolder: join(root, 'out/window'),
  preload: join(root, 'out/preload/preload.cjs'),
  recipe: process.argv[2] ?? join(root, 'samples/demo.halosieve.json'),
};

await runApplication(parts, engine, places, (error) => {
  const lines = error instanceof ProblemError ? error.problems.map(problemText) : [String(error)];
  process.stderr.write(`${lines.join('\n')}\n`);
});
