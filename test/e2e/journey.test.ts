import { execFileSync } from 'node:child_process';
import { existsSync, readFileSync, readdirSync } from 'node:fs';
import { join, resolve } from 'node:path';
import axe from 'axe-core';
import type { Browser, Page } from 'playwright';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { hasChromium, startBrowser } from './browser';
import { type Door, openDoor, workplace, type Workplace } from './door';

const HALOSIEVE = resolve(import.meta.dirname, '../../out/main/halosieve.js');

describe.skipIf(!hasChromium)('the bench in a real browser', () => {
  let browser: Browser;
  let place: Workplace;
  let door: Door;
  let page: Page;
  let faults: string[];

  beforeAll(async () => {
    browser = await startBrowser();
  });
  afterAll(() => browser.close());
  beforeEach(async () => {
    place = workplace();
    door = await openDoor(place, place.recipe);
    page = await openPage(door.address);
  });
  afterEach(async () => {
    await page.context().close();
    await door.stop();
    place.remove();
  });

  async function openPage(address: string): Promise<Page> {
    const context = await browser.newContext({ viewport: { width: 1440, height: 900 } });
    const opened = await context.newPage();
    faults = [];
    opened.on('pageerror', (error) => faults.push(error.message));
    opened.on('console', (message) => {
      if (message.type() === 'error') faults.push(message.text());
    });
    await opened.goto(address);
    await opened.getByRole('heading', { name: 'Ledger' }).waitFor();
    return opened;
  }

  const figure = async (name: string): Promise<number> =>
    Number(await page.locator(`.figures .${name} dd`).evaluate((element) => element.firstChild?.textContent ?? ''));
  const limit = (name: RegExp) => page.getByRole('slider', { name });
  const cards = () => page.getByRole('article', { name: /^Cut / });

  it('moves verdicts, counts and plates with a dragged limit, and undoes the drag in one step', async () => {
    const before = await figure('dropped');
    const plates = await page.locator('.sheet canvas').first().screenshot();
    const handle = limit(/Fe\/H/);
    await handle.waitFor();
    const box = (await handle.boundingBox())!;
    await page.mouse.move(box.x + box.width / 2, box.y + box.height / 2);
    await page.mouse.down();
    await page.mouse.move(box.x - 60, box.y + 10, { steps: 12 });
    await page.mouse.up();
    await expect.poll(() => figure('dropped')).toBeGreaterThan(before);
    expect(await page.locator('.sheet canvas').first().screenshot()).not.toEqual(plates);
    await page.keyboard.press('Control+z');
    await expect.poll(() => figure('dropped')).toBe(before);
    expect(faults).toEqual([]);
  });

  it('moves a limit by the keyboard and keeps the sum of verdicts', async () => {
    const handle = limit(/Fe\/H/);
    await handle.focus();
    const before = Number(await handle.getAttribute('aria-valuenow'));
    await page.keyboard.press('PageDown');
    await expect.poll(async () => Number(await handle.getAttribute('aria-valuenow'))).toBeLessThan(before);
    const sum =
      (await figure('kept')) + (await figure('borderline')) + (await figure('dropped')) + (await figure('unjudged'));
    expect(sum).toBe(180);
  });

  it('does the whole job with keys alone', async () => {
    const tabTo = async (selector: string): Promise<void> => {
      for (let presses = 0; presses < 400; presses++) {
        await page.keyboard.press('Tab');
        if (await page.evaluate((wanted) => document.activeElement?.matches(wanted) ?? false, selector)) return;
      }
      throw new Error(`Tab never reached ${selector}`);
    };
    await limit(/Fe\/H/).waitFor();
    const before = await figure('dropped');
    await tabTo('[role=slider][aria-label="Limit on [Fe/H]"]');
    await page.keyboard.press('PageDown');
    await expect.poll(() => figure('dropped')).toBeGreaterThan(before);
    await tabTo('textarea');
    await page.keyboard.press('Control+End');
    await page.keyboard.type(' Moved by a key.');
    const moved = await figure('dropped');
    await tabTo('input[type=search]');
    await page.keyboard.type('Brévane 12');
    await expect.poll(() => page.locator('.roster tbody tr[tabindex]').count()).toBe(1);
    await tabTo('.roster tbody tr');
    await page.keyboard.press('Enter');
    await tabTo('input[placeholder=Reason]');
    await page.keyboard.type('Blended with a neighbour.');
    await page
      .getByRole('complementary', { name: /^Object / })
      .getByRole('button', { name: 'Drop' })
      .focus();
    await page.keyboard.press('Enter');
    await expect.poll(() => figure('dropped')).toBe(moved + 1);
    await tabTo('.strip button.strong');
    await page.keyboard.press('Enter');
    await page.getByRole('dialog').waitFor();
    await tabTo('dialog button.strong');
    await page.keyboard.press('Enter');
    await expect.poll(() => page.getByRole('dialog').getByRole('status').textContent()).toMatch(/Edition 1 is written/);
    const frozen = readFileSync(join(place.folder, 'samples/editions/edition-1/recipe.halosieve.json'), 'utf8');
    expect(frozen).toMatch(/Moved by a key\./);
    expect(frozen).toMatch(/Blended with a neighbour\./);
    expect(faults).toEqual([]);
  });

  it('draws axes in the colours of the look at once when it changes', async () => {
    const label = page.locator('.plate .xtick text').first();
    await label.waitFor();
    const ink = (): Promise<string> =>
      label.evaluate((text) => {
        const probe = document.createElement('i');
        probe.style.color = 'var(--ink-soft)';
        document.body.append(probe);
        const wanted = getComputedStyle(probe).color;
        probe.remove();
        return getComputedStyle(text).fill === wanted ? 'of the look' : `${getComputedStyle(text).fill}, not ${wanted}`;
      });
    for (const look of ['dark', 'light']) {
      await page.getByLabel('Light or dark').selectOption(look);
      await expect.poll(ink).toBe('of the look');
    }
  });

  it('turns a lasso into a cut in data coordinates', async () => {
    const count = await cards().count();
    const sheet = (await page.locator('.sheet').first().boundingBox())!;
    const corner = (x: number, y: number): [number, number] => [sheet.x + x * sheet.width, sheet.y + y * sheet.height];
    await page.mouse.move(...corner(0.3, 0.3));
    await page.mouse.down();
    for (const [x, y] of [
      [0.6, 0.3],
      [0.6, 0.7],
      [0.3, 0.7],
      [0.3, 0.31],
    ] as const)
      await page.mouse.move(...corner(x, y), { steps: 8 });
    await page.mouse.up();
    await page.getByRole('button', { name: 'Drop what is inside' }).click();
    await expect.poll(() => cards().count()).toBe(count + 1);
    const card = page.getByRole('article', { name: 'Cut lasso' });
    await expect.poll(() => card.textContent()).toMatch(/corners in gal_l and gal_b/);
    expect(await card.getByText('only by it').count()).toBe(1);
    expect(faults).toEqual([]);
  });

  it('keeps an object by name with a reason, and says so on its way through the ledger', async () => {
    const dropped = await figure('dropped');
    await page.getByRole('button', { name: 'dropped' }).click();
    await page.locator('.roster tbody tr[tabindex]').first().click();
    const card = page.getByRole('complementary', { name: /^Object / });
    await expect.poll(() => card.getByRole('button', { name: 'Keep' }).isDisabled()).toBe(true);
    await card.getByPlaceholder('Reason').fill('Confirmed by its orbit.');
    await card.getByRole('button', { name: 'Keep' }).click();
    await expect.poll(() => figure('dropped')).toBe(dropped - 1);
    await expect.poll(() => card.textContent()).toContain('kept by name');
  });

  it('freezes an edition only with a rationale on every cut, and the edition verifies', async () => {
    await page.getByLabel('Another cut').selectOption('range');
    await page.getByRole('button', { name: 'Add', exact: true }).click();
    await page.getByRole('article', { name: 'Cut range' }).waitFor();
    await page.getByRole('button', { name: 'Freeze…' }).click();
    expect(await page.getByRole('button', { name: 'Freeze', exact: true }).isDisabled()).toBe(true);
    await page.getByRole('button', { name: 'Write the rationale of range' }).click();
    await page.keyboard.type('Keeps what the model can describe.');
    await page.getByRole('button', { name: 'Freeze…' }).click();
    await page.getByRole('button', { name: 'Freeze', exact: true }).click();
    await page.getByText('Edition 1 is written').waitFor();
    const edition = join(place.folder, 'samples/editions/edition-1');
    expect(await page.getByText(edition).count()).toBe(1);
    expect(readdirSync(edition)).toContain('sample.ecsv');
    expect(readFileSync(join(edition, 'recipe.halosieve.json'), 'utf8')).toContain(
      'Keeps what the model can describe.',
    );
    const verdict = execFileSync(process.execPath, [HALOSIEVE, 'verify', edition]).toString();
    expect(verdict).toContain('Nothing differs.');
    expect(faults).toEqual([]);
  });

  it('brings the bench back with its history after the program was killed', async () => {
    const handle = limit(/Fe\/H/);
    await handle.focus();
    await page.keyboard.press('ArrowLeft');
    await expect.poll(() => page.getByRole('button', { name: 'Undo' }).isEnabled()).toBe(true);
    const moved = await handle.getAttribute('aria-valuenow');
    // The autosave runs after the answer; a moment is what a crash in daily life leaves it.
    await expect
      .poll(
        () =>
          existsSync(place.state) &&
          readdirSync(join(place.state, 'halosieve')).some((name) => name.endsWith('.bench.json')),
      )
      .toBe(true);
    await door.stop('SIGKILL');
    await page.getByText('not connected').waitFor();
    door = await openDoor(place, place.recipe);
    await page.context().close();
    page = await openPage(door.address);
    await page.getByText('brought back from the last run').waitFor();
    expect(await limit(/Fe\/H/).getAttribute('aria-valuenow')).toBe(moved);
    await page.getByRole('button', { name: 'Undo' }).click();
    await expect.poll(() => limit(/Fe\/H/).getAttribute('aria-valuenow')).toBe('-0.8');
  });

  it('shows one bench in two windows, and refuses a second program on it', async () => {
    const second = await page.context().newPage();
    await second.goto(new URL('/', door.address).href);
    await second.getByRole('heading', { name: 'Ledger' }).waitFor();
    await limit(/Fe\/H/).focus();
    await page.keyboard.press('PageDown');
    const count = await figure('dropped');
    await expect
      .poll(async () =>
        Number(
          await second.locator('.figures .dropped dd').evaluate((element) => element.firstChild?.textContent ?? ''),
        ),
      )
      .toBe(count);
    await expect(openDoor(place, place.recipe)).rejects.toThrow(new RegExp(`process ${door.process.pid}`));
  });

  it('says what is wrong with a file that is no catalogue, and keeps the bench', async () => {
    const before = await figure('kept');
    await page.getByRole('button', { name: 'Add a source…' }).click();
    await page.getByLabel('Path on the machine').fill(process.execPath);
    await page.getByRole('button', { name: 'Open', exact: true }).last().click();
    await page
      .getByRole('alert')
      .filter({ hasText: /not a text table/ })
      .waitFor();
    expect(await figure('kept')).toBe(before);
  });

  it.each(['light', 'dark'])('has no accessibility violation in the %s look', async (look) => {
    await page.getByLabel('Light or dark').selectOption(look);
    await page.locator('.roster tbody tr[tabindex]').first().click();
    await page.getByRole('complementary', { name: /^Object / }).waitFor();
    await page.getByText('Columns and roles').first().click();
    await page.evaluate(axe.source);
    const found = await page.evaluate(async () => {
      const { violations } = await (globalThis as unknown as { axe: typeof axe }).axe.run();
      return violations.map(
        ({ id, nodes }) =>
          `${id}: ${nodes
            .slice(0, 3)
            .map(({ html }) => html.slice(0, 160))
            .join(' | ')}`,
      );
    });
    expect(found).toEqual([]);
  });
});
