import { existsSync } from 'node:fs';
import { chromium, type Browser } from 'playwright';

const CHROMIUM = process.env['CHROMIUM'] ?? '/usr/bin/chromium';

/** Whether the browser that the journeys drive is installed. */
export const hasChromium = existsSync(CHROMIUM);

/** Starts Debian's Chromium without a display, a GPU or any connection of its own. */
export function startBrowser(): Promise<Browser> {
  return chromium.launch({
    executablePath: CHROMIUM,
    args: [
      '--headless',
      '--no-sandbox',
      '--disable-gpu',
      '--enable-unsafe-swiftshader',
      '--disable-quic',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
    ],
  });
}
