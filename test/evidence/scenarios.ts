/** Evidence by search: what sweeps of minutes say about the shipped sheets and the trends. Seeded, so the figures come again. */
import type { Section } from '../reference/markdown.ts';
import { heatSection } from './heat.ts';
import { ratioSection } from './high-ratio.ts';
import { rippleSection } from './ripple.ts';
import { sheetSections } from './sheets.ts';

/** All sections by search, one after the other. */
export function scenarioSections(): readonly Section[] {
  return [...sheetSections(), ratioSection(), heatSection(), rippleSection()];
}
