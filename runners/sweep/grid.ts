/** What fixes the archives and measures of a problem: read from its objectives, never from values found. */
import {
  type ArchiveGrid,
  createHypervolume,
  type Designs,
  type NearMissGrid,
  selectSubset,
  type Widths,
} from '../../optimizer/index.ts';
import type { Problem } from '../../optimizer/problem.ts';
import type { Measure } from './measure.ts';

/** A design that misses its one broken limit by at most this share is a near miss. */
const NEAR = 0.5;

/** Widths of the problem's rows. */
export function widthsOf(problem: Problem): Widths {
  return { genes: problem.genes.length, objectives: problem.objectives.length, violations: problem.limits.length };
}

/** Grid of the archive of feasible designs. */
export function archiveGrid(problem: Problem): ArchiveGrid {
  const { objectives } = problem;
  return {
    ...widthsOf(problem),
    ideal: Float64Array.from(objectives, (objective) => objective.ideal),
    resolution: Float64Array.from(objectives, (objective) => objective.resolution),
  };
}

/** Grid of the archive of near misses. */
export function nearMissGrid(problem: Problem): NearMissGrid {
  const { objectives } = problem;
  return {
    ...widthsOf(problem),
    ideal: Float64Array.from(objectives, (objective) => objective.ideal),
    reference: Float64Array.from(objectives, (objective) => objective.reference),
    share: NEAR,
  };
}

/** Size, hypervolume (normalised to the box from ideal to reference) and best values of a set of feasible designs. */
export function measureDesigns(problem: Problem, designs: Designs): Measure {
  const { objectives } = problem;
  const m = objectives.length;
  const rows = Int32Array.from({ length: designs.count }, (_, i) => i);
  const scaled = scale(problem, designs);
  const one = new Float64Array(m).fill(1);
  const hypervolume =
    designs.count === 0 ? 0 : createHypervolume(designs.count, m).volume(scaled, rows, designs.count, one);
  const best = designs.count === 0 ? [] : objectives.map((_, c) => smallest(designs, m, c));
  return { frontSize: designs.count, hypervolume, best };
}

/** Rows of the at most `keep` designs that together dominate most, ascending; the best in each objective are among them. */
export function chooseFront(problem: Problem, designs: Designs, keep: number): readonly number[] {
  const m = problem.objectives.length;
  const rows = undominated(designs, m);
  if (rows.length <= keep) return [...rows];
  const one = new Float64Array(m).fill(1);
  const chosen = new Set(selectSubset(scale(problem, designs), rows, rows.length, Math.max(1, keep - m), one, m) ?? []);
  for (let c = 0; c < m; c++) {
    const best = rows.reduce((a, b) =>
      (designs.objectives[b * m + c] ?? 0) < (designs.objectives[a * m + c] ?? 0) ? b : a,
    );
    chosen.add(best);
  }
  return [...chosen].sort((a, b) => a - b);
}

/** Genes of row `i`. */
export function genesOf(designs: Designs, width: number, i: number): Float64Array {
  return designs.genes.slice(i * width, (i + 1) * width);
}

function scale(problem: Problem, designs: Designs): Float64Array {
  const { objectives } = problem;
  const m = objectives.length;
  const scaled = new Float64Array(designs.count * m);
  for (let i = 0; i < scaled.length; i++) {
    const objective = objectives[i % m];
    if (objective === undefined) continue;
    scaled[i] = ((designs.objectives[i] ?? 0) - objective.ideal) / (objective.reference - objective.ideal);
  }
  return scaled;
}

function smallest(designs: Designs, m: number, c: number): number {
  let best = Number.POSITIVE_INFINITY;
  for (let i = 0; i < designs.count; i++) best = Math.min(best, designs.objectives[i * m + c] ?? best);
  return best;
}

// An archive keeps one design a cell and each extreme, so a few members may dominate others; a front must not.
function undominated(designs: Designs, m: number): Int32Array {
  const { count, objectives } = designs;
  const order = Array.from({ length: count }, (_, i) => i);
  const kept = order.filter((i) => !order.some((j) => j !== i && beats(objectives, m, j, i)));
  return Int32Array.from(kept);
}

function beats(objectives: Float64Array, m: number, a: number, b: number): boolean {
  let better = false;
  for (let c = 0; c < m; c++) {
    const x = objectives[a * m + c] ?? 0;
    const y = objectives[b * m + c] ?? 0;
    if (x > y) return false;
    if (x < y) better = true;
  }
  // Of designs with the same objectives only the first stays.
  return better || a < b;
}
