/**
 * Every view's drawing equals the stored one in `drawings/`; a missing or orphaned file fails. After a change of looks that
 * was meant, look at the new drawings and store them: DRAW=store npx vitest run --config test/vitest.config.ts test/viz/drawings.test.ts
 */
import { existsSync, mkdirSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { GALLERY } from './gallery.ts';
import { place } from './page-at.ts';

const FOLDER = join(import.meta.dirname, 'drawings');
const isStoring = process.env.DRAW === 'store';

describe('stored drawings', () => {
  const complaints: unknown[] = [];
  beforeEach(() => {
    complaints.length = 0;
    for (const level of ['warn', 'error'] as const)
      vi.spyOn(console, level).mockImplementation((...words) => void complaints.push(words));
  });
  afterEach(() => {
    vi.restoreAllMocks();
  });

  test.each(Object.keys(GALLERY))('%s', (name) => {
    const drawing = drawingOf(name);
    const file = join(FOLDER, `${name}.html`);
    if (isStoring) {
      mkdirSync(FOLDER, { recursive: true });
      writeFileSync(file, drawing);
    }
    expect(existsSync(file), `no stored drawing ${name}.html`).toBe(true);
    expect(drawing).toBe(readFileSync(file, 'utf8'));
    expect(complaints, 'a drawing must not warn').toEqual([]);
  });

  test('no orphan lies among them', () => {
    expect(readdirSync(FOLDER).sort()).toEqual(
      Object.keys(GALLERY)
        .map((name) => `${name}.html`)
        .sort(),
    );
  });

  test('drawing twice into one place equals drawing once', () => {
    for (const [name, draw] of Object.entries(GALLERY)) {
      if (name === 'marks' || name.startsWith('tradeoff')) continue;
      const root = place();
      draw(root);
      draw(root);
      expect(tidy(root.html()), name).toBe(drawingOf(name));
    }
  });

  test('no drawing carries a style attribute, which the page’s policy would refuse', () => {
    for (const name of Object.keys(GALLERY)) expect(drawingOf(name)).not.toMatch(/\sstyle=/);
  });
});

const drawn = new Map<string, string>();

/** The drawing as text; drawn once. */
function drawingOf(name: string): string {
  const known = drawn.get(name);
  if (known !== undefined) return known;
  const root = place();
  GALLERY[name]?.(root);
  const text = tidy(root.html());
  drawn.set(name, text);
  return text;
}

/** One element a line, so that a difference reads well. */
function tidy(html: string): string {
  return `${html.replaceAll('><', '>\n<')}\n`;
}
