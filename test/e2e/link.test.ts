import { once } from 'node:events';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Browser } from 'playwright';
import { hasChromium, startBrowser } from './browser';
import { openDoor, workplace } from './door';

describe.skipIf(!hasChromium)('the printed link', () => {
  let browser: Browser;
  beforeAll(async () => {
    browser = await startBrowser();
  });
  afterAll(() => browser.close());

  it("opens the window also from another site's page, survives a reload, and leaves no token in the address", async () => {
    const place = workplace();
    const door = await openDoor(place, place.recipe);
    const site = createServer((_, response) => {
      response.setHeader('Content-Type', 'text/html');
      response.end(`<a href="${door.address}">a terminal in a web page</a>`);
    }).listen(0, '127.0.0.1');
    await once(site, 'listening');
    const page = await browser.newPage();
    // To a browser, localhost and 127.0.0.1 are two sites.
    await page.goto(`http://localhost:${(site.address() as AddressInfo).port}/`);
    await page.getByRole('link').click();
    await page.getByRole('heading', { name: 'Ledger' }).waitFor();
    expect(page.url()).toBe(new URL('/', door.address).href);
    await page.reload();
    await page.getByRole('heading', { name: 'Ledger' }).waitFor();
    const stranger = await browser.newPage();
    expect((await stranger.goto(door.address))?.status()).toBe(403);
    site.close();
    await door.stop();
    place.remove();
  });
});
