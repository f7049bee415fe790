/**
 * A sweep from locked folder to last file, for any problem: makes or resumes the rings, runs them on an engine, saves, shows
 * progress, publishes. What is special to rails (reading sheets, front files, pages) comes in as functions.
 */
import type { Designs } from '../../optimizer/index.ts';
import type { Problem } from '../../optimizer/problem.ts';
import type { Engine } from '../engines/protocol.ts';
import type { Reporter } from '../progress/figures.ts';
import { checkpointNames } from '../run-folder/checkpoint.ts';
import { sweepLeftovers } from '../run-folder/files.ts';
import type { Found } from '../run-folder/found.ts';
import { takeLock } from '../run-folder/lock.ts';
import { type Fault, type RunRecord, writeRecord } from '../run-folder/record.ts';
import type { Budget } from './budget.ts';
import { createMeter } from './meter.ts';
import { momentOf, type RunIdentity } from './moment.ts';
import { resumeFrom } from './resume.ts';
import { createRing, islandsOf, type Ring } from './ring.ts';
import { createSaver, maySaveLater, type Saver } from './saving.ts';
import { createSearch, planRing, type Search, type SearchSettings } from './search.ts';
import type { StopRequest } from './stop.ts';
import { type CheckpointRule, type Ending, startSweep } from './sweep.ts';

/** A sweep to run. */
export interface RunPlan {
  readonly folder: string;
  readonly identity: RunIdentity;
  readonly problem: Problem;
  /** Islands of one ring, and how each is bred. */
  readonly settings: SearchSettings;
  readonly budget: Budget;
  readonly threads: number;
  /** Makes the engine, once the folder is ready. */
  engine(): Engine;
  readonly reporter: Reporter;
  readonly stop: StopRequest;
  readonly checkpoints: CheckpointRule;
  /** Text for the best value of each objective. */
  describeBest(values: readonly number[]): readonly string[];
  /** Writes the snapshot of the inputs; called when a run starts. */
  snapshot(): void;
  /** Told that a checkpoint was written, to refresh what people look at in another process. */
  refresh(): void;
  /** Seconds of the whole machine that the last refresh took; 0 while unknown. */
  refreshCost(): number;
  /** Writes the final files, once refreshing has ended. */
  publish(found: Found, ending: Ending): Promise<void>;
}

/** How a run ended. */
export interface RunEnd {
  readonly ending: Ending;
  readonly found: Found;
  readonly record: RunRecord;
  /** Smallest value of each objective; empty where nothing feasible was found. */
  readonly best: readonly number[];
  /** All designs that the islands hold, feasible or not. */
  readonly atHand: Designs;
}

/** Seconds that running epochs get to finish after a stop. */
const GRACE = 3;

/** Runs the plan. Throws refusals; the folder's lock is free again afterwards. */
export async function runSweep(plan: RunPlan): Promise<RunEnd> {
  const lock = takeLock(plan.folder);
  try {
    sweepLeftovers(plan.folder);
    const search = createSearch(plan.problem);
    const begun = begin(plan, search);
    for (const warning of begun.warnings) plan.reporter.say(warning);
    const saver = createSaver(plan.folder, lock, begun.number);
    return await carryOut(plan, search, begun, saver);
  } finally {
    lock.release();
  }
}

interface Begun {
  readonly rings: readonly Ring[];
  readonly seconds: number;
  /** Spent on saving, s; grows as the sweep goes on. */
  saving: number;
  readonly started: string;
  readonly number: number;
  readonly warnings: readonly string[];
}

function begin(plan: RunPlan, search: Search): Begun {
  if (checkpointNames(plan.folder).length > 0) return resumeFrom(plan.folder, search.tally);
  const { shard, shards } = plan.identity;
  const all = shard === undefined ? Array.from({ length: shards }, (_, i) => i) : [shard];
  const rings = all.map((one) => startRing(plan, search, one));
  const begun = { rings, seconds: 0, saving: 0, started: new Date().toISOString(), number: 0, warnings: [] };
  writeRecord(plan.folder, momentOf(search, { ...plan, ...begun }, 'running', 0).record);
  plan.snapshot();
  return begun;
}

function startRing(plan: RunPlan, search: Search, shard: number): Ring {
  const { seed, shards } = plan.identity;
  const { evaluations } = plan.budget;
  const wanted = evaluations === undefined ? undefined : Math.ceil(evaluations / shards);
  const ring = planRing(plan.problem, { seed, shard, shards, evaluations: wanted }, plan.settings);
  const epochEvaluations = ring.islands * ring.population * ring.epochGenerations;
  return createRing({ shard, epoch: 0, epochEvaluations, islands: search.start(ring) });
}

async function carryOut(plan: RunPlan, search: Search, begun: Begun, saver: Saver): Promise<RunEnd> {
  const engine = plan.engine();
  const { rings } = begun;
  let seconds = (): number => begun.seconds;
  const save = (reason: 'interval' | 'end'): void => {
    const before = performance.now();
    const status = reason === 'interval' ? 'running' : rings.every((ring) => ring.done) ? 'done' : 'stopped';
    saver.save(momentOf(search, { ...plan, ...begun }, status, seconds()));
    begun.saving += (performance.now() - before) / 1000;
  };
  const { budget, reporter, describeBest, problem, checkpoints } = plan;
  const { shards } = plan.identity;
  const { apart, measure, neighbours, tally } = search;
  const meter = createMeter({ rings, reporter, budget, shards, measure, describeBest, lastSave: () => saver.last });
  try {
    const sweep = startSweep({
      engine,
      rings,
      budget,
      shards,
      checkpoints,
      besides: () => plan.refreshCost(),
      neighbours,
      tally,
      measure,
      apart,
      geneNames: problem.genes.map((gene) => gene.name),
      secondsBefore: begun.seconds,
      save: (reason) => trySave(plan, save, reason),
      onFault: (fault) => reporter.say(faultLine(fault)),
      stop: plan.stop.asked,
      graceSeconds: GRACE,
    });
    seconds = sweep.seconds;
    meter.start(seconds);
    return await conclude(plan, search, begun, await sweep.ended, seconds());
  } finally {
    meter.end();
    await engine.close();
  }
}

async function conclude(plan: RunPlan, search: Search, begun: Begun, ending: Ending, seconds: number): Promise<RunEnd> {
  const islands = begun.rings.flatMap(islandsOf);
  const { found, record } = momentOf(search, { ...plan, ...begun }, ending, seconds);
  await plan.publish(found, ending);
  return { ending, found, record, best: search.measure(islands).best, atHand: search.atHand(islands) };
}

function trySave(plan: RunPlan, save: (reason: 'interval' | 'end') => void, reason: 'interval' | 'end'): void {
  try {
    save(reason);
  } catch (error) {
    if (reason === 'end' || !maySaveLater(error)) throw error;
    plan.reporter.say(error instanceof Error ? error.message : String(error));
    return;
  }
  if (reason === 'interval') plan.refresh();
}

function faultLine(fault: Fault): string {
  const design = fault.design === undefined ? '' : ` while evaluating ${JSON.stringify(fault.design)}`;
  return `island ${fault.island} of shard ${fault.shard} is lost after epoch ${fault.epoch}: ${fault.reason}${design}; going on without it`;
}
