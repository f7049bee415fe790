/**
 * Slots that each hold the best design offered to them, best by a fixed total order: whatever the order of offers, the same designs stay.
 */
import type { NearMissDesigns, Widths } from './designs.ts';
import { compareRows, copyRow, gatherRows } from './rows.ts';

/** A fixed number of slots for designs. */
export class DirectionSlots {
  /** Merit of the row about to be offered, in a cell of its own so that no double is boxed on the way. */
  readonly merit = new Float64Array(1);
  private readonly widths: Widths;
  private readonly filled: Uint8Array;
  private readonly merits: Float64Array;
  private readonly genes: Float64Array;
  private readonly objectives: Float64Array;
  private readonly violations: Float64Array;

  constructor(widths: Widths, slots: number) {
    this.widths = widths;
    this.filled = new Uint8Array(slots);
    this.merits = new Float64Array(slots);
    this.genes = new Float64Array(slots * widths.genes);
    this.objectives = new Float64Array(slots * widths.objectives);
    this.violations = new Float64Array(slots * widths.violations);
  }

  /** Empties every slot. */
  clear(): void {
    this.filled.fill(0);
  }

  /** Takes the row into the slot if it comes before what is there: by merit, then objectives, violations and genes. 1 when it did. */
  offer(slot: number, genes: Float64Array, objectives: Float64Array, violations: Float64Array, row: number): number {
    const merit = this.merit[0];
    const { genes: g, objectives: m, violations: v } = this.widths;
    if (this.filled[slot] === 1) {
      if (merit > this.merits[slot]) return 0;
      if (merit === this.merits[slot]) {
        const order =
          compareRows(objectives, row, this.objectives, slot, m) ||
          compareRows(violations, row, this.violations, slot, v) ||
          compareRows(genes, row, this.genes, slot, g);
        if (order >= 0) return 0;
      }
    }
    this.filled[slot] = 1;
    this.merits[slot] = merit;
    copyRow(genes, row, this.genes, slot, g);
    copyRow(objectives, row, this.objectives, slot, m);
    copyRow(violations, row, this.violations, slot, v);
    return 1;
  }

  /** All designs held, each once a limit, by limit, objectives, violations and genes; limit k owns the `perLimit` slots from k · perLimit. */
  pack(perLimit: number): NearMissDesigns {
    const { genes: g, objectives: m, violations: v } = this.widths;
    const limitOf = (slot: number): number => Math.floor(slot / perLimit);
    const order = (a: number, b: number): number =>
      limitOf(a) - limitOf(b) ||
      compareRows(this.objectives, a, this.objectives, b, m) ||
      compareRows(this.violations, a, this.violations, b, v) ||
      compareRows(this.genes, a, this.genes, b, g);
    const sorted: number[] = [];
    for (let slot = 0; slot < this.filled.length; slot++) if (this.filled[slot] === 1) sorted.push(slot);
    sorted.sort(order);
    const rows = sorted.filter((slot, i) => i === 0 || order(sorted[i - 1], slot) !== 0);
    return {
      count: rows.length,
      genes: gatherRows(this.genes, rows, g),
      objectives: gatherRows(this.objectives, rows, m),
      violations: gatherRows(this.violations, rows, v),
      limit: Int32Array.from(rows, limitOf),
    };
  }
}
