/**
 * The archive of feasible designs on an ε-grid (after Laumanns, Thiele, Deb, Zitzler 2002): what it holds depends on the set of designs
 * shown to it and never on their order, so archives of shards merge in any order to the same bytes.
 *
 * A cell is floor((f − ideal) / resolution). Held are, of all designs ever shown: the first by a fixed order in each cell that no other cell
 * dominates, and the first in each objective. The fixed order is: smaller sum of (f − ideal) / resolution, then objectives, then genes
 * lexicographically; it agrees with domination. A design that dominates another lies in a cell that is at most the other's, so members never
 * dominate one another: the whole archive is the front.
 */
import { CellTree } from './cell-tree.ts';
import type { Designs, Widths } from './designs.ts';
import { compareRows, copyRow, gatherRows, rowIsFinite } from './rows.ts';

/** What fixes an archive's grid. It comes from the problem, never from values found. */
export interface ArchiveGrid extends Widths {
  /** Corner of the grid, one value an objective (`Objective.ideal`). */
  readonly ideal: Float64Array;
  /** Edge of a cell, one value above zero an objective (`Objective.resolution`). */
  readonly resolution: Float64Array;
}

/** Feasible non-dominated designs, one a grid cell, and the best in each objective. No bound on their number but the grid. */
export interface Archive {
  readonly grid: ArchiveGrid;
  /** Number of members. */
  size(): number;
  /** Forgets all, and is then as good as new. */
  clear(): void;
  /**
   * Shows row `row` of the arrays to the archive. Returns 1 when its members changed, 0 when not: infeasible, not finite, in a dominated cell, or no
   * better than its cell's member. Copies what it keeps. A microsecond or so with thousands of members.
   */
  insert(genes: Float64Array, objectives: Float64Array, violations: Float64Array, row: number): number;
  /** All members in canonical order: by objectives, then by genes, lexicographically. */
  pack(): Designs;
  /**
   * Copies the member that the draws of `whole` (a number below its argument) come upon to row `row` of the arrays; false when a few draws find
   * none. Every member in a cell is as likely as any other.
   */
  draw(whole: (count: number) => number, genes: Float64Array, objectives: Float64Array, row: number): boolean;
  /**
   * Upper corners of the held cells, row-major: what the archive guarantees. Their hypervolume never falls as designs are shown (that of the members
   * can, by less than a cell's worth, when a cell changes its member).
   */
  corners(): Float64Array;
}

/** Slots looked at for a member drawn at random: some are empty. */
const DRAWS = 12;

/** An empty archive on `grid`. */
export function createArchive(grid: ArchiveGrid): Archive {
  return new EpsilonArchive(grid);
}

/** All members in canonical order: by objectives, then by genes, lexicographically. */
export function packArchive(archive: Archive): Designs {
  return archive.pack();
}

/** The archive whose members are what `designs` leaves on `grid`; the inverse of `packArchive`. */
export function unpackArchive(grid: ArchiveGrid, designs: Designs): Archive {
  const archive = createArchive(grid);
  insertAll(archive, designs);
  return archive;
}

/** Shows every design to the archive; returns how many changed it. */
export function insertAll(archive: Archive, designs: Designs): number {
  let changed = 0;
  for (let i = 0; i < designs.count; i++) {
    changed += archive.insert(designs.genes, designs.objectives, designs.violations, i);
  }
  return changed;
}

/** Shows all members of `from` to `into` (same grid): what `into` then holds does not depend on the order of merging. */
export function mergeArchive(into: Archive, from: Archive): void {
  insertAll(into, from.pack());
}

class EpsilonArchive implements Archive {
  readonly grid: ArchiveGrid;
  /** Slots 0 … m − 1 hold the best in each objective, the slots above hold the cells' members. */
  private genes: Float64Array;
  private objectives: Float64Array;
  private merit: Float64Array;
  private cells: Float64Array;
  private readonly tree: CellTree;
  private readonly free: number[] = [];
  private used: number;
  private started = false;
  private readonly query: Float64Array;
  private readonly queryMerit = new Float64Array(1);
  private readonly removed: number[] = [];

  constructor(grid: ArchiveGrid) {
    const m = grid.objectives;
    const room = 256;
    this.grid = grid;
    this.genes = new Float64Array(room * grid.genes);
    this.objectives = new Float64Array(room * m);
    this.merit = new Float64Array(room);
    this.cells = new Float64Array(room * m);
    this.tree = new CellTree(m, this.cells);
    this.used = m;
    this.query = new Float64Array(m);
  }

