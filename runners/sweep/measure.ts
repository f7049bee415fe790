/** How good the union of some islands is; what the history and the progress show. */

/** Measured on the merged archive. */
export interface Measure {
  readonly frontSize: number;
  /** Normalised by each objective's ideal and reference, 0 … 1. */
  readonly hypervolume: number;
  /** Smallest value of each objective, in its unit; empty while nothing feasible is known. */
  readonly best: readonly number[];
}
