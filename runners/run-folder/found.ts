/**
 * What a run has found, apart from how it goes on: the archive of feasible designs, the near misses, and where they came
 * from, and a sample of everything feasible. It is what `merge` and the page read; `archive.bin` holds it, sealed.
 */
import { readFileSync } from 'node:fs';
import type { DesignSample, Designs, NearMissDesigns } from '../../optimizer/index.ts';
import { reasonOf, refusal, systemCode } from '../errors.ts';
import { writeWhole } from './files.ts';
import { RUN_FILES, runFile } from './folder.ts';
import { seal, unseal } from './sealed.ts';
import type { Source } from './sources.ts';

/** What was found. */
export interface Found {
  readonly railHash: string;
  readonly partsHash: string;
  /** Ordered by seed, shards, shard; each once. */
  readonly sources: readonly Source[];
  readonly archive: Designs;
  readonly nearMisses: NearMissDesigns;
  /** At most 50,000 of the feasible designs evaluated. */
  readonly sample: DesignSample;
}

type Header = Pick<Found, 'railHash' | 'partsHash' | 'sources'> & {
  readonly designs: number;
  readonly nearMisses: number;
  readonly sampled: number;
};

const KIND = 'archive 2';

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
  const { archive, nearMisses, sample, ...rest } = found;
  const counts = { designs: archive.count, nearMisses: nearMisses.count, sampled: sample.count };
  const header: Header = { ...rest, ...counts };
  const arrays = [archive, nearMisses].flatMap(({ genes, objectives, violations }) => [genes, objectives, violations]);
  const all = [...arrays, nearMisses.limit, sample.keys, sample.objectives, sample.family];
  const parts = all.map((a) => new Uint8Array(a.buffer, a.byteOffset, a.byteLength));
  return seal(KIND, { header, parts });
}

/** What those bytes hold. Throws an `Error` that says what is wrong with them. */
function unpackFound(bytes: Uint8Array): Found {
  const { header, parts } = unseal(KIND, bytes);
  const { designs, nearMisses, sampled, ...rest } = header as Header;
  const doubles = parts.slice(0, 6).map((part) => new Float64Array(part.buffer));
  const [genes, objectives, violations, missGenes, missObjectives, missViolations] = doubles;
  const [limit, keys, points, family] = parts.slice(6);
  if (!genes || !objectives || !violations || !missGenes || !missObjectives || !missViolations || !limit) {
    throw new Error('parts are missing');
  }
  if (!keys || !points || !family) throw new Error('the sample is missing');
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
    sample: {
      count: sampled,
      keys: new Float64Array(keys.buffer),
      objectives: new Float64Array(points.buffer),
      family: new Int32Array(family.buffer),
    },
  };
}
