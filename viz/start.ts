/** Takes the drawn page over: state, events, and repainting no more than what a change touches. */
import type { Assessor } from './assessor.ts';
import { type Change, changesBetween } from './changes.ts';
import type { PageData } from './data.ts';
import { type Desk, opened, toggled, togglePin } from './desk.ts';
import { download } from './download.ts';
import {
  paintAll,
  paintAway,
  paintCompare,
  paintNarrow,
  paintOpen,
  paintOpenHead,
  paintPoint,
  paintWhatIf,
} from './paint.ts';
import { paintDesigns } from './paint-picture.ts';
import { attachPicture } from './picture.ts';
import { type Bench, benchOf, firstState, judgeBy, type Scene, sceneOf } from './scene.ts';
import { fromFragment, type State, toFragment } from './state.ts';
import { valueAt } from './views/ranges.ts';
import { knobValue } from './views/whatif.ts';
import { designKnobs, railKnobs } from './whatif.ts';

/** Starts the live page in `document`. */
export function start(document: Document, data: PageData, assessor: Assessor): Desk {
  const bench = benchOf(data, assessor);
  const judge = judgeBy(bench);
  const first = firstState(bench);
  const read = () => fromFragment(document.location.hash, first, bench.known);
  let scene = sceneOf(bench, read(), judge);
  for (const id of ['ranges', 'legend', 'knobs', 'move-picture']) {
    const place = document.getElementById(id);
    place?.replaceChildren();
    place?.removeAttribute('data-drawn');
    place?.removeAttribute('data-design');
  }
  paintAll(document, bench, scene, false);
  const desk: Desk = { bench, scene: () => scene, set: (part) => show({ ...scene.state, ...part }, true) };
  const picture = attachPicture(document, desk);
  const show = (state: State, isOwn: boolean) => {
    const before = scene;
    scene = sceneOf(bench, state, judge, before);
    repaint(document, bench, before, scene, changesBetween(before.state, state), picture);
    if (isOwn) remember(document, scene.state);
  };
  listen(document, desk);
  document.defaultView?.addEventListener('hashchange', () => {
    if (document.location.hash.slice(1) !== written) show(read(), false);
  });
  document.documentElement.dataset.live = 'yes';
  document.defaultView?.requestAnimationFrame(() => paintWhatIf(document, bench, scene));
  return desk;
}

let written = '';
let timer: ReturnType<typeof setTimeout> | undefined;

/** Writes the state into the address, at most a few times a second. */
function remember(document: Document, state: State): void {
  clearTimeout(timer);
  timer = setTimeout(() => {
    written = toFragment(state);
    document.defaultView?.history.replaceState(null, '', `#${written}`);
  }, 120);
}

function repaint(
  document: Document,
  bench: Bench,
  before: Scene,
  scene: Scene,
  changed: ReadonlySet<Change>,
  picture: ReturnType<typeof attachPicture>,
): void {
  const has = (...names: Change[]) => names.some((name) => changed.has(name));
  const isRescaled =
    has('open') && (bench.dataset.misses.has(before.open ?? -1) || bench.dataset.misses.has(scene.open ?? -1));
  if (has('axes', 'ranges') || isRescaled) picture.redraw();
  else if (has('open', 'pinned')) picture.overlay();
  else if (has('moved')) picture.moved();
  if (has('ranges')) paintNarrow(document, bench, scene);
  if (has('open')) paintOpen(document, bench, scene);
  else if (has('pinned', 'ranges') && scene.own?.ok === true) paintOpenHead(document, bench, scene, scene.own.value);
  if (has('point') && !has('open')) paintPoint(document, bench, scene);
  if (has('open', 'moved', 'axes', 'ranges')) paintWhatIf(document, bench, scene);
  if (has('pinned')) paintCompare(document, bench, scene);
  if (has('open', 'ranges')) paintAway(document, bench, scene);
  if (has('axes', 'ranges')) paintDesigns(document, bench, scene, isTableOpen(document));
}

function isTableOpen(document: Document): boolean {
  return document.getElementById('picture-numbers')?.hasAttribute('open') === true;
}

function listen(document: Document, desk: Desk): void {
  document.addEventListener('click', (event) => {
    const target = event.target instanceof Element ? event.target.closest<HTMLElement>('[data-act]') : null;
    if (target === null) return;
    act(document, desk, target);
    refocus(document, target);
  });
  document.addEventListener('input', (event) => {
    const target = event.target;
    if (!(target instanceof HTMLInputElement || target instanceof HTMLSelectElement)) return;
    if (target instanceof HTMLInputElement && target.dataset.end !== undefined) narrow(desk, target);
    else if (target.dataset.knob !== undefined) turn(desk, target);
    else choose(desk, target);
  });
  document.getElementById('picture-numbers')?.addEventListener('toggle', () => {
    if (isTableOpen(document)) paintDesigns(document, desk.bench, desk.scene(), true);
  });
}

