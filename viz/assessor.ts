/** What the page asks of the model: one design judged, on the sheet's rail or on a changed one. */
import type { Assessment, DesignRecord } from '../model/assessment.ts';
import type { Rail } from '../model/rail/rail.ts';

/** A gene that what-if can move. */
export interface Movable {
  readonly name: string;
  readonly unit: string;
  readonly kind: 'real' | 'log' | 'whole' | 'choice';
  readonly low: number;
  readonly high: number;
  /** Names of a choice's options, in index order. */
  readonly options?: readonly string[];
}

/** A design judged, or why it cannot be. */
export type Verdict = { readonly ok: true; readonly value: Assessment } | { readonly ok: false; readonly why: string };

/** A file that the page offers: its bytes are the command line's. */
export interface TakeAwayFile {
  readonly name: string;
  readonly text: string;
}

/** The model as the page sees it. */
export interface Assessor {
  /**
   * Judges `design` on `rail` after `moves` (by gene name: a number, or an option's name), moved onto the nearest
   * buildable design. Parts and genes that are unknown there, or a rail without any space, give a reason.
   */
  assess(design: DesignRecord, rail: Rail, moves: Readonly<Record<string, number | string>>): Verdict;
  /** What `design` has of each movable gene that plays a part in it: a number, or an option's name. */
  values(design: DesignRecord): Readonly<Record<string, number | string>>;
  /** What may be moved on the sheet's own rail. */
  readonly genes: readonly Movable[];
  /** Names of the files that a design leaves as, in the order of `takeAway`. */
  readonly files: readonly string[];
  /** Files of one design, such as its spec and parts list; none where it cannot be built here. */
  takeAway(design: DesignRecord): readonly TakeAwayFile[];
  /** `front.csv` of the designs with these ids. */
  frontCsv(ids: ReadonlySet<string>): string;
}
