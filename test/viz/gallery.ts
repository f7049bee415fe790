/** Every stored drawing by name: the view drawn from the invented sweep. `drawings/` holds exactly these. */
import type { Assessment } from '../../model/assessment.ts';
import type { Proof } from '../../model/handoff/proof.ts';
import type { Rail } from '../../model/rail/rail.ts';
import type { Root } from '../../viz/marks/root.ts';
import { pictureInput } from '../../viz/paint-picture.ts';
import { benchOf, firstState, sceneOf } from '../../viz/scene.ts';
import { renderAway } from '../../viz/views/away.ts';
import { renderCompare } from '../../viz/views/compare.ts';
import { renderEfficiency } from '../../viz/views/efficiency.ts';
import { renderFamilies } from '../../viz/views/families.ts';
import { familyMark, renderLegend } from '../../viz/views/legend.ts';
import { renderLimits } from '../../viz/views/limits.ts';
import { renderLosses } from '../../viz/views/losses.ts';
import { renderMakeup } from '../../viz/views/makeup.ts';
import { renderMasthead } from '../../viz/views/masthead.ts';
import { renderMind } from '../../viz/views/mind.ts';
import { renderOpenHead } from '../../viz/views/open.ts';
import { renderParts } from '../../viz/views/parts.ts';
import { renderPrices } from '../../viz/views/prices.ts';
import { renderProof } from '../../viz/views/proof.ts';
import { renderRanges } from '../../viz/views/ranges.ts';
import { renderTemperatures } from '../../viz/views/temperatures.ts';
import { renderTradeoff } from '../../viz/views/tradeoff.ts';
import { renderTrust } from '../../viz/views/trust.ts';
import { renderWaveforms } from '../../viz/views/waveforms.ts';
import { renderKnobs, renderMove } from '../../viz/views/whatif.ts';
import { fixture, fixtureAssessor } from './fixture.ts';

type Place = Root<HTMLDivElement>;

const data = fixture(60, 400);
export const bench = benchOf(data, fixtureAssessor());
const first = firstState(bench);
export const scene = sceneOf(bench, { ...first, pinned: bench.dataset.designs.slice(0, 4).map((design) => design.id) });
export const open: Assessment = opened();

function opened(): Assessment {
  if (scene.own?.ok !== true) throw new Error('the invented model judges every design');
  return scene.own.value;
}

function picture(root: Place, as: 'size' | 'shade', isCloudy: boolean): void {
  const input = pictureInput(bench, { ...scene, state: { ...scene.state, as } }, isCloudy);
  if (input !== undefined) renderTradeoff(root.append('svg') as unknown as Root<SVGSVGElement>, input);
}

function moved(root: Place): void {
  renderMove(root, open, sceneOf(bench, { ...first, changes: { frequency: '120000' } }).moved);
}

const missScene = sceneOf(bench, { ...first, open: data.nearMisses[0]?.design.id ?? '' });
const missed: Assessment = missScene.own?.ok === true ? missScene.own.value : open;
const head = {
  isPinned: true,
  isLeft: true,
  isIncumbent: false,
  alike: scene.alike.length,
  isMiss: false,
  yield: 0.973,
};

/** An invented proof: one corner that disagrees in one figure, one that could not be simulated. */
export const PROOF: Proof = {
  format: 'chopfront-proof',
  version: 1,
  tool: '0.1.0',
  id: open.id,
  simulator: 'an invented simulator',
  corners: [
    {
      inputVoltage: 12.8,
      outputVoltage: 3.3,
      load: 1,
      figures: [
        {
          name: 'output ripple',
          unit: 'V',
          predicted: 0.0102,
          simulated: 0.01,
          difference: 0.02,
          band: 0.05,
          agrees: true,
        },
        { name: 'choke rms', unit: 'A', predicted: 4.2, simulated: 4, difference: 0.05, band: 0.02, agrees: false },
      ],
    },
    { inputVoltage: 15, outputVoltage: 3.3, load: 0.02, figures: [], failure: 'no steady state' },
  ],
  limits: [{ name: 'outputRipple', unit: 'V', simulated: 0.01, allowed: 0.02, holds: true }],
  agrees: false,
};

const point = open.points[first.point] ?? opened().points[0];

/** The open design on a rail whose load gives power back for a part of the time. */
const TWO_WAY: Rail = {
  ...data.rail,
  profile: [
    { fraction: -0.5, share: 0.4 },
    { fraction: 1, share: 0.6 },
  ],
};
const twoWay: Assessment = {
  ...open,
  efficiencyCurves: open.efficiencyCurves.map(({ inputVoltage, load, efficiency }) => ({
    inputVoltage,
    load: [...load.map((one) => -one).reverse(), ...load],
    efficiency: [...efficiency.toReversed().map((one) => one - 0.01), ...efficiency],
  })),
};

/** Draws one view into an empty place. */
export const GALLERY: Readonly<Record<string, (root: Place) => void>> = {
  'tradeoff-size': (root) => picture(root, 'size', true),
  'tradeoff-shade': (root) => picture(root, 'shade', false),
  'tradeoff-miss': (root) => {
    const input = pictureInput(bench, missScene, false);
    if (input !== undefined) renderTradeoff(root.append('svg') as unknown as Root<SVGSVGElement>, input);
  },
  masthead: (root) => renderMasthead(root, data.rail, data.run, data.front.designs.length, ['loss', 'volume', 'cost']),
  ranges: (root) => renderRanges(root, bench.dataset, { ranges: { 'o.volume': [1.4e-6, 2e-6] } }, scene.kept),
  legend: (root) => renderLegend(root, bench.dataset, ['buck-synchronous ×1'], scene.kept),
  'open-head': (root) => renderOpenHead(root, { ...head, design: open }),
  'open-miss': (root) => renderOpenHead(root, { ...head, design: missed, isMiss: true, proof: PROOF }),
  proof: (root) => renderProof(root, open.id, PROOF),
  losses: (root) => renderLosses(root, open, data.rail.profile.length),
  efficiency: (root) => renderEfficiency(root, open, data.rail),
  'efficiency-reverse': (root) => renderEfficiency(root, twoWay, TWO_WAY),
  waveforms: (root) => point !== undefined && renderWaveforms(root, point),
  temperatures: (root) => point !== undefined && renderTemperatures(root, open, point, data.rail.ambient),
  limits: (root) => renderLimits(root, open),
  makeup: (root) => renderMakeup(root, open, 'EUR'),
  parts: (root) => renderParts(root, open, 'EUR'),
  knobs: (root) =>
    renderKnobs(root, open, data.rail, { genes: bench.assessor.genes, own: bench.assessor.values(open.design) }, {}),
  move: moved,
  compare: (root) => renderCompare(root, bench.dataset, scene.pinned),
  prices: (root) => renderPrices(root, data),
  families: (root) => renderFamilies(root, data.families),
  trust: (root) => renderTrust(root, data.run, data.history),
  away: (root) => renderAway(root, open.id, ['spec.json'], 12),
  mind: (root) => renderMind(root, data.cautions, data.notCovered),
  marks: (root) => {
    for (const architecture of [
      'buck-synchronous',
      'buck-diode',
      'two-switch-forward',
      'half-bridge-centre-tap',
      'half-bridge-current-doubler',
      'full-bridge-centre-tap',
      'full-bridge-current-doubler',
    ]) {
      for (let phases = 1; phases <= 8; phases++) familyMark(root.append('span'), `${architecture} ×${phases}`);
    }
  },
};
