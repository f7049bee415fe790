/** What the reader has chosen, and its form in the address fragment: a link returns to the same view. */

/** Lowest and highest value kept, SI. */
export type Interval = readonly [number, number];

export interface State {
  /** Objective names on the axes, and the one shown by `as` (empty for none). */
  readonly x: string;
  readonly y: string;
  readonly third: string;
  readonly as: 'size' | 'shade';
  /** Visible window of the picture, SI: x from, x to, y from, y to; absent for all. */
  readonly window?: readonly [number, number, number, number] | undefined;
  /** Id of the open design. */
  readonly open: string;
  /** Ids side by side, in the order they were pinned. */
  readonly pinned: readonly string[];
  /** Ranges by quantity key. */
  readonly ranges: Readonly<Record<string, Interval>>;
  /** Families not shown. */
  readonly hidden: readonly string[];
  /** Operating point of the open design whose waveforms are drawn. */
  readonly point: number;
  /** What-if changes: gene or slot or `rail.…` → value. */
  readonly changes: Readonly<Record<string, string>>;
}

/** The fragment (without `#`) that stands for `state`. */
export function toFragment(state: State): string {
  const words = new URLSearchParams();
  words.set('x', state.x);
  words.set('y', state.y);
  if (state.third !== '') words.set('third', `${state.as} ${state.third}`);
  if (state.window !== undefined) words.set('window', state.window.join(' '));
  words.set('open', state.open);
  for (const id of state.pinned) words.append('pin', id);
  for (const [key, [low, high]] of Object.entries(state.ranges)) words.append('range', `${key} ${low} ${high}`);
  for (const family of state.hidden) words.append('hide', family);
  words.set('point', String(state.point));
  for (const [name, value] of Object.entries(state.changes)) words.append('change', `${name} ${value}`);
  return words.toString();
}

/** What a fragment may refer to; anything else in it is dropped. */
export interface Known {
  readonly objectives: readonly string[];
  readonly ids: ReadonlyMap<string, number>;
  readonly keys: ReadonlyMap<string, unknown>;
  readonly families: readonly string[];
}

/** `fallback` with everything that `fragment` says validly. Never throws, whatever the text. */
export function fromFragment(fragment: string, fallback: State, known: Known): State {
  const words = new URLSearchParams(fragment.replace(/^#/, ''));
  const objective = (name: string | null, other: string) =>
    name !== null && known.objectives.includes(name) ? name : other;
  const [as, ...third] = (words.get('third') ?? '').split(' ');
  const x = objective(words.get('x'), fallback.x);
  const chosen = objective(words.get('y'), fallback.y);
  const y = chosen === x ? (known.objectives.find((name) => name !== x) ?? chosen) : chosen;
  const window = numbers(words.get('window') ?? '');
  return {
    x,
    y,
    third: words.has('x') ? objective(third.join(' '), '') : fallback.third,
    as: as === 'shade' ? 'shade' : 'size',
    ...windowOf(window),
    open: known.ids.has(words.get('open') ?? '') ? (words.get('open') ?? '') : fallback.open,
    pinned: [...new Set(words.getAll('pin').filter((id) => known.ids.has(id)))].slice(0, MOST_PINNED),
    ranges: Object.fromEntries(words.getAll('range').flatMap((text) => rangeOf(text, known))),
    hidden: words.getAll('hide').filter((family) => known.families.includes(family)),
    point: Math.max(0, Math.trunc(Number(words.get('point') ?? fallback.point)) || 0),
    changes: Object.fromEntries(words.getAll('change').flatMap(changeOf)),
  };
}

/** As many designs stand side by side as a page is wide. */
export const MOST_PINNED = 8;

function windowOf(values: readonly number[]): Pick<State, 'window'> {
  const [x0, x1, y0, y1] = values;
  if (x0 === undefined || x1 === undefined || y0 === undefined || y1 === undefined) return {};
  return x1 > x0 && y1 > y0 ? { window: [x0, x1, y0, y1] } : {};
}

function rangeOf(text: string, known: Known): [string, Interval][] {
  const parts = text.split(' ');
  const [low, high] = numbers(parts.slice(-2).join(' '));
  const key = parts.slice(0, -2).join(' ');
  return known.keys.has(key) && low !== undefined && high !== undefined && low <= high ? [[key, [low, high]]] : [];
}

function changeOf(text: string): [string, string][] {
  const gap = text.indexOf(' ');
  return gap > 0 && gap < text.length - 1 ? [[text.slice(0, gap), text.slice(gap + 1)]] : [];
}

function numbers(text: string): number[] {
  const list = text.split(' ').map((word) => (word === '' ? Number.NaN : Number(word)));
  return list.every((value) => Number.isFinite(value)) ? list : [];
}
