/** The shipped rails and parts tables, read from disk as a person's would be. */
import { readFileSync } from 'node:fs';
import { pathToFileURL } from 'node:url';
import { BUILT_IN_TABLES } from '../../model/parts/built-in.ts';
import { joinTables } from '../../model/parts/join.ts';
import { readTable } from '../../model/parts/read-table.ts';
import type { PartsTables } from '../../model/parts/tables.ts';
import { createRailProblem, type RailProblem } from '../../model/problem.ts';
import type { Rail } from '../../model/rail/rail.ts';
import { readRail } from '../../model/rail/read.ts';
import { SHIPPED_RAILS } from '../../model/rail/shipped.ts';
import { packagePath } from '../../runners/package-path.ts';
import { need } from './support.ts';

/** The files themselves: the build has no copy of them. */
const MODEL = pathToFileURL(`${packagePath('model')}/`);

/** Names of the shipped rails. */
export const RAIL_NAMES = SHIPPED_RAILS;

let tables: PartsTables | undefined;

/** The built-in tables, read once. */
export function builtInTables(): PartsTables {
  tables ??= need(
    joinTables(
      BUILT_IN_TABLES.map(({ kind, file }) => ({
        kind,
        rows: need(readTable(kind, readFileSync(new URL(`tables/${file}`, MODEL), 'utf8'), file)),
      })),
    ),
  );
  return tables;
}

/** A shipped rail. */
export function shippedRail(name: string): Rail {
  const file = name.endsWith('.yaml') ? name : `${name}.yaml`;
  return need(readRail(readFileSync(new URL(`rails/${file}`, MODEL), 'utf8'), file));
}

/** The space of a shipped rail over the built-in tables. */
export function shippedProblem(name: string): RailProblem {
  return need(createRailProblem(shippedRail(name), builtInTables()));
}
