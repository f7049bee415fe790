/** From data and state to what the views draw: which designs are left, the open one judged, the moved one judged. */
import type { Assessment } from '../model/assessment.ts';
import type { Assessor, Verdict } from './assessor.ts';
import { indistinguishable } from './bands.ts';
import type { FrontDesign, PageData } from './data.ts';
import { type Dataset, datasetOf } from './dataset.ts';
import { lookOf } from './marks/mark.ts';
import { kept } from './narrow.ts';
import { picksOf } from './picks.ts';
import type { Known, State } from './state.ts';
import { applied } from './whatif.ts';

/** Data and model, ready for any state. */
export interface Bench {
  readonly data: PageData;
  readonly dataset: Dataset;
  readonly assessor: Assessor;
  readonly known: Known;
}

/** One state, worked out. */
export interface Scene {
  readonly state: State;
  readonly kept: readonly number[];
  /** Row of the open design; absent where there is none. */
  readonly open?: number | undefined;
  readonly own?: Verdict | undefined;
  readonly moved?: Verdict | undefined;
  readonly alike: readonly number[];
  readonly pinned: readonly number[];
}

export function benchOf(data: PageData, assessor: Assessor): Bench {
  const dataset = datasetOf(data);
  const known = {
    objectives: dataset.objectives.map((objective) => objective.name),
    ids: dataset.index,
    keys: dataset.byKey,
    families: dataset.families,
  };
  return { data, dataset, assessor, known };
}

/** The view that a page opens with: volume (or the second objective) across, the first up, the balanced design open. */
export function firstState({ dataset, data }: Bench): State {
  const [first, second, third] = dataset.objectives.map((objective) => objective.name);
  const balanced = picksOf(
    dataset,
    dataset.designs.map((_, i) => i),
  )[0];
  return {
    x: second ?? first ?? '',
    y: first ?? '',
    third: third ?? '',
    as: 'size',
    open: balanced === undefined ? '' : (dataset.designs[balanced.index]?.id ?? ''),
    pinned: [],
    ranges: {},
    hidden: [],
    point: heaviest(data.rail),
    changes: {},
  };
}

/** Place of the profile's heaviest load, the point that stresses a design most. */
function heaviest({ profile }: PageData['rail']): number {
  const most = Math.max(...profile.map((point) => point.fraction));
  return Math.max(
    0,
    profile.findIndex((point) => point.fraction === most),
  );
}

/** Works out `state`; `judge` may remember verdicts between states, and what `before` knows already is taken from it. */
export function sceneOf(bench: Bench, state: State, judge = judgeBy(bench), before?: Scene): Scene {
  const open = bench.dataset.index.get(state.open);
  const design = open === undefined ? undefined : bench.dataset.rows[open];
  return {
    state,
    kept: isSameChoice(before?.state, state) ? (before?.kept ?? []) : kept(bench.dataset, state),
    open,
    own: design === undefined ? undefined : judge(design, {}),
    moved: design === undefined || Object.keys(state.changes).length === 0 ? undefined : judge(design, state.changes),
    alike: before !== undefined && before.open === open ? before.alike : alikeOf(bench, open),
    pinned: state.pinned.flatMap((id) => bench.dataset.index.get(id) ?? []),
  };
}

function isSameChoice(a: State | undefined, b: State): boolean {
  return a !== undefined && a.ranges === b.ranges && a.hidden === b.hidden;
}

function alikeOf({ data, dataset, known }: Bench, open: number | undefined): readonly number[] {
  const row = open === undefined ? undefined : dataset.rows[open];
  if (row === undefined) return [];
  return indistinguishable(known.objectives, dataset.designs, row, data.rail).filter((i) => i !== open);
}

export type Judge = (design: FrontDesign, changes: State['changes']) => Verdict;

/** Judges through the model; the verdict on an unchanged design is remembered. */
export function judgeBy(bench: Bench): Judge {
  const memory = new Map<string, Verdict>();
  return (design, changes) => {
    const isOwn = Object.keys(changes).length === 0;
    const known = isOwn ? memory.get(design.id) : undefined;
    if (known !== undefined) return known;
    const { moves, rail } = applied(bench.data.rail, bench.assessor.genes, changes);
    const verdict = bench.assessor.assess(recordOf(design), rail, moves);
    if (isOwn) memory.set(design.id, verdict);
    return verdict;
  };
}

/** A front row as the record that the model reads. */
export function recordOf(design: FrontDesign): Assessment['design'] {
  const architecture = lookOf(design.family).architecture as Assessment['design']['architecture'];
  return { architecture, genes: design.genes, parts: design.parts };
}
