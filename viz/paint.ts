/** Draws a scene into the page: the same code at build time in jsdom and live in the browser. */
import { select } from 'd3';
import type { Assessment } from '../model/assessment.ts';
import { varies } from './dataset.ts';
import { titled } from './labels.ts';
import { clear, type Root } from './marks/root.ts';
import { picksOf } from './picks.ts';
import type { Bench, Scene } from './scene.ts';
import { renderAway } from './views/away.ts';
import { renderCompare } from './views/compare.ts';
import { efficiencyDefaults, renderEfficiency } from './views/efficiency.ts';
import { renderFamilies } from './views/families.ts';
import { renderLegend } from './views/legend.ts';
import { limitsDefaults, renderLimits } from './views/limits.ts';
import { lossesDefaults, renderLosses } from './views/losses.ts';
import { renderMakeup } from './views/makeup.ts';
import { profileWords, renderMasthead } from './views/masthead.ts';
import { renderMind } from './views/mind.ts';
import { renderOpenHead } from './views/open.ts';
import { renderParts } from './views/parts.ts';
import { designWords, pictureNote, renderDesigns, renderPicks } from './views/picture-words.ts';
import { renderPrices } from './views/prices.ts';
import { renderCount, renderRanges, shownQuantities } from './views/ranges.ts';
import { renderTemperatures } from './views/temperatures.ts';
import {
  renderMovedMark,
  renderOverlay,
  renderTradeoff,
  smallTradeoff,
  type TradeoffInput,
  type TradeoffOptions,
  type TradeoffScales,
  tradeoffDefaults,
  tradeoffScales,
} from './views/tradeoff.ts';
import { renderTrust, trustDefaults } from './views/trust.ts';
import { operatingPoint, renderWaveforms, waveformsDefaults } from './views/waveforms.ts';
import { renderKnobs, renderMove } from './views/whatif.ts';

/** Designs in the table behind the picture until it is opened. */
const FEW = 40;

/** The element of a view. */
export function placeOf(document: Document, id: string): Root<HTMLElement> {
  const element = document.getElementById(id);
  if (element === null) throw new Error(`the page has no place called ${id}`);
  return select(element) as unknown as Root<HTMLElement>;
}

/** A chart's width on this screen, so that its text keeps its size; none where nothing is laid out, as at build time. */
function measured(document: Document, id: string): { readonly width?: number } {
  const width = Math.min(620, document.getElementById(id)?.clientWidth ?? 0);
  return width > 0 ? { width } : {};
}

/** Draws a view anew and leaves the table behind it open if it was. */
function redraw(root: Root<HTMLElement>, draw: (root: Root<HTMLElement>) => void): void {
  const wasOpen = root.select<HTMLDetailsElement>('details.numbers').node()?.open === true;
  draw(root);
  if (wasOpen) root.select('details.numbers').attr('open', '');
}

/** Everything that does not change with the reader's choices. */
export function paintFixed(document: Document, { data, known }: Bench): void {
  const place = (id: string) => placeOf(document, id);
  renderMasthead(place('masthead'), data.rail, data.run, data.front.designs.length, known.objectives);
  renderPrices(place('prices'), data.front, data.nearMisses, data.rail);
  renderFamilies(place('families'), data.families);
  renderTrust(place('trust'), data.run, data.history, { ...trustDefaults, ...measured(document, 'trust') });
  renderMind(place('mind'), data.cautions, data.notCovered);
  clear(place('colophon'))
    .append('p')
    .text(
      `Load profile: ${profileWords(data.rail)}. Sheet ${data.run.railHash.slice(0, 12)}, parts ${data.run.partsHash.slice(0, 12)}, version ${data.run.version}, seed ${data.run.seed}. This file holds everything; it asks nothing of any network.`,
    );
}

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

function fill(document: Document, id: string, options: readonly (readonly [string, string])[], chosen: string): void {
  const root = placeOf(document, id);
  root
    .selectAll('option')
    .data(options)
    .join('option')
    .attr('value', ([value]) => value)
    .text(([, text]) => text);
  choose(document, id, chosen);
}

function choose(document: Document, id: string, value: string): void {
  placeOf(document, id)
    .selectAll<HTMLOptionElement, unknown>('option')
    .each(function mark() {
      this.toggleAttribute('selected', this.value === value);
      this.selected = this.value === value;
    });
}

