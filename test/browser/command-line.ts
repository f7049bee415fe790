/** The page and the command line give the same bytes: files taken from the page against those that `handoff` writes. */
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { Browser, Page } from 'playwright-core';
import { expect, test } from 'vitest';
import { openTab, textOf } from './browser.ts';
import type { SweptRun } from './run.ts';

/** Defines the tests. */
export function commandLine(browser: Browser, swept: SweptRun): void {
  const { run, address, data, command, beside } = swept;

  test('every file taken from the page equals the one that handoff writes, byte for byte', async () => {
    const { page, context, complaints } = await openTab(browser, address);
    const walk = (key: string) => async () => {
      await page.locator('#picture').focus();
      await page.keyboard.press(key);
    };
    const nearMiss = () => page.locator('#prices [data-act="open"]').first().click();
    for (const open of [walk('Home'), walk('End'), nearMiss]) {
      await open();
      const id = await textOf(page, '#open-head .id');
      const out = beside(`out-${id}`);
      command('handoff', run, id, '--out', out);
      const names = readdirSync(out).sort();
      const offered = await page.locator('[data-act="away"]').allTextContents();
      expect(names).toEqual(['magnetics.md', 'note.html', 'note.md', 'parts.csv', 'spec.json', 'stage.cir']);
      expect(offered.sort()).toEqual([...names, 'front.csv'].sort());
      for (const name of names) {
        const written = readFileSync(join(out, name));
        expect((await taken(page, name)).equals(written), `${name} of ${id}`).toBe(true);
      }
    }
    expect(data.nearMisses.map(({ design }) => design.id)).toContain(await textOf(page, '#open-head .id'));
    expect(complaints).toEqual([]);
    await context.close();
  });

  test('front.csv from the page equals the run’s, yields too', async () => {
    const { page, context } = await openTab(browser, address);
    const text = (await taken(page, 'front.csv')).toString('utf8');
    expect(text.split('\n')[0]).toMatch(/,yield$/);
    expect(text).toBe(readFileSync(join(run, 'front.csv'), 'utf8'));
    await context.close();
  });

  test('assess says of a spec taken from the page what the page says', async () => {
    const { page, context } = await openTab(browser, address);
    const id = await textOf(page, '#open-head .id');
    const out = beside(`again-${id}`);
    command('handoff', run, id, '--out', out);
    const words = command('assess', join(run, 'rail.yaml'), join(out, 'spec.json'), '--json');
    expect(JSON.parse(words)).toMatchObject({ id, feasible: true });
    await context.close();
  });
}

async function taken(page: Page, name: string): Promise<Buffer> {
  const coming = page.waitForEvent('download');
  await page.locator(`[data-file="${name}"]`).click();
  const file = await coming;
  expect(file.suggestedFilename()).toBe(name);
  return readFileSync(await file.path());
}
