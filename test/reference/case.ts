/** One check whose expected value comes from outside the code, and how it is judged. Tests and the evidence table share it. */
import type { SourceId } from '../../model/sources.ts';

/** How the expected value was come by: page seen; recalled; computed from the published formula by other means. */
export type Mark = 'seen' | 'from memory' | 'computed';

/** One published value and our figure for it. */
export interface ReferenceCase {
  readonly source: SourceId;
  /** Page, table, equation or example. */
  readonly place: string;
  readonly what: string;
  /** SI unit of the value, 1 for a ratio. */
  readonly unit: string;
  readonly mark: Mark;
  readonly expected: number;
  /** Largest difference allowed: of the expected value's size, or in the unit where `expected` is 0. */
  readonly tolerance: number;
  /** Ours. */
  readonly ours: () => number;
}

/** A judged case. */
export interface Verdict {
  readonly expected: number;
  readonly got: number;
  /** Relative difference, absolute where `expected` is 0. */
  readonly difference: number;
  readonly tolerance: number;
  readonly passed: boolean;
}

/** Cases that belong together. */
export interface CaseGroup {
  readonly title: string;
  readonly cases: readonly ReferenceCase[];
}

/** Judges one case. */
export function checkCase(item: ReferenceCase): Verdict {
  const got = item.ours();
  const scale = item.expected === 0 ? 1 : Math.abs(item.expected);
  const difference = (got - item.expected) / scale;
  return {
    expected: item.expected,
    got,
    difference,
    tolerance: item.tolerance,
    passed: Math.abs(difference) <= item.tolerance,
  };
}

/** Fields that a run of cases shares. */
export type Common = Pick<ReferenceCase, 'source' | 'place' | 'unit' | 'mark' | 'tolerance'>;

/** One case from shared fields, a description, the expected value and our way to it. */
export function make(common: Common, what: string, expected: number, ours: () => number): ReferenceCase {
  return { ...common, what, expected, ours };
}
