/**
 * What a run has found, apart from how it goes on: the archive of feasible designs, the near misses, and where they came
 * from. It is what `merge`, `compare` and the page read; `archive.bin` holds it, sealed.
 */
import { readFileSync } from 'node:fs';
import type { Designs, NearMissDesigns } from '../../optimizer/index.ts';
import { reasonOf, refusal, systemCode } from '../errors.ts';
import type { HistoryRow } from '../sweep/history.ts';
import { writeWhole } from './files.ts';
import { RUN_FILES, runFile } from './folder.ts';
import { seal, unseal } from './sealed.ts';

/** One ring of islands that contributed. */
export interface Source {
  readonly seed: string;
  readonly shards: number;
  readonly shard: number;
  readonly epoch: number;
  readonly evaluations: number;
  readonly feasible: number;
  readonly history: readonly HistoryRow[];
  /** How much of each family was tried, in the order of the problem's families; absent where it was not counted. */
  readonly families?: readonly { readonly evaluated: number; readonly feasible: number }[];
}

/** What was found. */
export interface Found {
  readonly railHash: string;
  readonly partsHash: string;
  /** Ordered by seed, shards, shard; each once. */
  readonly sources: readonly Source[];
  readonly archive: Designs;
  readonly nearMisses: NearMissDesigns;
}

type Header = Pick<Found, 'railHash' | 'partsHash' | 'sources'> & {
  readonly designs: number;
  readonly nearMisses: number;
};

const KIND = 'archive 1';

/** Writes `archive.bin` into a run folder. */
export function writeFound(folder: string, found: Found): void {
  writeWhole(runFile(folder, 'archive'), packFound(found));
}

/** `archive.bin` of a run. Throws the refusals `run-empty` and `run-damaged`. */
export function readFound(folder: string): Found {
  try {
    return unpackFound(readFileSync(runFile(folder, 'archive')));
  } catch (error) {
    if (systemCode(error) === 'ENOENT') throw refusal('run-empty', { folder });
    throw refusal('run-damaged', { folder, file: RUN_FILES.archive, reason: reasonOf(error) });
  }
}

/** The bytes of `archive.bin`. */
function packFound(found: Found): Uint8Array {
  const { archive, nearMisses, ...rest } = found;
  const header: Header = { ...rest, designs: archive.count, nearMisses: nearMisses.count };
  const arrays = [archive, nearMisses].flatMap(({ genes, objectives, violations }) => [genes, objectives, violations]);
  const parts = [...arrays, nearMisses.limit].map((a) => new Uint8Array(a.buffer, a.byteOffset, a.byteLength));
  return seal(KIND, { header, parts });
}

/** What those bytes hold. Throws an `Error` that says what is wrong with them. */
function unpackFound(bytes: Uint8Array): Found {
  const { header, parts } = unseal(KIND, bytes);
  const { designs, nearMisses, ...rest } = header as Header;
  const doubles = parts.slice(0, 6).map((part) => new Float64Array(part.buffer));
  const [genes, objectives, violations, missGenes, missObjectives, missViolations] = doubles;
  const limit = parts[6];
  if (!genes || !objectives || !violations || !missGenes || !missObjectives || !missViolations || !limit) {
    throw new Error('parts are missing');
  }
  return {
    ...rest,
    archive: { count: designs, genes, objectives, violations },
    nearMisses: {
      count: nearMisses,
      genes: missGenes,
      objectives: missObjectives,
      violations: missViolations,
      limit: new Int32Array(limit.buffer),
    },
  };
}
