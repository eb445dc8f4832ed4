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
function doubles({ first = true, asked }: { first?: boolean; asked?: string } = {}) {
  const app = Object.assign(new EventEmitter(), {
    quit: vi.fn(),
    requestSingleInstanceLock: vi.fn(() => first),
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
  const questions: string[] = [];
  const engine = {
    handle: vi.fn<(name: string, params?: unknown) => Promise<unknown>>((name) => {
      questions.push(name);
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
    tell: vi.fn(),
  };
  const run = (): Promise<void> =>
    runApplication(
      parts as unknown as Parts,
      engine as unknown as Engine,
      { windowFolder: folder, preload: 'preload.cjs', asked, demo: 'demo.halosieve.json' },
      () => undefined,
    );
  return { app, ipc, contents, window, permissions, protocol, engine, questions, parts, run };
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

  it('opens the demo when nothing was asked for, and shows the window when it is drawn', async () => {
    const { window, engine, run } = doubles();
    await run();
    expect(engine.handle).toHaveBeenCalledWith('bench.open', { path: 'demo.halosieve.json' });
    expect(window.loadURL).toHaveBeenCalledWith('app://halosieve/index.html');
    expect(window.show).not.toHaveBeenCalled();
    window.emit('ready-to-show');
    expect(window.show).toHaveBeenCalled();
  });

  it('tells why what was asked for cannot be opened, and shows an empty bench', async () => {
    const { engine, parts, window, run } = doubles({ asked: '/data/broken.csv' });
    const refusal = new Error('not a table');
    engine.handle.mockRejectedValueOnce(refusal);
    await run();
    expect(engine.handle.mock.calls).toEqual([
      ['bench.open', { path: '/data/broken.csv' }],
      ['bench.new', {}],
    ]);
    expect(parts.tell).toHaveBeenCalledWith(refusal);
    expect(window.loadURL).toHaveBeenCalled();
  });

  it.each(['window-all-closed', 'the menu'])('quits by %s, but only when the engine has closed', async (way) => {
    const { app, engine, run } = doubles();
    await run();
    let closed = (): void => undefined;
    engine.close.mockReturnValueOnce(new Promise<void>((done) => (closed = done)));
    // As Electron does: a quit asks first, and is over when nobody prevents it.
    const ended = vi.fn();
    app.quit.mockImplementation(() => {
      const preventDefault = vi.fn();
      app.emit('will-quit', { preventDefault });
      if (preventDefault.mock.calls.length === 0) ended();
    });
    if (way === 'the menu') app.quit();
    else app.emit(way);
    app.quit();
    await vi.waitFor(() => expect(engine.close).toHaveBeenCalledTimes(1));
    expect(engine.handle).toHaveBeenLastCalledWith('work.stop', {});
    expect(ended).not.toHaveBeenCalled();
    closed();
    await vi.waitFor(() => expect(ended).toHaveBeenCalledTimes(1));
  });

  it('quits also when the engine cannot close', async () => {
    const { app, engine, run } = doubles();
    await run();
    engine.handle.mockRejectedValue(new Error('gone'));
    engine.close.mockRejectedValue(new Error('gone'));
    app.emit('will-quit', { preventDefault: vi.fn() });
    await vi.waitFor(() => expect(app.quit).toHaveBeenCalledTimes(1));
    const preventDefault = vi.fn();
    app.emit('will-quit', { preventDefault });
    expect(preventDefault).not.toHaveBeenCalled();
  });

  it('a second start leaves the first one alone and goes', async () => {
    const { app, parts, run } = doubles({ first: false });
    await run();
    expect(app.quit).toHaveBeenCalled();
    expect(parts.createWindow).not.toHaveBeenCalled();
  });

  it('a second start raises the window and hands over the file that it was asked for, if any', async () => {
    const { app, window, engine, parts, run } = doubles({ asked: '/data/one.csv' });
    await run();
    expect(parts.app.requestSingleInstanceLock).toHaveBeenCalledWith({ asked: '/data/one.csv' });
    app.emit('second-instance', {}, [], '/elsewhere', {});
    expect(window.restore).toHaveBeenCalled();
    expect(window.focus).toHaveBeenCalled();
    expect(engine.handle).toHaveBeenCalledTimes(1);
    app.emit('second-instance', {}, ['electron', '--flag', 'x.json'], '/elsewhere', { asked: '/data/other.csv' });
    expect(engine.handle).toHaveBeenLastCalledWith('bench.open', { path: '/data/other.csv' });
  });

  it('a file that the system opens before the window is there is what the start opens', async () => {
    const { app, engine, run } = doubles({ asked: '/data/one.csv' });
    const running = run();
    const preventDefault = vi.fn();
    app.emit('open-file', { preventDefault }, '/data/two.csv');
    await running;
    expect(preventDefault).toHaveBeenCalled();
    expect(engine.handle.mock.calls).toEqual([['bench.open', { path: '/data/two.csv' }]]);
    app.emit('open-file', { preventDefault }, '/data/three.csv');
    expect(engine.handle).toHaveBeenLastCalledWith('bench.open', { path: '/data/three.csv' });
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
      ['will-navigate', 'app://halosieve.evil.example/', true],
      ['will-redirect', 'app://halosieve/index.html', true],
      ['will-frame-navigate', 'app://halosieve/index.html', true],
      ['will-attach-webview', '', true],
    ] as const) {
      const preventDefault = vi.fn();
      contents.emit(event, { url, isMainFrame: false, preventDefault });
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
    const { ipc, contents, questions, run } = doubles();
    await run();
    const packet = { type: 'ask', id: 3, name: 'bench.view', params: {} };
    const from = (url: string, parent: unknown = null): void =>
      void ipc.emit(TO_ENGINE, { sender: contents, senderFrame: { url, parent } }, packet);
    from('https://evil.example/');
    from('app://halosieve/index.html', {});
    ipc.emit(TO_ENGINE, { sender: contents, senderFrame: null }, packet);
    ipc.emit(
      TO_ENGINE,
      { sender: { id: 8 }, senderFrame: { url: 'app://halosieve/index.html', parent: null } },
      packet,
    );
    expect(questions).toEqual(['bench.open']);
    from('app://halosieve/index.html');
    await vi.waitFor(() =>
      expect(contents.send).toHaveBeenCalledWith(TO_WINDOW, { type: 'answer', id: 3, result: { name: 'bench.view' } }),
    );
  });

  it('what is no packet is dropped without harm, and a window that is gone is written to no more', async () => {
    const { ipc, contents, questions, run } = doubles();
    await run();
    const event = { sender: contents, senderFrame: { url: 'app://halosieve/index.html', parent: null } };
    for (const rubbish of [undefined, null, 'text', { type: 'ask' }]) ipc.emit(TO_ENGINE, event, rubbish);
    contents.emit('destroyed');
    ipc.emit(TO_ENGINE, event, { type: 'ask', id: 1, name: 'bench.view', params: {} });
    expect(questions).toEqual(['bench.open']);
    expect(contents.send).not.toHaveBeenCalled();
  });
});
