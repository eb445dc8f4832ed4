import type { App, BrowserWindow, IpcMain, Menu, Protocol, Session } from 'electron';
import type { Engine } from '../engine/engine';
import { connectWindows } from './ipc';
import { menuTemplate } from './menu';
import { servePages } from './pages';
import { denyPermissions, lockNavigation, WINDOW_ORIGIN, windowOptions } from './policy';
import { quitThroughEngine } from './quit';

/** The parts of Electron that the application uses; a test gives doubles. */
export interface Parts {
  readonly app: Pick<App, 'on' | 'quit' | 'requestSingleInstanceLock' | 'whenReady'>;
  readonly ipc: Pick<IpcMain, 'on'>;
  readonly menu: Pick<typeof Menu, 'buildFromTemplate' | 'setApplicationMenu'>;
  readonly protocol: Pick<Protocol, 'handle'>;
  readonly session: () => Pick<Session, 'setPermissionRequestHandler' | 'setPermissionCheckHandler'>;
  readonly createWindow: (options: ReturnType<typeof windowOptions>) => BrowserWindow;
  /** Tells the user why a file could not be opened. */
  readonly tell: (error: unknown) => void;
}

export interface Places {
  readonly windowFolder: string;
  readonly preload: string;
  /** Absolute path of the recipe or catalogue that was asked for. */
  readonly asked: string | undefined;
  /** What is opened when nothing was asked for. */
  readonly demo: string;
}

/**
 * Runs the application: one instance, one bench, one window; quitting closes the engine first. A second start, or a
 * file opened from the desktop, goes to the window that is there.
 */
export async function runApplication(
  { app, ipc, menu, protocol, session, createWindow, tell }: Parts,
  engine: Engine,
  places: Places,
  bug: (error: unknown) => void,
): Promise<void> {
  // The path travels as data of its own: Chromium reorders the words of a command line and adds some.
  if (!app.requestSingleInstanceLock({ asked: places.asked })) {
    app.quit();
    return;
  }
  const shown: { window?: BrowserWindow } = {};
  let asked = places.asked;
  const openPath = (path: string): void => {
    asked = path;
    // Before there is a window, the start itself opens what was asked for last.
    if (shown.window) void engine.handle('bench.open', { path }).catch(tell);
  };
  app.on('second-instance', (_event, _words, _folder, data) => {
    if (shown.window?.isMinimized() === true) shown.window.restore();
    shown.window?.focus();
    const { asked: path } = data as { asked?: unknown };
    if (typeof path === 'string') openPath(path);
  });
  app.on('open-file', (event, path) => {
    event.preventDefault();
    openPath(path);
  });
  quitThroughEngine(app, engine, bug);

  await app.whenReady();
  denyPermissions(session());
  servePages(protocol, places.windowFolder);
  menu.setApplicationMenu(menu.buildFromTemplate(menuTemplate(process.platform)));
  const seat = connectWindows(ipc, engine, bug);
  const window = createWindow(windowOptions(places.preload));
  shown.window = window;
  lockNavigation(window.webContents);
  window.once('ready-to-show', () => window.show());
  await engine.handle('bench.open', { path: asked ?? places.demo }).catch(async (error: unknown) => {
    tell(error);
    await engine.handle('bench.new', {});
  });
  seat(window.webContents);
  await window.loadURL(`${WINDOW_ORIGIN}/index.html`);
}
