/** A 60-bit name for a text: FNV-1a over its UTF-8 bytes (Fowler, Noll, Vo), folded from 64 bits. */

const OFFSET = 0xcbf29ce484222325n;
const PRIME = 0x100000001b3n;
const MASK = 0xffffffffffffffffn;
const LETTERS = '0123456789abcdefghjkmnpqrstvwxyz';

/** Twelve letters and digits (no i, l, o, u) that name `text`: 60 bits. */
export function shortHash(text: string): string {
  let hash = OFFSET;
  for (const byte of new TextEncoder().encode(text)) hash = ((hash ^ BigInt(byte)) * PRIME) & MASK;
  let folded = (hash >> 60n) ^ (hash & 0xfffffffffffffffn);
  let name = '';
  for (let i = 0; i < 12; i++) {
    name = LETTERS[Number(folded & 31n)] + name;
    folded >>= 5n;
  }
  return name;
}
