/** Draws the trade-off picture of a scene, large and small, with the words around it. */
import { titled } from './labels.ts';
import { clear, type Root } from './marks/root.ts';
import { picksOf } from './picks.ts';
import { fill, placeOf } from './places.ts';
import type { Bench, Scene } from './scene.ts';
import { renderMovedMark, renderOverlay } from './views/overlay.ts';
import { designWords, pictureNote, renderDesigns, renderPicks } from './views/picture-words.ts';
import { renderTradeoff } from './views/tradeoff.ts';
import {
  smallTradeoff,
  type TradeoffInput,
  type TradeoffOptions,
  type TradeoffScales,
  tradeoffDefaults,
  tradeoffScales,
} from './views/tradeoff-scales.ts';

/** Designs in the table behind the picture until it is opened. */
const FEW = 40;

/** What the picture draws in this scene; absent where there is no front. */
export function pictureInput({ dataset, data }: Bench, scene: Scene, withCloud: boolean): TradeoffInput | undefined {
  const { state } = scene;
  const x = dataset.byKey.get(`o.${state.x}`);
  const y = dataset.byKey.get(`o.${state.y}`);
  if (x === undefined || y === undefined || dataset.designs.length === 0) return undefined;
  const { moved } = scene;
  return {
    dataset,
    rail: data.rail,
    x,
    y,
    third: dataset.byKey.get(`o.${state.third}`),
    as: state.as,
    window: state.window,
    kept: scene.kept,
    open: scene.open,
    alike: scene.alike,
    pinned: scene.pinned,
    incumbents: (data.incumbents ?? []).flatMap((id) => dataset.index.get(id) ?? []),
    changed: moved?.ok === true ? moved.value.objectives.map((figure) => figure.value) : undefined,
    cloud: withCloud ? data.cloud : undefined,
  };
}

/** The picture whole, with the words around it. */
export function paintPicture(
  document: Document,
  bench: Bench,
  scene: Scene,
  withCloud: boolean,
  options: TradeoffOptions = tradeoffDefaults,
): TradeoffScales | undefined {
  const input = pictureInput(bench, scene, withCloud);
  const svg = placeOf(document, 'picture').select<SVGSVGElement>('svg') as unknown as Root<SVGSVGElement>;
  if (input === undefined) {
    clear(svg)
      .attr('viewBox', '0 0 680 120')
      .append('text')
      .attr('x', 20)
      .attr('y', 60)
      .attr('class', 'empty')
      .text('No design keeps every limit yet: see what each limit costs, below.');
    return undefined;
  }
  const scales = renderTradeoff(svg, input, options);
  paintPictureWords(document, bench, scene, input);
  axisChoices(document, bench, scene);
  return scales;
}

/** Only what follows the open, pinned and moved designs. */
export function paintOverlay(
  document: Document,
  bench: Bench,
  scene: Scene,
  scales: TradeoffScales,
  options: TradeoffOptions,
): void {
  const input = pictureInput(bench, scene, false);
  if (input === undefined) return;
  const svg = placeOf(document, 'picture').select<SVGSVGElement>('svg') as unknown as Root<SVGSVGElement>;
  renderOverlay(svg, input, scales, options);
  paintPictureWords(document, bench, scene, input);
}

/** Only the moved design. */
export function paintMoved(document: Document, bench: Bench, scene: Scene, scales: TradeoffScales): void {
  const input = pictureInput(bench, scene, false);
  const svg = placeOf(document, 'picture').select<SVGSVGElement>('svg') as unknown as Root<SVGSVGElement>;
  if (input !== undefined) renderMovedMark(svg, input, scales);
}

function paintPictureWords(document: Document, bench: Bench, scene: Scene, input: TradeoffInput): void {
  const place = (id: string) => placeOf(document, id);
  renderPicks(place('picks'), bench.dataset, picksOf(bench.dataset, scene.kept), scene.state.open);
  place('picture-note').text(pictureNote(input));
  const order = [...scene.kept].sort((a, b) => (input.x.values[a] ?? 0) - (input.x.values[b] ?? 0));
  place('picture')
    .attr('aria-valuemax', Math.max(1, order.length))
    .attr('aria-valuenow', Math.max(1, order.indexOf(scene.open ?? -1) + 1))
    .attr('aria-valuetext', scene.open === undefined ? 'none open' : designWords(bench.dataset, scene.open).join(', '));
}

/** The table behind the picture. */
export function paintDesigns(document: Document, bench: Bench, scene: Scene, isWhole: boolean): void {
  const input = pictureInput(bench, scene, false);
  if (input !== undefined)
    renderDesigns(
      placeOf(document, 'picture-numbers').select<HTMLElement>('.scroll') as unknown as Root<HTMLElement>,
      input,
      isWhole ? Number.POSITIVE_INFINITY : FEW,
    );
}

/** The small picture beside the knobs; its marks are drawn anew only where they changed. */
export function paintMovePicture(document: Document, bench: Bench, scene: Scene): void {
  const input = pictureInput(bench, { ...scene, state: { ...scene.state, window: undefined }, pinned: [] }, false);
  if (input === undefined) return;
  const svg = placeOf(document, 'move-picture') as unknown as Root<SVGSVGElement>;
  const key = JSON.stringify([
    scene.state.x,
    scene.state.y,
    scene.state.third,
    scene.state.as,
    scene.state.ranges,
    scene.state.hidden,
  ]);
  if (svg.attr('data-drawn') === key) renderMovedMark(svg, input, tradeoffScales(input, smallTradeoff));
  else {
    renderTradeoff(svg, input, smallTradeoff);
    svg.attr('data-drawn', key);
  }
}

function axisChoices(document: Document, { dataset }: Bench, { state }: Scene): void {
  const names = dataset.objectives.map((objective) => [objective.name, short(objective.name)] as const);
  fill(document, 'axis-x', names, state.x);
  fill(document, 'axis-y', names, state.y);
  const thirds = names.flatMap(([name, text]) => [
    [`size ${name}`, `size: ${text.toLowerCase()}`] as const,
    [`shade ${name}`, `shade: ${text.toLowerCase()}`] as const,
  ]);
  fill(document, 'axis-third', [['', 'plain'], ...thirds], state.third === '' ? '' : `${state.as} ${state.third}`);
}

/** `Loss` for `loss, profile mean`: what stands after a comma is said elsewhere. */
function short(name: string): string {
  return titled(name).split(',')[0] ?? '';
}
