/** The D3 selection that every view renders into, and the few helpers that they share. */
import type { Selection } from 'd3';

/** One element to fill. */
export type Root<E extends Element = Element> = Selection<E, unknown, null, undefined>;

/** Empties `root`, so that rendering twice equals rendering once. */
export function clear<E extends Element>(root: Root<E>): Root<E> {
  root.selectAll('*').remove();
  return root;
}

/** Two decimals: positions in a drawing, so that the stored ones do not change with the last bits. */
export function px(value: number): number {
  return Math.round(value * 100) / 100;
}

/** `translate(x,y)` with tidy numbers. */
export function moved(x: number, y: number): string {
  return `translate(${px(x)},${px(y)})`;
}
