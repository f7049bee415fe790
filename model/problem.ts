/** The converter space of one rail as the search sees it, with its rich twin for a person. */
import type { Families, Problem } from '../optimizer/problem.ts';
import { assessDesign } from './assess.ts';
import type { Assessment, DesignRecord } from './assessment.ts';
import { type Catalogue, createCatalogue, hasTransformer, isFullBridge, usesLowSwitch } from './catalogue.ts';
import { Evaluator, judgeDesign } from './evaluate.ts';
import { createGenes, GENE, type GeneName, NUMERIC_GENES } from './genes.ts';
import type { LimitDefinition } from './limits/book.ts';
import { objectivesOf, objectiveWriters } from './objectives.ts';
import { bad, type Finding, good, type Outcome } from './outcome.ts';
import type { PartsTables } from './parts/tables.ts';
import type { Rail } from './rail/rail.ts';
import { fromRecord, type RecordSpace, recordId, toRecord } from './record.ts';
import { isPackaged, isWound, nearestRow, snapGenes } from './snap.ts';
import type { Stage } from './stages/contract.ts';
import type { Architecture } from './stages/list.ts';
import { stageOf } from './stages/list.ts';

/** Figures of one design. */
export interface Judgement {
  readonly objectives: readonly number[];
  /** By limit name, in the limit's unit; a limit that does not apply to the design is absent. */
  readonly margins: Readonly<Record<string, number>>;
  /** Smallest margin as a fraction of what is allowed. */
  readonly worstMargin: number;
  readonly feasible: boolean;
}

/** A rail's design space: a problem for the search, and everything a person asks of one design. */
export interface RailProblem extends Problem {
  readonly rail: Rail;
  readonly catalogue: Catalogue;
  /** Architectures that can serve the rail, in the order in which the `architecture` gene counts them. */
  readonly architectures: readonly Architecture[];
  /** Genes of this space that are numbers, in the order of a record. */
  readonly numericGenes: readonly GeneName[];
  /** Limits with unit and sense, in the order of `limits`. */
  readonly limitDefinitions: readonly LimitDefinition[];
  /** Objectives and margins of the design of snapped `genes`, without its story. */
  judge(genes: Float64Array): Judgement;
  /** Everything about the design of `genes`, which are snapped first in a copy. */
  assess(genes: Float64Array): Assessment;
  /** Names and numbers of the design of snapped `genes`. */
  record(genes: Float64Array): DesignRecord;
  /** Snapped genes of a record; every name or value that this space does not know is a finding in `file`. */
  genesFrom(record: DesignRecord, file?: string): Outcome<Float64Array>;
  /** The design's id. */
  id(genes: Float64Array): string;
}

/**
 * The space of `rail` over `tables`, or why there is none. The search starts from `incumbents` too; one that cannot stand in
 * this space is a finding.
 */
export function createRailProblem(
  rail: Rail,
  tables: PartsTables,
  incumbents: readonly DesignRecord[] = [],
): Outcome<RailProblem> {
  const serving = servingStages(rail);
  if (!serving.ok) return serving;
  const stages = serving.value;
  const architectures = stages.map((stage) => stage.architecture);
  const narrowed: Rail = { ...rail, search: { ...rail.search, architectures } };
  const catalogue = createCatalogue(narrowed, tables);
  if (!catalogue.ok) return catalogue;
  const space = new ConverterSpace(narrowed, catalogue.value, stages);
  const seeds = incumbents.map((record, i) => space.genesFrom(record, rail.incumbents?.[i] ?? `incumbent ${i + 1}`));
  const findings = seeds.flatMap((seed) => (seed.ok ? [] : seed.findings));
  if (findings.length > 0) return bad(findings);
  space.seeds = seeds.flatMap((seed) => (seed.ok ? [seed.value] : []));
  return good(space);
}

/** The stages that can serve `rail`, or one finding for each that cannot where none can. */
function servingStages(rail: Rail): Outcome<readonly Stage[]> {
  const findings: Finding[] = [];
  const stages: Stage[] = [];
  for (const architecture of rail.search.architectures) {
    const stage = stageOf(architecture);
    const refusal = stage === undefined ? 'this architecture is not modelled yet' : stage.refusal(rail);
    if (stage !== undefined && refusal === undefined) stages.push(stage);
    else {
      const field = 'search.architectures';
      findings.push({ file: rail.name, line: 0, column: 0, field, found: architecture, allowed: refusal ?? '' });
    }
  }
  return stages.length > 0 ? good(stages) : bad(findings);
}

class ConverterSpace implements RailProblem {
  readonly name: string;
  readonly rail: Rail;
  readonly catalogue: Catalogue;
  readonly architectures: readonly Architecture[];
  readonly genes;
  readonly objectives;
  readonly limits: readonly string[];
  readonly limitDefinitions: readonly LimitDefinition[];
  readonly numericGenes: readonly GeneName[];
  readonly families: Families;
  seeds: readonly Float64Array[] = [];
  private readonly evaluator: Evaluator;
  private readonly writers;
  private readonly space: RecordSpace;

