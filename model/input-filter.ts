/**
 * The input filter: the choke that keeps ripple current out of the source, chosen from the stocked inductors once the worst
 * ripple of a design is known, and whether filter and source together stay stable before the converter's negative resistance.
 */
import type { Bank } from './capacitors/index.ts';
import type { Design } from './design.ts';
import type { Inductor } from './parts/inductor.ts';
import type { Rail } from './rail/rail.ts';

/** Efficiency assumed for the input current that a choke must carry. */
const EFFICIENCY = 0.9;
/** Points at which the impedance is looked at, and the span of frequency around the corner that they cover. */
const POINTS = 33;
const SPAN = 8;
/** Those frequencies over the corner, and their inverses. */
const RATIOS = Float64Array.from({ length: POINTS }, (_, i) => 1 / SPAN + (i / (POINTS - 1)) * (SPAN - 1 / SPAN));
const PER_RATIO = RATIOS.map((ratio) => 1 / ratio);

/**
 * Inductance, H, that lets `allowed` A peak to peak of a bank ripple of `ripple` V peak to peak at `frequency` Hz into the source:
 * V/(2π·f·I), the whole ripple taken as its fundamental.
 * @derivation impedance of an inductor at the fundamental; higher harmonics see more
 * @valid source impedance small at the ripple frequency
 * @example filterInductance(0.1, 500000, 0.01) = 3.1830989e-6
 */
export function filterInductance(ripple: number, frequency: number, allowed: number): number {
  return ripple / (2 * Math.PI * frequency * allowed);
}

/**
 * Input current that a filter choke of `rail` carries at full load and lowest input, A.
 * @derivation power balance at the lowest input with a stated efficiency
 * @valid efficiency near 0.9
 */
export function filterCurrent(rail: Rail): number {
  return (rail.output.maximum * rail.output.current) / (EFFICIENCY * rail.input.minimum);
}

/** The smallest of `rows` (by rising volume) that holds `inductance` (H) at its low tolerance and carries `current` (A). */
export function chooseFilterChoke(
  rows: readonly Inductor[],
  inductance: number,
  current: number,
): Inductor | undefined {
  for (const row of rows) {
    const holds = row.inductance * (1 - row.tolerance) >= inductance;
    if (holds && row.ratedCurrent >= current && row.saturationCurrent >= 1.2 * current) return row;
  }
  return undefined;
}

/** What stands between an ideal source and the input bank of a design, and how it peaks. Reused. */
export class SourcePath {
  /** Ω, H. */
  resistance = 0.5;
  inductance = 0.5;
  /** Largest impedance that it and the bank show the converter, Ω. */
  peak = 0.5;
}

/**
 * Fills `path` with source and filter choke of `design`, and with the peak before `bank`; no peak without inductance.
 * @derivation resistances and inductances in series add
 * @valid choke not saturated
 */
export function findSourcePath(path: SourcePath, design: Design, rail: Rail, bank: Bank): void {
  path.resistance = rail.input.sourceResistance;
  path.inductance = rail.input.sourceInductance;
  if (design.filterChoke !== undefined) {
    path.resistance += design.filterChoke.dcResistance;
    path.inductance += design.filterChoke.inductance;
  }
  if (path.inductance > 0) findPeak(path, bank);
}

/**
 * Largest impedance, Ω, that source, filter choke and input bank show the converter: |(R + jωL) ‖ bank| over frequencies about the
 * corner.
 * @source middlebrook-1976
 * @valid inductance above 0
 */
function findPeak(path: SourcePath, bank: Bank): void {
  const { resistance, inductance } = path;
  const { c1, r1, c2, r2 } = bank;
  const corner = 1 / Math.sqrt(inductance * (c1 + c2));
  const reactance = corner * inductance;
  const first = -1 / (corner * c1);
  const second = c2 > 0 ? -1 / (corner * c2) : 0;
  let least = Number.POSITIVE_INFINITY;
  for (let i = 0; i < POINTS; i++) {
    // Admittances of the source branch and of both capacitor groups add.
    const x = RATIOS[i] * reactance;
    const x1 = PER_RATIO[i] * first;
    const y = 1 / (resistance * resistance + x * x);
    const y1 = 1 / (r1 * r1 + x1 * x1);
    let re = resistance * y + r1 * y1;
    let im = x * y + x1 * y1;
    if (c2 > 0) {
      const x2 = PER_RATIO[i] * second;
      const y2 = 1 / (r2 * r2 + x2 * x2);
      re += r2 * y2;
      im += x2 * y2;
    }
    least = Math.min(least, re * re + im * im);
  }
  path.peak = 1 / Math.sqrt(least);
}
