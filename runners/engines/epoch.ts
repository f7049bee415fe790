/** One epoch as every engine runs it: unpack, take immigrants from the neighbours, step, pack. */
import { type Island, immigrantsFor, packIsland, step, unpackIsland } from '../../optimizer/index.ts';
import type { Problem } from '../../optimizer/problem.ts';
import { type EpochResult, type EpochTask, noting } from './protocol.ts';

/** A function that runs epochs of islands of `problem`, noting each design before it is evaluated. */
export function epochRunner(problem: Problem): (task: EpochTask) => EpochResult {
  let cells: Float64Array = new Float64Array(problem.genes.length + 1);
  const noted = noting(problem, () => cells);
  return (task) => {
    cells = new Float64Array(task.note);
    const island = unpackIsland(task.island);
    const neighbours = task.neighbours.map(unpackIsland);
    const next = step(noted, island, immigrantsFor(ringAround(island, neighbours), island.index));
    return { ok: true, island: packIsland(next) };
  };
}

/** The ring as far as an island can see it: itself and its neighbours, each in its place; the others are not looked at. */
function ringAround(island: Island, neighbours: readonly Island[]): Island[] {
  const ring = new Array<Island>(island.plan.islands).fill(island);
  for (const one of neighbours) ring[one.index] = one;
  return ring;
}
