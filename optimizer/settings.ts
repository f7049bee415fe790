/**
 * The constants that steer the search, in one place; the chances of a single kind of move stand at the head of its own file. They hold for all
 * problems alike: the rules read the budget, the number of genes and the number of families, nothing else.
 */

/** Designs an island breeds from. */
export const POPULATION = 50;
/** Children made between two selections, as a part of the population. */
export const BATCH_SHARE = 0.2;
/** Generations (of `population` evaluations each) in an epoch, the unit of checkpoints and migration. */
export const EPOCH_GENERATIONS = 50;
/** Epochs in which each family is searched by itself, when the budget is not known. */
export const TRIAL_EPOCHS = 2;
/** Evaluations that justify one more island. */
export const EVALUATIONS_PER_ISLAND = 25_000;
/** Most islands of a shard, unless asked for. */
export const MOST_ISLANDS = 16;
/** Smallest part of an island's population that each of its families has while families are tried. */
export const NICHE = 4;
/** Immigrants from each of the two neighbours, as a part of the population. */
export const IMMIGRATION = 0.1;
/** Generations over which the ε-relaxed start tightens to zero. */
export const RELAXED_GENERATIONS = 10;
/** Part of a first population that counts as feasible in the ε-relaxed start when nothing is feasible. */
export const RELAXED_SHARE = 0.2;
/** Generations without one archive entry after which an island restarts. */
export const STALLED_GENERATIONS = 8;
/** Slots for the hashes of designs seen, a power of two. */
export const SEEN_SLOTS = 1 << 16;
/** Tries at a child that was not seen before. */
export const TRIES = 8;
/** Most feasible designs that an island's sample keeps, and that the sample of a whole search keeps. */
export const ISLAND_SAMPLE = 4000;
export const WHOLE_SAMPLE = 50_000;
/** Largest violation, as a fraction of the limit, of a near miss. */
export const NEAR_MISS_SHARE = 0.25;
/** How far beyond the worst member of a front its hypervolume reference lies, as a part of the front's range. */
export const REFERENCE_MARGIN = 0.2;
/**
 * Part of the children whose first parent is drawn from the whole archive in the place of the population, in the second half of the planned epochs: before
 * that the archive holds much that selection has left behind.
 */
export const ARCHIVE_PARENTS = 0.25;
/** Part of the population kept for the best designs that miss limits by a little. */
export const BOLD_SHARE = 0.1;
/** Total normalised violation (below 1 a limit) under which a design counts as missing them by a little. */
export const BOLD_MISS = 0.2;
