/**
 * A bounded memory of designs seen: a table of fingerprints in buckets of four, where a newcomer pushes out the oldest. It calls a new design
 * seen with a chance of about one in 10⁹, and forgets old ones only where buckets overflow.
 */

/** Hashes one row of genes into `out`: the slot hash first, the fingerprint (never 0) second. MurmurHash3's mixing (Appleby 2011). */
export function hashRow(words: Uint32Array, out: Uint32Array): void {
  let a = 0x9747b28c | 0;
  let b = 0x3c6ef372 | 0;
  for (let i = 0; i < words.length; i++) {
    const k = Math.imul(words[i], 0xcc9e2d51 | 0);
    const mixed = Math.imul((k << 15) | (k >>> 17), 0x1b873593);
    a ^= mixed;
    a = (Math.imul((a << 13) | (a >>> 19), 5) + 0xe6546b64) | 0;
    b = Math.imul(b ^ mixed, 0x85ebca6b | 0);
    b ^= b >>> 15;
  }
  out[0] = finish(a ^ words.length);
  out[1] = finish(b) | 1;
}

/** Slots of a bucket: a design is looked for, and remembered, in one bucket. */
const WAYS = 4;

/** Remembers the design hashed in `hash`; true when it was remembered already. A full bucket forgets its oldest. */
export function remember(seen: Uint32Array, hash: Uint32Array): boolean {
  const bucket = (hash[0] & (seen.length / WAYS - 1)) * WAYS;
  for (let k = bucket; k < bucket + WAYS; k++) if (seen[k] === hash[1]) return true;
  for (let k = bucket + WAYS - 1; k > bucket; k--) seen[k] = seen[k - 1];
  seen[bucket] = hash[1];
  return false;
}

function finish(h: number): number {
  let x = h ^ (h >>> 16);
  x = Math.imul(x, 0x85ebca6b | 0);
  x ^= x >>> 13;
  x = Math.imul(x, 0xc2b2ae35 | 0);
  return x ^ (x >>> 16);
}
