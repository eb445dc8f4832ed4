import type { App, BrowserWindow, IpcMain, Menu, Protocol, Session } from 'electron';
import type { Engine } from '../engine/engine';
import { connectWindows } from './ipc';
import { menuTemplate } from './menu';
import { servePages } from './pages';
import { denyPermissions, lockNavigation, WINDOW_ORIGIN, windowOptions } from './policy';

/** The parts of Electron that the application uses; a test gives doubles. */
export interface Parts {
  readonly app: Pick<App, 'on' | 'quit' | 'requestSingleInstanceLock' | 'whenReady'>;
  readonly ipc: Pick<IpcMain, 'on'>;
  readonly menu: Pick<typeof Menu, 'buildFromTemplate' | 'setApplicationMenu'>;
  readonly protocol: Pick<Protocol, 'handle'>;
  readonly session: () => Pick<Session, 'setPermissionRequestHandler' | 'setPermissionCheckHandler'>;
  readonly createWindow: (options: ReturnType<typeof windowOptions>) => BrowserWindow;
}

export interface Places {
  readonly windowFolder: string;
  readonly preload: string;
  /** Recipe or catalogue to open. */
  readonly recipe: string;
}

/**
 * Runs the application: one instance, one bench, one window; closing the window closes the engine and quits. A second
 * start, or a file opened from the desktop, goes to the window that is there.
 */
export async function runApplication(
  { app, ipc, menu, protocol, session, createWindow }: Parts,
  engine: Engine,
  places: Places,
  bug: (error: unknown) => void,
): Promise<void> {
  if (!app.requestSingleInstanceLock()) {
    app.quit();
    return;
  }
  const shown: { window?: BrowserWindow } = {};
  const openPath = (path: string): void => void engine.handle('bench.open', { path }).catch(bug);
  app.on('second-instance', (_, words) => {
    if (shown.window?.isMinimized() === true) shown.window.restore();
    shown.window?.focus();
    const path = words.slice(1).find((word) => /\.(halosieve\.)?json$|\.[ct]sv$/i.test(word));
    if (path !== undefined) openPath(path);
  });
  app.on('open-file', (event, path) => {
    event.preventDefault();
    openPath(path);
  });
  app.on(
    'window-all-closed',
    () =>
      void engine
        .close()
        .catch(bug)
        .finally(() => app.quit()),
  );

  await app.whenReady();
  denyPermissions(session());
  servePages(protocol, places.windowFolder);
  menu.setApplicationMenu(menu.buildFromTemplate(menuTemplate(process.platform)));
  await engine.handle('bench.open', { path: places.recipe }).catch(async (error: unknown) => {
    bug(error);
    await engine.handle('bench.new', {});
  });
  const seat = connectWindows(ipc, engine, bug);
  const window = createWindow(windowOptions(places.preload));
  shown.window = window;
  lockNavigation(window.webContents);
  seat(window.webContents);
  window.once('ready-to-show', () => window.show());
  await window.loadURL(`${WINDOW_ORIGIN}/index.html`);
}
