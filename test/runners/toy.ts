/**
 * A small problem that stands in for a rail in the runner's tests: two objectives, one limit, four families, and, where asked,
 * a trap that ends, fills, hangs or throws inside the worker that evaluates. Loaded by worker threads as compiled code.
 */
import { closeSync, openSync } from 'node:fs';
import type { Problem } from '../../optimizer/problem.ts';
import type { CreateProblem } from '../../runners/engines/protocol.ts';

/** What a toy does to the thread that evaluates one of its designs. */
export type Trap = 'exit' | 'heap' | 'loop' | 'throw';

/** How a toy is made; plain data. */
export interface ToySource {
  /** Turns of an idle loop in each evaluation. */
  readonly work?: number;
  readonly trap?: Trap;
  /** A file that says that the trap has gone off: it goes off once. Absent: every time. */
  readonly once?: string;
}

/** Makes the toy. */
export const createProblem: CreateProblem = (source) => createToy(source as ToySource);

/** The toy: family k shifts the front, designs with x0 < 0.1 break the limit. */
export function createToy(source: ToySource = {}): Problem {
  return {
    name: 'toy',
    genes: [
      { name: 'family', unit: '', kind: 'choice', low: 0, high: 3, options: ['a', 'b', 'c', 'd'] },
      ...[0, 1, 2].map((i) => ({ name: `x${i}`, unit: 'm', kind: 'real' as const, low: 0, high: 1 })),
    ],
    objectives: ['f', 'g'].map((name) => ({ name, unit: 'm', resolution: 0.02, ideal: 0, reference: 2 })),
    limits: ['x0'],
    families: {
      names: ['a', 'b', 'c', 'd'],
      of: (genes) => genes[0] ?? 0,
      confine: (genes, family) => {
        genes[0] = family;
      },
    },
    seeds: [],
    snap: (genes) => {
      genes[0] = Math.round(genes[0] ?? 0);
      for (let i = 1; i < genes.length; i++) genes[i] = Math.round(1e6 * (genes[i] ?? 0)) / 1e6;
    },
    evaluate: (genes, objectives, violations) => {
      const [family = 0, x = 0, y = 0, z = 0] = genes;
      idle(source.work ?? 0);
      if (source.trap !== undefined && x > 0.5) spring(source.trap, source.once);
      const far = y * y + z * z + 0.1 * family;
      objectives[0] = x + far;
      objectives[1] = 1 - Math.sqrt(x) + far;
      violations[0] = x < 0.1 ? 0.1 - x : 0;
    },
  };
}

let sink = 0;

function idle(turns: number): void {
  for (let i = 0; i < turns; i++) sink = (sink + i) % 7;
}

function spring(trap: Trap, once: string | undefined): void {
  if (once !== undefined && !claim(once)) return;
  if (trap === 'exit') process.exit(5);
  if (trap === 'throw') throw new Error('the trap went off');
  const hoard: unknown[] = [];
  for (;;) if (trap === 'heap') hoard.push(Array.from({ length: 1000 }, () => ({ hoard })));
}

function claim(file: string): boolean {
  try {
    closeSync(openSync(file, 'wx'));
    return true;
  } catch {
    return false;
  }
}
