/** The file as built: drawn before any script runs, closed to every network, safe with any name. */
import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { JSDOM } from 'jsdom';
import { describe, expect, test } from 'vitest';
import type { PageData } from '../../viz/data.ts';
import { staticPage } from '../../viz/static-page.ts';
import { fixture, fixtureAssessor } from './fixture.ts';

const HOSTILE = '</script><img src=x onerror=alert(1)>"\'&\u202e';
const assets = { script: 'void 0;', style: readFileSync(new URL('../../viz/theme.css', import.meta.url), 'utf8') };
const data = fixture(40, 200);
const page = staticPage(data, assets, fixtureAssessor());

/** The invented sweep with a hostile name wherever a person may write one. */
function hostile(): PageData {
  const renamed = (names: Readonly<Record<string, string>>) =>
    Object.fromEntries(Object.keys(names).map((slot) => [slot, `${HOSTILE}${slot}`]));
  return {
    ...data,
    rail: { ...data.rail, name: HOSTILE + 'n'.repeat(10_000) },
    front: {
      ...data.front,
      designs: data.front.designs.map((design) => ({ ...design, parts: renamed(design.parts) })),
    },
    nearMisses: data.nearMisses.map((miss) => ({ ...miss, design: { ...miss.design, family: HOSTILE } })),
    families: data.families.map((note) => ({ ...note, reason: HOSTILE })),
    cautions: [HOSTILE],
  };
}

describe('the page’s file', () => {
  test('the same data give the same bytes', () => {
    expect(staticPage(data, assets, fixtureAssessor())).toBe(page);
  });

  test('its policy lets nothing in but its own style and script, and no element carries a style', () => {
    const { document } = new JSDOM(page).window;
    const policy = document.querySelector('meta[http-equiv="Content-Security-Policy"]')?.getAttribute('content') ?? '';
    const digest = (text: string) => `sha256-${createHash('sha256').update(text).digest('base64')}`;
    expect(policy).toContain("default-src 'none'");
    expect(policy).toContain(`style-src '${digest(document.querySelector('style')?.textContent ?? '')}'`);
    const scripts = document.querySelectorAll('script:not([type])');
    expect(scripts).toHaveLength(1);
    expect(policy).toContain(`script-src '${digest(scripts[0]?.textContent ?? '')}'`);
    expect(policy).not.toContain('unsafe');
    expect(document.querySelectorAll('[style]')).toHaveLength(0);
    for (const element of document.querySelectorAll('*')) {
      for (const { name } of element.attributes)
        expect(name.startsWith('on'), `${element.tagName} ${name}`).toBe(false);
    }
  });

  test('the first picture is in the file: a mark for every design, an open design with its losses, limits and parts', () => {
    const { document } = new JSDOM(page).window;
    expect(document.querySelectorAll('#picture .front path')).toHaveLength(data.front.designs.length);
    for (const id of [
      'losses',
      'limits',
      'efficiency',
      'waveforms',
      'temperatures',
      'makeup',
      'parts',
      'families',
      'trust',
      'mind',
    ]) {
      expect(document.getElementById(id)?.textContent?.length, id).toBeGreaterThan(20);
    }
  });

  test('nothing in it points outside', () => {
    const { document } = new JSDOM(page).window;
    expect(document.querySelectorAll('[src], link, iframe, object, form, a[href^="http"]')).toHaveLength(0);
    expect(assets.style).not.toMatch(/url\(|@import/);
  });

  test('every id is unique and every label has its control', () => {
    const { document } = new JSDOM(page).window;
    const ids = Array.from(document.querySelectorAll('[id]'), (element) => element.id);
    expect(new Set(ids).size).toBe(ids.length);
    for (const label of document.querySelectorAll('label[for]'))
      expect(document.getElementById(label.getAttribute('for') ?? ''), label.textContent ?? '').not.toBeNull();
  });

  test('hostile names stay text', () => {
    const { document } = new JSDOM(staticPage(hostile(), assets, fixtureAssessor())).window;
    expect(document.querySelectorAll('img')).toHaveLength(0);
    expect(document.querySelector('h1')?.textContent).toContain(HOSTILE);
    expect(document.querySelector('#parts')?.textContent).toContain(HOSTILE);
    expect(document.querySelector('.cautions')?.textContent).toBe(HOSTILE);
  });

  test('a run without any feasible design still gives a page that says so', () => {
    const empty = {
      ...data,
      front: { ...data.front, designs: [] },
      cloud: { families: [], family: [], objectives: [] },
    };
    const { document } = new JSDOM(staticPage(empty, assets, fixtureAssessor())).window;
    expect(document.querySelector('#picture')?.textContent).toContain('No design keeps every limit yet');
  });

  test('an asset that would end its own element is refused', () => {
    expect(() => staticPage(data, { ...assets, script: '"</script>"' }, fixtureAssessor())).toThrow(
      'end its own element',
    );
  });
});
