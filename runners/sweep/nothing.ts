/** When nothing keeps every limit: which limits stood in the way, by how much, and the designs that came nearest. */
import type { RailProblem } from '../../model/index.ts';
import type { Designs } from '../../optimizer/index.ts';
import { spoken } from '../../viz/labels.ts';
import { percent } from '../progress/figures.ts';
import { table } from '../terminal/table.ts';

const NEAREST = 5;

/** The explanation as lines of text; `designs` are all that the search has at hand, feasible or not. */
export function explainNothing(problem: RailProblem, designs: Designs): string {
  const near = nearest(designs, problem.limits.length);
  if (near.length === 0) return 'no design could be computed at all';
  const width = problem.genes.length;
  const broken = limitsInTheWay(problem, designs, near);
  const rows = near.map((row) => describe(problem, designs.genes.slice(row * width, (row + 1) * width)));
  return [
    'limits in the way, in the designs that came nearest:',
    ...table([{ head: '' }, { head: '' }], broken),
    'nearest designs:',
    ...table([{ head: 'id' }, { head: 'family' }, { head: 'breaks' }], rows),
  ].join('\n');
}

function nearest(designs: Designs, limits: number): number[] {
  const sums = Array.from({ length: designs.count }, (_, row) => {
    const own = designs.violations.subarray(row * limits, (row + 1) * limits);
    return own.reduce((sum, violation) => sum + Math.max(0, violation), 0);
  });
  const rows = sums.map((_, row) => row).filter((row) => Number.isFinite(sums[row]));
  return rows.sort((a, b) => (sums[a] ?? 0) - (sums[b] ?? 0) || a - b).slice(0, NEAREST);
}

function limitsInTheWay(problem: RailProblem, designs: Designs, near: readonly number[]): string[][] {
  const k = problem.limits.length;
  const worst = problem.limits.map((name, i) => {
    const values = near.map((row) => designs.violations[row * k + i] ?? 0).filter((value) => value > 0);
    return { name, count: values.length, least: values.length === 0 ? 0 : Math.min(...values) };
  });
  return worst
    .filter((limit) => limit.count > 0)
    .sort((a, b) => b.count - a.count || b.least - a.least)
    .map(({ name, count, least }) => [
      spoken(name),
      `broken by ${count} of ${near.length}, by ${percent(least)} or more`,
    ]);
}

function describe(problem: RailProblem, genes: Float64Array): string[] {
  const { id, family, limits } = problem.assess(genes);
  const broken = limits.filter((limit) => limit.violation > 0).sort((a, b) => b.violation - a.violation);
  return [id, family, broken.map((limit) => `${spoken(limit.name)} by ${percent(limit.violation)}`).join(', ')];
}
