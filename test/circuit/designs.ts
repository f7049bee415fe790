/**
 * Twenty front designs over all architectures, some interleaved: what searches of the shipped rails with 5,000 to 8,000 evaluations and
 * one seed left, some held to two phases, kept as records
 * (designs.json), so that a change of the model changes figures and not which designs are looked at.
 */
import { readFileSync } from 'node:fs';
import {
  type Architecture,
  BUILT_IN_TABLES,
  createRailProblem,
  type DesignRecord,
  joinTables,
  type Rail,
  type RailProblem,
  readRail,
  readTable,
} from '../../model/index.ts';
import { need } from '../model/support.ts';

/** A design with the space it comes from. */
export interface FoundDesign {
  readonly name: string;
  readonly problem: RailProblem;
  readonly genes: Float64Array;
}

/** A design as the file holds it: the rail it was found for, and its record. */
type Held = DesignRecord & { readonly rail: string };

const tables = need(
  joinTables(
    BUILT_IN_TABLES.map(({ kind, file }) => ({
      kind,
      rows: need(readTable(kind, readFileSync(`model/tables/${file}`, 'utf8'), file)),
    })),
  ),
);

/** A shipped rail. */
export function shippedRail(name: string): Rail {
  const file = `${name}.yaml`;
  return need(readRail(readFileSync(`model/rails/${file}`, 'utf8'), file));
}

/** The space of a shipped rail with its architectures narrowed to `architecture`. */
export function shippedProblem(name: string, architecture: Architecture): RailProblem {
  const rail = shippedRail(name);
  return need(createRailProblem({ ...rail, search: { ...rail.search, architectures: [architecture] } }, tables));
}

/** A design of the rail called `rail`, under a name that says where it comes from. */
export function named(rail: string, problem: RailProblem, genes: Float64Array): FoundDesign {
  return {
    name: `${rail}: ${problem.families.names[problem.families.of(genes)]} (${problem.id(genes)})`,
    problem,
    genes,
  };
}

/** All twenty. */
export function foundDesigns(): FoundDesign[] {
  const held: readonly Held[] = JSON.parse(readFileSync('test/circuit/designs.json', 'utf8'));
  return held.map(({ rail, ...record }) => {
    const problem = shippedProblem(rail, record.architecture);
    return named(rail, problem, need(problem.genesFrom(record)));
  });
}
