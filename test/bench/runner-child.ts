/** What the runner's bench starts as a process of its own, so that its memory and processor time are its own: a sweep, or a merge of synthetic shards. */
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { problemOf, readSheet } from '../../runners/inputs.ts';
import { main } from '../../runners/main.ts';
import { readFound, writeFound } from '../../runners/run-folder/found.ts';
import { createJoiner } from '../../runners/run-folder/merge.ts';
import { measureDesigns } from '../../runners/sweep/grid.ts';
import { syntheticFound } from '../runners/synthetic.ts';

/** What a child is asked to do. */
export type ChildTask =
  | { readonly work: 'sweep'; readonly args: readonly string[] }
  | { readonly work: 'merge'; readonly sheet: string; readonly counts: readonly number[]; readonly designs: number };

/** A merge after so many shards. */
export interface MergeMark {
  readonly shards: number;
  /** Reading and joining them, one after the other, ms. */
  readonly ms: number;
  /** Resident, MB. */
  readonly megabytes: number;
  readonly front: number;
  readonly hypervolume: number;
}

const task: ChildTask = JSON.parse(process.argv[2] ?? '');
if (task.work === 'sweep') process.exitCode = await main(task.args);
else process.stdout.write(`${JSON.stringify(merge(task.sheet, task.counts, task.designs))}\n`);

function merge(sheet: string, counts: readonly number[], designs: number): MergeMark[] {
  const problem = problemOf(readSheet(sheet));
  const folder = mkdtempSync(join(tmpdir(), 'merge-bench-'));
  try {
    const joiner = createJoiner(problem);
    const shards = Math.max(...counts);
    const marks: MergeMark[] = [];
    let ms = 0;
    for (let shard = 0; shard < shards; shard++) {
      writeFound(folder, syntheticFound(problem, { shard, shards, designs, epochs: 100 }));
      const start = performance.now();
      joiner.add(readFound(folder));
      ms += performance.now() - start;
      if (!counts.includes(shard + 1)) continue;
      const { archive } = joiner.joined();
      const { hypervolume } = measureDesigns(problem, archive);
      globalThis.gc?.();
      marks.push({
        shards: shard + 1,
        ms,
        megabytes: process.memoryUsage().rss / 1e6,
        front: archive.count,
        hypervolume,
      });
    }
    return marks;
  } finally {
    rmSync(folder, { recursive: true });
  }
}
