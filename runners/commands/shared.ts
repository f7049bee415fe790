/** What several commands say or ask in the same way. Loaded by `--help`, so it imports nothing heavy. */
import { InvalidArgumentError } from 'commander';
import { readDuration } from '../terminal/duration.ts';

/** What a command gets to say how it ended, where that is not 0. */
export type SetStatus = (status: number) => void;

/** Text of `--help` with examples, each a command line without the program's name. */
export function examples(lines: readonly string[]): string {
  return `\nExamples:\n${lines.map((line) => `  chopfront ${line}`).join('\n')}\n`;
}

/** A count on the command line: `200000`, `200k`, `2M`, `1.5M`. */
export function countOption(text: string): number {
  const found = /^(\d+(?:\.\d+)?)\s*(k|M|G)?$/.exec(text.replaceAll('_', '').trim());
  const scale = { k: 1e3, M: 1e6, G: 1e9 }[found?.[2] ?? ''] ?? 1;
  const value = found === null ? Number.NaN : Number(found[1]) * scale;
  if (!Number.isSafeInteger(value) || value < 1) {
    throw new InvalidArgumentError('give a whole number above zero, such as 200000, 200k or 2M.');
  }
  return value;
}

/** A whole number from `low` to `high`. */
export function wholeOption(low: number, high: number): (text: string) => number {
  return (text) => {
    const value = /^\d+$/.test(text.trim()) ? Number(text) : Number.NaN;
    if (!(value >= low && value <= high)) throw new InvalidArgumentError(`give a whole number from ${low} to ${high}.`);
    return value;
  };
}

/** A duration on the command line, s. */
export function durationOption(text: string): number {
  const seconds = readDuration(text);
  if (seconds === undefined) throw new InvalidArgumentError('give a duration, such as 90s, 30min, 8h or 1h30m.');
  return seconds;
}

/** A share on the command line, as a number or in percent, above 0 and below 1. */
export function shareOption(text: string): number {
  const found = /^(\d*\.?\d+)\s*(%)?$/.exec(text.trim());
  const value = found === null ? Number.NaN : Number(found[1]) / (found[2] === '%' ? 100 : 1);
  if (!(value > 0 && value < 1)) throw new InvalidArgumentError('give a share, such as 0.001 or 0.1%.');
  return value;
}

/** `I/K`: shard I of K, counted from 0. */
export function shardOption(text: string): { readonly shard: number; readonly shards: number } {
  const found = /^(\d{1,6})\/(\d{1,6})$/.exec(text.trim());
  if (found === null) throw new InvalidArgumentError('give I/K, such as 0/4 for the first shard of four.');
  const [shard, shards] = [Number(found[1]), Number(found[2])];
  if (shard >= shards)
    throw new InvalidArgumentError(`shards count from 0, so the last of ${shards} is ${shards - 1}.`);
  return { shard, shards };
}
