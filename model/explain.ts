/** What can be said of a sheet before any search: derived facts, which architectures can serve it, the baseline, cautions. */
import { cautionsOf, NOT_COVERED } from './cautions.ts';
import type { Outcome } from './outcome.ts';
import { good } from './outcome.ts';
import type { Controller } from './parts/controller.ts';
import type { PartsTables } from './parts/tables.ts';
import { createRailProblem } from './problem.ts';
import { formatQuantity } from './quantity/index.ts';
import type { Rail } from './rail/rail.ts';
import type { Stage } from './stages/contract.ts';
import type { Architecture } from './stages/list.ts';
import { stageOf } from './stages/list.ts';

/** A named line of text. */
export interface Fact {
  readonly name: string;
  readonly text: string;
}

/** Whether an architecture can serve the rail, and why not. */
export interface ArchitectureVerdict {
  readonly name: Architecture;
  readonly possible: boolean;
  /** Duty range where it can; the reason where it cannot. */
  readonly reason: string;
}

export interface RailExplanation {
  readonly facts: readonly Fact[];
  readonly architectures: readonly ArchitectureVerdict[];
  /** The series regulator that the converter must beat: efficiency Vo/Vi and loss at full load, nominal input. */
  readonly baseline: { readonly efficiency: number; readonly loss: number };
  /** Number of designs in the space (frequency at three digits). */
  readonly spaceSize: number;
  readonly cautions: readonly string[];
  readonly notCovered: readonly string[];
}

/** Explains `rail` over `tables`; the findings of a rail that no design can serve come back as they are. */
export function explainRail(rail: Rail, tables: PartsTables): Outcome<RailExplanation> {
  const problem = createRailProblem(rail, tables);
  if (!problem.ok) return problem;
  const efficiency = rail.output.nominal / rail.input.nominal;
  const power = rail.output.nominal * rail.output.current;
  return good({
    facts: facts(rail),
    architectures: rail.search.architectures.map((name) => verdict(rail, name, problem.value.catalogue.controllers)),
    baseline: { efficiency, loss: power * (1 / efficiency - 1) },
    spaceSize: spaceSize(problem.value.genes),
    cautions: cautionsOf(rail),
    notCovered: NOT_COVERED,
  });
}

function facts(rail: Rail): Fact[] {
  const power = rail.output.nominal * rail.output.current;
  const ratio = (vi: number, vo: number): string => (vi / vo).toPrecision(3);
  const list: Fact[] = [
    { name: 'full-load power', text: formatQuantity(power, 'W') },
    {
      name: 'step-down ratio',
      text: `${ratio(rail.input.minimum, rail.output.maximum)} to ${ratio(rail.input.maximum, rail.output.minimum)}`,
    },
    {
      name: 'full-load input current at minimum input, without loss',
      text: formatQuantity((rail.output.maximum * rail.output.current) / rail.input.minimum, 'A'),
    },
    { name: 'mean load of the profile', text: `${(meanLoad(rail) * 100).toPrecision(3)} %` },
  ];
  const { frequency } = rail.search;
  const shortest = rail.output.minimum / (rail.input.maximum * frequency.maximum);
  list.push({
    name: 'on-time of a plain buck at maximum input and the highest frequency searched',
    text: formatQuantity(shortest, 's'),
  });
  if (rail.step !== undefined) {
    list.push({
      name: 'capacitance that would carry the load step alone for one period of the lowest frequency searched',
      text: formatQuantity(rail.step.current / (rail.step.deviation * frequency.minimum), 'F'),
    });
  }
  return list;
}

function meanLoad(rail: Rail): number {
  return rail.profile.reduce((sum, point) => sum + point.share * Math.abs(point.fraction), 0);
}

function verdict(rail: Rail, name: Architecture, controllers: readonly Controller[]): ArchitectureVerdict {
  const stage = stageOf(name);
  if (stage === undefined) return { name, possible: false, reason: 'this architecture is not modelled yet' };
  const refusal = stage.refusal(rail);
  if (refusal !== undefined) return { name, possible: false, reason: refusal };
  if (stage.form !== undefined) return { name, possible: true, reason: turnsReason(rail, stage) };
  return buckVerdict(rail, stage, controllers);
}

/** Duty range of a buck, and the highest frequency that the shortest on-time of its controllers lets it reach. */
function buckVerdict(rail: Rail, stage: Stage, controllers: readonly Controller[]): ArchitectureVerdict {
  const name = stage.architecture;
  const low = stage.idealDuty(rail.input.maximum, rail.output.minimum, 1);
  const high = stage.idealDuty(rail.input.minimum, rail.output.maximum, 1);
  const duty = `duty ${percent(low)} to ${percent(high)}`;
  const own = controllers.filter((row) => row.stages.includes(stage.control)).map((row) => row.minimumOnTime);
  if (own.length === 0) return { name, possible: false, reason: `${duty}, but no controller of the tables can run it` };
  const shortest = Math.max(Math.min(...own), rail.limits.minimumOnTime ?? 0);
  if (!(shortest > 0)) return { name, possible: true, reason: duty };
  const highest = low / shortest;
  const bound = `the shortest on-time, ${formatQuantity(shortest, 's')}, allows at most ${formatQuantity(highest, 'Hz')}`;
  if (highest >= rail.search.frequency.minimum) return { name, possible: true, reason: `${duty}; ${bound}` };
  const searched = `the search starts at ${formatQuantity(rail.search.frequency.minimum, 'Hz')}`;
  return { name, possible: false, reason: `${duty}: at maximum input ${bound}, and ${searched}` };
}

function percent(share: number): string {
  return `${(share * 100).toPrecision(3)} %`;
}

/** Turns ratio with which a transformer stage reaches its highest duty at minimum input, and the duty left at maximum input. */
function turnsReason(rail: Rail, stage: Stage): string {
  const perRatio = stage.idealDuty(rail.input.minimum, rail.output.maximum, 1);
  const ratio = (0.9 * stage.highestDuty) / perRatio;
  const low = stage.idealDuty(rail.input.maximum, rail.output.minimum, ratio);
  return `turns ratio up to about ${ratio.toPrecision(3)}; duty then ${(low * 100).toPrecision(3)} % at maximum input`;
}

function spaceSize(genes: readonly { kind: string; low: number; high: number; name: string }[]): number {
  let size = 1;
  for (const gene of genes) {
    if (gene.name === 'inductance') continue;
    if (gene.name === 'frequency') size *= threeDigitValues(gene.low, gene.high);
    else size *= gene.high - gene.low + 1;
  }
  return size;
}

/** How many three-digit values lie between two frequencies. */
function threeDigitValues(low: number, high: number): number {
  let count = 1;
  let decade = 1;
  while (decade * 1000 <= low) decade *= 10;
  for (let value = low; value < high; ) {
    const step = decade;
    const end = Math.min(high, decade * 1000);
    count += Math.floor((end - value) / step);
    value = end;
    decade *= 10;
  }
  return count;
}
