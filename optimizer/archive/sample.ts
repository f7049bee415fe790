/**
 * A bounded, fair sample of the feasible designs seen: those whose genes have the smallest hashes. What it holds depends on the set of designs
 * shown to it and on its bound, never on their order or repetition (bottom-k sampling, Cohen, Kaplan 2007), so samples of islands and shards
 * merge in any order to the same bytes.
 */
import { hashRow } from '../seen.ts';

/** Designs by the hash of their genes, smallest first; plain data. */
export interface DesignSample {
  readonly count: number;
  /** Hash of each design's snapped genes, a whole number of 53 bits; ascending, each once. */
  readonly keys: Float64Array;
  /** Row-major, one row of objectives a design. */
  readonly objectives: Float64Array;
  /** Index of each design's family. */
  readonly family: Int32Array;
}

/** A sample that takes in designs. */
export interface Sampler {
  /** Shows row `row` of the arrays to the sample; the design must be feasible and its genes snapped. */
  offer(genes: Float64Array, objectives: Float64Array, family: Int32Array, row: number): void;
  /** Shows all designs of another sample. */
  addAll(sample: DesignSample): void;
  /** Forgets all. */
  clear(): void;
  pack(): DesignSample;
  /** As `pack`, but in the sampler's own arrays: until something is offered, added or forgotten. */
  view(): DesignSample;
}

/** A sample without designs. */
export const NO_SAMPLE: DesignSample = {
  count: 0,
  keys: new Float64Array(0),
  objectives: new Float64Array(0),
  family: new Int32Array(0),
};

/** An empty sampler of at most `bound` designs with `genes` genes and `m` objectives. */
export function createSampler(genes: number, m: number, bound: number): Sampler {
  return new BottomSampler(genes, m, bound);
}

/** Places of newcomers between two sortings, as a part of the bound. */
const ROOM = 0.25;
/** 2²¹: 32 bits of one hash above 21 bits of another make a whole number that a double holds. */
const HIGH = 2_097_152;

/** Kernel. Rows 0 … held − 1 are settled: sorted, each key once; rows held … used − 1 are newcomers. */
class BottomSampler implements Sampler {
  private readonly n: number;
  private readonly m: number;
  private readonly bound: number;
  private keys: Float64Array;
  private objectives: Float64Array;
  private family: Int32Array;
  /** Where the next sorting writes to; the arrays it read from take its place. */
  private spare: { keys: Float64Array; objectives: Float64Array; family: Int32Array } | undefined;
  private readonly gene: Float64Array;
  private readonly words: Uint32Array;
  private readonly hash = new Uint32Array(2);
  /** Key of the newcomer, and largest key that can still come in. */
  private readonly mark = new Float64Array([0, Number.POSITIVE_INFINITY]);
  private held = 0;
  private used = 0;

  constructor(genes: number, m: number, bound: number) {
    const room = bound + Math.ceil(bound * ROOM) + 1;
    this.n = genes;
    this.m = m;
    this.bound = bound;
    this.keys = new Float64Array(room);
    this.objectives = new Float64Array(room * m);
    this.family = new Int32Array(room);
    this.gene = new Float64Array(genes);
    this.words = new Uint32Array(this.gene.buffer);
  }

  offer(genes: Float64Array, objectives: Float64Array, family: Int32Array, row: number): void {
    const { n, gene, hash, mark } = this;
    // Adding 0 turns −0 into 0, so that equal designs have equal hashes.
    for (let g = 0; g < n; g++) gene[g] = genes[row * n + g] + 0;
    hashRow(this.words, hash);
    mark[0] = hash[0] * HIGH + (hash[1] >>> 11);
    if (mark[0] <= mark[1]) this.take(objectives, family, row);
  }

