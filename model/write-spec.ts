/** Writes a spec. It stands apart from the schema so that the page, which only writes specs, need not carry the schema's library. */
import type { RailProblem } from './problem.ts';
import type { Spec } from './spec.ts';
import { MODEL_VERSION } from './version.ts';

/** The spec of the design of `genes`. */
export function writeSpec(problem: RailProblem, genes: Float64Array): Spec {
  const assessment = problem.assess(genes);
  const { design } = assessment;
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
    tolerances: { ...problem.rail.tolerances },
    cautions: [...assessment.cautions],
  };
}
