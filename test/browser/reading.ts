/** Whoever reads and however: light, dark, phone, screen reader, keyboard alone, without colour, with hostile names. */
import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type { Browser, Page } from 'playwright-core';
import { beforeAll, expect, test } from 'vitest';
import type { PageData } from '../../viz/data.ts';
import { fixture } from '../viz/fixture.ts';
import { openTab, textOf } from './browser.ts';
import { inventedPage, type PagesFolder } from './built.ts';

const axe = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');
const LEVELS = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];

/** Defines the tests, on pages written into `folder`. */
export function reading(browser: Browser, folder: PagesFolder): void {
  const data = fixture(160, 2000);
  const pins = data.front.designs
    .slice(0, 4)
    .map((design) => `pin=${design.id}`)
    .join('&');
  let plain = '';
  beforeAll(async () => {
    plain = folder.write('plain.html', await inventedPage(data));
  });

  test.each([
    ['light', 1280, 720],
    ['dark', 1280, 720],
    ['light', 390, 844],
    ['dark', 390, 844],
  ] as const)('axe finds nothing: %s at %d×%d', async (colorScheme, width, height) => {
    const { page, context, complaints } = await openTab(
      browser,
      `${plain}#${pins}&change=frequency 100000&range=o.loss 0.1 0.4`,
      { colorScheme, viewport: { width, height } },
    );
    for (const details of await page.locator('details').all())
      await details.evaluate((element) => element.setAttribute('open', ''));
    expect(await violations(page)).toEqual([]);
    expect(await page.evaluate(() => document.documentElement.scrollWidth), 'no sideways scroll').toBe(width);
    expect(complaints).toEqual([]);
    await context.close();
  });

  test('the keyboard alone reaches every control, each with a visible focus', async () => {
    const { page, context } = await openTab(browser, `${plain}#${pins}`);
    const reachable = await page.evaluate(() => {
      const all = [...document.querySelectorAll<HTMLElement>('button, select, input, summary, [tabindex]')];
      return all.filter(
        (element) => !element.matches(':disabled') && element.checkVisibility() && element.tabIndex >= 0,
      ).length;
    });
    const seen = new Set<string>();
    for (let i = 0; i < reachable + 5; i++) {
      await page.keyboard.press('Tab');
      const focus = await page.evaluate(() => {
        const element = document.activeElement as HTMLElement;
        const all = [...document.querySelectorAll('*')];
        const style = getComputedStyle(element);
        const thumb = element.matches('.thumbs input');
        return {
          place: all.indexOf(element),
          isVisible: thumb || (style.outlineStyle !== 'none' && Number.parseFloat(style.outlineWidth) >= 2),
          tag: element.outerHTML.slice(0, 90),
        };
      });
      if (focus.tag.startsWith('<body')) continue;
      expect(focus.isVisible, focus.tag).toBe(true);
      seen.add(String(focus.place));
    }
    expect(seen.size).toBeGreaterThanOrEqual(reachable);
    await context.close();
  });

  test('a press keeps the focus, though the button is drawn anew; an open table stays open from design to design', async () => {
    const { page, context } = await openTab(browser, plain);
    const focus = () =>
      page.evaluate(() => (document.activeElement as HTMLElement).dataset.act ?? document.activeElement?.id);
    await page.locator('[data-act="pin"]').focus();
    await page.keyboard.press('Enter');
    expect(await focus()).toBe('pin');
    await page.getByRole('button', { name: 'Smallest' }).focus();
    await page.keyboard.press('Enter');
    expect(await focus()).toBe('open');
    await page.locator('[data-act="unpin"]').focus();
    await page.keyboard.press('Enter');
    expect(await focus()).toBe('picture');
    await page.locator('#efficiency summary').click();
    await page.locator('#picture').focus();
    await page.keyboard.press('End');
    expect(await page.locator('#efficiency details').getAttribute('open')).toBe('');
    await context.close();
  });

  test('every drawing has its numbers as a table in the same card (the small picture beside the knobs repeats the large one)', async () => {
    const { page, context } = await openTab(browser, plain);
    const bare = await page.evaluate(() =>
      [...document.querySelectorAll('svg.drawing:not(#move-picture)')]
        .filter((svg) => svg.closest('.card')?.querySelector('table') === null)
        .map((svg) => svg.outerHTML.slice(0, 80)),
    );
    expect(bare).toEqual([]);
    await context.close();
  });

  test('in grey the families still differ: no two marks of the legend look the same', async () => {
    const { page, context } = await openTab(browser, plain);
    const session = await context.newCDPSession(page);
    await session.send('Emulation.setEmulatedVisionDeficiency', { type: 'achromatopsia' });
    const samples = await page.locator('#families .mark-sample').all();
    const pictures = await Promise.all(samples.map(async (sample) => (await sample.screenshot()).toString('base64')));
    expect(pictures.length).toBeGreaterThan(4);
    expect(new Set(pictures).size).toBe(pictures.length);
    await context.close();
  });

  test('hostile names are text', async () => {
    const HOSTILE = '</script><img src=x onerror=alert(1)>"\'&\u202e';
    const renamed = (names: Readonly<Record<string, string>>) =>
      Object.fromEntries(Object.keys(names).map((slot) => [slot, `${HOSTILE}${slot}`]));
    const hostile: PageData = {
      ...data,
      rail: { ...data.rail, name: HOSTILE + 'n'.repeat(10_000) },
      front: {
        ...data.front,
        designs: data.front.designs.map((design) => ({ ...design, parts: renamed(design.parts) })),
      },
      families: data.families.map((note) => ({ ...note, reason: HOSTILE })),
      cautions: [HOSTILE],
    };
    const address = folder.write('hostile.html', await inventedPage(hostile));
    const { page, context, complaints } = await openTab(browser, `${address}#${pins}`);
    expect(await page.locator('img').count()).toBe(0);
    expect(await textOf(page, 'h1')).toContain('<img src=x');
    expect(await textOf(page, '#parts')).toContain('<img src=x');
    expect(await textOf(page, '#compare')).toContain('<img src=x');
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBe(1280);
    expect(complaints).toEqual([]);
    await context.close();
  });

  test('a fragment of nonsense opens the first view without a word', async () => {
    const { page, context, complaints } = await openTab(
      browser,
      `${plain}#open=%E0%A4%A&window=a b c d&range=x&point=NaN&third=&pin=<script>`,
    );
    expect(await textOf(page, '#open-head .id')).not.toBe('');
    expect(complaints).toEqual([]);
    await context.close();
  });
}

/** What axe finds at WCAG 2.2 A and AA. */
async function violations(page: Page): Promise<string[]> {
  await page.evaluate(axe);
  return page.evaluate(async (levels) => {
    const { axe } = globalThis as unknown as {
      axe: {
        run(
          where: Document,
          how: object,
        ): Promise<{ violations: { id: string; nodes: { html: string; failureSummary: string }[] }[] }>;
      };
    };
    const result = await axe.run(document, { runOnly: { type: 'tag', values: levels } });
    return result.violations.flatMap(({ id, nodes }) =>
      nodes.map((node) => `${id}: ${node.html.slice(0, 160)} ${node.failureSummary.slice(0, 200)}`),
    );
  }, LEVELS);
}
