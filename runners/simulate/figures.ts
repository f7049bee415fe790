/** Figures of a simulated period, by straight lines between the simulator's own time steps. */
import type { LossTerm, Prediction, Reading } from '../../model/index.ts';
import type { Run } from './run.ts';

/** The figure that `prediction` speaks of. Throws where a vector is missing. */
export function readFigure(run: Run, prediction: Pick<Prediction, 'reading' | 'vectors'>): number {
  const values = prediction.vectors.map((name) => readVector(run, name, prediction.reading));
  if (prediction.reading !== 'rms') return values.reduce((sum, value) => sum + value, 0) / values.length;
  return Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / values.length);
}

/** W that the terms come to in the run. */
export function conductionIn(run: Run, terms: readonly LossTerm[]): number {
  return terms.reduce((sum, { resistance, drop, count, vectors }) => {
    const rms = readFigure(run, { reading: 'rms', vectors });
    const mean = drop === 0 ? 0 : readFigure(run, { reading: 'mean', vectors });
    return sum + count * (resistance * rms * rms + drop * mean);
  }, 0);
}

function readVector(run: Run, name: string, reading: Reading): number {
  const values = run.vectors.get(name);
  if (values === undefined) throw new Error(`the simulator gave no ${name}`);
  if (reading === 'mean') return meanOf(run.time, values);
  if (reading === 'rms') return rmsOf(run.time, values);
  return swingOf(run.time, values);
}

/** Share of the kept time that a level must last to count: shorter spikes come of a simulator's step across an inductance. */
const LASTING = 1e-4;

/** Peak to peak of the levels that last. */
function swingOf(time: ArrayLike<number>, values: ArrayLike<number>): number {
  const order = Array.from({ length: values.length }, (_, i) => i).sort((a, b) => at(values, a) - at(values, b));
  const least = LASTING * (at(time, time.length - 1) - at(time, 0));
  return levelFrom(order.reverse(), time, values, least) - levelFrom(order.reverse(), time, values, least);
}

/** The first value of `order` whose points, with those before it, last `least` s. */
function levelFrom(
  order: readonly number[],
  time: ArrayLike<number>,
  values: ArrayLike<number>,
  least: number,
): number {
  let lasts = 0;
  for (const i of order) {
    const from = at(time, Math.max(0, i - 1));
    const to = at(time, Math.min(time.length - 1, i + 1));
    lasts += 0.5 * (to - from);
    if (lasts >= least) return at(values, i);
  }
  return Number.NaN;
}

/** Mean over the kept time. */
function meanOf(time: ArrayLike<number>, values: ArrayLike<number>): number {
  let sum = 0;
  for (let i = 1; i < time.length; i++) {
    sum += 0.5 * (at(time, i) - at(time, i - 1)) * (at(values, i) + at(values, i - 1));
  }
  return sum / (at(time, time.length - 1) - at(time, 0));
}

/** Root of the mean square over the kept time. */
function rmsOf(time: ArrayLike<number>, values: ArrayLike<number>): number {
  let sum = 0;
  for (let i = 1; i < time.length; i++) {
    const [a, b] = [at(values, i - 1), at(values, i)];
    sum += ((at(time, i) - at(time, i - 1)) * (a * a + a * b + b * b)) / 3;
  }
  return Math.sqrt(sum / (at(time, time.length - 1) - at(time, 0)));
}

function at(values: ArrayLike<number>, i: number): number {
  return values[i] ?? Number.NaN;
}
