/** Measures and choices on sets of designs of a problem: what the history, the record and the front file need. */
import { chooseSubset, type Designs, hypervolumeOf } from '../../optimizer/index.ts';
import type { Problem } from '../../optimizer/problem.ts';
import type { Measure } from './measure.ts';

/** Size, hypervolume (normalised to the box from ideal to reference) and best values of a set of feasible designs. */
export function measureDesigns(
  problem: Problem,
  designs: Designs,
  volumeOf = (front: Designs): number => hypervolumeOf(problem, front),
): Measure {
  const { objectives } = problem;
  const hypervolume = designs.count === 0 ? 0 : volumeOf(designs);
  const best = designs.count === 0 ? [] : objectives.map((_, c) => smallest(designs, objectives.length, c));
  return { frontSize: designs.count, hypervolume, best };
}

/** Gene vectors of at most `keep` designs that together dominate most; the best in each objective are among them. */
export function chooseFront(problem: Problem, designs: Designs, keep: number): Float64Array[] {
  const m = problem.objectives.length;
  const width = problem.genes.length;
  const front = undominated(designs, width, m);
  const all = rowsOf(front, width);
  if (front.count <= keep) return all;
  const chosen = rowsOf(chooseSubset(front, Math.max(1, keep - m)), width);
  const known = new Set(chosen.map(String));
  for (let c = 0; c < m; c++) {
    const best = all[extreme(front, m, c)];
    if (best === undefined || known.has(String(best))) continue;
    known.add(String(best));
    chosen.push(best);
  }
  return chosen;
}

/** Gene vectors of a set, one a design. */
export function rowsOf(designs: Designs, width: number): Float64Array[] {
  return Array.from({ length: designs.count }, (_, i) => designs.genes.slice(i * width, (i + 1) * width));
}

function smallest(designs: Designs, m: number, c: number): number {
  return designs.objectives[extreme(designs, m, c) * m + c] ?? Number.NaN;
}

function extreme({ count, objectives }: Designs, m: number, c: number): number {
  let best = 0;
  for (let i = 1; i < count; i++) {
    if ((objectives[i * m + c] ?? Infinity) < (objectives[best * m + c] ?? Infinity)) best = i;
  }
  return best;
}

// An archive keeps one design a cell and each extreme, so a few members may dominate others; a front must not.
function undominated(designs: Designs, width: number, m: number): Designs {
  const { count, genes, objectives } = designs;
  const kept: number[] = [];
  for (let i = 0; i < count; i++) {
    let beaten = false;
    for (let j = 0; j < count && !beaten; j++) beaten = j !== i && beats(objectives, m, j, i);
    if (!beaten) kept.push(i);
  }
  return {
    count: kept.length,
    genes: Float64Array.from(kept.flatMap((i) => [...genes.subarray(i * width, (i + 1) * width)])),
    objectives: Float64Array.from(kept.flatMap((i) => [...objectives.subarray(i * m, (i + 1) * m)])),
    violations: new Float64Array(0),
  };
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
