/** Shipped sheets and tables as spaces, and one way to sweep a space in a test: everything a scenario starts from. */
import { readFileSync } from 'node:fs';
import { BUILT_IN_TABLES } from '../../model/parts/built-in.ts';
import { joinTables } from '../../model/parts/join.ts';
import { readTable } from '../../model/parts/read-table.ts';
import type { PartsTables } from '../../model/parts/tables.ts';
import { createRailProblem, type RailProblem } from '../../model/problem.ts';
import type { Rail } from '../../model/rail/rail.ts';
import { readRail } from '../../model/rail/read.ts';
import { type Designs, type FamilyRecord, mergeRecords, search } from '../../optimizer/index.ts';
import { packagePath } from '../../runners/package-path.ts';
import { need } from '../model/support.ts';

/** One design of a front. */
export interface Member {
  readonly genes: Float64Array;
  /** In the order of the problem's objectives, SI. */
  readonly objectives: readonly number[];
  readonly family: string;
}

/** What a sweep left. */
export interface Sweep {
  readonly problem: RailProblem;
  readonly evaluations: number;
  readonly front: Designs;
  readonly members: readonly Member[];
  /** 0 … 1. */
  readonly hypervolume: number;
  readonly record: FamilyRecord;
}

let tables: PartsTables | undefined;

/** The built-in tables, read once. */
export function builtInTables(): PartsTables {
  tables ??= need(
    joinTables(
      BUILT_IN_TABLES.map(({ kind, file }) => ({
        kind,
        rows: need(readTable(kind, readFileSync(packagePath('model', 'tables', file), 'utf8'), file)),
      })),
    ),
  );
  return tables;
}

/** A shipped sheet by its rail's name. */
export function shippedRail(name: string): Rail {
  const file = `${name}.yaml`;
  return need(readRail(readFileSync(packagePath('model', 'rails', file), 'utf8'), file));
}

/** The space of `rail` over the built-in tables, or over `own`. */
export function spaceOf(rail: Rail, own: PartsTables = builtInTables()): RailProblem {
  return need(createRailProblem(rail, own));
}

/** `rail` with other search ranges. */
export function searching(rail: Rail, over: Partial<Rail['search']>): Rail {
  return { ...rail, search: { ...rail.search, ...over } };
}

/** Sweeps `problem` in this thread: same seed, same front. */
export function sweep(problem: RailProblem, evaluations: number, seed = 'scenario'): Sweep {
  const found = search(problem, { evaluations, seed });
  const record = mergeRecords(found.islands);
  const { front, hypervolume } = found;
  return { problem, evaluations: found.evaluations, front, members: membersOf(problem, front), hypervolume, record };
}

/** The designs of a front, one by one. */
export function membersOf(problem: RailProblem, front: Designs): Member[] {
  const n = problem.genes.length;
  const m = problem.objectives.length;
  return Array.from({ length: front.count }, (_, row) => {
    const genes = front.genes.slice(row * n, (row + 1) * n);
    const objectives = [...front.objectives.subarray(row * m, (row + 1) * m)];
    return { genes, objectives, family: problem.families.names[problem.families.of(genes)] };
  });
}

/** Place of an objective in `problem`. */
export function objectiveIndex(problem: RailProblem, name: string): number {
  const place = problem.objectives.findIndex((objective) => objective.name === name);
  if (place < 0) throw new Error(`${problem.name} has no objective ${name}`);
  return place;
}

/** The member with the least of an objective; an error where the front is empty. */
export function least(of: Sweep, objective: string): Member {
  const place = objectiveIndex(of.problem, objective);
  const [first, ...others] = of.members;
  if (first === undefined) throw new Error(`${of.problem.name}: no design keeps every limit`);
  return others.reduce((best, one) => (one.objectives[place] < best.objectives[place] ? one : best), first);
}

/** The member with the smallest product of its objectives: a percent more of one weighs as a percent less of another. */
export function balanced(of: Sweep): Member {
  const product = (one: Member): number => one.objectives.reduce((all, value) => all * value, 1);
  const [first, ...others] = of.members;
  if (first === undefined) throw new Error(`${of.problem.name}: no design keeps every limit`);
  return others.reduce((best, one) => (product(one) < product(best) ? one : best), first);
}