  addAll(sample: DesignSample): void {
    if (this.used === 0 && this.begin(sample)) return;
    const { count, keys, objectives, family } = sample;
    const { mark } = this;
    // Newcomers that are in order need no sorting, and those of a sample are, if they stand by themselves.
    this.settle();
    for (let row = 0; row < count; row++) {
      mark[0] = keys[row];
      if (mark[0] <= mark[1]) this.take(objectives, family, row);
    }
    this.settle();
  }

  clear(): void {
    this.held = 0;
    this.used = 0;
    this.mark[1] = Number.POSITIVE_INFINITY;
  }

  pack(): DesignSample {
    const { count, keys, objectives, family } = this.view();
    return { count, keys: keys.slice(), objectives: objectives.slice(), family: family.slice() };
  }

  view(): DesignSample {
    this.settle();
    const { held, m } = this;
    return {
      count: held,
      keys: this.keys.subarray(0, held),
      objectives: this.objectives.subarray(0, held * m),
      family: this.family.subarray(0, held),
    };
  }

  /** Begins with a sample that is sorted as those of this bound are, without sorting it again; false where it is not. */
  private begin({ count, keys, objectives, family }: DesignSample): boolean {
    if (count > this.bound) return false;
    for (let row = 1; row < count; row++) if (!(keys[row - 1] < keys[row])) return false;
    this.keys.set(keys.subarray(0, count));
    for (let k = 0; k < count * this.m; k++) this.objectives[k] = objectives[k] + 0;
    this.family.set(family.subarray(0, count));
    this.held = count;
    this.used = count;
    if (count === this.bound) this.mark[1] = keys[count - 1];
    return true;
  }

  private take(objectives: Float64Array, family: Int32Array, row: number): void {
    const { m, used } = this;
    this.keys[used] = this.mark[0];
    for (let c = 0; c < m; c++) this.objectives[used * m + c] = objectives[row * m + c] + 0;
    this.family[used] = family[row];
    this.used = used + 1;
    if (this.used === this.keys.length) this.settle();
  }

  /** Sorts the newcomers in among the settled, keeps each key once and no more than the bound. */
  private settle(): void {
    const { m, held, used, bound, keys, objectives, family } = this;
    if (used === held) return;
    const order = (a: number, b: number): number => compare(keys, objectives, family, m, a, b);
    const fresh = new Int32Array(used - held);
    let sorted = true;
    for (let k = 0; k < fresh.length; k++) {
      fresh[k] = held + k;
      if (k > 0 && order(fresh[k - 1], fresh[k]) > 0) sorted = false;
    }
    if (!sorted) fresh.sort(order);
    const into = this.spare ?? {
      keys: new Float64Array(keys.length),
      objectives: new Float64Array(objectives.length),
      family: new Int32Array(family.length),
    };
    let kept = 0;
    for (let old = 0, k = 0; kept < bound && (old < held || k < fresh.length); ) {
      const fromOld = k === fresh.length || (old < held && order(old, fresh[k]) <= 0);
      const row = fromOld ? old++ : fresh[k++];
      if (kept > 0 && into.keys[kept - 1] === keys[row]) continue;
      into.keys[kept] = keys[row];
      for (let c = 0; c < m; c++) into.objectives[kept * m + c] = objectives[row * m + c];
      into.family[kept++] = family[row];
    }
    this.spare = { keys, objectives, family };
    this.keys = into.keys;
    this.objectives = into.objectives;
    this.family = into.family;
    this.held = kept;
    this.used = kept;
    if (kept === bound) this.mark[1] = this.keys[kept - 1];
  }
}

/** By key; two designs of one hash, which would be chance, by objectives and family. */
function compare(
  keys: Float64Array,
  objectives: Float64Array,
  family: Int32Array,
  m: number,
  a: number,
  b: number,
): number {
  if (keys[a] !== keys[b]) return keys[a] - keys[b];
  for (let c = 0; c < m; c++) {
    if (objectives[a * m + c] !== objectives[b * m + c]) return objectives[a * m + c] - objectives[b * m + c];
  }
  return family[a] - family[b];
}
