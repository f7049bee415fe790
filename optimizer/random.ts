/**
 * Random numbers of the search: seedrandom's `alea`, seeded by seed, shard and island, whose state is four plain numbers that can be
 * saved and restored at any draw.
 */
import alea from 'seedrandom/lib/alea.js';
import { log } from './maths/index.ts';

/** Everything a generator remembers. */
export interface RandomState {
  readonly c: number;
  readonly s0: number;
  readonly s1: number;
  readonly s2: number;
}

/** A stream of random numbers. */
export interface Random {
  /** Evenly spread over 0 (inclusive) … 1 (exclusive), in steps of 2⁻³². */
  uniform(): number;
  /** Whole number, evenly spread over 0 … count − 1. */
  whole(count: number): number;
  /** Standard normal, mean 0 and deviation 1. */
  normal(): number;
  /** State from which `restoreRandom` goes on with the same numbers. */
  state(): RandomState;
}

/** State of a fresh stream; different arguments give unrelated streams. */
export function seedRandom(seed: number | string, shard: number, island: number): RandomState {
  return alea(`${seed}/${shard}/${island}`, { state: true }).state();
}

/** The stream that goes on from `state`. */
export function restoreRandom(state: RandomState): Random {
  const uniform = alea('', { state });
  return {
    uniform,
    whole: (count) => Math.floor(uniform() * count),
    normal: () => polarNormal(uniform),
    state: () => uniform.state(),
  };
}

/** Marsaglia's polar method (1964), the second number of each pair thrown away so that the state stays four numbers. */
function polarNormal(uniform: () => number): number {
  for (;;) {
    const x = 2 * uniform() - 1;
    const y = 2 * uniform() - 1;
    const s = x * x + y * y;
    if (s > 0 && s < 1) return x * Math.sqrt((-2 * log(s)) / s);
  }
}
