/** Helpers of the sheet tests: shipped sheets as text, and findings as a person sees them. */
import { readFileSync } from 'node:fs';
import { describeFinding } from '../../../model/outcome.ts';
import type { Rail } from '../../../model/rail/rail.ts';
import { readRail } from '../../../model/rail/read.ts';

/** A small sound sheet. */
export const SOUND = `rail: test
input:
  voltage: {min: 18 V, nominal: 24 V, max: 32 V}
output:
  voltage: 5 V
  current: 6 A
  ripple: 30 mV
`;

/** Text of a shipped sheet. */
export function shipped(file: string): string {
  return readFileSync(new URL(`../../../model/rails/${file}`, import.meta.url), 'utf8');
}

/** The rail of a text that must read clean. */
export function railOf(text: string): Rail {
  const outcome = readRail(text, 'rail.yaml');
  if (!outcome.ok) throw new Error(outcome.findings.map(describeFinding).join('\n'));
  return outcome.value;
}

/** The messages of a text that must not. */
export function complaints(text: string): readonly string[] {
  const outcome = readRail(text, 'rail.yaml');
  return outcome.ok ? [] : outcome.findings.map(describeFinding);
}
