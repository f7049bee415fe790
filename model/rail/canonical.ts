/** A rail as canonical text, for hashing and for telling two sheets apart. */
import { canonicalText } from '../canonical.ts';
import type { Rail } from './rail.ts';

/** Stable JSON of the rail in SI units: the same for the same requirements, however the sheet was written. */
export function canonicalRail(rail: Rail): string {
  return canonicalText(rail);
}
