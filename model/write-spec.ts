/** Writes a spec. It stands apart from the schema so that the page, which only writes specs, need not carry the schema's library. */
import type { PointReport } from './assessment.ts';
import { loopAt } from './handoff/loop.ts';
import { fullLoad, type SolvedPoint, solveAt } from './handoff/solved-point.ts';
import { waveformFigures } from './handoff/waveform-figures.ts';
import type { RailProblem } from './problem.ts';
import type { Rail } from './rail/rail.ts';
import type { Spec } from './spec.ts';
import { MODEL_VERSION } from './version.ts';

/** Hashes of the canonical sheet and parts that a design belongs to. */
export interface SpecHashes {
  readonly rail: string;
  readonly parts: string;
}

/** The spec of the design of snapped `genes`; `hashes` are those of its run, where there is one. */
export function writeSpec(problem: RailProblem, genes: Float64Array, hashes?: SpecHashes): Spec {
  const assessment = problem.assess(genes);
  const { design } = assessment;
  const point = solveAt(problem, genes, fullLoad(problem.rail));
  return {
    format: 'chopfront-spec',
    version: 1,
    tool: MODEL_VERSION,
    id: assessment.id,
    rail: problem.rail.name,
    architecture: design.architecture,
    genes: { ...design.genes },
    parts: { ...design.parts },
    partsList: assessment.parts.map(({ slot, name, count, cost }) => ({ slot, name, count, cost })),
    feasible: assessment.feasible,
    objectives: assessment.objectives.map((objective) => ({ ...objective })),
    limits: assessment.limits.map(({ name, unit, value, allowed, margin }) => ({ name, unit, value, allowed, margin })),
    points: assessment.points
      .filter((report) => report.share > 0)
      .map(({ losses, traces, inputPower, ...kept }) => ({ ...kept, temperatures: { ...kept.temperatures } })),
    losses: assessment.losses.map((loss) => ({ ...loss })),
    requirement: requirementOf(problem.rail),
    waveforms: waveformFigures(point).map((figures) => ({ ...figures })),
    ...compensatorOf(point),
    temperatures: hottest(assessment.points),
    ...(hashes === undefined ? {} : { hashes: { rail: hashes.rail, parts: hashes.parts } }),
    tolerances: { ...problem.rail.tolerances },
    cautions: [...assessment.cautions],
  };
}

/** The loop as the spec holds it; nothing where no crossover is found. */
function compensatorOf(point: SolvedPoint): Pick<Spec, 'compensator'> {
  const { crossover, phaseMargin, parts } = loopAt(point);
  if (!Number.isFinite(crossover)) return {};
  return { compensator: { form: 'type-III', crossover, phaseMargin: (180 / Math.PI) * phaseMargin, ...parts } };
}

function requirementOf(rail: Rail): Record<string, number> {
  const { input, output, step, limits } = rail;
  return {
    inputMinimum: input.minimum,
    inputNominal: input.nominal,
    inputMaximum: input.maximum,
    outputMinimum: output.minimum,
    outputNominal: output.nominal,
    outputMaximum: output.maximum,
    outputCurrent: output.current,
    outputRipple: output.ripple,
    ...(input.ripple === undefined ? {} : { inputRipple: input.ripple }),
    ...(step === undefined ? {} : { stepCurrent: step.current, stepSlew: step.slew, stepDeviation: step.deviation }),
    ambient: rail.ambient,
    airSpeed: rail.airSpeed,
    coolingArea: rail.coolingArea,
    ...Object.fromEntries(Object.entries(limits).filter(([, value]) => typeof value === 'number')),
    quantity: rail.quantity,
  };
}

/** Highest temperature of each part over `points`, K. */
export function hottest(points: readonly PointReport[]): Record<string, number> {
  const highest: Record<string, number> = {};
  for (const { temperatures } of points) {
    for (const [part, value] of Object.entries(temperatures)) highest[part] = Math.max(value, highest[part] ?? 0);
  }
  return highest;
}
