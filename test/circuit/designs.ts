/** Twenty front-like designs over all architectures: what short seeded searches of the shipped rails leave. */
import { readFileSync } from 'node:fs';
import {
  type Architecture,
  BUILT_IN_TABLES,
  createRailProblem,
  joinTables,
  type Rail,
  type RailProblem,
  readRail,
  readTable,
} from '../../model/index.ts';
import { search } from '../../optimizer/index.ts';
import { need } from '../model/support.ts';

/** A design with the space it comes from. */
export interface FoundDesign {
  readonly name: string;
  readonly problem: RailProblem;
  readonly genes: Float64Array;
}

interface Hunt {
  readonly rail: string;
  readonly architecture: Architecture;
  /** Designs taken from the front. */
  readonly take: number;
}

const HUNTS: readonly Hunt[] = [
  { rail: 'buoy-sensors', architecture: 'buck-synchronous', take: 2 },
  { rail: 'buoy-sensors', architecture: 'buck-diode', take: 2 },
  { rail: 'buoy-winch', architecture: 'buck-synchronous', take: 3 },
  { rail: 'hut-link', architecture: 'buck-synchronous', take: 3 },
  { rail: 'hut-shelf', architecture: 'two-switch-forward', take: 2 },
  { rail: 'hut-shelf', architecture: 'half-bridge-centre-tap', take: 2 },
  { rail: 'hut-shelf', architecture: 'half-bridge-current-doubler', take: 2 },
  { rail: 'hut-shelf', architecture: 'full-bridge-centre-tap', take: 2 },
  { rail: 'hut-shelf', architecture: 'full-bridge-current-doubler', take: 2 },
];

/** Evaluations of one hunt: enough that most designs keep every limit. */
const EVALUATIONS = 5_000;

const tables = need(
  joinTables(
    BUILT_IN_TABLES.map(({ kind, file }) => ({
      kind,
      rows: need(readTable(kind, readFileSync(new URL(`../../model/tables/${file}`, import.meta.url), 'utf8'), file)),
    })),
  ),
);

/** The space of a shipped rail, with its architectures narrowed to `architecture`. */
function shippedProblem(name: string, architecture?: Architecture): RailProblem {
  const file = `${name}.yaml`;
  const rail: Rail = need(readRail(readFileSync(new URL(`../../model/rails/${file}`, import.meta.url), 'utf8'), file));
  const narrowed =
    architecture === undefined ? rail : { ...rail, search: { ...rail.search, architectures: [architecture] } };
  return need(createRailProblem(narrowed, tables));
}

/** All twenty. */
export function foundDesigns(): FoundDesign[] {
  return HUNTS.flatMap(({ rail, architecture, take }) => {
    const problem = shippedProblem(rail, architecture);
    const { front } = search(problem, { evaluations: EVALUATIONS, seed: 7, keep: take });
    const width = problem.genes.length;
    return Array.from({ length: front.count }, (_, i) => {
      const genes = front.genes.slice(i * width, (i + 1) * width);
      return {
        name: `${rail}: ${problem.families.names[problem.families.of(genes)]} (${problem.id(genes)})`,
        problem,
        genes,
      };
    });
  });
}