/** A press redraws the button itself in some views: the focus goes on to its successor, or stays near where that vanished. */
function refocus(document: Document, pressed: HTMLElement): void {
  if (pressed.isConnected || document.activeElement !== document.body) return;
  const { act: name = '', id = '' } = pressed.dataset;
  const all = [...document.querySelectorAll<HTMLElement>(`[data-act="${name}"]`)];
  const next = all.find((one) => (one.dataset.id ?? '') === id) ?? all[0] ?? document.getElementById('picture');
  next?.focus({ preventScroll: true });
}

/** Buttons. */
function act(document: Document, desk: Desk, target: HTMLElement): void {
  const { state } = desk.scene();
  const { act: name, id = '', family = '', file = '' } = target.dataset;
  if (name === 'open') desk.set(opened(id));
  if (name === 'pin') togglePin(desk, state.open);
  if (name === 'unpin') desk.set({ pinned: state.pinned.filter((one) => one !== id) });
  if (name === 'clear') desk.set({ ranges: {}, hidden: [] });
  if (name === 'reset') desk.set({ changes: {} });
  if (name === 'family') desk.set({ hidden: toggled(state.hidden, family) });
  if (name === 'go') goTo(document, target.dataset.to ?? '');
  if (name === 'away') takeAway(document, desk, file);
}

/** Scrolls to a section and puts the focus on its first control; the address keeps the state, so no link does this. */
function goTo(document: Document, id: string): void {
  const place = document.getElementById(id);
  place?.scrollIntoView({ block: 'start' });
  const first = place?.matches('[tabindex]') ? place : place?.querySelector<HTMLElement>('input, select, button');
  first?.focus({ preventScroll: true });
}

function takeAway(document: Document, { bench, scene }: Desk, name: string): void {
  const { kept, own } = scene();
  if (name === 'front.csv') {
    const ids = new Set(kept.map((i) => bench.dataset.designs[i]?.id ?? ''));
    download(document, { name, text: bench.assessor.frontCsv(ids) });
    return;
  }
  const files = own?.ok === true ? bench.assessor.takeAway(own.value.design) : [];
  const file = files.find((one) => one.name === name);
  if (file !== undefined) download(document, file);
}

/** A thumb of a range: the other end gives way; both at their ends means no range. */
function narrow(desk: Desk, input: HTMLInputElement): void {
  const key = input.closest<HTMLElement>('[data-key]')?.dataset.key ?? '';
  const quantity = desk.bench.dataset.byKey.get(key);
  if (quantity === undefined) return;
  const { ranges } = desk.scene().state;
  const value = valueAt(quantity, Number(input.value) / Number(input.max));
  const [low, high] = ranges[key] ?? [quantity.low, quantity.high];
  const next =
    input.dataset.end === 'low' ? ([value, Math.max(value, high)] as const) : ([Math.min(low, value), value] as const);
  const { [key]: _, ...others } = ranges;
  const isWhole = next[0] <= quantity.low && next[1] >= quantity.high;
  desk.set({ ranges: isWhole && !(key in ranges && isAdded(quantity.key)) ? others : { ...others, [key]: next } });
}

/** Rows that were added by hand stay when their range is whole again. */
function isAdded(key: string): boolean {
  return key.startsWith('m.') || key.startsWith('v.');
}

/** A knob of what-if. */
function turn(desk: Desk, input: HTMLInputElement | HTMLSelectElement): void {
  const { bench, scene } = desk;
  const { own, state } = scene();
  const name = input.dataset.knob ?? '';
  if (own?.ok !== true) return;
  const knobs = [
    ...designKnobs(bench.assessor.values(own.value.design), bench.assessor.genes),
    ...railKnobs(bench.data.rail),
  ];
  const knob = knobs.find((one) => one.name === name);
  if (knob === undefined) return;
  const value = input instanceof HTMLSelectElement ? input.value : String(knobValue(knob, Number(input.value)));
  const { [name]: _, ...others } = state.changes;
  const home = String('own' in knob ? knob.own : knob.value);
  desk.set({ changes: value === home ? others : { ...others, [name]: value } });
}

/** Axes, operating point, a further range. */
function choose(desk: Desk, input: HTMLInputElement | HTMLSelectElement): void {
  const { state } = desk.scene();
  const { value } = input;
  if (input.id === 'axis-x') desk.set({ x: value, y: value === state.y ? state.x : state.y, ...noWindow(state) });
  if (input.id === 'axis-y') desk.set({ y: value, x: value === state.x ? state.y : state.x, ...noWindow(state) });
  if (input.id === 'axis-third') {
    const [as, ...third] = value.split(' ');
    desk.set({ as: as === 'shade' ? 'shade' : 'size', third: third.join(' ') });
  }
  if (input.id === 'point') desk.set({ point: Number(value) });
  if (input.id !== 'add-range') return;
  const quantity = desk.bench.dataset.byKey.get(value);
  if (quantity !== undefined) desk.set({ ranges: { ...state.ranges, [value]: [quantity.low, quantity.high] } });
}

function noWindow(state: State): Pick<State, 'window'> {
  return state.window === undefined ? {} : { window: undefined };
}
