/** Gathers what a page embeds from the files of a run. */
import { explainRail, frontFile, type RailProblem } from '../../model/index.ts';
import { mergeNearMisses } from '../../optimizer/index.ts';
import type { Cloud, NearMiss, PageData, RunRecord as PageRun } from '../../viz/data.ts';
import { type Inputs, problemOf, take } from '../inputs.ts';
import { rowsOf } from '../sweep/grid.ts';
import { familyNotes } from './family-notes.ts';
import { type Found, readFound } from './found.ts';
import { readFront } from './front.ts';
import { pageHistory } from './page-history.ts';
import { readProofs } from './proofs.ts';
import { type RunRecord, readRecord } from './record.ts';
import { readSnapshot } from './snapshot.ts';

/** Everything that the page of a run shows. Throws refusals where the run has nothing to show. */
export function gatherPage(folder: string): PageData {
  const record = readRecord(folder);
  const inputs: Inputs = readSnapshot(folder, record);
  const problem = problemOf(inputs);
  const found = readFound(folder);
  const front = readFront(folder);
  const explanation = take(explainRail(inputs.rail, inputs.tables));
  return {
    run: pageRun(record),
    rail: inputs.rail,
    tables: inputs.tables,
    front,
    cloud: cloudOf(problem, found),
    history: pageHistory(found.sources),
    nearMisses: nearMissesOf(problem, found),
    families: familyNotes(problem, found.sources, front.designs, explanation.architectures),
    cautions: explanation.cautions,
    notCovered: explanation.notCovered,
    incumbents: problem.seeds.map((genes) => problem.id(genes)),
    proofs: readProofs(folder),
  };
}

function pageRun(record: RunRecord): PageRun {
  const { status, seed, evaluations, epochs, seconds, threads, feasibleShare, hypervolume } = record;
  const { version, railHash, partsHash } = record;
  const built = new Date().toISOString();
  const counts = { evaluations, epochs, seconds, threads, feasibleShare, hypervolume };
  return { status, seed, ...counts, ...agreementOf(record), version, railHash, partsHash, built };
}

/** Each island's own share of the whole hypervolume, where the search recorded it. */
function agreementOf({ trust }: RunRecord): Pick<PageRun, 'agreement'> {
  const list = Array.isArray(trust.agreement) ? trust.agreement.filter((one) => typeof one === 'number') : [];
  return list.length > 1 ? { agreement: list } : {};
}

/** The sample of everything feasible that was evaluated. */
function cloudOf(problem: RailProblem, { sample }: Found): Cloud {
  return { families: problem.families.names, family: sample.family, objectives: sample.objectives };
}

function nearMissesOf(problem: RailProblem, found: Found): NearMiss[] {
  const nearMisses = mergeNearMisses(problem, [found.nearMisses], found.archive);
  const genes = rowsOf(nearMisses, problem.genes.length);
  const designs = new Map(frontFile(problem, genes).designs.map((design) => [design.id, design]));
  return genes.flatMap((row, i) => {
    const limit = problem.limits[nearMisses.limit[i] ?? -1] ?? '';
    const figure = problem.assess(row).limits.find((one) => one.name === limit);
    const design = designs.get(problem.id(row));
    if (figure === undefined || design === undefined) return [];
    return [{ limit, value: figure.value, allowed: figure.allowed, design }];
  });
}
