/** Draws a scene into the page: the same code at build time in jsdom and live in the browser. */
import type { Assessment } from '../model/assessment.ts';
import { varies } from './dataset.ts';
import { capital } from './labels.ts';
import { clear } from './marks/root.ts';
import { paintDesigns, paintMovePicture, paintPicture } from './paint-picture.ts';
import { fill, measured, placeOf, redraw } from './places.ts';
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
import { renderPrices } from './views/prices.ts';
import { renderProof } from './views/proof.ts';
import { renderCount, renderRanges, shownQuantities } from './views/ranges.ts';
import { renderTemperatures } from './views/temperatures.ts';
import { type TradeoffOptions, type TradeoffScales, tradeoffDefaults } from './views/tradeoff-scales.ts';
import { renderTrust, trustDefaults } from './views/trust.ts';
import { operatingPoint, renderWaveforms, waveformsDefaults } from './views/waveforms.ts';
import { renderKnobs, renderMove } from './views/whatif.ts';

/** Everything that does not change with the reader's choices. */
function paintFixed(document: Document, { data, known }: Bench): void {
  const place = (id: string) => placeOf(document, id);
  renderMasthead(place('masthead'), data.rail, data.run, data.front.designs.length, known.objectives);
  renderPrices(place('prices'), data);
  renderFamilies(place('families'), data.families);
  renderTrust(place('trust'), data.run, data.history, { ...trustDefaults, ...measured(document, 'trust') });
  renderMind(place('mind'), data.cautions, data.notCovered);
  clear(place('colophon'))
    .append('p')
    .text(
      `Load profile: ${profileWords(data.rail)}. Sheet ${data.run.railHash.slice(0, 12)}, parts ${data.run.partsHash.slice(0, 12)}, version ${data.run.version}, seed ${data.run.seed}. This file holds everything; it asks nothing of any network.`,
    );
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
    [['', 'choose …'], ...more.map((quantity) => [quantity.key, capital(quantity.label)] as const)],
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
  renderProof(
    place('proof'),
    own.value.id,
    bench.data.proofs?.find((proof) => proof.id === own.value.id),
  );
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
    isMiss: bench.dataset.misses.has(index),
    yield: bench.dataset.rows[index]?.yield,
    proof: bench.data.proofs?.find((proof) => proof.id === design.id),
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

export function paintCompare(document: Document, { dataset }: Bench, scene: Scene): void {
  redraw(placeOf(document, 'compare'), (root) => {
    renderCompare(root, dataset, scene.pinned);
  });
}

export function paintAway(document: Document, bench: Bench, scene: Scene): void {
  const files = scene.own?.ok === true ? bench.assessor.files : [];
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
