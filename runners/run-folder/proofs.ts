/** Proofs kept in a run folder: `proof-<id>.json`, written whole, read by the page. */
import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import type { Proof } from '../../model/index.ts';
import { reasonOf, refusal } from '../errors.ts';
import { readText, writeWhole } from './files.ts';

/** Writes `proof` into a run folder. Throws the refusal `file-unwritable`. */
export function writeProof(folder: string, proof: Proof): void {
  const path = join(folder, `proof-${proof.id}.json`);
  try {
    writeWhole(path, `${JSON.stringify(proof, undefined, 1)}\n`);
  } catch (error) {
    throw refusal('file-unwritable', { file: path, reason: reasonOf(error) });
  }
}

/** Every proof of a run, by id. One that cannot be understood is left out: it can be made again. */
export function readProofs(folder: string): Proof[] {
  const names = readdirSync(folder).filter((name) => /^proof-[a-z0-9]+\.json$/.test(name));
  return names.sort().flatMap((name) => {
    try {
      const data: unknown = JSON.parse(readText(join(folder, name), 'a proof'));
      return isProof(data) ? [data] : [];
    } catch {
      return [];
    }
  });
}

function isProof(data: unknown): data is Proof {
  if (typeof data !== 'object' || data === null) return false;
  const { format, version, corners, limits } = data as Partial<Proof>;
  return format === 'chopfront-proof' && version === 1 && Array.isArray(corners) && Array.isArray(limits);
}
