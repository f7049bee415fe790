/** The genes of a converter design: one fixed list, with the place of each by name. */
import type { Gene } from '../optimizer/problem.ts';
import { type Catalogue, isFullBridge } from './catalogue.ts';
import type { Rail } from './rail/rail.ts';

/** Order of the genes in a gene vector. */
const GENE_NAMES = [
  'architecture',
  'phases',
  'frequency',
  'inductance',
  'inductorSeries',
  'highSwitch',
  'highParallel',
  'lowSwitch',
  'lowParallel',
  'diode',
  'controller',
  'outputCeramic',
  'outputCeramicCount',
  'outputBulk',
  'outputBulkCount',
  'inputCeramic',
  'inputCeramicCount',
  'inputBulk',
  'inputBulkCount',
  'chokeBuild',
  'chokeCore',
  'chokeMaterial',
  'chokeTurns',
  'chokeConductor',
  'transformerCore',
  'transformerMaterial',
  'primaryTurns',
  'secondaryTurns',
  'primaryConductor',
  'secondaryConductor',
  'legBuild',
  'powerStage',
  'bridgeControl',
] as const;
export type GeneName = (typeof GENE_NAMES)[number];

/** Options of the gene `chokeBuild`. */
export const STOCKED = 'stocked';
export const WOUND = 'wound';

/** Options of the gene `legBuild`. */
const DISCRETE = 'discrete';
export const PACKAGED = 'power stage';

/** Options of the gene `bridgeControl`. */
const BRIDGE_CONTROLS = ['hard-switched', 'phase-shifted'] as const;

/** Most turns that a gene counts. */
const MOST_CHOKE_TURNS = 60;
const MOST_PRIMARY_TURNS = 96;
const MOST_SECONDARY_TURNS = 8;

/** Place of each gene in a gene vector. */
export const GENE = Object.fromEntries(GENE_NAMES.map((name, index) => [name, index])) as Readonly<
  Record<GeneName, number>
>;

/** Genes whose value names a part (or an architecture), so that a record holds the name and not the number. */
const NAMED_GENES: readonly GeneName[] = [
  'architecture',
  'inductorSeries',
  'highSwitch',
  'lowSwitch',
  'diode',
  'controller',
  'outputCeramic',
  'outputBulk',
  'inputCeramic',
  'inputBulk',
  'chokeBuild',
  'chokeCore',
  'chokeMaterial',
  'chokeConductor',
  'transformerCore',
  'transformerMaterial',
  'primaryConductor',
  'secondaryConductor',
  'legBuild',
  'powerStage',
  'bridgeControl',
];

/** Genes with a number that a person reads, in the order of a record. */
export const NUMERIC_GENES: readonly GeneName[] = GENE_NAMES.filter((name) => !NAMED_GENES.includes(name));

/** SI unit of each numeric gene that is not a count. */
export const GENE_UNITS: Readonly<Partial<Record<GeneName, string>>> = { frequency: 'Hz', inductance: 'H' };

