/**
 * A bounded memory of designs seen: a table with one fingerprint a slot, where a newcomer replaces what was there. It never calls a new design
 * seen but for one chance in 2³², and forgets old ones only where slots collide.
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

/** Remembers the design hashed in `hash`; true when it was remembered already. */
export function remember(seen: Uint32Array, hash: Uint32Array): boolean {
  const slot = hash[0] & (seen.length - 1);
  if (seen[slot] === hash[1]) return true;
  seen[slot] = hash[1];
  return false;
}

function finish(h: number): number {
  let x = h ^ (h >>> 16);
  x = Math.imul(x, 0x85ebca6b | 0);
  x ^= x >>> 13;
  x = Math.imul(x, 0xc2b2ae35 | 0);
  return x ^ (x >>> 16);
}
