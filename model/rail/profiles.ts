/** Ready-made load profiles by their published names. */
import type { LoadPoint } from './rail.ts';

const points = (...pairs: readonly (readonly [number, number])[]): readonly LoadPoint[] =>
  pairs.map(([fraction, share]) => ({ fraction, share }));

/**
 * Loads and weights. `cec`: California Energy Commission; `european`: the European weights; both as weighted efficiencies of
 * photovoltaic inverters are stated. `average-25-50-75-100`: external supplies (Commission Regulation (EU) 2019/1782).
 * `points-10-20-50-100`: the load points of server supplies, here with equal weights (from memory).
 */
export const PROFILES = {
  'full-load': points([1, 1]),
  'average-25-50-75-100': points([0.25, 0.25], [0.5, 0.25], [0.75, 0.25], [1, 0.25]),
  'points-10-20-50-100': points([0.1, 0.25], [0.2, 0.25], [0.5, 0.25], [1, 0.25]),
  cec: points([0.1, 0.04], [0.2, 0.05], [0.3, 0.12], [0.5, 0.21], [0.75, 0.53], [1, 0.05]),
  european: points([0.05, 0.03], [0.1, 0.06], [0.2, 0.13], [0.3, 0.1], [0.5, 0.48], [1, 0.2]),
} as const satisfies Record<string, readonly LoadPoint[]>;
export type ProfileName = keyof typeof PROFILES;
export const PROFILE_NAMES: readonly ProfileName[] = Object.keys(PROFILES) as ProfileName[];
