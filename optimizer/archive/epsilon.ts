/**
 * The archive of feasible designs on an ε-grid (after Laumanns, Thiele, Deb, Zitzler 2002): what it holds depends on the set of designs
 * shown to it and never on their order, so archives of shards merge in any order to the same bytes.
 */
import type { Designs, Widths } from './designs.ts';

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
  /**
   * Shows row `row` of `designs` to the archive. Returns 1 when the archive changed, 0 when not: infeasible, not finite, in a dominated cell, or no
   * better than its cell's member. Copies what it keeps.
   */
  insert(genes: Float64Array, objectives: Float64Array, violations: Float64Array, row: number): number;
}

interface PlainMember {
  genes: Float64Array;
  objectives: Float64Array;
  cell: Float64Array;
  merit: number;
}

const plain = new WeakMap<Archive, PlainMember[]>();

/** An empty archive on `grid`. */
export function createArchive(grid: ArchiveGrid): Archive {
  let members: PlainMember[] = [];
  const archive: Archive = {
    grid,
    size: () => members.length,
    insert(genes, objectives, violations, row) {
      const { genes: g, objectives: m, violations: v } = grid;
      for (let k = 0; k < v; k++) if (!(violations[row * v + k] <= 0)) return 0;
      const member: PlainMember = {
        genes: genes.slice(row * g, row * g + g).map((x) => x + 0),
        objectives: objectives.slice(row * m, row * m + m).map((x) => x + 0),
        cell: new Float64Array(m),
        merit: 0,
      };
      for (let c = 0; c < m; c++) {
        if (!Number.isFinite(member.objectives[c])) return 0;
        const offset = (member.objectives[c] - grid.ideal[c]) / grid.resolution[c];
        member.merit += offset;
        member.cell[c] = Math.floor(offset);
      }
      const next = settle([...members, member], m);
      if (next.length === members.length && !next.includes(member)) return 0;
      members = next;
      plain.set(archive, members);
      return 1;
    },
  };
  plain.set(archive, members);
  return archive;
}

/** All members in canonical order: by objectives, then by genes, lexicographically. */
export function packArchive(archive: Archive): Designs {
  const { genes: g, objectives: m, violations: v } = archive.grid;
  const members = (plain.get(archive) ?? [])
    .slice()
    .sort((a, b) => compare(a.objectives, b.objectives) || compare(a.genes, b.genes));
  const genes = new Float64Array(members.length * g);
  const objectives = new Float64Array(members.length * m);
  members.forEach((member, i) => {
    genes.set(member.genes, i * g);
    objectives.set(member.objectives, i * m);
  });
  return { count: members.length, genes, objectives, violations: new Float64Array(members.length * v) };
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
  for (let i = 0; i < designs.count; i++)
    changed += archive.insert(designs.genes, designs.objectives, designs.violations, i);
  return changed;
}

/** Shows all members of `from` to `into` (same grid): what `into` then holds does not depend on the order of merging. */
export function mergeArchive(into: Archive, from: Archive): void {
  insertAll(into, packArchive(from));
}

function settle(all: PlainMember[], m: number): PlainMember[] {
  const kept = new Set<PlainMember>();
  for (const a of all) {
    const beaten = all.some((b) => {
      if (a === b) return false;
      const same = a.cell.every((v, c) => v === b.cell[c]);
      if (same) return order(b, a) < 0 || (order(b, a) === 0 && all.indexOf(b) < all.indexOf(a));
      return b.cell.every((v, c) => v <= a.cell[c]);
    });
    if (!beaten) kept.add(a);
  }
  for (let c = 0; c < m; c++) {
    kept.add(all.reduce((best, a) => ((a.objectives[c] - best.objectives[c] || order(a, best)) < 0 ? a : best)));
  }
  return all.filter((a) => kept.has(a));
}

function order(a: PlainMember, b: PlainMember): number {
  return a.merit - b.merit || compare(a.objectives, b.objectives) || compare(a.genes, b.genes);
}

function compare(a: Float64Array, b: Float64Array): number {
  for (let i = 0; i < a.length; i++) if (a[i] !== b[i]) return a[i] < b[i] ? -1 : 1;
  return 0;
}
