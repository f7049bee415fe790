/** Rail sheets: reading, canonical form, differences, starter and shipped sheets. */
export { canonicalRail } from './canonical.ts';
export { DEFAULTS, type SheetDefault } from './defaults.ts';
export { diffRails } from './diff.ts';
export { LARGEST_SHEET } from './document.ts';
export { PROFILE_NAMES, PROFILES, type ProfileName } from './profiles.ts';
export { readRail } from './read.ts';
export { SHIPPED_RAILS } from './shipped.ts';
export { starterSheet } from './starter.ts';
