/**
 * The coordinates in which designs are varied: real and logarithmic genes run from 0 to 1 along their (logarithmic) range, whole
 * numbers and choices keep their value. So every operator treats both kinds of line alike.
 */
import { expAt, log, logAt } from '../maths/index.ts';
import type { Gene } from '../problem.ts';

/** Code of a gene that varies along a line of reals. */
export const LINE = 0;
/** Code of a gene that varies over whole numbers. */
export const WHOLE = 1;
/** Code of a gene that varies among unordered options. */
export const CHOICE = 2;

/** The genes as flat arrays. */
export interface Space {
  /** Number of genes. */
  readonly n: number;
  /** LINE, WHOLE or CHOICE of each gene. */
  readonly kind: Uint8Array;
  /** 1 where a line is logarithmic. */
  readonly logarithmic: Uint8Array;
  readonly low: Float64Array;
  readonly high: Float64Array;
  /** high − low, or ln(high/low) for a logarithmic line. */
  readonly span: Float64Array;
  /** Places of the genes that can vary at all. */
  readonly live: Int32Array;
  /** 1 where a gene counts named options. */
  readonly named: Uint8Array;
}

/** Flattens the genes. */
export function createSpace(genes: readonly Gene[]): Space {
  const span = Float64Array.from(genes, ({ kind, low, high }) => (kind === 'log' ? log(high / low) : high - low));
  return {
    n: genes.length,
    kind: Uint8Array.from(genes, (gene) => (gene.kind === 'whole' ? WHOLE : gene.kind === 'choice' ? CHOICE : LINE)),
    logarithmic: Uint8Array.from(genes, (gene) => (gene.kind === 'log' ? 1 : 0)),
    low: Float64Array.from(genes, (gene) => gene.low),
    high: Float64Array.from(genes, (gene) => gene.high),
    span,
    live: Int32Array.from(genes.map((_, g) => g).filter((g) => span[g] > 0)),
    named: Uint8Array.from(genes, (gene) => (gene.options === undefined ? 0 : 1)),
  };
}

/** Whether gene g is a quantity on a logarithmic line. */
export function isQuantity(space: Space, g: number): boolean {
  return space.kind[g] === LINE && space.logarithmic[g] === 1;
}

/** Whether gene g counts things. */
export function isCount(space: Space, g: number): boolean {
  return space.kind[g] === WHOLE && space.named[g] === 0;
}

/** Whether gene g names one row of a list. */
export function isRow(space: Space, g: number): boolean {
  return space.kind[g] !== LINE && space.named[g] === 1;
}

/** Writes the coordinates of the design at `genes[from …]` to `coordinates[to …]`. */
export function toCoordinates(
  space: Space,
  genes: Float64Array,
  from: number,
  coordinates: Float64Array,
  to: number,
): void {
  const { n, kind, logarithmic, low, span } = space;
  for (let g = 0; g < n; g++) {
    const value = genes[from + g];
    if (kind[g] !== LINE) coordinates[to + g] = value;
    else if (!(span[g] > 0)) coordinates[to + g] = 0;
    else if (logarithmic[g] === 0) coordinates[to + g] = (value - low[g]) / span[g];
    else {
      coordinates[to + g] = value / low[g];
      logAt(coordinates, to + g);
      coordinates[to + g] /= span[g];
    }
  }
}

/** Writes the genes at `coordinates[from …]`, held inside their ranges, to `genes[to …]`. */
export function toGenes(space: Space, coordinates: Float64Array, from: number, genes: Float64Array, to: number): void {
  const { n, kind, logarithmic, low, high, span } = space;
  for (let g = 0; g < n; g++) {
    const x = coordinates[from + g];
    if (kind[g] !== LINE) genes[to + g] = Math.round(x);
    else if (logarithmic[g] === 0) genes[to + g] = low[g] + x * span[g];
    else {
      genes[to + g] = x * span[g];
      expAt(genes, to + g);
      genes[to + g] *= low[g];
    }
    if (genes[to + g] < low[g]) genes[to + g] = low[g];
    else if (genes[to + g] > high[g]) genes[to + g] = high[g];
  }
}
