import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import axe from 'axe-core';
import type { Browser, Page } from 'playwright';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { reportText } from '../../core/edition/report/page';
import { cut, editionInput, smallRecipe } from '../core/edition/fixture';
import { hasChromium, startBrowser } from './browser';

const recipe = smallRecipe({
  ledger: [
    cut('metals', 'metallicity', { min: null, max: -1 }, { evidence: ['2010ApJ...714..229L'] }),
    cut('dust', 'extinction', { ebvMax: null, avMax: null, absBMin: 10 }, { on: false }),
    cut('eye', 'named', { objects: [{ key: 'ember1', name: 'Ember 1', action: 'keep', reason: 'seen' }] }),
  ],
});

describe.skipIf(!hasChromium)('the report in a browser', () => {
  let browser: Browser;
  const folder = mkdtempSync(join(tmpdir(), 'halosieve-report-'));
  const path = join(folder, 'report.html');

  beforeAll(async () => {
    const text = reportText(
      editionInput(smallRecipe({ ...recipe, sources: recipe.sources.map((one) => ({ ...one, invented: true })) })),
    );
    writeFileSync(path, text);
    browser = await startBrowser();
  });
  afterAll(async () => {
    await browser.close();
    rmSync(folder, { recursive: true });
  });

  async function open(
    colorScheme: 'light' | 'dark',
    width: number,
  ): Promise<{ page: Page; asked: string[]; said: string[] }> {
    const context = await browser.newContext({ colorScheme, viewport: { width, height: 800 } });
    const page = await context.newPage();
    const [asked, said]: [string[], string[]] = [[], []];
    page.on('request', (request) => asked.push(request.url()));
    page.on('console', (message) => said.push(message.text()));
    await page.goto(pathToFileURL(path).href);
    return { page, asked, said };
  }

  test.each(['light', 'dark'] as const)('is legible in %s: axe finds nothing, contrast included', async (scheme) => {
    const { page } = await open(scheme, 1000);
    await page.evaluate(axe.source);
    const found = await page.evaluate(async () => {
      const { violations } = await (globalThis as unknown as { axe: typeof axe }).axe.run();
      return violations.map(({ id, nodes }) => [id, ...nodes.map(({ html }) => html)]);
    });
    expect(found).toEqual([]);
    await page.context().close();
  });

  test('asks for nothing but itself and complains of nothing', async () => {
    const { page, asked, said } = await open('light', 1000);
    expect(asked).toEqual([pathToFileURL(path).href]);
    expect(said).toEqual([]);
    await page.context().close();
  });

  test('fits the width of a telephone; only tables scroll sideways', async () => {
    const { page } = await open('light', 360);
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(360);
    await page.context().close();
  });
});
