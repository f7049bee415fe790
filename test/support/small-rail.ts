/**
 * Converter spaces small enough to be judged whole: the demo's rail with a handful of parts, its switching frequency on a coarse grid. What the search finds in
 * them can be held against every design there is.
 */

import { GENE } from '../../model/genes.ts';
import { createRailProblem } from '../../model/problem.ts';
import { createArchive, packArchive } from '../../optimizer/archive/index.ts';
import type { Designs, Problem } from '../../optimizer/index.ts';
import { archiveGrid } from '../../optimizer/world.ts';
import { builtInTables, shippedRail } from '../model/shipped.ts';
import { need } from '../model/support.ts';

/** How large the space is to be. */
export interface SmallSpace {
  /** Names of the parts that may be used, all kinds together. */
  readonly parts: readonly string[];
  /** Most ceramics at the output and at the input, each. */
  readonly ceramics: number;
  /** Switching frequencies, rising, Hz. */
  readonly frequencies: readonly number[];
}

/** The space of the demo's rail cut down: one phase, a synchronous buck, single switches, no bulk capacitors. */
export function smallProblem({ parts, ceramics, frequencies }: SmallSpace): Problem {
  const rail = shippedRail('buoy-sensors');
  const problem = need(
    createRailProblem(
      {
        ...rail,
        parts: { ...rail.parts, preferred: parts },
        search: {
          ...rail.search,
          architectures: ['buck-synchronous'],
          phases: { minimum: 1, maximum: 1 },
          frequency: { minimum: Math.min(...frequencies), maximum: Math.max(...frequencies) },
          parallelSwitches: 1,
          ceramics,
          bulks: 0,
        },
      },
      builtInTables(),
    ),
  );
  const { name, genes, objectives, limits, families } = problem;
  return {
    name,
    genes,
    objectives,
    limits,
    families,
    seeds: [],
    snap(design) {
      problem.snap(design);
      design[GENE.frequency] = nearest(frequencies, design[GENE.frequency]);
    },
    evaluate: (design, values, violations) => problem.evaluate(design, values, violations),
  };
}

/** Every design of a small problem, judged: how many there are, how many keep all limits, and their front. */
export function judgeAll(
  problem: Problem,
  frequencies: readonly number[],
): { readonly designs: number; readonly feasible: number; readonly front: Designs } {
  const archive = createArchive(archiveGrid(problem));
  const objectives = new Float64Array(problem.objectives.length);
  const violations = new Float64Array(problem.limits.length);
  const snapped = new Float64Array(problem.genes.length);
  let designs = 0;
  let feasible = 0;
  const values = problem.genes.map((gene, g) =>
    g === GENE.frequency ? frequencies : g === GENE.inductance ? inductances(problem) : wholeRange(gene.low, gene.high),
  );
  walk(values, (design) => {
    snapped.set(design);
    problem.snap(snapped);
    // A design stands for itself only where snapping leaves it as it is: every other one is counted where it lands.
    if (snapped.some((value, g) => value !== design[g])) return;
    designs++;
    problem.evaluate(snapped, objectives, violations);
    if (violations.some((violation) => violation > 0)) return;
    feasible++;
    archive.insert(snapped, objectives, violations, 0);
  });
  return { designs, feasible, front: packArchive(archive) };
}

/** All inductances that stocked rows have: found by snapping a fine sweep in every series. */
function inductances(problem: Problem): readonly number[] {
  const found = new Set<number>();
  const { low, high } = problem.genes[GENE.inductance];
  const design = Float64Array.from(problem.genes, (gene) => gene.low);
  for (let series = 0; series <= problem.genes[GENE.inductorSeries].high; series++) {
    for (let k = 0; k <= 400; k++) {
      design[GENE.inductorSeries] = series;
      design[GENE.inductance] = low * (high / low) ** (k / 400);
      problem.snap(design);
      found.add(design[GENE.inductance]);
    }
  }
  return [...found].sort((a, b) => a - b);
}

function wholeRange(low: number, high: number): readonly number[] {
  return Array.from({ length: high - low + 1 }, (_, k) => low + k);
}

/** Calls `visit` with every combination of the values of all genes. */
function walk(values: readonly (readonly number[])[], visit: (design: Float64Array) => void): void {
  const design = new Float64Array(values.length);
  const turn = (g: number): void => {
    if (g === values.length) visit(design);
    else
      for (const value of values[g]) {
        design[g] = value;
        turn(g + 1);
      }
  };
  turn(0);
}

function nearest(list: readonly number[], value: number): number {
  return list.reduce((best, each) => (Math.abs(each - value) < Math.abs(best - value) ? each : best));
}
