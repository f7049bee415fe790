/** `magnetics.md`: the order sheet of every wound part, and of a stocked choke what it must carry. */
import type { Assessment, LossItem } from '../assessment.ts';
import type { Conductor } from '../parts/conductor.ts';
import type { RailProblem } from '../problem.ts';
import { formatDifference, formatQuantity } from '../quantity/index.ts';
import { type Document, markdown, type Section } from './document.ts';
import { fullLoad, type SolvedPoint, solveAt } from './solved-point.ts';
import { chokeCurrent, LISTED, transformerCurrents, type WindingCurrent } from './winding-currents.ts';

/** What every wound part's sheet says of insulation. */
const INSULATION =
  'Insulation between windings and to the core, creepage and clearance are not designed here: the maker and the safety standard of the product decide them.';

/** The text of `magnetics.md` for the design of snapped `genes`. */
export function magneticsSheet(problem: RailProblem, genes: Float64Array): string {
  const point = solveAt(problem, genes, fullLoad(problem.rail));
  const assessment = problem.assess(genes);
  const { stage } = point.design;
  const document: Document = {
    title: `Magnetics of ${assessment.id}`,
    subtitle: `${assessment.family} for ${problem.rail.name}. Currents and losses at full load, nominal input, usual values; limits at the worst corner.`,
    sections: [
      ...(stage.form === undefined ? [] : transformerSections(point, assessment)),
      ...chokeSections(point, assessment),
    ],
  };
  return markdown(document);
}

function transformerSections(point: SolvedPoint, assessment: Assessment): Section[] {
  const { design, state } = point;
  const t = design.transformer;
  const choice = design.transformerChoice;
  if (choice === undefined) return [];
  const centre = design.stage.form?.centreTap === true;
  const rows = [
    ['pieces', String(design.phases)],
    ['core', `${choice.core.name} (${choice.core.shape}), ungapped, both halves ground`],
    ['material', `${choice.material.name} (${choice.material.kind})`],
    ['primary', turnsText(choice.primaryTurns, choice.primary, t.primaryParallel)],
    [
      centre ? 'secondary, two halves, each' : 'secondary',
      turnsText(choice.secondaryTurns, choice.secondary, t.secondaryParallel),
    ],
    ['winding order', 'half the primary, secondary, other half of the primary'],
    ['magnetizing inductance, primary', `${formatQuantity(t.magnetizing, 'H')} at least 70 % of it`],
    ['leakage inductance, primary', `${formatQuantity(t.leakage, 'H')} expected`],
    ['dc resistance at 25 °C, primary', formatQuantity(t.primaryResistance, 'Ω')],
    ['dc resistance at 25 °C, one secondary winding', formatQuantity(t.secondaryResistance, 'Ω')],
    ['flux swing, peak to peak', formatQuantity(state.fluxSwing, 'T')],
    ['magnetizing current, peak', formatQuantity(state.magnetizingPeak, 'A')],
    ['window used', percent(t.fill)],
    ...limitRows(assessment, ['transformerFlux', 'transformerTemperature']),
  ];
  return [
    { title: 'Transformer', table: { head: ['what', 'value'], rows } },
    currentSection('Transformer currents', transformerCurrents(point)),
    harmonicSection('Transformer harmonics', transformerCurrents(point)),
    lossSection('Transformer loss budget, one piece', assessment, 'transformer', design.phases),
    { title: 'Transformer insulation', paragraphs: [INSULATION] },
  ];
}

function chokeSections(point: SolvedPoint, assessment: Assessment): Section[] {
  const { design, state } = point;
  const pieces = design.phases * design.stage.chokes;
  const current = [chokeCurrent(point)];
  const tail = [
    currentSection('Choke currents', current),
    harmonicSection('Choke harmonics', current),
    lossSection('Choke loss budget, one piece', assessment, 'inductor', pieces),
  ];
  const shared = [
    ['inductance without bias', `${formatQuantity(design.inductance, 'H')} ± ${percent(design.inductor.tolerance)}`],
    ['inductance at full load', formatQuantity(state.effectiveInductance, 'H')],
    ['dc resistance at 25 °C', formatQuantity(design.inductor.dcResistance, 'Ω')],
    ...limitRows(assessment, ['saturation', 'inductorTemperature']),
  ];
  const { chokeMaterial, woundChoke: choke } = design;
  if (chokeMaterial === undefined) {
    const rows = [['pieces', String(pieces)], ['stocked part', design.inductor.name], ...shared];
    const note = 'This choke is bought from stock: the figures below are for whoever looks for a substitute.';
    return [{ title: 'Choke', paragraphs: [note], table: { head: ['what', 'value'], rows } }, ...tail];
  }
  const { parts, genes } = assessment.design;
  const rows = [
    ['pieces', String(pieces)],
    ['core', parts.chokeCore ?? ''],
    ['material', `${chokeMaterial.name} (${chokeMaterial.kind})`],
    ['turns', `${genes.chokeTurns} of ${parts.chokeConductor ?? ''}, ${choke.parallel} in parallel`],
    [
      'gap',
      choke.gap > 0 ? `${formatQuantity(choke.gap, 'm')}, in the centre leg` : 'none; the gap is in the material',
    ],
    ['window used', percent(choke.fill)],
    ...shared,
  ];
  return [
    { title: 'Choke', table: { head: ['what', 'value'], rows } },
    ...tail,
    { title: 'Choke insulation', paragraphs: [INSULATION] },
  ];
}

function turnsText(turns: number, conductor: Conductor, parallel: number): string {
  return `${turns} turns of ${conductor.name} (${conductor.kind}), ${parallel} in parallel`;
}

function limitRows(assessment: Assessment, names: readonly string[]): string[][] {
  return assessment.limits
    .filter(({ name }) => names.includes(name))
    .map(({ name, value, allowed, unit, margin }) => [
      `${name}, worst corner`,
      `${formatQuantity(value, unit)} of ${formatQuantity(allowed, unit)}, margin ${formatDifference(margin, unit)}`,
    ]);
}

function currentSection(title: string, currents: readonly WindingCurrent[]): Section {
  const amps = (value: number): string => formatQuantity(value, 'A');
  const rows = currents.map((one) => [one.name, amps(one.mean), amps(one.rms), amps(one.peak), amps(one.valley)]);
  return { title, table: { head: ['winding', 'mean', 'rms', 'peak', 'valley'], rows } };
}

function harmonicSection(title: string, currents: readonly WindingCurrent[]): Section {
  const head = ['winding', 'first at', ...Array.from({ length: LISTED }, (_, k) => `${k + 1} (A rms)`)];
  const rows = currents.map((one) => [
    one.name,
    formatQuantity(one.frequency, 'Hz'),
    ...one.harmonics.map((value) => value.toPrecision(3)),
  ]);
  return { title, table: { head, rows } };
}

function lossSection(title: string, assessment: Assessment, part: string, pieces: number): Section {
  const full = assessment.points.find((one) => one.load === 1) ?? assessment.points[0];
  const items: readonly LossItem[] = (full?.losses ?? []).filter((item) => item.part === part);
  const total = items.reduce((sum, { watts }) => sum + watts, 0);
  const rows = [...items.map(({ effect, watts }) => [effect, watts]), ['together', total]].map(([name, watts]) => [
    String(name),
    formatQuantity(Number(watts) / pieces, 'W'),
  ]);
  return { title, table: { head: ['effect', 'loss'], rows } };
}

function percent(value: number): string {
  return `${(100 * value).toFixed(0)} %`;
}
