/** Compares the fronts of two runs with the same objectives, and judges each front by the other's sheet and parts. */
import { describeFinding, diffRails, type FrontFile, type RailProblem } from '../../model/index.ts';
import { hypervolumeOf } from '../../optimizer/index.ts';
import type { Problem } from '../../optimizer/problem.ts';
import type { Carried, Change, Comparison, Volumes, Why } from '../../viz/compare-data.ts';
import { refusal } from '../errors.ts';
import { type Inputs, problemOf } from '../inputs.ts';
import { percent } from '../progress/figures.ts';
import { recordOf } from './design.ts';
import { dominates, type FrontDesign, readFront } from './front.ts';
import { type RunRecord, readRecord } from './record.ts';
import { readSnapshot } from './snapshot.ts';

/** Compares two run folders. Throws refusals where they have no fronts or other objectives. */
export function compareRuns(a: string, b: string): Comparison {
  const [before, after] = [openRun(a), openRun(b)];
  const names = (front: FrontFile): string => front.objectives.map((objective) => objective.name).join(', ');
  if (names(before.front) !== names(after.front)) {
    throw refusal('objectives-differ', { folder: b, names: names(after.front), ours: names(before.front) });
  }
  const same = {
    sheet: before.record.railHash === after.record.railHash,
    parts: before.record.partsHash === after.record.partsHash,
    version: before.record.version === after.record.version,
  };
  const { objectives } = before.front;
  return { a, b, objectives, same, differences: differencesOf(before, after, same), ...compareFronts(before, after) };
}

/** A front with the problem that judges it. */
export interface Side {
  readonly problem: RailProblem;
  readonly front: Pick<FrontFile, 'designs'>;
}

/** The part of a comparison that follows from the fronts and their problems. */
export function compareFronts(a: Side, b: Side): Omit<Comparison, 'a' | 'b' | 'same' | 'differences' | 'objectives'> {
  const [designsA, designsB] = [a.front.designs, b.front.designs];
  const inA = new Map(designsA.map((design) => [design.id, design]));
  const inB = new Map(designsB.map((design) => [design.id, design]));
  const aUnderB = designsA.map((design) => judge(b.problem, design));
  const bUnderA = designsB.map((design) => judge(a.problem, design));
  const both = designsA.flatMap((design) => onBoth(design, inB.get(design.id)));
  return {
    hypervolume: { byA: volumes(a.problem, designsA, designsB), byB: volumes(b.problem, designsA, designsB) },
    carried: { a: carried(b.problem, aUnderB), b: carried(a.problem, bUnderA) },
    restated: { a: restated(a), b: restated(b) },
    dominated: { a: beaten(designsA, designsB), b: beaten(designsB, designsA) },
    best: a.problem.objectives.map((_, i) => ({ a: least(designsA, i), b: least(designsB, i) })),
    sizes: { a: designsA.length, b: designsB.length },
    gained: designsB.flatMap((design, i) =>
      inA.has(design.id) ? [] : [alone('gained', design, bUnderA[i], designsA)],
    ),
    lost: designsA.flatMap((design, i) => (inB.has(design.id) ? [] : [alone('lost', design, aUnderB[i], designsB)])),
    moved: both.filter(({ change }) => change === 'moved'),
    kept: both.filter(({ change }) => change === 'kept'),
  };
}

type Designs = readonly FrontDesign[];

/** How a problem judges a design that may come from elsewhere. */
interface Verdict {
  /** Absent where it cannot be built there. */
  readonly objectives?: readonly number[];
  /** Why it is not good there; absent where it keeps every limit. */
  readonly why?: Why;
}

interface Opened extends Side {
  readonly front: FrontFile;
  readonly record: RunRecord;
  readonly inputs: Inputs;
}

function openRun(folder: string): Opened {
  const front = readFront(folder);
  const record = readRecord(folder);
  const inputs = readSnapshot(folder, record);
  return { front, record, inputs, problem: problemOf(inputs) };
}

function differencesOf(before: Opened, after: Opened, same: Comparison['same']): string[] {
  const was = new Map(before.inputs.texts.tables.map((table) => [table.file, table.text]));
  const is = new Set(after.inputs.texts.tables.map((table) => table.file));
  const changed = after.inputs.texts.tables.filter(
    (table) => was.has(table.file) && was.get(table.file) !== table.text,
  );
  return [
    ...(same.sheet ? [] : diffRails(before.inputs.rail, after.inputs.rail)),
    ...changed.map((table) => `parts: ${table.file} differs`),
    ...[...is].filter((file) => !was.has(file)).map((file) => `parts: ${file} is new`),
    ...[...was.keys()].filter((file) => !is.has(file)).map((file) => `parts: ${file} is not named any more`),
    ...(same.version ? [] : [`version: ${before.record.version} became ${after.record.version}`]),
  ];
}

