/** Weighted efficiencies by their published names. */
import { PROFILES, type ProfileName } from '../../model/rail/profiles.ts';
import type { SourceId } from '../../model/sources.ts';
import { type CaseGroup, make } from './case.ts';

/** Efficiency by load, made up for this check. */
const EFFICIENCY: Readonly<Record<number, number>> = {
  0.05: 0.86,
  0.1: 0.9,
  0.2: 0.93,
  0.25: 0.944,
  0.3: 0.945,
  0.5: 0.955,
  0.75: 0.957,
  1: 0.95,
};

function weighted(name: ProfileName): number {
  return PROFILES[name].reduce((sum, { fraction, share }) => sum + share * EFFICIENCY[fraction], 0);
}

const SCHEMES: readonly (readonly [ProfileName, SourceId, string, number])[] = [
  ['european', 'european-weights', 'weights of 5, 10, 20, 30, 50, 100 %', 0.9436],
  ['cec', 'cec-weights', 'weights of 10, 20, 30, 50, 75, 100 %', 0.95116],
  ['average-25-50-75-100', 'eu-2019-1782', 'mean of 25, 50, 75, 100 %', 0.9515],
];

export const PROFILE_CASES: readonly CaseGroup[] = [
  {
    title: 'Weighted efficiency',
    cases: SCHEMES.map(([name, source, place, expected]) =>
      make({ source, place, unit: '1', mark: 'computed', tolerance: 1e-9 }, name, expected, () => weighted(name)),
    ),
  },
];
