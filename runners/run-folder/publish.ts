/** The files of a run that people and other programs read, written from what was found. Same findings, same bytes. */
import { type FrontFile, frontCsv, frontFile, type RailProblem } from '../../model/index.ts';
import type { NearMissDesigns } from '../../optimizer/index.ts';
import { chooseFront, genesOf } from '../sweep/grid.ts';
import { writeWhole } from './files.ts';
import { runFile } from './folder.ts';
import type { Found } from './found.ts';
import { historyCsv } from './history-csv.ts';

/** Writes `front.json`, `front.csv`, `near-misses.csv` and `history.csv`; returns the front. */
export function publish(folder: string, problem: RailProblem, found: Found): FrontFile {
  const front = frontOf(problem, found);
  writeWhole(runFile(folder, 'frontJson'), `${JSON.stringify(front, undefined, 1)}\n`);
  writeWhole(runFile(folder, 'frontCsv'), frontCsv(front));
  writeWhole(runFile(folder, 'nearMisses'), nearMissCsv(problem, found.nearMisses));
  writeWhole(runFile(folder, 'history'), historyCsv(found.sources));
  return front;
}

/** The front that the sheet's front size leaves of an archive. */
export function frontOf(problem: RailProblem, found: Pick<Found, 'archive'>): FrontFile {
  const rows = chooseFront(problem, found.archive, problem.rail.settings.frontSize);
  return frontFile(
    problem,
    rows.map((row) => genesOf(found.archive, problem.genes.length, row)),
  );
}

/** The table of near misses: the broken limit, then what `front.csv` tells of a design; margins below zero are the miss. */
export function nearMissCsv(problem: RailProblem, misses: NearMissDesigns): string {
  const genes = Array.from({ length: misses.count }, (_, i) => genesOf(misses, problem.genes.length, i));
  const limits = new Map(genes.map((row, i) => [problem.id(row), problem.limits[misses.limit[i] ?? -1] ?? '']));
  const file = frontFile(problem, genes);
  const [head, ...lines] = frontCsv(file).trimEnd().split('\n');
  const rows = lines.map((line) => `${limits.get(line.split(',', 1)[0] ?? '') ?? ''},${line}`);
  return `${[`limit,${head}`, ...rows.sort()].join('\n')}\n`;
}
