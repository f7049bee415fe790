/** Moves a gene vector onto the nearest buildable design, and gives genes that play no part one canonical value. */
import type { Gene } from '../optimizer/problem.ts';
import type { Catalogue, InductorSeries } from './catalogue.ts';
import { hasTransformer, isFullBridge, takesPowerStages, usesLowSwitch } from './catalogue.ts';
import { GENE, PACKAGED, WOUND } from './genes.ts';
import type { Architecture } from './stages/list.ts';

/** Powers of ten as literals: a computed one could differ in its last digit between engines. */
const DECADES = [1, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8];

/** Snaps `genes` in place; idempotent. A gene that is not a number takes its lowest value. */
export function snapGenes(
  genes: Float64Array,
  list: readonly Gene[],
  catalogue: Catalogue,
  architectures: readonly Architecture[],
): void {
  for (let i = 0; i < list.length; i++) genes[i] = clampGene(genes[i], list[i]);
  genes[GENE.frequency] = clampGene(significant(genes[GENE.frequency]), list[GENE.frequency]);
  if (isWound(genes, list)) {
    // Whole nanohenries over 1e9 give the double nearest to the decimal, so the text reads back the same.
    genes[GENE.inductance] = clampGene(significant(genes[GENE.inductance] * 1e9) / 1e9, list[GENE.inductance]);
  } else {
    const series = catalogue.inductorSeries[genes[GENE.inductorSeries]];
    genes[GENE.inductance] = series.rows[nearestRow(series, genes)].inductance;
  }
  rest(genes, list, architectures[genes[GENE.architecture]]);
}

/** Index of the row of `series` whose inductance is nearest to that of `genes` on a logarithmic scale. */
export function nearestRow(series: InductorSeries, genes: Float64Array): number {
  const { rows } = series;
  const inductance = genes[GENE.inductance];
  let index = 0;
  while (index + 1 < rows.length && inductance * inductance > rows[index].inductance * rows[index + 1].inductance)
    index++;
  return index;
}

/** `value`, at least 100, at three significant digits: finer than any oscillator is set. */
function significant(value: number): number {
  let unit = 0;
  while (unit + 1 < DECADES.length && value >= DECADES[unit + 1] * 100) unit++;
  // A whole number times an exact power of ten is the double nearest to the decimal, so the text reads back the same.
  return round(value / DECADES[unit]) * DECADES[unit];
}

/** Whether the choke of snapped `genes` is wound to order. */
export function isWound(genes: Float64Array, list: readonly Gene[]): boolean {
  return list[GENE.chokeBuild].options?.[genes[GENE.chokeBuild]] === WOUND;
}

/** Whether the leg of snapped `genes` is a power stage: only some architectures' can be. */
export function isPackaged(genes: Float64Array, list: readonly Gene[], architecture: Architecture): boolean {
  return takesPowerStages(architecture) && list[GENE.legBuild].options?.[genes[GENE.legBuild]] === PACKAGED;
}

const DISCRETE_GENES = [GENE.highSwitch, GENE.highParallel, GENE.lowSwitch, GENE.lowParallel];
const LEG_GENES = [GENE.powerStage];
const CHOKE_GENES = [GENE.chokeCore, GENE.chokeMaterial, GENE.chokeTurns, GENE.chokeConductor];
const TRANSFORMER_GENES = [
  GENE.transformerCore,
  GENE.transformerMaterial,
  GENE.primaryTurns,
  GENE.secondaryTurns,
  GENE.primaryConductor,
  GENE.secondaryConductor,
];

/** The one value of a gene that plays no part: the middle of its range, so that a design in which it does begins at no extreme. */
function middle(gene: Gene): number {
  return Math.floor(0.5 * (gene.low + gene.high));
}

function reset(genes: Float64Array, list: readonly Gene[], places: readonly number[]): void {
  for (const place of places) genes[place] = middle(list[place]);
}

function rest(genes: Float64Array, list: readonly Gene[], architecture: Architecture): void {
  if (isPackaged(genes, list, architecture)) reset(genes, list, DISCRETE_GENES);
  else reset(genes, list, LEG_GENES);
  if (!takesPowerStages(architecture)) genes[GENE.legBuild] = 0;
  if (usesLowSwitch(architecture)) {
    genes[GENE.diode] = middle(list[GENE.diode]);
  } else {
    genes[GENE.lowSwitch] = middle(list[GENE.lowSwitch]);
    genes[GENE.lowParallel] = list[GENE.lowParallel].low;
  }
  if (isWound(genes, list)) genes[GENE.inductorSeries] = middle(list[GENE.inductorSeries]);
  else reset(genes, list, CHOKE_GENES);
  if (!hasTransformer(architecture)) reset(genes, list, TRANSFORMER_GENES);
  if (!isFullBridge(architecture)) genes[GENE.bridgeControl] = 0;
  if (genes[GENE.outputBulkCount] === 0) genes[GENE.outputBulk] = middle(list[GENE.outputBulk]);
  if (genes[GENE.inputBulkCount] === 0) genes[GENE.inputBulk] = middle(list[GENE.inputBulk]);
}

function clampGene(value: number, gene: Gene): number {
  if (!(value > gene.low)) return gene.low;
  if (value > gene.high) return gene.high;
  return gene.kind === 'whole' || gene.kind === 'choice' ? round(value) : value;
}

function round(value: number): number {
  return Math.floor(value + 0.5);
}
