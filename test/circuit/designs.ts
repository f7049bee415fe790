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

/** The space of a shipped rail, with its architectures narrowed to `architecture`. */
function shippedProblem(name: string, architecture?: Architecture): RailProblem {
  const file = `${name}.yaml`;
  const rail: Rail = need(readRail(readFileSync(`model/rails/${file}`, 'utf8'), file));
  const narrowed =
    architecture === undefined ? rail : { ...rail, search: { ...rail.search, architectures: [architecture] } };
  return need(createRailProblem(narrowed, tables));
}

/** All twenty. */
export function foundDesigns(): FoundDesign[] {
  const held: readonly Held[] = JSON.parse(readFileSync('test/circuit/designs.json', 'utf8'));
  return held.map(({ rail, ...record }) => {
    const problem = shippedProblem(rail, record.architecture);
    const genes = need(problem.genesFrom(record));
    return {
      name: `${rail}: ${problem.families.names[problem.families.of(genes)]} (${problem.id(genes)})`,
      problem,
      genes,
    };
  });
}
