/** One epoch as every engine runs it: unpack, take immigrants from the neighbours, step, pack. */
import { createStepper, type Island, immigrantsFor, packIsland, unpackIsland } from '../../optimizer/index.ts';
import type { Problem } from '../../optimizer/problem.ts';
import { createRoom, type EpochResult, type EpochTask, noting } from './protocol.ts';

/** A function that runs epochs of islands of `problem`, noting each design before it is evaluated. */
export function epochRunner(problem: Problem): (task: EpochTask) => EpochResult {
  let cells: Float64Array = new Float64Array(problem.genes.length + 1);
  const step = createStepper(noting(problem, () => cells));
  return (task) => {
    cells = new Float64Array(task.note);
    const spent = { variation: 0, model: 0, ranking: 0, archive: 0, transfer: 0 };
    const begun = now();
    const island = unpackIsland(task.island);
    const immigrants = immigrantsFor(ringAround(island, task.neighbours.map(unpackIsland)), island.index);
    const opened = now();
    const next = step(island, immigrants, { now, spent });
    const stepped = now();
    const bytes = packIsland(next, (size) => {
      const { room } = task;
      return room !== undefined && room.byteLength >= size ? room : createRoom(size);
    });
    spent.transfer = opened - begun + (now() - stepped);
    return { ok: true, island: bytes, spent };
  };
}

function now(): number {
  return performance.now() / 1000;
}

/** The ring as far as an island can see it: itself and its neighbours, each in its place; the others are not looked at. */
function ringAround(island: Island, neighbours: readonly Island[]): Island[] {
  const ring = new Array<Island>(island.plan.islands).fill(island);
  for (const one of neighbours) ring[one.index] = one;
  return ring;
}
