/** What two runs compared come to: the values behind the text, the table and the page of a comparison. SI base units. */

/** What became of a design from run A to run B. */
export interface Change {
  readonly change: 'kept' | 'moved' | 'gained' | 'lost';
  readonly id: string;
  readonly family: string;
  /** Objectives by A's sheet and parts: of A's front, or assessed anew; absent where the design cannot be built there. */
  readonly before?: readonly number[];
  /** The same by B's. */
  readonly after?: readonly number[];
  /** Why the other front lacks a gained or lost design. */
  readonly why?: Why;
}

/** Why a design is not on the other front: by kind, and in words. */
export interface Why {
  /** Its parts or architecture are missing there; it breaks a limit; the front beats it; nothing beats it, so it was not found or not kept. */
  readonly kind: 'unbuildable' | 'breaks' | 'beaten' | 'unbeaten';
  readonly words: string;
}

/** Hypervolume of the fronts, each in its own figures, and of both together, 0 … 1. */
export interface Volumes {
  readonly a: number;
  readonly b: number;
  readonly together: number;
}

/** One run's front assessed by the other's sheet and parts. */
export interface Carried {
  /** Designs that can be built there, and those of them that keep every limit. */
  readonly buildable: number;
  readonly feasible: number;
  /** Of those that keep every limit, in the other run's scale, 0 … 1. */
  readonly hypervolume: number;
}

/** Two runs compared. */
export interface Comparison {
  /** Run folders as they were named. */
  readonly a: string;
  readonly b: string;
  readonly objectives: readonly { readonly name: string; readonly unit: string }[];
  /** Whether sheet, parts and version are the same, and what differs, a line each. */
  readonly same: { readonly sheet: boolean; readonly parts: boolean; readonly version: boolean };
  readonly differences: readonly string[];
  /** By the ideal and reference of A's sheet, and by those of B's. */
  readonly hypervolume: { readonly byA: Volumes; readonly byB: Volumes };
  /** A's front under B's sheet and parts, and B's under A's. */
  readonly carried: { readonly a: Carried; readonly b: Carried };
  /** Designs whose figures this version computes otherwise than the run has them, by the run's own sheet and parts. */
  readonly restated: { readonly a: number; readonly b: number };
  /** Share of A's designs that some design of B dominates, each in its own figures, and the other way round. */
  readonly dominated: { readonly a: number; readonly b: number };
  /** Best value of each objective in A and in B. */
  readonly best: readonly { readonly a: number; readonly b: number }[];
  readonly sizes: { readonly a: number; readonly b: number };
  /** Designs of B alone, of A alone, of both with other figures, of both with the same. */
  readonly gained: readonly Change[];
  readonly lost: readonly Change[];
  readonly moved: readonly Change[];
  readonly kept: readonly Change[];
}
