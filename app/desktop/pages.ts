import type { Protocol } from 'electron';
import { CONTENT_SECURITY_POLICY } from '../contract/csp';
import { windowFile } from '../browser/windowfiles';

/** The scheme of the window's pages, to be registered before the application is ready. */
export const SCHEME = {
  scheme: 'app',
  privileges: { standard: true, secure: true, supportFetchAPI: true },
} as const;

/** Serves the built window on app://halosieve, with the policy as a header. */
export function servePages(protocol: Pick<Protocol, 'handle'>, folder: string): void {
  protocol.handle(SCHEME.scheme, async (request) => {
    const url = new URL(request.url);
    const file = url.host === 'halosieve' ? await windowFile(folder, url.pathname) : undefined;
    if (!file) return new Response('There is no such page.', { status: 404 });
    return new Response(new Uint8Array(file.bytes), {
      headers: {
        'Content-Type': file.type,
        'Content-Security-Policy': CONTENT_SECURITY_POLICY,
        'X-Content-Type-Options': 'nosniff',
      },
    });
  });
}
