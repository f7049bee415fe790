/** An engineer's morning on the page of a real sweep. */
import type { Browser, Page } from 'playwright-core';
import { expect, test } from 'vitest';
import { openTab, textOf } from './browser.ts';
import type { SweptRun } from './run.ts';

const openId = (page: Page) => textOf(page, '#open-head .id');
const fragment = (page: Page) => page.evaluate(() => location.hash);

/** Defines the tests. */
export function morning(browser: Browser, { address, data }: SweptRun): void {
  test('a morning: walk, narrow, open, change, pin, take away, return', async () => {
    const { page, context, complaints } = await openTab(browser, address);
    const first = await openId(page);

    await page.locator('#picture').focus();
    await page.keyboard.press('Home');
    const smallest = await openId(page);
    const least = Math.min(...data.front.designs.map((design) => design.objectives[1] ?? 0));
    expect(data.front.designs.find((design) => design.id === smallest)?.objectives[1]).toBe(least);
    await page.keyboard.press('ArrowRight');
    await page.keyboard.press('ArrowRight');
    expect(await openId(page)).not.toBe(smallest);
    expect(await page.locator('#picture').getAttribute('aria-valuenow')).toBe('3');
    expect(await page.locator('#picture').getAttribute('aria-valuetext')).toContain(await openId(page));

    const count = async () => Number((await textOf(page, '#count strong')).replace(/\D/g, ''));
    expect(await count()).toBe(data.front.designs.length);
    await press(page, '[data-key="o.loss"] input.high', 'ArrowLeft', 50);
    const afterOne = await count();
    expect(afterOne).toBeLessThan(data.front.designs.length);
    await press(page, '[data-key="o.cost"] input.high', 'ArrowLeft', 40);
    const afterTwo = await count();
    expect(afterTwo).toBeLessThan(afterOne);
    expect(afterTwo).toBeGreaterThan(0);
    expect(await page.locator('#picture .mark:not(.out)').count()).toBe(afterTwo);

    await page.getByRole('button', { name: 'Balanced' }).click();
    const chosen = await openId(page);
    expect(chosen).not.toBe('');
    expect(await page.locator('.moved-mark').count()).toBe(0);
    await press(page, '#knob-frequency', 'Home', 1);
    expect(await page.locator('#picture .moved-mark').count()).toBe(1);
    expect(await page.locator('#move .broken li').count()).toBeGreaterThan(0);
    await page.getByRole('button', { name: 'Back to the design as chosen' }).click();
    expect(await page.locator('.moved-mark').count()).toBe(0);

    expect(afterTwo).toBeGreaterThanOrEqual(8);
    await page.locator('#picture').focus();
    await page.keyboard.press('Home');
    for (let i = 0; i < 4; i++) {
      await page.keyboard.press('p');
      await page.keyboard.press('ArrowRight');
      await page.keyboard.press('ArrowRight');
    }
    const pinned = await page
      .locator('#compare [data-act="unpin"]')
      .evaluateAll((all) => all.map((one) => one.getAttribute('data-id')));
    expect(new Set(pinned).size).toBe(4);
    expect(await page.locator('#picture .pinned circle').count()).toBe(4);

    await press(page, '#knob-frequency', 'ArrowRight', 5);
    await page.waitForTimeout(300);
    const before = await snapshot(page);
    expect(await fragment(page)).toContain('change=frequency');
    await page.reload();
    await page.waitForSelector('html[data-live="yes"]');
    expect(await snapshot(page)).toEqual(before);
    expect(first).not.toBe('');
    expect(complaints).toEqual([]);
    await context.close();
  });

  test('prints to a few pages', async () => {
    const { page, context, complaints } = await openTab(browser, address);
    const file = await page.pdf({ format: 'A4' });
    expect(file.subarray(0, 5).toString('latin1')).toBe('%PDF-');
    const pages = file.toString('latin1').match(/\/Type\s*\/Page\b/g) ?? [];
    expect(pages.length).toBeGreaterThan(0);
    expect(pages.length).toBeLessThanOrEqual(8);
    expect(complaints).toEqual([]);
    await context.close();
  });

  test('the picture shows before any script, and nothing jumps when the script takes over', async () => {
    const still = await browser.newContext({ viewport: { width: 1280, height: 720 }, javaScriptEnabled: false });
    const bare = await still.newPage();
    await bare.goto(address);
    const boxes = (page: Page) =>
      Promise.all(
        ['#picture', '#narrow', '#open', '#detail', '#whatif-section'].map((id) => page.locator(id).boundingBox()),
      );
    const before = await boxes(bare);
    await still.close();
    const { page, context } = await openTab(browser, address);
    const after = await boxes(page);
    const moves = before.map((box, i) =>
      Math.max(Math.abs((box?.y ?? 0) - (after[i]?.y ?? 0)), Math.abs((box?.x ?? 0) - (after[i]?.x ?? 0))),
    );
    expect(Math.max(...moves.slice(0, 3)), moves.join(', ')).toBe(0);
    await context.close();
  });

  test('hover names the design under the pointer, a click opens it', async () => {
    const { page, context, complaints } = await openTab(browser, address);
    const mark = page.locator('#picture .front path').last();
    const box = await mark.boundingBox();
    if (box === null) throw new Error('no mark');
    const [x, y] = [box.x + box.width / 2, box.y + box.height / 2];
    await page.mouse.move(x, y);
    const words = await textOf(page, '#hover');
    await page.mouse.click(x, y);
    expect(words).toContain(await openId(page));
    expect(complaints).toEqual([]);
    await context.close();
  });

  test('zoom and pan change the window, and All returns to the whole', async () => {
    const { page, context, complaints } = await openTab(browser, address);
    await page.locator('[data-act="closer"]').click();
    await page.waitForTimeout(250);
    const near = new URLSearchParams((await fragment(page)).slice(1)).get('window')?.split(' ').map(Number) ?? [];
    const box = await page.locator('#picture').boundingBox();
    if (box === null) throw new Error('no picture');
    await page.mouse.move(box.x + 300, box.y + 200);
    await page.mouse.down();
    await page.mouse.move(box.x + 360, box.y + 180, { steps: 4 });
    await page.mouse.up();
    await page.waitForTimeout(250);
    const panned = new URLSearchParams((await fragment(page)).slice(1)).get('window')?.split(' ').map(Number) ?? [];
    expect(panned[0]).toBeLessThan(near[0] ?? 0);
    expect((panned[1] ?? 0) - (panned[0] ?? 0)).toBeCloseTo((near[1] ?? 0) - (near[0] ?? 0), 9);
    await page.locator('[data-act="whole"]').click();
    await page.waitForTimeout(250);
    expect(await fragment(page)).not.toContain('window=');
    expect(complaints).toEqual([]);
    await context.close();
  });

  test('a near miss opens from the price table like any design: marked, judged, moved, pinned, kept in the address', async () => {
    const { page, context, complaints } = await openTab(browser, address);
    await page.locator('#prices summary').click();
    await page.locator('#prices details [data-act="open"]').first().click();
    const id = await openId(page);
    const miss = data.nearMisses.find((one) => one.design.id === id);
    expect(miss).toBeDefined();
    expect(await textOf(page, '#open-head')).toContain('Breaks a limit');
    expect(await page.locator('#limits tr.broken').count()).toBe(1);
    expect(await page.locator('#picture .open-ring.missed').count()).toBe(1);
    await page.locator('[data-act="pin"]').click();
    expect(await textOf(page, '#compare')).toContain('near miss');
    await press(page, '#knob-frequency', 'ArrowRight', 3);
    expect(await page.locator('#picture .moved-mark').count()).toBe(1);
    await page.waitForTimeout(300);
    await page.reload();
    await page.waitForSelector('html[data-live="yes"]');
    expect(await openId(page)).toBe(id);
    expect(complaints).toEqual([]);
    await context.close();
  });

  test('yields of a spread are a range, a figure of the open design and a column', async () => {
    const { page, context } = await openTab(browser, address);
    expect(await page.locator('[data-key="y.yield"]').count()).toBe(1);
    expect(await textOf(page, '#open-head .figures')).toContain('yield');
    expect(await textOf(page, '#picture-numbers thead')).toContain('Yield');
    await context.close();
  });
}

/** Moves a range input as a person does: focus and arrow keys. */
async function press(page: Page, selector: string, key: string, times: number): Promise<void> {
  await page.locator(selector).focus();
  for (let i = 0; i < times; i++) await page.keyboard.press(key);
}

/** What a returning reader compares: the open design, what is left, what is pinned, the move, and the picture itself. */
async function snapshot(page: Page): Promise<Record<string, string>> {
  const ids = ['open-head', 'count', 'compare', 'move', 'ranges', 'picture'];
  const entries = ids.map(
    async (id) => [id, await page.locator(`#${id}`).evaluate((element) => element.textContent ?? '')] as const,
  );
  const marks = await page.locator('#picture .plot-marks').evaluate((element) => element.innerHTML);
  return { ...Object.fromEntries(await Promise.all(entries)), marks };
}
