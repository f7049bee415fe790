/** Shapes a published test problem into a `Problem` of the search, by the same rule for all. */
import { type Gene, ONE_FAMILY, type Problem } from '../../../optimizer/index.ts';

/** A published test problem and what is known of its front. */
export interface Published {
  readonly problem: Problem;
  /** Smallest and largest value of each objective on the true front. */
  readonly ideal: readonly number[];
  readonly nadir: readonly number[];
}

/** What a test problem states. */
export interface Statement {
  readonly name: string;
  readonly genes: readonly Gene[];
  readonly ideal: readonly number[];
  readonly nadir: readonly number[];
  readonly limits?: readonly string[];
  readonly snap?: (genes: Float64Array) => void;
  readonly evaluate: (genes: Float64Array, objectives: Float64Array, violations: Float64Array) => void;
}

/** Cells of the archive grid along the range of each objective's true front. */
const CELLS = 10000;

/** Builds the problem: hypervolume reference at 1.1 of the front's range, archive cells of a 2000th of it. */
export function publish(statement: Statement): Published {
  const { name, genes, ideal, nadir, limits = [], snap = () => {}, evaluate } = statement;
  const objectives = ideal.map((low, i) => ({
    name: `f${i + 1}`,
    unit: '',
    resolution: (nadir[i] - low) / CELLS,
    ideal: low,
    reference: low + 1.1 * (nadir[i] - low),
  }));
  return {
    problem: { name, genes, objectives, limits, families: ONE_FAMILY, seeds: [], snap, evaluate },
    ideal,
    nadir,
  };
}

/** `count` real genes from `low` to `high`, named x1, x2, … from `first` on. */
export function reals(count: number, low: number, high: number, first = 1): Gene[] {
  return Array.from({ length: count }, (_, i) => ({ name: `x${i + first}`, unit: '', kind: 'real', low, high }));
}
