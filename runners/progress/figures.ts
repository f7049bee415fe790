/** What a running sweep tells of itself, and the words for it; the three reporters differ only in where these go. */
import { showDuration } from '../terminal/duration.ts';

/** The state of a sweep at one moment. */
export interface Progress {
  /** Share of the budget used, 0 … 1. */
  readonly share: number;
  readonly evaluations: number;
  /** Designs evaluated a second, over the last while. */
  readonly perSecond: number;
  /** Share of designs that keep every limit, 0 … 1. */
  readonly feasible: number;
  readonly frontSize: number;
  readonly hypervolume: number;
  /** Gain of hypervolume over the last tenth of the work as a share; undefined while too early to say. */
  readonly trend: number | undefined;
  /** Best value of each objective, formatted for reading, such as `loss 1.23 W`. */
  readonly best: readonly string[];
  /** s; undefined while unknown. */
  readonly secondsLeft: number | undefined;
  readonly seconds: number;
  /** s since the last checkpoint; undefined before the first. */
  readonly checkpointAge: number | undefined;
  readonly faults: number;
}

/** Shows progress somewhere. */
export interface Reporter {
  /** Called about once a second. */
  show(progress: Progress): void;
  /** A line that stays: a warning, a fault. */
  say(line: string): void;
  /** Leaves the terminal tidy. */
  end(): void;
}

/** `0.1234` → `12.3 %`. */
export function percent(share: number, digits = 1): string {
  return `${(100 * share).toFixed(digits)} %`;
}

/** `123456` → `123 k`, for rates and counts that are read at a glance. */
export function rounded(count: number): string {
  if (count < 1000) return count.toFixed(0);
  if (count < 999_500) return `${(count / 1000).toFixed(count < 99_950 ? 1 : 0)} k`;
  return `${(count / 1e6).toFixed(count < 99.95e6 ? 2 : 0)} M`;
}

/** The lines of the live block under its bar. */
export function blockLines(progress: Progress): string[] {
  const trend = progress.trend === undefined ? 'too early for a trend' : `${signed(progress.trend)} in the last tenth`;
  const age = progress.checkpointAge;
  const saved = age === undefined ? 'nothing saved yet' : `saved ${showDuration(age)} ago`;
  const faults = progress.faults === 0 ? '' : `   islands lost ${progress.faults}`;
  return [
    `designs     ${rounded(progress.evaluations)}, ${rounded(progress.perSecond)} a second, ${percent(progress.feasible)} keep every limit`,
    `front       ${progress.frontSize} designs, hypervolume ${progress.hypervolume.toFixed(5)} (${trend})`,
    `best        ${progress.best.length === 0 ? 'none yet' : progress.best.join(', ')}`,
    `state       ${saved}${faults}`,
  ];
}

/** One line for logs. */
export function plainLine(progress: Progress): string {
  const left = progress.secondsLeft === undefined ? '' : `, ${showDuration(progress.secondsLeft)} left`;
  const best = progress.best.length === 0 ? '' : `, best ${progress.best.join(' / ')}`;
  return (
    `${percent(progress.share)} done${left}, ${rounded(progress.evaluations)} designs, ${rounded(progress.perSecond)}/s, ` +
    `feasible ${percent(progress.feasible)}, front ${progress.frontSize}, hypervolume ${progress.hypervolume.toFixed(5)}${best}`
  );
}

function signed(share: number): string {
  return `${share < 0 ? '−' : '+'}${percent(Math.abs(share), 2)}`;
}