  constructor(rail: Rail, catalogue: Catalogue, stages: readonly Stage[]) {
    this.name = rail.name;
    this.rail = rail;
    this.catalogue = catalogue;
    this.architectures = rail.search.architectures;
    this.genes = createGenes(rail, catalogue);
    this.numericGenes = numericGenes(catalogue);
    this.objectives = objectivesOf(rail);
    this.writers = objectiveWriters(rail);
    this.evaluator = new Evaluator(rail, catalogue, stages);
    this.limitDefinitions = this.evaluator.book.definitions;
    this.limits = this.limitDefinitions.map((definition) => definition.name);
    this.families = familiesOf(rail);
    this.space = recordSpace(this);
  }

  snap(genes: Float64Array): void {
    snapGenes(genes, this.genes, this.catalogue, this.architectures);
  }

  evaluate(genes: Float64Array, objectives: Float64Array, violations: Float64Array): void {
    const { evaluator, writers } = this;
    judgeDesign(evaluator, genes);
    for (let i = 0; i < writers.length; i++) writers[i](evaluator, objectives, i);
    evaluator.book.violations(violations);
  }

  judge(genes: Float64Array): Judgement {
    const objectives = new Float64Array(this.objectives.length);
    const violations = new Float64Array(this.limits.length);
    this.evaluate(genes, objectives, violations);
    const { book } = this.evaluator;
    const margins: Record<string, number> = {};
    let worstMargin = Number.POSITIVE_INFINITY;
    for (const [i, { name, sense, whole }] of book.definitions.entries()) {
      if (book.slack[i] === Number.POSITIVE_INFINITY) continue;
      margins[name] = sense === 'most' ? book.allowed[i] - book.value[i] : book.value[i] - book.allowed[i];
      if (whole !== true || book.slack[i] < 0) worstMargin = Math.min(worstMargin, book.slack[i]);
    }
    const feasible = violations.every((violation) => violation === 0) && objectives.every(Number.isFinite);
    return { objectives: [...objectives], margins, worstMargin, feasible };
  }

  assess(genes: Float64Array): Assessment {
    const snapped = Float64Array.from(genes);
    this.snap(snapped);
    return assessDesign(this, this.evaluator, snapped);
  }

  record(genes: Float64Array): DesignRecord {
    return toRecord(this.space, genes);
  }

  genesFrom(record: DesignRecord, file = 'design'): Outcome<Float64Array> {
    const outcome = fromRecord(this.space, record, file);
    if (outcome.ok) this.snap(outcome.value);
    return outcome;
  }

  id(genes: Float64Array): string {
    return recordId(this.record(genes));
  }
}

/** The numeric genes that can play a part: those of wound parts only where there is something to wind on. */
function numericGenes(catalogue: Catalogue): readonly GeneName[] {
  return NUMERIC_GENES.filter((name) => {
    if (name === 'chokeTurns') return catalogue.chokeCores.length > 0;
    return !TRANSFORMER.test(name) || catalogue.transformerCores.length > 0;
  });
}

function familiesOf(rail: Rail): Families {
  const { architectures, phases } = rail.search;
  const span = phases.maximum - phases.minimum + 1;
  const names = architectures.flatMap((architecture) =>
    Array.from({ length: span }, (_, i) => `${architecture} ×${phases.minimum + i}`),
  );
  return {
    names,
    of: (genes) => genes[GENE.architecture] * span + genes[GENE.phases] - phases.minimum,
    confine: (genes, family) => {
      genes[GENE.architecture] = Math.floor(family / span);
      genes[GENE.phases] = phases.minimum + (family % span);
    },
  };
}

/** Names of the genes of a transformer. */
const TRANSFORMER = /^(transformer|primary|secondary)/;

function recordSpace(problem: RailProblem): RecordSpace {
  const { catalogue, architectures } = problem;
  const low = (genes: Float64Array): boolean => usesLowSwitch(architectures[genes[GENE.architecture]]);
  const active = (genes: Float64Array, name: GeneName): boolean => {
    const packaged = isPackaged(genes, problem.genes, architectures[genes[GENE.architecture]]);
    if (name === 'powerStage') return packaged;
    if (name === 'bridgeControl') return isFullBridge(architectures[genes[GENE.architecture]]);
    if (name === 'highSwitch' || name === 'highParallel') return !packaged;
    if (name === 'lowSwitch' || name === 'lowParallel') return low(genes) && !packaged;
    if (name === 'diode') return !low(genes);
    if (name === 'outputBulk') return genes[GENE.outputBulkCount] > 0;
    if (name === 'inputBulk') return genes[GENE.inputBulkCount] > 0;
    if (name === 'inductorSeries') return !isWound(genes, problem.genes);
    if (name === 'legBuild') return false;
    if (name.startsWith('choke')) return name !== 'chokeBuild' && isWound(genes, problem.genes);
    if (TRANSFORMER.test(name)) return hasTransformer(architectures[genes[GENE.architecture]]);
    return true;
  };
  return {
    genes: problem.genes,
    architectures,
    active,
    inductorName: (genes) => {
      const series = catalogue.inductorSeries[genes[GENE.inductorSeries]];
      return series.rows[nearestRow(series, genes)].name;
    },
    inductorPlace: (name) => {
      for (const series of catalogue.inductorSeries) {
        const row = series.rows.find((candidate) => candidate.name === name);
        if (row !== undefined) return { series: series.name, inductance: row.inductance };
      }
      return undefined;
    },
  };
}
