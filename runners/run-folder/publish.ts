/** The files of a run that people and other programs read, written from what was found. Same findings, same bytes. */
import { type FrontFile, frontCsv, frontFile, type RailProblem } from '../../model/index.ts';
import { chooseFront, rowsOf } from '../sweep/grid.ts';
import { writeWhole } from './files.ts';
import { runFile } from './folder.ts';
import type { Found } from './found.ts';
import { historyCsv } from './history-csv.ts';
import { nearMissesWith, type Restarts, readRestarts } from './restarts.ts';

/** Writes `front.json`, `front.csv`, `near-misses.csv` and `history.csv`; returns the front. */
export function publish(folder: string, problem: RailProblem, found: Found): FrontFile {
  const front = frontOf(problem, found);
  writeWhole(runFile(folder, 'frontJson'), `${JSON.stringify(front, undefined, 1)}\n`);
  writeWhole(runFile(folder, 'frontCsv'), frontCsv(front));
  writeWhole(runFile(folder, 'nearMisses'), nearMissCsv(problem, found, readRestarts(folder, found.archive)));
  writeWhole(runFile(folder, 'history'), historyCsv(found.sources));
  return front;
}

/** The front that the sheet's front size leaves of an archive. */
function frontOf(problem: RailProblem, found: Pick<Found, 'archive'>): FrontFile {
  return frontFile(problem, chooseFront(problem, found.archive, problem.rail.settings.frontSize));
}

/** The table of near misses: the broken limit, then what `front.csv` tells of a design; margins below zero are the miss. */
function nearMissCsv(
  problem: RailProblem,
  found: Pick<Found, 'archive' | 'nearMisses'>,
  restarts: Restarts | undefined,
): string {
  const misses = nearMissesWith(problem, found, restarts);
  const genes = rowsOf(misses, problem.genes.length);
  const limits = new Map(genes.map((row, i) => [problem.id(row), problem.limits[misses.limit[i] ?? -1] ?? '']));
  const file = frontFile(problem, genes);
  const [head, ...lines] = frontCsv(file).trimEnd().split('\n');
  const rows = lines.map((line) => `${limits.get(line.split(',', 1)[0] ?? '') ?? ''},${line}`);
  return `${[`limit,${head}`, ...rows.sort()].join('\n')}\n`;
}
