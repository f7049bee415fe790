/** The portable functions' hashes, a tenth of the results each: every function that Node's own test fixes. */
import { hashOf, SUBJECTS } from '../optimizer/maths/hash.ts';

/** All hashes in one text. */
export function mathsHash(count = 100_000): string {
  return SUBJECTS.map(({ name }) => `${name} ${hashOf(name, count)}`).join('\n');
}
