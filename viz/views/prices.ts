/** What each limit costs: designs that break one limit by a little, and what that little would buy. */
import type { Rail } from '../../model/rail/rail.ts';
import type { Front, NearMiss } from '../data.ts';
import { counted, listed, spoken } from '../labels.ts';
import { clear, type Root } from '../marks/root.ts';
import { percent, show } from '../units.ts';
import { limitName, written } from './limits.ts';

const pricesDefaults = {
  /** Rows shown for one limit at most. */
  perLimit: 2,
};

/** One offer: relax a limit by `relaxation`, and objective `objective` falls from `from` to `to`. */
export interface Offer {
  readonly miss: NearMiss;
  readonly unit: string;
  /** Fraction of what is allowed today. */
  readonly relaxation: number;
  readonly objective: number;
  readonly from: number;
  readonly to: number;
  /** (from − to)/from. */
  readonly gain: number;
}

/** The best offers of each limit, limits by their best gain, largest first. */
export function offersOf(front: Front, misses: readonly NearMiss[], perLimit: number): readonly Offer[] {
  const all = misses.flatMap((miss) => bestOffer(front, miss));
  const limits = [...new Set(all.map((offer) => offer.miss.limit))];
  const groups = limits.map((limit) => paying(all.filter((offer) => offer.miss.limit === limit)).slice(0, perLimit));
  return groups.sort((a, b) => (b[0]?.gain ?? 0) - (a[0]?.gain ?? 0)).flat();
}

/** Offers of one limit that are worth their relaxation: each next one asks for less and is the best that little can buy. */
function paying(offers: readonly Offer[]): readonly Offer[] {
  const sorted = [...offers].sort((a, b) => b.gain - a.gain || a.relaxation - b.relaxation);
  return sorted.filter((offer, i) => sorted.slice(0, i).every((other) => other.relaxation > offer.relaxation * 1.3));
}

/** The objective that gains most against front designs that are no worse in every other objective. */
function bestOffer(front: Front, miss: NearMiss): readonly Offer[] {
  const mine = miss.design.objectives;
  const offers = mine.map((to, k) => {
    const rivals = front.designs.filter((design) =>
      design.objectives.every((value, j) => j === k || value <= (mine[j] ?? 0) * (1 + 1e-9)),
    );
    const from = rivals.reduce(
      (least, design) => Math.min(least, design.objectives[k] ?? least),
      Number.POSITIVE_INFINITY,
    );
    return { objective: k, from, to, gain: Number.isFinite(from) ? (from - to) / from : 0 };
  });
  const best = offers.reduce((a, b) => (b.gain > a.gain ? b : a), { objective: 0, from: 0, to: 0, gain: 0 });
  const unit = front.limits.find((limit) => limit.name === miss.limit)?.unit ?? '';
  const relaxation = Math.abs(miss.value - miss.allowed) / (Math.abs(miss.allowed) || 1);
  return best.gain > 0 ? [{ miss, unit, relaxation, ...best }] : [];
}

export function renderPrices<E extends Element>(
  root: Root<E>,
  front: Front,
  misses: readonly NearMiss[],
  rail: Rail,
  options = pricesDefaults,
): void {
  clear(root);
  const offers = offersOf(front, misses, options.perLimit);
  if (offers.length === 0) {
    root
      .append('p')
      .attr('class', 'hint')
      .text(
        `No design found that would beat the front by breaking one limit of ${rail.name} a little: no single limit stands in the way.`,
      );
    return;
  }
  const table = root
    .append('div')
    .attr('class', 'scroll')
    .attr('tabindex', 0)
    .attr('role', 'region')
    .attr('aria-label', 'What each limit costs')
    .append('table')
    .attr('class', 'ledger prices');
  table.append('caption').attr('class', 'unseen').text('Limits, by how much to relax them, and what that buys');
  const head = table.append('thead').append('tr');
  for (const word of ['If this limit', 'moved', 'it would buy', 'which design'])
    head.append('th').attr('scope', 'col').text(word);
  const body = table.append('tbody');
  for (const offer of offers) offerRow(body.append('tr'), front, offer);
  root
    .append('p')
    .attr('class', 'hint')
    .text(
      `From ${counted(misses.length, 'near miss')}`
        .replace('misss', 'misses')
        .concat(': designs that break exactly one limit and would beat the front.'),
    );
}

/** `20 mV → 21.8 mV`; a limit that allows nothing at all is told by how far it is broken. */
function relaxationWords({ miss, unit }: Offer): string {
  const limit = { name: miss.limit, unit };
  if (miss.allowed === 0) return `by ${percent(Math.abs(miss.value))}`;
  return `${written(limit, miss.allowed)} → ${written(limit, miss.value)}`;
}

function offerRow(row: Root<HTMLTableRowElement>, front: Front, offer: Offer): void {
  const column = front.objectives[offer.objective];
  const others = front.objectives
    .filter((_, k) => k !== offer.objective)
    .map(({ name }) => spoken(name).split(',')[0] ?? '');
  row.append('th').attr('scope', 'row').text(limitName(offer.miss.limit));
  row.append('td').text(relaxationWords(offer));
  row
    .append('td')
    .text(
      `${percent(offer.gain)} less ${spoken(column?.name ?? '')} at no more ${listed(others)}: ${show(offer.from, column?.unit ?? '')} → ${show(offer.to, column?.unit ?? '')}`,
    );
  row.append('td').append('bdi').text(`${offer.miss.design.family}, ${offer.miss.design.id}`);
}
