import { EventEmitter } from 'node:events';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { BrowserWindow } from 'electron';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { type Parts, runApplication } from '../../../app/desktop/application';
import { TO_ENGINE, TO_WINDOW } from '../../../app/desktop/channel';
import { windowOptions } from '../../../app/desktop/policy';
import type { Engine } from '../../../app/engine/engine';

type Serve = (request: Request) => Promise<Response>;
let folder: string;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'halosieve-desktop-'));
  writeFileSync(join(folder, 'index.html'), '<p>window</p>');
});
afterEach(() => rmSync(folder, { recursive: true }));

/** Doubles of the parts of Electron that the application uses, and what it did with them. */
function doubles(first = true) {
  const app = Object.assign(new EventEmitter(), {
    quit: vi.fn(),
    requestSingleInstanceLock: () => first,
    whenReady: () => Promise.resolve(),
  });
  const ipc = new EventEmitter();
  const contents = Object.assign(new EventEmitter(), {
    id: 7,
    send: vi.fn(),
    isDestroyed: () => false,
    setWindowOpenHandler: vi.fn(),
  });
  const window = Object.assign(new EventEmitter(), {
    webContents: contents,
    loadURL: vi.fn(() => Promise.resolve()),
    show: vi.fn(),
    focus: vi.fn(),
    restore: vi.fn(),
    isMinimized: () => true,
  });
  const permissions = { setPermissionRequestHandler: vi.fn(), setPermissionCheckHandler: vi.fn() };
  const protocol = { handle: vi.fn<(scheme: string, serve: Serve) => void>() };
  const asked: string[] = [];
  const engine = {
    handle: vi.fn((name: string) => {
      asked.push(name);
      return Promise.resolve({ name });
    }),
    listen: () => () => undefined,
    close: vi.fn(() => Promise.resolve()),
  };
  const parts = {
    app,
    ipc,
    menu: { buildFromTemplate: vi.fn(), setApplicationMenu: vi.fn() },
    protocol,
    session: () => permissions,
    createWindow: vi.fn(() => window as unknown as BrowserWindow),
  };
  const run = (): Promise<void> =>
    runApplication(
      parts as unknown as Parts,
      engine as unknown as Engine,
      { windowFolder: folder, preload: 'preload.cjs', recipe: 'demo.halosieve.json' },
      () => undefined,
    );
  return { app, ipc, contents, window, permissions, protocol, engine, asked, parts, run };
}

describe('the desktop application', () => {
  it('opens an isolated, sandboxed window without Node', () => {
    expect(windowOptions('p').webPreferences).toMatchObject({
      contextIsolation: true,
      sandbox: true,
      nodeIntegration: false,
      webSecurity: true,
      webviewTag: false,
    });
  });

  it('opens the recipe, shows the window, and quits through the engine', async () => {
    const { app, window, engine, run } = doubles();
    await run();
    expect(engine.handle).toHaveBeenCalledWith('bench.open', { path: 'demo.halosieve.json' });
    expect(window.loadURL).toHaveBeenCalledWith('app://halosieve/index.html');
    window.emit('ready-to-show');
    expect(window.show).toHaveBeenCalled();
    app.emit('window-all-closed');
    await vi.waitFor(() => expect(app.quit).toHaveBeenCalled());
    expect(engine.close).toHaveBeenCalled();
  });

  it('a second start leaves the first one alone and goes', async () => {
    const { app, parts, run } = doubles(false);
    await run();
    expect(app.quit).toHaveBeenCalled();
    expect(parts.createWindow).not.toHaveBeenCalled();
  });

  it('a second start elsewhere raises the window and opens its file', async () => {
    const { app, window, engine, run } = doubles();
    await run();
    app.emit('second-instance', {}, ['halosieve', 'other.halosieve.json']);
    expect(window.restore).toHaveBeenCalled();
    expect(engine.handle).toHaveBeenCalledWith('bench.open', { path: 'other.halosieve.json' });
  });

  it('denies permissions, new windows, other addresses and embedded pages', async () => {
    const { contents, permissions, run } = doubles();
    await run();
    const answer = vi.fn();
    permissions.setPermissionRequestHandler.mock.calls[0]![0]({}, 'geolocation', answer);
    expect(answer).toHaveBeenCalledWith(false);
    expect(permissions.setPermissionCheckHandler.mock.calls[0]![0]()).toBe(false);
    expect(contents.setWindowOpenHandler.mock.calls[0]![0]()).toEqual({ action: 'deny' });
    for (const [event, url, refused] of [
      ['will-navigate', 'https://evil.example/', true],
      ['will-navigate', 'app://halosieve/index.html', false],
      ['will-attach-webview', '', true],
    ] as const) {
      const preventDefault = vi.fn();
      contents.emit(event, { url, preventDefault });
      expect(preventDefault).toHaveBeenCalledTimes(refused ? 1 : 0);
    }
  });

  it('serves its pages under the policy, and nothing else', async () => {
    const { protocol, run } = doubles();
    await run();
    const [scheme, serve] = protocol.handle.mock.calls[0]!;
    expect(scheme).toBe('app');
    const page = await serve(new Request('app://halosieve/index.html'));
    expect(await page.text()).toBe('<p>window</p>');
    expect(page.headers.get('Content-Security-Policy')).toContain("default-src 'none'");
    expect((await serve(new Request('app://elsewhere/index.html'))).status).toBe(404);
  });

  it('answers its own page and drops the packets of any other sender', async () => {
    const { ipc, contents, asked, run } = doubles();
    await run();
    const packet = { type: 'ask', id: 3, name: 'bench.view', params: {} };
    const from = (url: string, parent: unknown = null): void =>
      void ipc.emit(TO_ENGINE, { sender: contents, senderFrame: { url, parent } }, packet);
    from('https://evil.example/');
    from('app://halosieve/index.html', {});
    expect(asked).toEqual(['bench.open']);
    from('app://halosieve/index.html');
    await vi.waitFor(() =>
      expect(contents.send).toHaveBeenCalledWith(TO_WINDOW, { type: 'answer', id: 3, result: { name: 'bench.view' } }),
    );
  });
});
