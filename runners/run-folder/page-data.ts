/** Gathers what a page embeds from the files of a run. */
import { explainRail, type RailProblem, type Relaxations } from '../../model/index.ts';
import type { Cloud, PageData, RunRecord as PageRun } from '../../viz/data.ts';
import { type Inputs, problemOf, take } from '../inputs.ts';
import { rowsOf } from '../sweep/grid.ts';
import { familyNotes } from './family-notes.ts';
import { type Found, readFound } from './found.ts';
import { readFront } from './front.ts';
import { nearMissesOf } from './near-misses.ts';
import { pageHistory } from './page-history.ts';
import { readProofs } from './proofs.ts';
import { type RunRecord, readRecord } from './record.ts';
import { type Restarts, readRestarts } from './restarts.ts';
import { readSnapshot } from './snapshot.ts';

/** Everything that the page of a run shows. Throws refusals where the run has nothing to show. */
export function gatherPage(folder: string): PageData {
  const record = readRecord(folder);
  const inputs: Inputs = readSnapshot(folder, record);
  const problem = problemOf(inputs);
  const found = readFound(folder);
  const front = readFront(folder);
  const restarts = readRestarts(folder, found.archive);
  const explanation = take(explainRail(inputs.rail, inputs.tables));
  return {
    run: pageRun(record),
    rail: inputs.rail,
    tables: inputs.tables,
    front,
    cloud: cloudOf(problem, found),
    history: pageHistory(found.sources),
    nearMisses: nearMissesOf(problem, found, restarts),
    ...(restarts === undefined ? {} : { relaxations: relaxationsOf(problem, restarts) }),
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

function relaxationsOf(problem: RailProblem, { steps, limits, evaluations, level }: Restarts): Relaxations {
  const rows = rowsOf(level, problem.genes.length);
  const placed = rows.map((genes) => ({
    id: problem.id(genes),
    family: problem.families.names[problem.families.of(genes)] ?? '',
    objectives: problem.judge(genes).objectives,
  }));
  return { steps, limits, evaluations, level: placed };
}
