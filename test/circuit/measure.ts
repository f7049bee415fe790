/** Figures of one kept period: mean, ripple, rms, mean power, by the trapezoid rule over the simulator's own time steps. */
import type { Run } from './simulator.ts';

/** The vector `name`, or an error that lists what there is. */
export function vector(run: Run, name: string): readonly number[] {
  const found = run.vectors.get(name);
  if (found === undefined) throw new Error(`no ${name} among ${[...run.vectors.keys()].join(', ')}`);
  return found;
}

/** Mean over the kept time. */
export function meanOf(run: Run, values: readonly number[]): number {
  const { time } = run;
  let sum = 0;
  for (let i = 1; i < time.length; i++) sum += 0.5 * (time[i] - time[i - 1]) * (values[i] + values[i - 1]);
  return sum / (time[time.length - 1] - time[0]);
}

/** Root of the mean square over the kept time, each step a straight line. */
export function rmsOf(run: Run, values: readonly number[]): number {
  const { time } = run;
  let sum = 0;
  for (let i = 1; i < time.length; i++) {
    const [a, b] = [values[i - 1], values[i]];
    sum += ((time[i] - time[i - 1]) * (a * a + a * b + b * b)) / 3;
  }
  return Math.sqrt(sum / (time[time.length - 1] - time[0]));
}

/** Peak to peak. */
export function rippleOfRun(values: readonly number[]): number {
  return Math.max(...values) - Math.min(...values);
}

/** Mean of (a − b)·i: power that goes into whatever lies between two nodes. */
export function powerOf(run: Run, a: readonly number[], b: readonly number[], i: readonly number[]): number {
  return meanOf(
    run,
    i.map((amperes, k) => amperes * (a[k] - b[k])),
  );
}
