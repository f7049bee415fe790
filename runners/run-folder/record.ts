/** `run.json`: what a run is and how it stands, for people and other programs. Fields are added, never renamed. */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { z } from 'zod';
import { refusal, systemCode } from '../errors.ts';
import { writeWhole } from './files.ts';
import { RUN_RECORD } from './folder.ts';
import { issueText } from './issue.ts';

const count = z.number().int().nonnegative();

const FAULT = z.object({
  shard: count,
  island: count,
  epoch: count,
  /** What happened. */
  reason: z.string(),
  /** Gene values of the design that was being evaluated, by gene name; absent where unknown. */
  design: z.record(z.string(), z.number()).optional(),
});

const RECORD = z.object({
  format: z.literal('chopfront-run'),
  status: z.enum(['running', 'stopped', 'done', 'failed']),
  /** Version of the tool. */
  version: z.string(),
  /** Version of Node. */
  node: z.string(),
  rail: z.string(),
  railHash: z.string(),
  partsHash: z.string(),
  seed: z.string(),
  shards: count,
  /** The shard that this run is; absent where it holds all of them. */
  shard: count.optional(),
  threads: count,
  islands: count,
  budget: z.object({
    evaluations: z.number().optional(),
    seconds: z.number().optional(),
    steady: z.number().optional(),
  }),
  evaluations: count,
  epochs: count,
  /** Wall clock, s, over all resumptions. */
  seconds: z.number(),
  /** Designs per second over the whole run. */
  perSecond: z.number(),
  /** How many of the evaluated designs keep every limit. */
  feasible: count,
  /** The same as a share, 0 … 1. */
  feasibleShare: z.number(),
  frontSize: count,
  archiveSize: count,
  nearMisses: count,
  /** Of the archive, normalised by each objective's ideal and reference, 0 … 1. */
  hypervolume: z.number(),
  /** Share of the budget used, 0 … 1. */
  share: z.number(),
  /** How the search went; see the documentation of the optimizer's trust record. */
  trust: z.record(z.string(), z.unknown()),
  faults: z.array(FAULT),
  /** Parts tables of the snapshot in `parts/`. */
  tables: z.array(z.object({ kind: z.string(), file: z.string(), stored: z.string() })),
  /** ISO 8601. */
  started: z.string(),
  updated: z.string(),
});

export type RunRecord = z.infer<typeof RECORD>;
export type Fault = z.infer<typeof FAULT>;

/** Writes the record into a run folder. */
export function writeRecord(folder: string, record: RunRecord): void {
  writeWhole(join(folder, RUN_RECORD), `${JSON.stringify(record, undefined, 2)}\n`);
}

/** The record of a run folder. Throws the refusals `run-missing` and `run-damaged`. */
export function readRecord(folder: string): RunRecord {
  try {
    return RECORD.parse(JSON.parse(readFileSync(join(folder, RUN_RECORD), 'utf8')));
  } catch (error) {
    const code = systemCode(error);
    if (code === 'ENOENT' || code === 'ENOTDIR') throw refusal('run-missing', { folder });
    throw refusal('run-damaged', { folder, file: RUN_RECORD, reason: issueText(error) });
  }
}
