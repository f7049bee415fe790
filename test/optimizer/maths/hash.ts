/**
 * One number that stands for a million results of a portable function, bit by bit. Pure: the tests of Node and of the page
 * run this same code and compare the numbers.
 */
import * as maths from '../../../optimizer/maths/index.ts';

/** A function of one or two arguments and the range its everyday arguments come from. */
interface Subject {
  readonly name: string;
  readonly low: number;
  readonly high: number;
  readonly call: (x: number, y: number) => number;
}

/** Every public function of `optimizer/maths/` that takes and returns numbers. */
export const SUBJECTS: readonly Subject[] = [
  { name: 'exp', low: -745, high: 710, call: maths.exp },
  { name: 'expm1', low: -40, high: 710, call: maths.expm1 },
  { name: 'log', low: 0, high: 100, call: maths.log },
  { name: 'log2', low: 0, high: 100, call: maths.log2 },
  { name: 'log10', low: 0, high: 100, call: maths.log10 },
  { name: 'pow', low: 0, high: 40, call: maths.pow },
  { name: 'sin', low: -100, high: 100, call: maths.sin },
  { name: 'cos', low: -100, high: 100, call: maths.cos },
  { name: 'tan', low: -100, high: 100, call: maths.tan },
  { name: 'atan', low: -10, high: 10, call: maths.atan },
  { name: 'sinh', low: -30, high: 30, call: maths.sinh },
  { name: 'cosh', low: -30, high: 30, call: maths.cosh },
  { name: 'tanh', low: -10, high: 10, call: maths.tanh },
  { name: 'cbrt', low: -1000, high: 1000, call: maths.cbrt },
  { name: 'hypot', low: -1000, high: 1000, call: maths.hypot },
];

/**
 * A stream of arguments that is the same everywhere: values spread evenly over low … high, mixed with random patterns
 * of 64 bits (so every exponent, infinities and NaN occur). Taken in pairs: of four firsts two are patterns, of four seconds one. Marsaglia's xorshift32 supplies the bits.
 */
export function argumentStream(low: number, high: number): () => number {
  const view = new DataView(new ArrayBuffer(8));
  let state = 0x9e3779b9 | 0;
  let turn = 0;
  const bits = (): number => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    return state >>> 0;
  };
  return () => {
    const first = bits();
    const second = bits();
    turn = (turn + 1) & 7;
    const pattern = turn === 2 || turn === 6 || turn === 7;
    if (!pattern) return low + (high - low) * (first / 4294967296 + second / 18446744073709552000);
    view.setUint32(0, first);
    view.setUint32(4, second);
    return view.getFloat64(0);
  };
}

/** 32-bit FNV-1a hash, taken over whole words, of `count` results of the named function. Every NaN counts as the same. */
export function hashOf(name: string, count = 1_000_000): number {
  const subject = SUBJECTS.find((candidate) => candidate.name === name);
  if (subject === undefined) throw new Error(`no portable function called ${name}`);
  const next = argumentStream(subject.low, subject.high);
  const view = new DataView(new ArrayBuffer(8));
  let hash = 0x811c9dc5 | 0;
  for (let i = 0; i < count; i++) {
    const x = next();
    const value = subject.call(x, next());
    view.setFloat64(0, Number.isNaN(value) ? 0.5 : value);
    hash = Math.imul(hash ^ view.getInt32(0), 0x01000193);
    hash ^= hash >>> 15;
    hash = Math.imul(hash ^ view.getInt32(4), 0x01000193);
    hash ^= hash >>> 13;
  }
  return hash >>> 0;
}
