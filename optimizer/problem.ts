/**
 * The seam between a design space and the search: everything the optimizer knows of what it searches, and the one file
 * of `optimizer/` (beside `maths/`) that the model may import.
 */

/** How a gene varies: on a line, on a logarithmic line, over whole numbers, or among unordered options. */
export type GeneKind = 'real' | 'log' | 'whole' | 'choice';

/** One coordinate of the design space. Stored as a double; a choice stores the index of its option. */
export interface Gene {
  /** Unique within the problem. */
  readonly name: string;
  /** SI unit of the stored value, empty for a count or a choice. */
  readonly unit: string;
  readonly kind: GeneKind;
  /** Smallest value, inclusive (above zero for `log`; 0 for `choice`). */
  readonly low: number;
  /** Largest value, inclusive (`options.length − 1` for `choice`). */
  readonly high: number;
  /** Names of the options of a `choice`, in index order; a `whole` may carry them too, as names of ordered options. */
  readonly options?: readonly string[];
}

/** One quantity to be made small. */
export interface Objective {
  readonly name: string;
  readonly unit: string;
  /** Edge of an archive cell, in the objective's unit, above zero. Two values closer than this count as alike. */
  readonly resolution: number;
  /** Value that no design is expected to beat; with `reference` it scales the objective. Below `reference`. */
  readonly ideal: number;
  /** Worst value that still counts towards hypervolume. */
  readonly reference: number;
}

/** A split of the space into families that must each be tried (for converters: architecture × phases). */
export interface Families {
  readonly names: readonly string[];
  /** Index of the family that snapped `genes` belong to, 0 … names.length − 1. */
  of(genes: Float64Array): number;
  /** Moves `genes` in place into the family with that index, leaving all other genes as they are. */
  confine(genes: Float64Array, family: number): void;
}

/** A space of designs that can be searched. All methods are deterministic and keep no memory of earlier calls. */
export interface Problem {
  readonly name: string;
  readonly genes: readonly Gene[];
  /** Two to four, all minimised. */
  readonly objectives: readonly Objective[];
  /** Names of the limits, in the order of `violations`; may be empty. */
  readonly limits: readonly string[];
  readonly families: Families;
  /** Known designs to start from, as gene vectors; may be empty. */
  readonly seeds: readonly Float64Array[];
  /** Moves `genes` in place onto the nearest buildable design; inactive genes take one canonical value. Idempotent. */
  snap(genes: Float64Array): void;
  /**
   * Judges one snapped design. Writes `objectives.length` values and `limits.length` violations: 0 where a limit holds,
   * above 0 the fraction by which it is missed. Never throws. A value that cannot be computed is written as NaN, which
   * the search counts and never lets into a front.
   */
  evaluate(genes: Float64Array, objectives: Float64Array, violations: Float64Array): void;
}

/** Families of a problem that has only one. */
export const ONE_FAMILY: Families = {
  names: ['all'],
  of: () => 0,
  confine: () => {},
};
