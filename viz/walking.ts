/** The keyboard on the picture: arrow keys walk along an axis, P pins, + − 0 zoom. */
import { type Desk, opened, togglePin } from './desk.ts';
import type { Gesture } from './zooming.ts';

/** Arrow keys walk along an axis, P pins, + − 0 zoom. */
export function keys(box: HTMLElement, desk: Desk, gestures: Gesture): void {
  box.addEventListener('keydown', (event) => {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const isDone = walk(desk, event.key) || press(desk, gestures, event.key);
    if (isDone) event.preventDefault();
  });
}

function press(desk: Desk, gestures: Gesture, key: string): boolean {
  const zooms: Readonly<Record<string, 'closer' | 'further' | 'whole'>> = {
    '+': 'closer',
    '=': 'closer',
    '-': 'further',
    '0': 'whole',
  };
  const gesture = zooms[key];
  if (gesture !== undefined) gestures(gesture);
  else if (key === 'p' || key === 'P') togglePin(desk, desk.scene().state.open);
  else return false;
  return true;
}

function walk(desk: Desk, key: string): boolean {
  const { state, kept, open } = desk.scene();
  const isAcross = ['ArrowLeft', 'ArrowRight', 'Home', 'End'].includes(key);
  if (!isAcross && key !== 'ArrowUp' && key !== 'ArrowDown') return false;
  const values = desk.bench.dataset.byKey.get(`o.${isAcross ? state.x : state.y}`)?.values;
  if (values === undefined || kept.length === 0) return true;
  const order = [...kept].sort((a, b) => (values[a] ?? 0) - (values[b] ?? 0) || a - b);
  const here = open === undefined ? -1 : order.indexOf(open);
  const step = key === 'ArrowRight' || key === 'ArrowUp' ? 1 : -1;
  const from = here >= 0 ? here + step : nearestRank(order, values, values[open ?? 0] ?? 0);
  const place = key === 'Home' ? 0 : key === 'End' ? order.length - 1 : from;
  const next = order[Math.max(0, Math.min(order.length - 1, place))];
  if (next !== undefined && next !== open) desk.set(opened(desk.bench.dataset.designs[next]?.id ?? ''));
  return true;
}

function nearestRank(order: readonly number[], values: Float64Array, value: number): number {
  const after = order.findIndex((i) => (values[i] ?? 0) >= value);
  return after < 0 ? order.length - 1 : after;
}
