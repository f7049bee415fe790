/**
 * What the short searches after a sweep found: `restarts.bin`, sealed like the archive it belongs to. An archive that went on
 * since makes it void, so that what people read never mixes two states of a run.
 */
import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { createMerger, type Designs, mergeNearMisses, type NearMissDesigns, NO_SAMPLE } from '../../optimizer/index.ts';
import type { Problem } from '../../optimizer/problem.ts';
import { writeWhole } from './files.ts';
import { runFile } from './folder.ts';
import type { Found } from './found.ts';
import { seal, unseal } from './sealed.ts';

/** Findings of the short searches, and how they were made. */
export interface Restarts {
  /** By what fractions limits were relaxed, and which. */
  readonly steps: readonly number[];
  readonly limits: readonly string[];
  /** Of each search. */
  readonly evaluations: number;
  /** Designs that keep every limit. */
  readonly level: Designs;
  readonly misses: NearMissDesigns;
}

type Header = Pick<Restarts, 'steps' | 'limits' | 'evaluations'> & {
  readonly archive: string;
  readonly level: number;
  readonly misses: number;
};

const KIND = 'restarts 1';

/** Writes `restarts.bin` for that archive. */
export function writeRestarts(folder: string, archive: Designs, restarts: Restarts): void {
  const { steps, limits, evaluations, level, misses } = restarts;
  const counts = { level: level.count, misses: misses.count };
  const header: Header = { archive: hashOf(archive), steps, limits, evaluations, ...counts };
  const arrays = [level, misses].flatMap(({ genes, objectives, violations }) => [genes, objectives, violations]);
  const parts = [...arrays, misses.limit].map((a) => new Uint8Array(a.buffer, a.byteOffset, a.byteLength));
  writeWhole(runFile(folder, 'restarts'), seal(KIND, { header, parts }));
}

/** `restarts.bin` of a run; undefined where there is none for that archive, or it cannot be understood: it can be made again. */
export function readRestarts(folder: string, archive: Designs): Restarts | undefined {
  try {
    const { header, parts } = unseal(KIND, readFileSync(runFile(folder, 'restarts')));
    const { archive: of, level: count, misses: missed, ...rest } = header as Header;
    if (of !== hashOf(archive)) return undefined;
    const [a, b, c, d, e, f] = parts.slice(0, 6).map((part) => new Float64Array(part.buffer));
    const limit = parts[6];
    if (!a || !b || !c || !d || !e || !f || !limit) return undefined;
    const level = { count, genes: a, objectives: b, violations: c };
    const misses = { count: missed, genes: d, objectives: e, violations: f, limit: new Int32Array(limit.buffer) };
    return { ...rest, level, misses };
  } catch {
    return undefined;
  }
}

/** What the run's people see as near misses: of the sweep and of the short searches, as far as nothing that keeps every limit beats them. */
export function nearMissesWith(
  problem: Problem,
  { archive, nearMisses }: Pick<Found, 'archive' | 'nearMisses'>,
  restarts: Restarts | undefined,
): NearMissDesigns {
  if (restarts === undefined) return mergeNearMisses(problem, [nearMisses], archive);
  const merger = createMerger(problem);
  merger.add({ archive, nearMisses, sample: NO_SAMPLE });
  merger.add({ archive: restarts.level, nearMisses: restarts.misses, sample: NO_SAMPLE });
  return mergeNearMisses(problem, [merger.nearMisses()], merger.archive());
}

function hashOf({ genes }: Designs): string {
  return createHash('sha256')
    .update(new Uint8Array(genes.buffer, genes.byteOffset, genes.byteLength))
    .digest('hex');
}
