/** Compares the fronts of two runs with the same objectives. */
import type { FrontFile } from '../../model/index.ts';
import { hypervolumeOf } from '../../optimizer/index.ts';
import type { Problem } from '../../optimizer/problem.ts';
import { refusal } from '../errors.ts';
import { problemOf } from '../inputs.ts';
import { dominates, type FrontDesign, readFront } from './front.ts';
import { readRecord } from './record.ts';
import { readSnapshot } from './snapshot.ts';

/** A design that is on both fronts, with figures that differ. */
export interface Moved {
  readonly id: string;
  readonly family: string;
  readonly before: readonly number[];
  readonly after: readonly number[];
}

/** What changed from run A to run B. */
export interface Comparison {
  readonly a: string;
  readonly b: string;
  readonly objectives: readonly { readonly name: string; readonly unit: string }[];
  /** Whether sheet, parts and version are the same. */
  readonly same: { readonly sheet: boolean; readonly parts: boolean; readonly version: boolean };
  /** Each front against A's ideal and reference, and both together; 0 … 1. */
  readonly hypervolume: { readonly a: number; readonly b: number; readonly together: number };
  /** Share of A's designs that some design of B dominates, and the other way round. */
  readonly dominated: { readonly a: number; readonly b: number };
  /** Best value of each objective in A and in B. */
  readonly best: readonly { readonly a: number; readonly b: number }[];
  readonly sizes: { readonly a: number; readonly b: number };
  readonly gained: readonly FrontDesign[];
  readonly lost: readonly FrontDesign[];
  readonly moved: readonly Moved[];
}

/** Compares two run folders. Throws refusals where they have no fronts or other objectives. */
export function compareRuns(a: string, b: string): Comparison {
  const [before, after] = [readFront(a), readFront(b)];
  const [was, is] = [readRecord(a), readRecord(b)];
  const names = (front: FrontFile): string => front.objectives.map((objective) => objective.name).join(', ');
  if (names(before) !== names(after)) {
    throw refusal('objectives-differ', { folder: b, names: names(after), ours: names(before) });
  }
  const problem = problemOf(readSnapshot(a, was));
  const same = {
    sheet: was.railHash === is.railHash,
    parts: was.partsHash === is.partsHash,
    version: was.version === is.version,
  };
  return { a, b, objectives: before.objectives, same, ...compareDesigns(problem, before.designs, after.designs) };
}

type Designs = readonly FrontDesign[];

/** The part of a comparison that follows from the designs alone. */
export function compareDesigns(
  problem: Problem,
  a: Designs,
  b: Designs,
): Omit<Comparison, 'a' | 'b' | 'same' | 'objectives'> {
  const volume = (designs: Designs): number => volumeOf(problem, designs);
  const beaten = (some: Designs, by: Designs): number => {
    const count = some.filter((one) => by.some((other) => dominates(other.objectives, one.objectives))).length;
    return some.length === 0 ? 0 : count / some.length;
  };
  const inA = new Map(a.map((design) => [design.id, design]));
  const inB = new Map(b.map((design) => [design.id, design]));
  const least = (designs: Designs, i: number): number =>
    Math.min(...designs.map((one) => one.objectives[i] ?? Infinity));
  return {
    hypervolume: { a: volume(a), b: volume(b), together: volume([...a, ...b]) },
    dominated: { a: beaten(a, b), b: beaten(b, a) },
    best: problem.objectives.map((_, i) => ({ a: least(a, i), b: least(b, i) })),
    sizes: { a: a.length, b: b.length },
    gained: b.filter((design) => !inA.has(design.id)),
    lost: a.filter((design) => !inB.has(design.id)),
    moved: a.flatMap((design) => movedTo(design, inB.get(design.id))),
  };
}

function movedTo(before: FrontDesign, after: FrontDesign | undefined): Moved[] {
  if (after === undefined || before.objectives.every((value, i) => value === after.objectives[i])) return [];
  return [{ id: before.id, family: before.family, before: before.objectives, after: after.objectives }];
}

function volumeOf(problem: Problem, designs: Designs): number {
  if (designs.length === 0) return 0;
  const none = new Float64Array(0);
  const objectives = Float64Array.from(designs.flatMap((design) => design.objectives));
  return hypervolumeOf(problem, { count: designs.length, genes: none, objectives, violations: none });
}