function judge(problem: RailProblem, design: FrontDesign): Verdict {
  const genes = problem.genesFrom(recordOf(design));
  if (!genes.ok) {
    const words = genes.findings.map((finding) => describeFinding({ ...finding, file: '' })).join('; ');
    return { why: { kind: 'unbuildable', words: `cannot be built: ${words.trim()}` } };
  }
  // Snapped onto other ranges it may have become another design, which says nothing of this one.
  if (problem.id(genes.value) !== design.id) return { why: { kind: 'unbuildable', words: 'lies outside the ranges' } };
  const { objectives, feasible } = problem.judge(genes.value);
  return feasible ? { objectives } : { objectives, why: { kind: 'breaks', words: brokenLimits(problem, genes.value) } };
}

function brokenLimits(problem: RailProblem, genes: Float64Array): string {
  const broken = problem.assess(genes).limits.filter((limit) => limit.violation > 0);
  const worst = broken.sort((x, y) => y.violation - x.violation).slice(0, 3);
  const words = worst.map((limit) => `${limit.name} by ${percent(limit.violation)}`).join(', ');
  return words === '' ? 'cannot be computed' : `breaks ${words}${broken.length > 3 ? ' and more' : ''}`;
}

function alone(change: 'gained' | 'lost', design: FrontDesign, there: Verdict | undefined, others: Designs): Change {
  const { id, family, objectives } = design;
  const [own, other] = change === 'gained' ? (['after', 'before'] as const) : (['before', 'after'] as const);
  const figures = there?.objectives === undefined ? {} : { [other]: there.objectives };
  return { change, id, family, [own]: objectives, ...figures, why: there?.why ?? whyNotThere(there, others) };
}

function whyNotThere(there: Verdict | undefined, others: Designs): Why {
  const figures = there?.objectives ?? [];
  const by = others.find((other) => dominates(other.objectives, figures));
  if (by !== undefined) return { kind: 'beaten', words: `beaten by ${by.id}` };
  return { kind: 'unbeaten', words: 'nothing there beats it: not found or not kept' };
}

function onBoth(before: FrontDesign, after: FrontDesign | undefined): Change[] {
  if (after === undefined) return [];
  const change = before.objectives.every((value, i) => value === after.objectives[i]) ? 'kept' : 'moved';
  return [{ change, id: before.id, family: before.family, before: before.objectives, after: after.objectives }];
}

function carried(problem: Problem, verdicts: readonly Verdict[]): Carried {
  const buildable = verdicts.filter((verdict) => verdict.objectives !== undefined);
  const feasible = buildable.filter((verdict) => verdict.why === undefined);
  const figures = feasible.map((verdict) => verdict.objectives ?? []);
  return { buildable: buildable.length, feasible: feasible.length, hypervolume: volumeOf(problem, figures) };
}

/** Designs whose stored figures are not what this version computes; the last digits may differ with the text of a number. */
function restated({ problem, front }: Side): number {
  return front.designs.filter((design) => {
    const now = judge(problem, design).objectives;
    return now === undefined || design.objectives.some((value, i) => !near(value, now[i] ?? Number.NaN));
  }).length;
}

function near(a: number, b: number): boolean {
  return Math.abs(a - b) <= 1e-9 * Math.abs(a);
}

function volumes(problem: Problem, a: Designs, b: Designs): Volumes {
  const of = (designs: Designs): number =>
    volumeOf(
      problem,
      designs.map((design) => design.objectives),
    );
  return { a: of(a), b: of(b), together: of([...a, ...b]) };
}

function volumeOf(problem: Problem, figures: readonly (readonly number[])[]): number {
  if (figures.length === 0) return 0;
  const none = new Float64Array(0);
  const objectives = Float64Array.from(figures.flat());
  return hypervolumeOf(problem, { count: figures.length, genes: none, objectives, violations: none });
}

function beaten(some: Designs, by: Designs): number {
  const count = some.filter((one) => by.some((other) => dominates(other.objectives, one.objectives))).length;
  return some.length === 0 ? 0 : count / some.length;
}

function least(designs: Designs, i: number): number {
  return designs.reduce((best, one) => Math.min(best, one.objectives[i] ?? best), Number.POSITIVE_INFINITY);
}