  insert(genes: Float64Array, objectives: Float64Array, violations: Float64Array, row: number): number {
    const { grid, query } = this;
    for (let k = 0; k < grid.violations; k++) if (!(violations[row * grid.violations + k] <= 0)) return 0;
    if (!rowIsFinite(genes, row, grid.genes) || !this.locate(objectives, row)) return 0;
    const changed = this.offerExtremes(genes, objectives, row);
    const found = this.tree.atMost(query);
    if (found >= 0) {
      if (compareRows(query, 0, this.cells, found, grid.objectives) !== 0) return changed;
      if (!this.precedes(genes, objectives, row, found)) return changed;
      this.write(genes, objectives, row, found);
      return 1;
    }
    this.tree.removeAtLeast(query, this.removed);
    for (const slot of this.removed) this.free.push(slot);
    const slot = this.takeSlot();
    this.write(genes, objectives, row, slot);
    this.tree.insert(slot);
    return 1;
  }

  size(): number {
    return this.memberSlots().length;
  }

  clear(): void {
    this.tree.clear();
    this.free.length = 0;
    this.used = this.grid.objectives;
    this.started = false;
  }

  draw(whole: (count: number) => number, genes: Float64Array, objectives: Float64Array, row: number): boolean {
    const { genes: g, objectives: m } = this.grid;
    for (let attempt = 0; attempt < DRAWS && this.used > m; attempt++) {
      const slot = m + whole(this.used - m);
      if (!this.tree.has(slot)) continue;
      for (let k = 0; k < g; k++) genes[row * g + k] = this.genes[slot * g + k];
      for (let c = 0; c < m; c++) objectives[row * m + c] = this.objectives[slot * m + c];
      return true;
    }
    return false;
  }

  pack(): Designs {
    const { grid } = this;
    const slots = this.memberSlots();
    return {
      count: slots.length,
      genes: gatherRows(this.genes, slots, grid.genes),
      objectives: gatherRows(this.objectives, slots, grid.objectives),
      violations: new Float64Array(slots.length * grid.violations),
    };
  }

  corners(): Float64Array {
    const m = this.grid.objectives;
    const corners = gatherRows(this.cells, this.tree.slots(), m);
    for (let k = 0; k < corners.length; k++) {
      corners[k] = this.grid.ideal[k % m] + (corners[k] + 1) * this.grid.resolution[k % m];
    }
    return corners;
  }

  /** Members in canonical order, each once: a best in an objective may be its cell's member too. */
  private memberSlots(): number[] {
    const { genes: g, objectives: m } = this.grid;
    const slots = this.tree.slots();
    if (this.started) for (let c = 0; c < m; c++) slots.push(c);
    const order = (a: number, b: number): number =>
      compareRows(this.objectives, a, this.objectives, b, m) || compareRows(this.genes, a, this.genes, b, g);
    slots.sort(order);
    return slots.filter((slot, i) => i === 0 || order(slots[i - 1], slot) !== 0);
  }

  /** Writes the row's cell to `query` and its place in the fixed order to `queryMerit`; false when it lies off any grid. */
  private locate(objectives: Float64Array, row: number): boolean {
    const { grid, query } = this;
    const m = grid.objectives;
    let merit = 0;
    for (let c = 0; c < m; c++) {
      const offset = (objectives[row * m + c] - grid.ideal[c]) / grid.resolution[c];
      merit += offset;
      query[c] = Math.floor(offset);
    }
    this.queryMerit[0] = merit;
    return merit - merit === 0;
  }

  /** Whether the row comes before the slot's design in the fixed order. */
  private precedes(genes: Float64Array, objectives: Float64Array, row: number, slot: number): boolean {
    const merit = this.queryMerit[0];
    if (merit !== this.merit[slot]) return merit < this.merit[slot];
    const order = compareRows(objectives, row, this.objectives, slot, this.grid.objectives);
    return (order || compareRows(genes, row, this.genes, slot, this.grid.genes)) < 0;
  }

  private offerExtremes(genes: Float64Array, objectives: Float64Array, row: number): number {
    const m = this.grid.objectives;
    let changed = 0;
    for (let c = 0; c < m; c++) {
      if (this.started) {
        const value = objectives[row * m + c];
        const held = this.objectives[c * m + c];
        if (value > held || (value === held && !this.precedes(genes, objectives, row, c))) continue;
      }
      this.write(genes, objectives, row, c);
      changed = 1;
    }
    this.started = true;
    return changed;
  }

  private write(genes: Float64Array, objectives: Float64Array, row: number, slot: number): void {
    const { genes: g, objectives: m } = this.grid;
    copyRow(genes, row, this.genes, slot, g);
    copyRow(objectives, row, this.objectives, slot, m);
    copyRow(this.query, 0, this.cells, slot, m);
    this.merit[slot] = this.queryMerit[0];
  }

  private takeSlot(): number {
    const slot = this.free.pop();
    if (slot !== undefined) return slot;
    if (this.used === this.merit.length) this.grow();
    return this.used++;
  }

  private grow(): void {
    this.genes = longer(this.genes);
    this.objectives = longer(this.objectives);
    this.merit = longer(this.merit);
    this.cells = longer(this.cells);
    this.tree.useCells(this.cells);
  }
}

function longer(from: Float64Array): Float64Array {
  const to = new Float64Array(2 * from.length);
  to.set(from);
  return to;
}
