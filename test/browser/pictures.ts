/**
 * Pictures of the page's main states, for the README and for the eyes of whoever changes the looks. After `npm run demo`:
 *
 *     node dist/test/browser/pictures.js runs/demo/page.html viz/pictures
 */
import { mkdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import type { Page } from 'playwright-core';
import { launchAll, openTab } from './browser.ts';
import { smallPng } from './small-png.ts';

interface State {
  readonly name: string;
  readonly width: number;
  readonly height: number;
  readonly colorScheme: 'light' | 'dark';
  /** Brings the page into the state. */
  readonly act?: (page: Page) => Promise<void>;
  /** The part that is taken; the window where absent. */
  readonly part?: string;
}

const DESK = { width: 1280, height: 800, colorScheme: 'light' } as const;

const STATES: readonly State[] = [
  { ...DESK, name: 'page' },
  { ...DESK, name: 'dark', colorScheme: 'dark' },
  { ...DESK, name: 'phone', width: 390, height: 844 },
  { ...DESK, name: 'what-if', act: whatIf, part: '#whatif-section' },
  { ...DESK, name: 'side-by-side', act: sideBySide, part: '#compare-section' },
  { ...DESK, name: 'near-miss', act: nearMiss },
  { ...DESK, name: 'trust', part: '#trust-section' },
];

/** Writes `page.png`, `dark.png`, … of the page at `path` into `folder`; returns their names, none where no browser starts. */
async function takePictures(path: string, folder: string): Promise<readonly string[]> {
  const { started } = await launchAll();
  const browser = started[0]?.browser;
  mkdirSync(folder, { recursive: true });
  const taken: string[] = [];
  for (const { name, width, height, colorScheme, act, part } of STATES) {
    if (browser === undefined) break;
    const viewport = { width, height };
    const { page, context } = await openTab(browser, pathToFileURL(path).href, { viewport, colorScheme });
    await act?.(page);
    await page.mouse.move(0, 0);
    const picture = await (part === undefined ? page.screenshot() : page.locator(part).screenshot());
    writeFileSync(join(folder, `${name}.png`), smallPng(picture));
    taken.push(`${name}.png`);
    await context.close();
  }
  for (const one of started) await one.browser.close();
  return taken;
}

/** A lower frequency than the open design can bear. */
async function whatIf(page: Page): Promise<void> {
  await page.locator('#knob-frequency').focus();
  for (let i = 0; i < 50; i++) await page.keyboard.press('ArrowLeft');
}

/** The first picks, one beside the other. */
async function sideBySide(page: Page): Promise<void> {
  const picks = await page.locator('#picks button').count();
  for (let i = 0; i < picks; i++) {
    await page.locator('#picks button').nth(i).click();
    const pin = page.locator('[data-act="pin"]');
    if ((await pin.getAttribute('aria-pressed')) === 'false') await pin.click();
  }
}

/** The near miss that would buy most. */
async function nearMiss(page: Page): Promise<void> {
  await page.locator('#prices [data-act="open"]').first().click();
  await page.evaluate(() => scrollTo(0, 0));
}

const [page = '', folder = ''] = process.argv.slice(2);
if (page === '' || folder === '') throw new Error('expected the path of a page and a folder for its pictures');
for (const name of await takePictures(page, folder)) console.log(join(folder, name));
