/** The short searches of a run that has ended: planned, run over threads, kept in its folder. */
import { pathToFileURL } from 'node:url';
import { type RailProblem, RELAXED_BY } from '../../model/index.ts';
import { reasonOf } from '../errors.ts';
import type { InputTexts } from '../inputs.ts';
import { packagePath } from '../package-path.ts';
import type { Found } from '../run-folder/found.ts';
import { readRestarts, writeRestarts } from '../run-folder/restarts.ts';
import { planRestarts } from './plan.ts';
import { runRestarts, threadRestarter } from './run.ts';

/** What the searches need. */
export interface RestartSetup {
  readonly folder: string;
  readonly problem: RailProblem;
  readonly found: Found;
  readonly texts: InputTexts;
  readonly threads: number;
  /** Told what is about to happen. */
  say(text: string): void;
  /** Resolves when they shall be given up; absent where nothing can ask for that. */
  readonly stop?: Promise<void>;
}

/** As `makeRestarts`; what fails is said and undoes nothing. */
export async function tryRestarts(setup: RestartSetup): Promise<void> {
  try {
    await makeRestarts(setup);
  } catch (error) {
    setup.say(`what limits cost is told from near misses alone (${reasonOf(error)})`);
  }
}

/** Makes `restarts.bin` unless the one there belongs to this archive, or there is nothing to search. Throws an `Error` where a search failed. */
async function makeRestarts(setup: RestartSetup): Promise<void> {
  const { folder, problem, found, texts, threads, say, stop } = setup;
  if (readRestarts(folder, found.archive) !== undefined) return;
  const evaluations = found.sources.reduce((sum, source) => sum + source.evaluations, 0);
  const plan = planRestarts(problem, found, { seed: found.sources[0]?.seed ?? '', evaluations });
  if (plan.searches.length === 0) return;
  const places = [...new Set(plan.searches.map(({ limit }) => limit))].filter((place) => place >= 0);
  const limits = places.map((place) => problem.limits[place] ?? '');
  const each = plan.searches[0]?.evaluations ?? 0;
  say(`what ${limits.length} limits cost: ${plan.searches.length} short searches of ${each} evaluations`);
  const module = pathToFileURL(packagePath('dist', 'runners', 'engines', 'rail-problem.js')).href;
  const worker = packagePath('dist', 'runners', 'restarts', 'worker.js');
  const restarter = threadRestarter(worker, { module, source: texts }, threads);
  try {
    const stopped = (stop ?? new Promise<void>(() => {})).then(() => undefined);
    const made = await Promise.race([runRestarts(restarter, problem, plan, found.archive), stopped]);
    if (made === undefined) return;
    const steps = RELAXED_BY.filter((share) => plan.searches.some((one) => one.share === share));
    writeRestarts(folder, found.archive, { steps, limits, evaluations: each, ...made });
  } finally {
    await restarter.close();
  }
}
