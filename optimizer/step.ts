/** One epoch of one island, as a pure function: same island, same immigrants, same result to the bit, on any engine. */
import type { Designs } from './archive/index.ts';
import { breed, createNursery, type Nursery, scatter, settle } from './breed.ts';
import type { Island } from './island.ts';
import { type Bench, createBench, judge } from './judge.ts';
import type { Problem } from './problem.ts';
import { NO_DESIGNS } from './ring.ts';
import { STALLED_GENERATIONS } from './settings.ts';
import { createSurvival, type Survival, survive } from './survive.ts';
import { learn } from './variation/index.ts';
import { addRows, closeWorld, createMemory, openWorld, type Watch, type World } from './world.ts';

/**
 * The island after one more epoch of `epochGenerations × population` evaluations (fewer only when no unseen design can be made). `island` is not
 * changed. `watch` measures where the time went and never influences the result.
 */
export function step(problem: Problem, island: Island, immigrants: Designs = NO_DESIGNS, watch?: Watch): Island {
  return createStepper(problem)(island, immigrants, watch);
}

/** `step` for one problem. */
export type Stepper = (island: Island, immigrants: Designs, watch?: Watch) => Island;

/**
 * A `step` that works in the same memory every time. The island it gives back is in part a view of that memory, so pack it before the next step. What it does
 * does not depend on what it did before.
 */
export function createStepper(problem: Problem): Stepper {
  const memory = createMemory(problem);
  let tools: Tools | undefined;
  return (island, immigrants, watch) => {
    const world = openWorld(memory, island, immigrants.count, watch);
    if (tools?.capacity !== world.capacity) tools = createTools(world);
    return advance(world, tools, immigrants);
  };
}

function advance(world: World, tools: Tools, immigrants: Designs): Island {
  const { plan } = world.island;
  const target = world.counters.evaluations + plan.epochGenerations * plan.population;
  addRows(world, immigrants);
  if (world.count > 0) survive(world, tools.survival, world.count);
  let idle = 0;
  while (world.counters.evaluations < target && idle < STALLED_GENERATIONS) {
    const left = target - world.counters.evaluations;
    const made = world.count === 0 ? founders(world, tools, left) : batch(world, tools, Math.min(world.batch, left));
    idle = made === 0 ? idle + 1 : 0;
  }
  return closeWorld(world);
}

interface Tools {
  /** Of the world they were made for. */
  readonly capacity: number;
  readonly nursery: Nursery;
  readonly bench: Bench;
  readonly survival: Survival;
}

function createTools(world: World): Tools {
  return {
    capacity: world.capacity,
    nursery: createNursery(world),
    bench: createBench(world),
    survival: createSurvival(world),
  };
}

/** A first population, or one around the archive in the place of one that stalled. */
function founders(world: World, tools: Tools, most: number): number {
  const size = Math.min(world.keep, most);
  const made = world.archive.size() > 0 ? scatter(world, tools.nursery, size) : settle(world, tools.nursery, size);
  judge(world, tools.bench, 0, made);
  survive(world, tools.survival, made);
  return made;
}

/** One batch of children, from breeding to survival. */
function batch(world: World, tools: Tools, size: number): number {
  const from = world.count;
  const before = world.entries;
  const made = breed(world, tools.nursery, size);
  world.tried.fill(0);
  world.earned.fill(0);
  judge(world, tools.bench, from, from + made);
  learn(world.shares, world.quality, world.tried, world.earned, world.ceilings);
  survive(world, tools.survival, from + made);
  noteStall(world, before !== world.entries, size);
  return made;
}

/** Counts generations without an archive entry; a stalled island leaves its population, its archive stays. */
function noteStall(world: World, entered: boolean, size: number): void {
  world.stalled = entered || world.archive.size() === 0 ? 0 : world.stalled + size / world.keep;
  if (world.stalled < STALLED_GENERATIONS || world.trial) return;
  world.stalled = 0;
  world.counters.restarts++;
  world.count = 0;
}
