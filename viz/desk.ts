/** What every handler of the live page works with: the bench, the present scene, and the one way to change the state. */
import type { Bench, Scene } from './scene.ts';
import { MOST_PINNED, type State } from './state.ts';

/** What the handlers may do. */
export interface Desk {
  readonly bench: Bench;
  scene(): Scene;
  /** Merges `part` into the state and repaints what it touches. */
  set(part: Partial<State>): void;
}

/** Opening a design forgets the moves of the one before. */
export function opened(id: string): Partial<State> {
  return { open: id, changes: {} };
}

/** Pins or unpins; beyond the most that fit, the first pinned goes. */
export function togglePin(desk: Desk, id: string): void {
  if (id !== '') desk.set({ pinned: toggled(desk.scene().state.pinned, id).slice(-MOST_PINNED) });
}

export function toggled(list: readonly string[], item: string): readonly string[] {
  return list.includes(item) ? list.filter((one) => one !== item) : [...list, item];
}

export function need(document: Document, id: string): HTMLElement {
  const element = document.getElementById(id);
  if (element === null) throw new Error(`the page has no place called ${id}`);
  return element;
}