/** The genes of `rail`'s space over the options of `catalogue`, in the order of `GENE_NAMES`. */
export function createGenes(rail: Rail, catalogue: Catalogue): readonly Gene[] {
  const { search } = rail;
  const ordered = (name: GeneName, rows: readonly { name: string }[]): Gene => ({
    name,
    unit: '',
    kind: 'whole',
    low: 0,
    high: Math.max(0, rows.length - 1),
    options: rows.map((row) => row.name),
  });
  const unordered = (name: GeneName, rows: readonly { name: string }[]): Gene => ({
    ...ordered(name, rows),
    kind: 'choice',
  });
  const count = (name: GeneName, low: number, high: number): Gene => ({ name, unit: '', kind: 'whole', low, high });
  const genes: Record<GeneName, Gene> = {
    architecture: {
      name: 'architecture',
      unit: '',
      kind: 'choice',
      low: 0,
      high: search.architectures.length - 1,
      options: search.architectures,
    },
    phases: count('phases', search.phases.minimum, search.phases.maximum),
    frequency: {
      name: 'frequency',
      unit: 'Hz',
      kind: 'log',
      low: search.frequency.minimum,
      high: search.frequency.maximum,
    },
    inductance: { name: 'inductance', unit: 'H', kind: 'log', ...inductanceSpan(rail, catalogue) },
    inductorSeries: ordered('inductorSeries', catalogue.inductorSeries),
    highSwitch: ordered('highSwitch', catalogue.highSwitches),
    highParallel: count('highParallel', 1, search.parallelSwitches),
    lowSwitch: ordered('lowSwitch', catalogue.lowSwitches),
    lowParallel: count('lowParallel', 1, search.parallelSwitches),
    diode: ordered('diode', catalogue.diodes),
    controller: ordered('controller', catalogue.controllers),
    outputCeramic: ordered('outputCeramic', catalogue.outputCeramics),
    outputCeramicCount: count('outputCeramicCount', 1, search.ceramics),
    outputBulk: ordered('outputBulk', catalogue.outputBulks),
    outputBulkCount: count('outputBulkCount', 0, catalogue.outputBulks.length > 0 ? search.bulks : 0),
    inputCeramic: ordered('inputCeramic', catalogue.inputCeramics),
    inputCeramicCount: count('inputCeramicCount', 1, search.ceramics),
    inputBulk: ordered('inputBulk', catalogue.inputBulks),
    inputBulkCount: count('inputBulkCount', 0, catalogue.inputBulks.length > 0 ? search.bulks : 0),
    legBuild: { name: 'legBuild', unit: '', kind: 'choice', ...legOptions(catalogue) },
    powerStage: ordered(
      'powerStage',
      catalogue.legs.map(({ stage }) => stage),
    ),
    bridgeControl: {
      name: 'bridgeControl',
      unit: '',
      kind: 'choice',
      low: 0,
      high: search.architectures.some(isFullBridge) ? BRIDGE_CONTROLS.length - 1 : 0,
      options: BRIDGE_CONTROLS,
    },
    chokeBuild: { name: 'chokeBuild', unit: '', kind: 'choice', ...buildOptions(catalogue) },
    chokeCore: ordered('chokeCore', catalogue.chokeCores),
    chokeMaterial: unordered('chokeMaterial', catalogue.chokeCores.length > 0 ? catalogue.materials : []),
    chokeTurns: count('chokeTurns', 1, catalogue.chokeCores.length > 0 ? MOST_CHOKE_TURNS : 1),
    chokeConductor: ordered('chokeConductor', catalogue.chokeCores.length > 0 ? catalogue.conductors : []),
    transformerCore: ordered('transformerCore', catalogue.transformerCores),
    transformerMaterial: unordered('transformerMaterial', catalogue.transformerMaterials),
    primaryTurns: count('primaryTurns', 1, catalogue.transformerCores.length > 0 ? MOST_PRIMARY_TURNS : 1),
    secondaryTurns: count('secondaryTurns', 1, catalogue.transformerCores.length > 0 ? MOST_SECONDARY_TURNS : 1),
    primaryConductor: ordered('primaryConductor', catalogue.transformerCores.length > 0 ? catalogue.conductors : []),
    secondaryConductor: ordered(
      'secondaryConductor',
      catalogue.transformerCores.length > 0 ? catalogue.conductors : [],
    ),
  };
  return GENE_NAMES.map((name) => genes[name]);
}

/** How the leg of a synchronous buck is had: from discrete switches, or as one package with its driver. */
function legOptions(catalogue: Catalogue): { low: number; high: number; options: readonly string[] } {
  const options = catalogue.legs.length > 0 ? [DISCRETE, PACKAGED] : [DISCRETE];
  return { low: 0, high: options.length - 1, options };
}

/** How a choke is had: from stock, wound to order, or either. */
function buildOptions(catalogue: Catalogue): { low: number; high: number; options: readonly string[] } {
  const options = [
    ...(catalogue.inductorSeries.length > 0 ? [STOCKED] : []),
    ...(catalogue.chokeCores.length > 0 ? [WOUND] : []),
  ];
  return { low: 0, high: options.length - 1, options };
}

function inductanceSpan(rail: Rail, catalogue: Catalogue): { low: number; high: number } {
  if (catalogue.chokeCores.length > 0)
    return { low: rail.search.inductance.minimum, high: rail.search.inductance.maximum };
  let low = Number.MAX_VALUE;
  let high = 0;
  for (const series of catalogue.inductorSeries) {
    for (const row of series.rows) {
      low = Math.min(low, row.inductance);
      high = Math.max(high, row.inductance);
    }
  }
  return { low, high };
}
