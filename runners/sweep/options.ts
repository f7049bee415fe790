/** What a person may ask of a sweep on the command line. */

/** Options of `chopfront sweep`, read; an absent one was not given. */
export interface SweepOptions {
  readonly out: string;
  readonly evaluations?: number;
  /** s. */
  readonly time?: number;
  readonly untilSteady?: number;
  readonly seed?: string;
  readonly threads?: number;
  readonly resume?: boolean;
  readonly shards?: number;
  readonly shard?: 'auto' | { readonly shard: number; readonly shards: number };
  readonly indexFrom?: number;
  readonly on?: 'slurm';
  readonly partition?: string;
  readonly timeLimit?: string;
  /** False with --no-page. */
  readonly page: boolean;
  readonly log?: 'json';
  /** s. */
  readonly checkpoint?: number;
  /** s. */
  readonly epochLimit?: number;
}
