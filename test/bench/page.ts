/** How fast the page is, in headless Chromium with software drawing: one line a figure, for the bench to print. */
import type { Page } from 'playwright-core';
import { launchAll, openTab } from '../browser/browser.ts';
import { pagesFolder, realPage } from '../browser/built.ts';
import { filled } from '../browser/filled.ts';
import { sweptData } from '../browser/sweep.ts';

/** One figure with what it is held to. */
export interface PageFigure {
  readonly name: string;
  readonly value: number;
  readonly unit: string;
  /** `at most` or `at least` what. */
  readonly target: string;
}

/** Times the page of a real sweep, filled up to 2,000 designs and 50,000 points; empty with a reason where no browser starts. */
export async function timePage(): Promise<{ readonly figures: readonly PageFigure[]; readonly note: string }> {
  const { started, reasons } = await launchAll();
  const first = started[0];
  if (first === undefined) return { figures: [], note: reasons.join('; ') };
  const folder = pagesFolder();
  try {
    const start = performance.now();
    const text = await realPage(filled(sweptData(20_000, 400), 2000, 50_000));
    const built = performance.now() - start;
    const address = folder.write('page.html', text);
    const { page } = await openTab(first.browser, address);
    const ready = await readiness(page);
    const hover = await hoverTimes(page);
    const pan = await panRate(page);
    const moves = await moveTimes(page);
    return {
      note: `${first.name} ${first.browser.version()}`,
      figures: figures(text, built, ready, hover, pan, moves),
    };
  } finally {
    for (const { browser } of started) await browser.close();
    folder.remove();
  }
}

function figures(
  text: string,
  built: number,
  ready: number,
  hover: number[],
  pan: number,
  moves: number[],
): readonly PageFigure[] {
  return [
    {
      name: 'page of 2,000 designs and 50,000 points',
      value: Buffer.byteLength(text) / 1e6,
      unit: 'MB',
      target: 'at most 3',
    },
    { name: 'bundling and drawing it', value: built, unit: 'ms', target: 'no bound' },
    { name: 'interactive after', value: ready, unit: 'ms', target: 'at most 1000' },
    { name: 'hover to highlight, 95th percentile', value: percentile(hover, 0.95), unit: 'ms', target: 'at most 16.7' },
    { name: 'panning the cloud', value: pan, unit: 'frames/s', target: 'at least 50' },
    { name: 'what-if to picture, 95th percentile', value: percentile(moves, 0.95), unit: 'ms', target: 'at most 30' },
  ];
}

/** Milliseconds from the start of the load to the end of the script that takes the page over. */
function readiness(page: Page): Promise<number> {
  return page.evaluate(() => {
    const [navigation] = performance.getEntriesByType('navigation') as PerformanceNavigationTiming[];
    return navigation?.domContentLoadedEventStart ?? Number.NaN;
  });
}

/** Time in handlers and layout for each of many pointer moves over the picture. */
function hoverTimes(page: Page): Promise<number[]> {
  return page.evaluate(async () => {
    const box = document.getElementById('picture');
    if (box === null) return [];
    const bounds = box.getBoundingClientRect();
    const times: number[] = [];
    for (let i = 0; i < 200; i++) {
      const start = performance.now();
      const place = {
        clientX: bounds.left + 60 + ((i * 37) % 480),
        clientY: bounds.top + 40 + ((i * 53) % 300),
        bubbles: true,
      };
      box.dispatchEvent(new PointerEvent('pointermove', place));
      document.getElementById('hover')?.getBoundingClientRect();
      times.push(performance.now() - start);
      if (i % 10 === 0) await new Promise((done) => requestAnimationFrame(done));
    }
    return times;
  });
}

/** Frames a second while the picture is dragged for about a second and a half. */
async function panRate(page: Page): Promise<number> {
  const box = await page.locator('#picture').boundingBox();
  if (box === null) return Number.NaN;
  const [x, y] = [box.x + box.width / 2, box.y + box.height / 2];
  await page.mouse.move(x, y);
  await page.mouse.down();
  const rate = page.evaluate(
    (place) =>
      new Promise<number>((done) => {
        let frames = 0;
        const start = performance.now();
        const tick = () => {
          frames++;
          const turn = frames / 9;
          const at = {
            clientX: place.x + 50 * Math.sin(turn),
            clientY: place.y + 40 * Math.cos(turn),
            bubbles: true,
            view: window,
          };
          window.dispatchEvent(new MouseEvent('mousemove', at));
          const passed = performance.now() - start;
          if (passed < 1500) requestAnimationFrame(tick);
          else done((1000 * frames) / passed);
        };
        requestAnimationFrame(tick);
      }),
    { x, y },
  );
  const frames = await rate;
  await page.mouse.up();
  return frames;
}

/** Time from a knob's move to the finished change of the page, layout included. */
function moveTimes(page: Page): Promise<number[]> {
  return page.evaluate(async () => {
    const knob = document.querySelector<HTMLInputElement>('#knob-frequency');
    if (knob === null) return [];
    const times: number[] = [];
    for (let i = 0; i < 60; i++) {
      const start = performance.now();
      knob.value = String(100 + ((i * 29) % 250));
      knob.dispatchEvent(new Event('input', { bubbles: true }));
      document.getElementById('move')?.getBoundingClientRect();
      times.push(performance.now() - start);
      await new Promise((done) => requestAnimationFrame(done));
    }
    return times.slice(5);
  });
}

function percentile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.min(sorted.length - 1, Math.floor(share * sorted.length))] ?? Number.NaN;
}
