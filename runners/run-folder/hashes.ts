/** Hashes of sheets and parts: of their canonical form in SI units, so that comments, order and spelling do not count. */
import { createHash } from 'node:crypto';

/** SHA-256 of a canonical text, in hexadecimal. */
export function hashOf(canonical: string): string {
  return createHash('sha256').update(canonical, 'utf8').digest('hex');
}
