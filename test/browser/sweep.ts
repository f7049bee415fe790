/** A small real sweep for the browser tests: the model, the built-in tables, a search in this thread, and the page's data. */
import { readFileSync } from 'node:fs';
import {
  BUILT_IN_TABLES,
  createRailProblem,
  explainRail,
  frontFile,
  joinTables,
  type Outcome,
  type PartsTables,
  type RailProblem,
  readTable,
} from '../../model/index.ts';
import { type Designs, hypervolumeOf, search } from '../../optimizer/index.ts';
import { packagePath } from '../../runners/package-path.ts';
import type { NearMiss, PageData } from '../../viz/data.ts';
import { RAIL } from '../viz/fixture.ts';

/** The page's data of a sweep of the demo rail. */
export function sweptData(evaluations = 20_000, keep = 300): PageData {
  const tables = builtInTables();
  const problem = given(createRailProblem(RAIL, tables));
  const explained = given(explainRail(RAIL, tables));
  const found = search(problem, { evaluations, seed: 1, keep });
  const front = frontFile(problem, rowsOf(problem, found.front));
  return {
    run: {
      status: 'done',
      seed: '1',
      evaluations: found.evaluations,
      epochs: 1,
      seconds: 1,
      threads: 1,
      feasibleShare: 0.5,
      hypervolume: hypervolumeOf(problem, found.front),
      version: '0.1.0',
      railHash: 'none',
      partsHash: 'none',
      built: '2026-01-01T00:00:00Z',
    },
    rail: RAIL,
    tables,
    front,
    cloud: cloudOf(problem, found.front),
    history: [],
    nearMisses: nearMisses(problem, found.nearMisses),
    families: problem.families.names.map((family) => ({
      family,
      evaluated: 0,
      feasible: 0,
      front: front.designs.filter((design) => design.family === family).length,
      reason: 'as the search left it',
    })),
    cautions: explained.cautions,
    notCovered: explained.notCovered,
  };
}

/** The shipped parts. */
function builtInTables(): PartsTables {
  const read = BUILT_IN_TABLES.map(({ kind, file }) => ({
    kind,
    rows: given(readTable(kind, readFileSync(packagePath('model', 'tables', file), 'utf8'), file)),
  }));
  return given(joinTables(read as Parameters<typeof joinTables>[0]));
}

/** The value of an outcome that must be good. */
function given<T>(outcome: Outcome<T>): T {
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.findings.slice(0, 3)));
  return outcome.value;
}

function rowsOf(problem: RailProblem, designs: Designs): Float64Array[] {
  const width = problem.genes.length;
  return Array.from({ length: designs.count }, (_, i) => designs.genes.slice(i * width, (i + 1) * width));
}

function cloudOf(problem: RailProblem, designs: Designs): PageData['cloud'] {
  const family = rowsOf(problem, designs).map((genes) => problem.families.of(genes));
  return { families: problem.families.names, family, objectives: designs.objectives };
}

function nearMisses(problem: RailProblem, designs: Designs & { readonly limit: ArrayLike<number> }): NearMiss[] {
  return rowsOf(problem, designs).flatMap((genes, i) => {
    const limit = problem.limits[designs.limit[i] ?? -1] ?? '';
    const figure = problem.assess(genes).limits.find((one) => one.name === limit);
    const design = frontFile(problem, [genes]).designs[0];
    return figure === undefined || design === undefined
      ? []
      : [{ limit, value: figure.value, allowed: figure.allowed, violation: figure.violation, design }];
  });
}
