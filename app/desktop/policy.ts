import type { BrowserWindowConstructorOptions, Session, WebContents } from 'electron';

/** Origin of the window's pages. */
export const WINDOW_ORIGIN = 'app://halosieve';

/** The window: an isolated, sandboxed page without Node, and a preload that only passes packets. */
export function windowOptions(preload: string): BrowserWindowConstructorOptions {
  return {
    width: 1440,
    height: 900,
    minWidth: 960,
    minHeight: 600,
    show: false,
    title: 'Halosieve',
    webPreferences: {
      preload,
      contextIsolation: true,
      sandbox: true,
      nodeIntegration: false,
      nodeIntegrationInWorker: false,
      webSecurity: true,
      webviewTag: false,
      spellcheck: false,
    },
  };
}

/** Keeps a page where it is: no other address, no new window, no embedded page. */
export function lockNavigation(contents: Pick<WebContents, 'on' | 'setWindowOpenHandler'>): void {
  contents.setWindowOpenHandler(() => ({ action: 'deny' }));
  const refuse = (event: { preventDefault: () => void }): void => event.preventDefault();
  contents.on('will-navigate', (event) => {
    if (!isWindowAddress(event.url)) event.preventDefault();
  });
  contents.on('will-frame-navigate', (event) => {
    if (!event.isMainFrame) event.preventDefault();
  });
  contents.on('will-redirect', refuse);
  contents.on('will-attach-webview', refuse);
}

/** Denies every permission that a page can ask for. */
export function denyPermissions(
  session: Pick<Session, 'setPermissionRequestHandler' | 'setPermissionCheckHandler'>,
): void {
  session.setPermissionRequestHandler((_, __, answer) => answer(false));
  session.setPermissionCheckHandler(() => false);
}

/** Whether an address belongs to the window itself. */
export function isWindowAddress(address: string): boolean {
  return address === WINDOW_ORIGIN || address.startsWith(`${WINDOW_ORIGIN}/`);
}
