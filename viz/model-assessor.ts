/** The real model behind the page's face of it: the same functions as the sweep, so the same bits. */
import type { DesignRecord } from '../model/assessment.ts';
import { frontCsv, frontFile } from '../model/front-file.ts';
import { describeFinding, type Finding } from '../model/outcome.ts';
import { createRailProblem, type RailProblem } from '../model/problem.ts';
import type { Rail } from '../model/rail/rail.ts';
import type { Assessor, Movable, TakeAwayFile, Verdict } from './assessor.ts';
import type { FrontDesign, PageData } from './data.ts';
import { TAKE_AWAY, takeAwayFiles } from './note/take-away.ts';
import { recordOf } from './scene.ts';

/** Slot of a record in which a named gene's part stands, where it is not the gene's own name. */
const SLOTS: Readonly<Record<string, string>> = { inductorSeries: 'inductor' };

/** Named choices that are no part but decide which parts there are. */
const STRUCTURE: readonly string[] = ['architecture', 'chokeBuild', 'legBuild'];

/** An assessor over the page's own rail and tables, or over none where they give no space. */
export function modelAssessor(
  data: Pick<PageData, 'rail' | 'tables' | 'front' | 'nearMisses' | 'relaxations' | 'run'>,
): Assessor {
  const own = createRailProblem(data.rail, data.tables);
  if (!own.ok) return refusing(why(own.findings));
  const problem = own.value;
  const spaces = remembered(data, problem);
  return {
    genes: problem.genes.map(movable),
    assess: (design, rail, moves) => assess(spaces(rail), design, moves),
    values: (design) => valuesOf(problem, design),
    files: TAKE_AWAY,
    takeAway: (design) => takeAway(problem, data, design),
    frontCsv: (ids) =>
      csvOf(
        problem,
        data.front.designs.filter((design) => ids.has(design.id)),
      ),
  };
}

type Space = RailProblem | string;

/** The sheet's own space, and the one of the rail last asked for. */
function remembered(data: Pick<PageData, 'rail' | 'tables'>, own: RailProblem): (rail: Rail) => Space {
  let last: { readonly key: string; readonly space: Space } | undefined;
  return (rail) => {
    if (rail === data.rail) return own;
    const key = JSON.stringify(rail);
    if (last?.key === key) return last.space;
    const made = createRailProblem(rail, data.tables);
    const space = made.ok ? made.value : why(made.findings);
    last = { key, space };
    return space;
  };
}

function assess(space: Space, design: DesignRecord, moves: Readonly<Record<string, number | string>>): Verdict {
  if (typeof space === 'string') return { ok: false, why: space };
  const genes = space.genesFrom(design, 'this design');
  if (!genes.ok) return { ok: false, why: why(genes.findings) };
  for (const [name, value] of Object.entries(moves)) {
    const place = space.genes.findIndex((gene) => gene.name === name);
    const index = typeof value === 'string' ? (space.genes[place]?.options?.indexOf(value) ?? -1) : value;
    if (place < 0 || (typeof value === 'string' && index < 0)) return { ok: false, why: `${name}: no ${value} here` };
    genes.value[place] = index;
  }
  return { ok: true, value: space.assess(genes.value) };
}

function movable(gene: RailProblem['genes'][number]): Movable {
  const { name, unit, kind, low, high, options } = gene;
  return options === undefined ? { name, unit, kind, low, high } : { name, unit, kind, low, high, options };
}

function valuesOf(problem: RailProblem, design: DesignRecord): Readonly<Record<string, number | string>> {
  const genes = problem.genesFrom(design);
  if (!genes.ok) return {};
  const entries = problem.genes.flatMap((gene, i): [string, number | string][] => {
    const value = genes.value[i] ?? 0;
    if (gene.options === undefined) return gene.name in design.genes ? [[gene.name, value]] : [];
    const isPart = (SLOTS[gene.name] ?? gene.name) in design.parts || STRUCTURE.includes(gene.name);
    return isPart ? [[gene.name, gene.options[value] ?? '']] : [];
  });
  return Object.fromEntries(entries);
}

/** In the context that `chopfront handoff` gives, so that the bytes are the same. */
function takeAway(
  problem: RailProblem,
  { front, nearMisses, relaxations, run }: Pick<PageData, 'front' | 'nearMisses' | 'relaxations' | 'run'>,
  design: DesignRecord,
): readonly TakeAwayFile[] {
  const genes = problem.genesFrom(design);
  if (!genes.ok) return [];
  const hashes = { rail: run.railHash, parts: run.partsHash };
  return takeAwayFiles(problem, genes.value, { designs: front.designs, nearMisses, relaxations, hashes });
}

/** Margins are judged anew: the page keeps them in single precision. Yields come from the run alone. */
function csvOf(problem: RailProblem, designs: readonly FrontDesign[]): string {
  const rows = designs.flatMap((design) => {
    const genes = problem.genesFrom(recordOf(design));
    return genes.ok ? [genes.value] : [];
  });
  const file = frontFile(problem, rows);
  const yields = new Map(designs.map((design) => [design.id, design.yield]));
  const withYield = (design: FrontDesign): FrontDesign => {
    const share = yields.get(design.id);
    return share === undefined ? design : { ...design, yield: share };
  };
  return frontCsv({ ...file, designs: file.designs.map(withYield) });
}

function refusing(reason: string): Assessor {
  return {
    genes: [],
    assess: () => ({ ok: false, why: reason }),
    values: () => ({}),
    files: [],
    takeAway: () => [],
    frontCsv: () => '',
  };
}

function why(findings: readonly Finding[]): string {
  return findings.map(describeFinding).join('; ');
}
