import { EventEmitter } from 'node:events';
import { expect, it, vi } from 'vitest';

const electron = vi.hoisted(() => ({ whenReady: vi.fn(() => new Promise<void>(() => undefined)), schemes: vi.fn() }));
vi.mock('electron', () => ({
  app: Object.assign(new EventEmitter(), {
    requestSingleInstanceLock: () => true,
    whenReady: electron.whenReady,
    quit: vi.fn(),
    exit: vi.fn(),
  }),
  BrowserWindow: vi.fn(),
  dialog: { showMessageBox: vi.fn() },
  ipcMain: new EventEmitter(),
  Menu: {},
  protocol: { registerSchemesAsPrivileged: electron.schemes, handle: vi.fn() },
  session: {},
}));
vi.mock('../../../app/engine/thread', () => ({ startEngineThread: vi.fn() }));

it('the main module runs to its end before Electron is ready, for Electron waits for it', async () => {
  await import('../../../app/desktop/main');
  expect(electron.whenReady).toHaveBeenCalled();
  expect(electron.schemes).toHaveBeenCalledWith([
    { scheme: 'app', privileges: { standard: true, secure: true, supportFetchAPI: true } },
  ]);
}, 10_000);
