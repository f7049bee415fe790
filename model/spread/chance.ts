/** Chance for the spread: a number for each (seed, sample, place), so that any thread may draw any sample. */
import { cos, log } from '../../optimizer/maths/index.ts';

/** 32 bits of a text. */
export function seedOf(text: string): number {
  let h = 0x811c9dc5;
  for (let i = 0; i < text.length; i++) h = Math.imul(h ^ text.charCodeAt(i), 0x01000193);
  return mix(h);
}

/**
 * Uniform in (0, 1): two rounds of a 32-bit finaliser over seed, sample and place give 52 bits.
 * @derivation counter-based generator: each number is a hash of its own place, so order does not matter
 * @valid whole `sample` and `place` below 2³²
 * @example uniform(1, 2, 3) = 0.328545
 */
export function uniform(seed: number, sample: number, place: number): number {
  const high = mix(seed ^ mix(sample ^ mix(place ^ 0x9e3779b9))) >>> 0;
  const low = mix(high ^ mix(sample + 0x7f4a7c15) ^ mix(place ^ seed)) >>> 0;
  return ((high >>> 6) * 67108864 + (low >>> 6) + 0.5) / 4503599627370496;
}

/**
 * Normal with mean 0 and deviation 1: Box and Muller (1958). Uses places `place` and `place + 1`.
 * @derivation polar form of two normals
 * @valid as `uniform`
 * @example normal(1, 2, 3) = -1.214941
 */
export function normal(seed: number, sample: number, place: number): number {
  const radius = Math.sqrt(-2 * log(uniform(seed, sample, place)));
  return radius * cos(2 * Math.PI * uniform(seed, sample, place + 1));
}

/** The 32-bit finaliser of MurmurHash3 (Appleby, public domain): every input bit reaches every output bit. */
function mix(value: number): number {
  let h = value | 0;
  h = Math.imul(h ^ (h >>> 16), 0x85ebca6b);
  h = Math.imul(h ^ (h >>> 13), 0xc2b2ae35);
  return h ^ (h >>> 16);
}
