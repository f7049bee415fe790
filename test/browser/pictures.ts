/**
 * Pictures of the page's main states, for the README and for the eyes of whoever changes the looks. After `npm run demo`:
 *
 *     node dist/test/browser/pictures.js runs/demo/page.html viz/pictures
 */
import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import type { Page } from 'playwright-core';
import { launchAll, openTab } from './browser.ts';

interface State {
  readonly name: string;
  readonly width: number;
  readonly height: number;
  readonly colorScheme: 'light' | 'dark';
  readonly isWhole: boolean;
  readonly act: (page: Page) => Promise<void>;
}

const nothing = async (): Promise<void> => {};

const STATES: readonly State[] = [
  { name: 'light', width: 1280, height: 800, colorScheme: 'light', isWhole: false, act: nothing },
  { name: 'dark', width: 1280, height: 800, colorScheme: 'dark', isWhole: false, act: nothing },
  { name: 'phone', width: 390, height: 844, colorScheme: 'light', isWhole: false, act: nothing },
  { name: 'whole', width: 1280, height: 800, colorScheme: 'light', isWhole: true, act: nothing },
  { name: 'what-if', width: 1280, height: 800, colorScheme: 'light', isWhole: false, act: whatIf },
];

/** Writes `light.png`, `dark.png`, … of the page at `path` into `folder`; returns their names, none where no browser starts. */
async function takePictures(path: string, folder: string): Promise<readonly string[]> {
  const { started } = await launchAll();
  const browser = started[0]?.browser;
  mkdirSync(folder, { recursive: true });
  const taken: string[] = [];
  for (const state of STATES) {
    if (browser === undefined) break;
    const { page, context } = await openTab(browser, pathToFileURL(path).href, {
      viewport: { width: state.width, height: state.height },
      colorScheme: state.colorScheme,
    });
    await state.act(page);
    await page.screenshot({ path: join(folder, `${state.name}.png`), fullPage: state.isWhole });
    taken.push(`${state.name}.png`);
    await context.close();
  }
  for (const one of started) await one.browser.close();
  return taken;
}

async function whatIf(page: Page): Promise<void> {
  await page.locator('#open-head').getByRole('button', { name: 'What if' }).click();
  await page.locator('#knob-frequency').focus();
  for (let i = 0; i < 60; i++) await page.keyboard.press('ArrowLeft');
}

const [page = '', folder = ''] = process.argv.slice(2);
if (page === '' || folder === '') throw new Error('expected the path of a page and a folder for its pictures');
for (const name of await takePictures(page, folder)) console.log(join(folder, name));
