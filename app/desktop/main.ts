import { join, resolve } from 'node:path';
import { app, BrowserWindow, dialog, ipcMain, Menu, protocol, session } from 'electron';
import { ProblemError } from '../../core/table/problem';
import { problemText } from '../../core/table/wording';
import about from '../../package.json';
import { defaultStateFolder } from '../engine/statefolder';
import { startEngineThread } from '../engine/thread';
import { runApplication } from './application';
import { SCHEME } from './pages';

const root = join(import.meta.dirname, '../..');
protocol.registerSchemesAsPrivileged([SCHEME]);

function sentences(error: unknown): string {
  if (error instanceof ProblemError) return error.problems.map(problemText).join('\n');
  const text = error instanceof Error ? error.message : String(error);
  return process.env['HALOSIEVE_DEBUG'] === '1' ? text : text.split('\n')[0]!;
}

const note = (error: unknown): void => void process.stderr.write(`${sentences(error)}\n`);
const engine = startEngineThread({ stateFolder: defaultStateFolder(), version: about.version });
const parts = {
  app,
  ipc: ipcMain,
  menu: Menu,
  protocol,
  session: () => session.defaultSession,
  createWindow: (options: ConstructorParameters<typeof BrowserWindow>[0]) => new BrowserWindow(options),
  tell(error: unknown): void {
    note(error);
    void dialog.showMessageBox({ type: 'error', title: 'Halosieve', message: sentences(error) });
  },
};
const word = process.argv.slice(2).find((given) => !given.startsWith('-'));
const places = {
  windowFolder: join(root, 'out/window'),
  preload: join(root, 'out/preload/preload.cjs'),
  asked: word === undefined ? undefined : resolve(word),
  demo: join(root, 'samples/demo.halosieve.json'),
};

// Not awaited here: Electron is ready only after this module has run to its end.
runApplication(parts, engine, places, note).catch((error: unknown) => {
  note(error);
  app.exit(1);
});