/** Ranges, count, families, the list of further ranges. */
export function paintNarrow(document: Document, bench: Bench, scene: Scene): void {
  const { dataset } = bench;
  const { state } = scene;
  renderRanges(placeOf(document, 'ranges'), dataset, state, scene.kept);
  renderCount(placeOf(document, 'count'), scene.kept.length, dataset.designs.length);
  renderLegend(placeOf(document, 'legend'), dataset, state.hidden, scene.kept);
  const shown = new Set(shownQuantities(dataset, state.ranges).map((quantity) => quantity.key));
  const more = dataset.quantities.filter((quantity) => varies(quantity) && !shown.has(quantity.key));
  fill(
    document,
    'add-range',
    [['', 'choose …'], ...more.map((quantity) => [quantity.key, titled(quantity.label)] as const)],
    '',
  );
  const isNarrowed = Object.keys(state.ranges).length + state.hidden.length > 0;
  placeOf(document, 'narrow')
    .select('[data-act=clear]')
    .attr('disabled', isNarrowed ? null : '');
}

/** The open design, whole. */
export function paintOpen(document: Document, bench: Bench, scene: Scene): void {
  const { own, open } = scene;
  if (own === undefined || open === undefined) return;
  if (!own.ok) {
    clear(placeOf(document, 'open-head'))
      .append('p')
      .attr('class', 'flagged')
      .text(`This design cannot be recomputed here: ${own.why}`);
    return;
  }
  paintOpenHead(document, bench, scene, own.value);
  const place = (id: string) => placeOf(document, id);
  const { rail } = bench.data;
  renderLosses(place('losses'), own.value, rail.profile.length, { ...lossesDefaults, effects: false });
  renderLosses(place('effects'), own.value, rail.profile.length);
  renderLimits(place('tightest'), own.value, { ...limitsDefaults, most: 4 });
  renderLimits(place('limits'), own.value);
  redraw(place('efficiency'), (root) => {
    renderEfficiency(root, own.value, rail, { ...efficiencyDefaults, ...measured(document, 'efficiency') });
  });
  renderMakeup(place('makeup'), own.value, rail.currency);
  renderParts(place('parts'), own.value, rail.currency);
  paintPoint(document, bench, scene);
}

/** Head of the open design alone, for a pin or a range that changes. */
export function paintOpenHead(document: Document, bench: Bench, scene: Scene, design: Assessment): void {
  const index = scene.open ?? 0;
  renderOpenHead(placeOf(document, 'open-head'), {
    design,
    isPinned: scene.state.pinned.includes(scene.state.open),
    isLeft: scene.kept.includes(index),
    isIncumbent: (bench.data.incumbents ?? []).includes(scene.state.open),
    alike: scene.alike.length,
  });
}

/** What follows the chosen operating point. */
export function paintPoint(document: Document, bench: Bench, scene: Scene): void {
  if (scene.own?.ok !== true) return;
  const design = scene.own.value;
  const at = Math.min(scene.state.point, design.points.length - 1);
  const point = design.points[at];
  if (point === undefined) return;
  fill(
    document,
    'point',
    design.points.map((one, i) => [String(i), operatingPoint(one)] as const),
    String(at),
  );
  redraw(placeOf(document, 'waveforms'), (root) => {
    renderWaveforms(root, point, { ...waveformsDefaults, ...measured(document, 'waveforms') });
  });
  renderTemperatures(placeOf(document, 'temperatures'), design, point, bench.data.rail.ambient);
}

/** Knobs and what they do. */
export function paintWhatIf(document: Document, bench: Bench, scene: Scene): void {
  if (scene.own?.ok !== true) return;
  renderKnobs(
    placeOf(document, 'knobs'),
    scene.own.value,
    bench.data.rail,
    { genes: bench.assessor.genes, own: bench.assessor.values(scene.own.value.design) },
    scene.state.changes,
  );
  if (document.documentElement.dataset.live === 'yes') paintMovePicture(document, bench, scene);
  renderMove(placeOf(document, 'move'), scene.own.value, scene.moved);
  placeOf(document, 'whatif')
    .select('[data-act=reset]')
    .attr('disabled', scene.moved === undefined ? '' : null);
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

export function paintCompare(document: Document, { dataset }: Bench, scene: Scene): void {
  redraw(placeOf(document, 'compare'), (root) => {
    renderCompare(root, dataset, scene.pinned);
  });
}

export function paintAway(document: Document, bench: Bench, scene: Scene): void {
  const files = scene.own?.ok === true ? bench.assessor.takeAway(scene.own.value.design) : [];
  renderAway(placeOf(document, 'away'), scene.state.open, files, scene.kept.length);
}

/** Everything, for the first picture. */
export function paintAll(
  document: Document,
  bench: Bench,
  scene: Scene,
  withCloud: boolean,
  options: TradeoffOptions = tradeoffDefaults,
): TradeoffScales | undefined {
  paintFixed(document, bench);
  const scales = paintPicture(document, bench, scene, withCloud, options);
  paintDesigns(document, bench, scene, false);
  paintNarrow(document, bench, scene);
  paintOpen(document, bench, scene);
  paintWhatIf(document, bench, scene);
  paintCompare(document, bench, scene);
  paintAway(document, bench, scene);
  return scales;
}
