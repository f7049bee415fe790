/**
 * The state of a sweep in one file: plain data and the packed islands, sealed with a checksum. The last two are kept, so
 * that a damaged one costs one interval and not the night.
 */
import { readdirSync, readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { reasonOf } from '../errors.ts';
import { writeWhole } from './files.ts';
import { seal, unseal } from './sealed.ts';

/** What a checkpoint holds. */
export interface Checkpoint {
  /** Count of checkpoints of this run up to this one; names sort by it. */
  readonly number: number;
  /** Version of Node that wrote it. */
  readonly node: string;
  /** Everything else that the sweep needs back: plain data. */
  readonly state: unknown;
  /** The packed islands, ring by ring. */
  readonly islands: readonly Uint8Array[];
}

type Header = Omit<Checkpoint, 'islands'>;

const KIND = 'checkpoint 1';
const KEEP = 2;
const NAME = /^checkpoint-(\d{10})\.bin$/;

/** Writes a checkpoint into `folder`, then removes all but the last two. Returns its name. Throws what the system throws. */
export function writeCheckpoint(folder: string, { islands, ...header }: Checkpoint): string {
  const name = `checkpoint-${String(header.number).padStart(10, '0')}.bin`;
  writeWhole(join(folder, name), seal(KIND, { header, parts: islands }));
  for (const old of checkpointNames(folder).slice(KEEP)) rmSync(join(folder, old), { force: true });
  return name;
}

/** The newest whole checkpoint of `folder`, with a warning for each damaged one that was passed over. */
export function readCheckpoint(folder: string): { readonly checkpoint?: Checkpoint; readonly warnings: string[] } {
  const warnings: string[] = [];
  for (const name of checkpointNames(folder)) {
    try {
      return { checkpoint: unpackCheckpoint(readFileSync(join(folder, name))), warnings };
    } catch (error) {
      warnings.push(`${join(folder, name)}: damaged (${reasonOf(error)}); going back to the one before`);
    }
  }
  return { warnings };
}

/** Names of the checkpoints in `folder`, newest first. */
export function checkpointNames(folder: string): string[] {
  return readdirSync(folder)
    .filter((name) => NAME.test(name))
    .sort()
    .reverse();
}

/** The checkpoint in those bytes. Throws an `Error` that says what is wrong with them. */
export function unpackCheckpoint(bytes: Uint8Array): Checkpoint {
  const { header, parts } = unseal(KIND, bytes);
  const { number, node, state } = (header ?? {}) as Partial<Header>;
  if (typeof number !== 'number' || typeof node !== 'string') throw new Error('it lacks its number or its version');
  return { number, node, state, islands: parts };
}
