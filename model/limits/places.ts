/** Where each limit of a rail stands in its book: looked up once, so that the hot path compares numbers, not names. */
import type { Rail } from '../rail/rail.ts';
import type { LimitBook } from './book.ts';
import { efficiencyLimitName, LIMIT_NAMES, type LimitName } from './list.ts';

/** Place by limit name; −1 where the rail does not have the limit. */
export type LimitPlaces = Readonly<Record<LimitName, number>> & {
  /** Place of each least efficiency, in the order of the sheet. */
  readonly efficiency: Int32Array;
};

/** The places of `rail`'s limits in `book`. */
export function limitPlaces(book: LimitBook, rail: Rail): LimitPlaces {
  const named = Object.fromEntries(LIMIT_NAMES.map((name) => [name, book.place(name)])) as Record<LimitName, number>;
  const efficiency = Int32Array.from(rail.limits.efficiency, (limit) => book.place(efficiencyLimitName(limit.load)));
  return { ...named, efficiency };
}
