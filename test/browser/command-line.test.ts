/** The page and the command line give the same bytes: a run swept by the built command, its page opened, its files compared. */
import { execFileSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import type { Page } from 'playwright-core';
import { afterAll, describe, expect, test } from 'vitest';
import { lacking } from '../support/needs.ts';
import { launchAll, openTab, textOf } from './browser.ts';

const ROOT = fileURLToPath(new URL('../..', import.meta.url));
const COMMAND = join(ROOT, 'dist/runners/chopfront.js');
const folder = mkdtempSync(join(tmpdir(), 'chopfront-run-'));
const run = join(folder, 'run');
const { started, reasons } = await launchAll();

function command(...words: string[]): string {
  return execFileSync(process.execPath, [COMMAND, ...words], {
    cwd: folder,
    encoding: 'utf8',
    stdio: ['ignore', 'pipe', 'pipe'],
  });
}

afterAll(async () => {
  for (const { browser } of started) await browser.close();
  rmSync(folder, { recursive: true, force: true });
});

const isHere = started.length > 0 || lacking('a browser', reasons.join('; '));
test.runIf(isHere)('a browser starts here', () => {
  expect(started[0]?.browser.isConnected()).toBe(true);
});

async function taken(page: Page, name: string): Promise<string> {
  const coming = page.waitForEvent('download');
  await page.locator(`[data-file="${name}"]`).click();
  return readFileSync(await (await coming).path(), 'utf8');
}

describe.each(started.slice(0, 1))('in $name', ({ browser }) => {
  test('files taken from the page equal those that the command line writes', async () => {
    command(
      'sweep',
      join(ROOT, 'model/rails/buoy-sensors.yaml'),
      '--out',
      run,
      '--evaluations',
      '20000',
      '--seed',
      '1',
      '--threads',
      '1',
    );
    const { page, context, complaints } = await openTab(browser, pathToFileURL(join(run, 'page.html')).href);
    expect(await taken(page, 'front.csv')).toBe(readFileSync(join(run, 'front.csv'), 'utf8'));
    for (const key of ['Home', 'End']) {
      await page.locator('#picture').focus();
      await page.keyboard.press(key);
      const id = await textOf(page, '#open-head .id');
      const out = join(folder, id);
      command('handoff', run, id, '--out', out);
      const names = (await page.locator('[data-act="away"]').allTextContents()).filter((name) => name !== 'front.csv');
      expect(names).toContain('spec.json');
      for (const name of names) expect(await taken(page, name), name).toBe(readFileSync(join(out, name), 'utf8'));
    }
    expect(complaints).toEqual([]);
    await context.close();
  });

  test('the page says of a design what assess says', async () => {
    const { page, context } = await openTab(browser, pathToFileURL(join(run, 'page.html')).href);
    const id = await textOf(page, '#open-head .id');
    const said = JSON.parse(
      command('assess', join(run, 'rail.yaml'), join(await handedOver(id), 'spec.json'), '--json'),
    ) as { id: string; feasible: boolean };
    expect(said.id).toBe(id);
    expect(said.feasible).toBe(true);
    await context.close();
  });
});

async function handedOver(id: string): Promise<string> {
  const out = join(folder, `again-${id}`);
  command('handoff', run, id, '--out', out);
  return out;
}
