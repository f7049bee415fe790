/** Reads a running sweep once in a while and tells the reporter. */
import type { Reporter } from '../progress/figures.ts';
import type { Budget } from './budget.ts';
import { lastGain } from './history.ts';
import type { Measure } from './measure.ts';
import { type IslandState, islandsOf, latestEvaluations, type Ring, sumTallies } from './ring.ts';
import { meanShare } from './shares.ts';

/** What the meter needs to know. */
export interface MeterSetup {
  readonly rings: readonly Ring[];
  readonly reporter: Reporter;
  readonly budget: Budget;
  readonly shards: number;
  measure(islands: readonly IslandState[]): Measure;
  describeBest(values: readonly number[]): readonly string[];
  /** `performance.now()` of the last checkpoint. */
  lastSave(): number | undefined;
}

/** Shows progress until it is ended. */
export interface Meter {
  start(seconds: () => number): void;
  end(): void;
}

const EVERY = 500;
/** Measuring merges archives, so it may take only this share of the time. */
const MEASURE_SHARE = 0.01;
/** Seconds over which speed is averaged. */
const WINDOW = 15;

/** A meter, not yet started. */
export function createMeter(setup: MeterSetup): Meter {
  let timer: NodeJS.Timeout | undefined;
  const show = createReading(setup);
  return {
    start(seconds): void {
      timer = setInterval(() => setup.reporter.show(show(seconds())), EVERY);
      timer.unref();
    },
    end(): void {
      clearInterval(timer);
      setup.reporter.end();
    },
  };
}

function createReading(setup: MeterSetup): (seconds: number) => Parameters<Reporter['show']>[0] {
  const marks: { seconds: number; evaluations: number }[] = [];
  const measure = sparing(setup);
  return (seconds) => {
    const { evaluations: counted, feasible } = sumTallies(setup.rings);
    const evaluations = latestEvaluations(setup.rings);
    const share = meanShare(setup.budget, setup.shards, setup.rings, seconds);
    const { frontSize, hypervolume, best } = measure();
    const saved = setup.lastSave();
    return {
      share,
      evaluations,
      perSecond: speed(marks, seconds, evaluations),
      feasible: counted === 0 ? 0 : feasible / counted,
      frontSize,
      hypervolume,
      trend: setup.rings[0] && lastGain(setup.rings[0].history),
      best: setup.describeBest(best),
      secondsLeft: share > 0.01 ? (seconds * (1 - share)) / share : undefined,
      seconds,
      checkpointAge: saved === undefined ? undefined : (performance.now() - saved) / 1000,
      faults: setup.rings.reduce((sum, ring) => sum + ring.faults.length, 0),
    };
  };
}

function sparing(setup: MeterSetup): () => Measure {
  let latest: Measure = { frontSize: 0, hypervolume: 0, best: [] };
  let next = 0;
  return () => {
    const before = performance.now();
    if (before < next) return latest;
    latest = setup.measure(setup.rings.flatMap(islandsOf));
    next = performance.now() + (performance.now() - before) / MEASURE_SHARE;
    return latest;
  };
}

function speed(marks: { seconds: number; evaluations: number }[], seconds: number, evaluations: number): number {
  marks.push({ seconds, evaluations });
  while (marks.length > 2 && seconds - (marks[0]?.seconds ?? 0) > WINDOW) marks.shift();
  const first = marks[0];
  return first === undefined || seconds <= first.seconds
    ? 0
    : (evaluations - first.evaluations) / (seconds - first.seconds);
}
