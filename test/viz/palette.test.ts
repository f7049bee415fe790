/**
 * The colours: text and marks keep the contrast of WCAG 2.2 (1.4.3: 4.5 for text, 1.4.11: 3 for what a picture needs) in light
 * and dark, and families stay apart for the three kinds of colour blindness (Viénot, Brettel, Mollon 1999 for red and green;
 * from memory).
 */
import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';

const css = readFileSync(new URL('../../viz/theme.css', import.meta.url), 'utf8');
const [light = '', dark = ''] = css.split('@media screen and (prefers-color-scheme: dark)');

type Colour = readonly [number, number, number];

function coloursOf(text: string): Record<string, Colour> {
  const found = [...text.matchAll(/--([a-z0-9-]+): #([0-9a-f]{6})/g)];
  const linear = (hex: string) => {
    const value = Number.parseInt(hex, 16) / 255;
    return value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4;
  };
  return Object.fromEntries(
    found.map(([, name = '', hex = '']) => [
      name,
      [linear(hex.slice(0, 2)), linear(hex.slice(2, 4)), linear(hex.slice(4, 6))],
    ]),
  );
}

const luminance = ([r, g, b]: Colour) => 0.2126 * r + 0.7152 * g + 0.0722 * b;

function contrast(a: Colour, b: Colour): number {
  const [high, low] = [luminance(a), luminance(b)].sort((x, y) => y - x);
  return ((high ?? 0) + 0.05) / ((low ?? 0) + 0.05);
}

/** Linear RGB as a red- or green-blind eye sees it. */
const BLIND: Readonly<Record<string, (colour: Colour) => Colour>> = {
  none: (colour) => colour,
  protan: ([r, g, b]) => [0.11238 * r + 0.88762 * g, 0.11238 * r + 0.88762 * g, 0.00401 * r - 0.00401 * g + b],
  deutan: ([r, g, b]) => [0.29275 * r + 0.70725 * g, 0.29275 * r + 0.70725 * g, -0.02234 * r + 0.02234 * g + b],
};

/** Distance in CIE L*a*b* (D65). */
function distance(a: Colour, b: Colour): number {
  const [x, y] = [lab(a), lab(b)];
  return Math.hypot(...x.map((value, i) => value - (y[i] ?? 0)));
}

function lab([r, g, b]: Colour): number[] {
  const f = (t: number) => (t > 0.008856 ? Math.cbrt(Math.max(0, t)) : 7.787 * t + 16 / 116);
  const x = f((0.4124 * r + 0.3576 * g + 0.1805 * b) / 0.95047);
  const y = f(0.2126 * r + 0.7152 * g + 0.0722 * b);
  const z = f((0.0193 * r + 0.1192 * g + 0.9505 * b) / 1.08883);
  return [116 * y - 16, 500 * (x - y), 200 * (y - z)];
}

describe.each([
  ['light', light],
  ['dark', dark],
])('%s', (_, text) => {
  const colours = coloursOf(text);
  const colour = (name: string): Colour => colours[name] ?? [0, 0, 0];

  test.each(['ink', 'soft', 'hand', 'good', 'bad', 'tight', 'focus'])(
    '%s reads as text on paper, card and well',
    (name) => {
      for (const ground of ['paper', 'card', 'well'])
        expect(contrast(colour(name), colour(ground)), ground).toBeGreaterThanOrEqual(4.5);
    },
  );

  test.each([0, 1, 2, 3, 4, 5, 6].map((kind) => `kind-${kind}`))('%s stands out from the card', (name) => {
    expect(contrast(colour(name), colour('card'))).toBeGreaterThanOrEqual(3);
  });

  test.each(Object.keys(BLIND))('the first four phase counts of one architecture differ for the eye %s', (eye) => {
    const seen = [0, 1, 2, 3].map((kind) => (BLIND[eye] ?? ((c: Colour) => c))(colour(`kind-${kind}`)));
    for (let i = 0; i < 4; i++)
      for (let j = 0; j < i; j++)
        expect(distance(seen[i] ?? [0, 0, 0], seen[j] ?? [0, 0, 0]), `${j} and ${i}`).toBeGreaterThan(10);
  });

  test('the shades run one way in lightness, so that they read in grey', () => {
    const levels = [0, 1, 2, 3, 4, 5].map((shade) => luminance(colour(`shade-${shade}`)));
    const steps = levels.slice(1).map((level, i) => Math.sign(level - (levels[i] ?? 0)));
    expect(new Set(steps).size).toBe(1);
  });
});
