/** The search on the demo's rail: what it finds beyond random feasible designs, and what it costs beside the model. */
import { createArchive, packArchive } from '../../optimizer/archive/index.ts';
import {
  createPlan,
  hypervolumeOf,
  NO_DESIGNS,
  type Problem,
  search,
  startIslands,
  step,
} from '../../optimizer/index.ts';
import { restoreRandom, seedRandom } from '../../optimizer/random.ts';
import { createSpace, LINE, toGenes } from '../../optimizer/variation/index.ts';
import { archiveGrid } from '../../optimizer/world.ts';
import { shippedProblem } from '../model/shipped.ts';
import { judgeAll, smallProblem } from '../support/small-rail.ts';
import { SMALL_PARTS } from '../support/small-spaces.ts';

/** Figures of the demo's rail. */
export interface ConverterFigures {
  /** Hypervolume after 200,000 evaluations of the search, seed 1, islands as a sheet has them. */
  readonly searched: number;
  /** The same with seeds 1 … N, and how far the best lies above the worst, as a part of the worst. */
  readonly seeds: readonly number[];
  readonly spread: number;
  /** Random designs drawn, and the hypervolume of those that kept every limit, at each doubling of their number. */
  readonly drawn: number;
  readonly random: readonly { readonly feasible: number; readonly hypervolume: number }[];
  /** Share of the time that an island of 200 spends outside the model. */
  readonly outsideModel: number;
}

/** A converter space judged whole, and what the search holds of its front after a hundredth of it. */
export interface WholeSpaceFigures {
  readonly designs: number;
  readonly feasible: number;
  /** Hypervolume of what each seed found over the true front's. */
  readonly shares: readonly number[];
}

/** Measures with seeds 1 … `seeds`, at least one; draws until `feasible` random designs keep every limit, some 300 draws each. */
export function measureConverter(feasible: number, seeds: number): ConverterFigures {
  const problem = shippedProblem('buoy-sensors');
  const sheet = { evaluations: 200_000, islands: 8, population: 50, epochGenerations: 20 };
  const found = seedsUpTo(Math.max(1, seeds)).map((seed) => search(problem, { ...sheet, seed }).hypervolume);
  return {
    searched: found[0],
    seeds: found,
    spread: Math.max(...found) / Math.min(...found) - 1,
    ...drawFeasible(problem, feasible),
    outsideModel: outsideModel(problem),
  };
}

/** Frequencies of the whole space: 0.5 to 1.475 MHz in steps of 25 kHz. */
const WHOLE_STEPS: readonly number[] = Array.from({ length: 40 }, (_, k) => 5e5 + 25e3 * k);
/** Most ceramics at the output and at the input of the whole space, each. */
const WHOLE_CERAMICS = 12;

/** Judges every design of the tests' small space on a fine grid of frequencies, nearly 10⁷ of them, then searches it with seeds 1 … `seeds`. */
export function measureWholeSpace(
  seeds: number,
  { ceramics, frequencies } = { ceramics: WHOLE_CERAMICS, frequencies: WHOLE_STEPS },
): WholeSpaceFigures {
  const problem = smallProblem({ parts: SMALL_PARTS, ceramics, frequencies });
  const { designs, feasible, front } = judgeAll(problem, frequencies);
  const truth = hypervolumeOf(problem, front);
  const evaluations = Math.floor(designs / 100);
  const shares = seedsUpTo(seeds).map((seed) => search(problem, { evaluations, seed }).hypervolume / truth);
  return { designs, feasible, shares };
}

function seedsUpTo(last: number): number[] {
  return Array.from({ length: last }, (_, k) => k + 1);
}

/** Draws designs evenly over the coordinates of the search into an archive like the search's. */
function drawFeasible(problem: Problem, wanted: number): Pick<ConverterFigures, 'drawn' | 'random'> {
  const space = createSpace(problem.genes);
  const draws = restoreRandom(seedRandom('random designs', 0, 0));
  const archive = createArchive(archiveGrid(problem));
  const at = new Float64Array(space.n);
  const genes = new Float64Array(space.n);
  const objectives = new Float64Array(problem.objectives.length);
  const violations = new Float64Array(problem.limits.length);
  const random: { feasible: number; hypervolume: number }[] = [];
  let drawn = 0;
  for (let held = 0, next = Math.min(wanted, 125); held < wanted; drawn++) {
    for (let g = 0; g < space.n; g++) {
      at[g] = space.kind[g] === LINE ? draws.uniform() : space.low[g] + draws.whole(space.span[g] + 1);
    }
    toGenes(space, at, 0, genes, 0);
    problem.snap(genes);
    problem.evaluate(genes, objectives, violations);
    if (violations.some((violation) => violation !== 0)) continue;
    archive.insert(genes, objectives, violations, 0);
    if (++held < next) continue;
    random.push({ feasible: held, hypervolume: hypervolumeOf(problem, packArchive(archive)) });
    next = Math.min(wanted, 2 * next);
  }
  return { drawn, random };
}

/** Three objectives, after one epoch to warm up. */
function outsideModel(problem: Problem): number {
  const plan = createPlan(problem, { seed: 1, islands: 1, population: 200, epochGenerations: 20, trialEpochs: 0 });
  const spent = { variation: 0, model: 0, ranking: 0, archive: 0 };
  let [island] = startIslands(problem, plan);
  island = step(problem, island);
  const start = performance.now();
  for (let epoch = 0; epoch < 4; epoch++) {
    island = step(problem, island, NO_DESIGNS, { now: () => performance.now(), spent });
  }
  return 1 - spent.model / (performance.now() - start);
}
