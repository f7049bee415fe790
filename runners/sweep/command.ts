/** The work behind `chopfront sweep`: from options and sheet to a plan, and from its end to what a person is told. */
import { availableParallelism } from 'node:os';
import type { RailProblem } from '../../model/index.ts';
import { THREAD_LIMITS, threadsEngine } from '../engines/threads.ts';
import { refusal, STATUS } from '../errors.ts';
import { type Inputs, problemOf, readSheet } from '../inputs.ts';
import { packagePath } from '../package-path.ts';
import { chooseReporter } from '../progress/choose.ts';
import type { Reporter } from '../progress/figures.ts';
import { tryRestarts } from '../restarts/make.ts';
import { prepareFolder } from '../run-folder/folder.ts';
import { publish } from '../run-folder/publish.ts';
import type { RunRecord } from '../run-folder/record.ts';
import { hashesOf, readSnapshot, tablesOf, writeSnapshot } from '../run-folder/snapshot.ts';
import { VERSION } from '../version.ts';
import type { Budget } from './budget.ts';
import { DEFAULT_BUDGET } from './budget.ts';
import { describeValues } from './describe.ts';
import { reportEnd } from './ending.ts';
import type { RunIdentity } from './moment.ts';
import type { SweepOptions } from './options.ts';
import { knownRun, type Place, placeOf } from './place.ts';
import { createRefresher } from './refresher.ts';
import { type RunPlan, runSweep } from './run.ts';
import { listenForStop, SIGNALS } from './stop.ts';
import { refuseChanges } from './unchanged.ts';

/** Runs the command; returns the exit status. Throws refusals. */
export async function sweepCommand(sheet: string | undefined, options: SweepOptions): Promise<number> {
  if (options.on === 'slurm') {
    const { submitSweep } = await import('../cluster/submit.ts');
    return submitSweep(sheet, options);
  }
  const where = placeOf(options);
  const reporter = chooseReporter(options.log);
  const known = knownRun(where);
  const inputs = inputsFor(where, sheet, known);
  if (known !== undefined) refuseChanges(where.folder, known, inputs, sheet !== undefined, options, where.shards);
  prepareFolder(where.folder, known !== undefined);
  for (const line of inputs.remarks) reporter.say(line);
  return sweepInputs(where, inputs, known, options, reporter);
}

/**
 * Saved after a quarter of a minute, and then so often that checkpoints, with the files that are made from each in another process, take less than a
 * hundredth of the time: with two cores about once a minute.
 */
const CHECKPOINTS: RunPlan['checkpoints'] = { seconds: 15, share: 0.008 };

function inputsFor(where: Place, sheet: string | undefined, known: RunRecord | undefined): Inputs {
  if (sheet !== undefined) return readSheet(sheet);
  if (known !== undefined) return readSnapshot(where.folder, known);
  if (where.resume) throw refusal('resume-nothing', { folder: where.folder });
  throw refusal('usage', { text: 'name the sheet to sweep', command: 'sweep ' });
}

async function sweepInputs(
  where: Place,
  inputs: Inputs,
  known: RunRecord | undefined,
  options: SweepOptions,
  reporter: Reporter,
): Promise<number> {
  const problem = problemOf(inputs);
  const { folder } = where;
  const stop = listenForStop((signal) => reporter.say(`${signal}: saving; this takes a few seconds`));
  const refresher = createRefresher(folder, (text) => reporter.say(text));
  const plan = planOf(where, inputs, problem, known, options, reporter, stop, refresher);
  try {
    const end = await runSweep(plan);
    if (stop.signal !== undefined && end.ending === 'stopped') {
      reporter.say(
        `saved after ${end.record.evaluations} evaluations; go on with: chopfront sweep --out ${folder} --resume`,
      );
      return where.task && stop.signal === 'SIGTERM' ? STATUS.requeue : SIGNALS[stop.signal];
    }
    return await reportEnd(folder, problem, end, { page: options.page && !where.task, json: options.log === 'json' });
  } finally {
    stop.dispose();
  }
}

function planOf(
  where: Place,
  inputs: Inputs,
  problem: RailProblem,
  known: RunRecord | undefined,
  options: SweepOptions,
  reporter: Reporter,
  stop: RunPlan['stop'],
  refresher: ReturnType<typeof createRefresher>,
): RunPlan {
  const { folder } = where;
  const threads = options.threads ?? availableParallelism();
  const engine: RunPlan['engine'] = () =>
    threadsEngine({
      worker: packagePath('dist', 'runners', 'engines', 'worker.js'),
      birth: { module: new URL('../engines/rail-problem.js', import.meta.url).href, source: inputs.texts },
      threads,
      epochSeconds: options.epochLimit ?? THREAD_LIMITS.epochSeconds,
      heapMegabytes: THREAD_LIMITS.heapMegabytes,
    });
  return {
    folder,
    identity: known === undefined ? identityOf(where, inputs, options) : pickIdentity(known),
    problem,
    settings: inputs.rail.settings,
    budget: budgetOf(options, known),
    threads,
    engine,
    reporter,
    stop,
    checkpoints: options.checkpoint === undefined ? CHECKPOINTS : { seconds: options.checkpoint, share: 1 },
    describeBest: (values) => describeValues(problem.objectives, values),
    snapshot: () => writeSnapshot(folder, inputs.texts),
    refresh: () => refresher.begin(),
    refreshCost: () => refresher.cost() / availableParallelism(),
    publish: async (found, ending) => {
      await refresher.settled();
      // A shard's limits are priced once, when the shards are merged.
      if (ending === 'done' && where.shard === undefined && found.archive.count > 0) {
        const setup = { folder, problem, found, texts: inputs.texts, threads, stop: stop.asked };
        await tryRestarts({ ...setup, say: (text) => reporter.say(text) });
      }
      publish(folder, problem, found);
    },
  };
}

function identityOf(where: Place, inputs: Inputs, options: SweepOptions): RunIdentity {
  return {
    version: VERSION,
    rail: inputs.rail.name,
    ...hashesOf(inputs),
    seed: options.seed ?? '1',
    shards: where.shards ?? 1,
    shard: where.shard,
    tables: tablesOf(inputs.texts),
  };
}

function pickIdentity(known: RunRecord): RunIdentity {
  const { version, rail, railHash, partsHash, seed, shards, shard, tables } = known;
  return { version, rail, railHash, partsHash, seed, shards, shard, tables };
}

// A run that goes on keeps its budget unless another is given.
function budgetOf(options: SweepOptions, known: RunRecord | undefined): Budget {
  const { evaluations, time: seconds, untilSteady: steady } = options;
  const given = { evaluations, seconds, steady };
  if (Object.values(given).some((value) => value !== undefined)) return given;
  return known?.budget ?? DEFAULT_BUDGET;
}
