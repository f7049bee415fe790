/** A set of designs as plain typed arrays: what archives take in, hand out, merge and store. */

/** Designs row by row; every array holds `count` rows (arrays may be longer than that). */
export interface Designs {
  readonly count: number;
  /** Row-major, one row of genes a design. */
  readonly genes: Float64Array;
  /** Row-major, one row of objectives a design, all minimised. */
  readonly objectives: Float64Array;
  /** Row-major, one row of violations a design; empty when the problem has no limits. */
  readonly violations: Float64Array;
}

/** Near misses with the limit each breaks. */
export interface NearMissDesigns extends Designs {
  /** Index of the broken limit of each design. */
  readonly limit: Int32Array;
}

/** Widths of the rows of a set of designs. */
export interface Widths {
  readonly genes: number;
  /** Two to four. */
  readonly objectives: number;
  readonly violations: number;
}
