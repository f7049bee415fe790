/** What a stage must bring to be compared with a circuit simulation, and the row of the evidence table that comes of it. */
import { type Run, runWasm } from './simulator.ts';

/** One figure of the model and how to read its twin off the simulation. */
export interface Figure {
  readonly quantity: string;
  readonly unit: string;
  /** The model's value, SI. */
  readonly model: number;
  /** Largest relative difference. */
  readonly tolerance: number;
  measure(run: Run): number;
}

/** One circuit with the figures that the model has for it. */
export interface CircuitCase {
  readonly name: string;
  readonly netlist: string;
  readonly figures: readonly Figure[];
}

/** One line of the comparison. */
export interface Row {
  readonly case: string;
  readonly quantity: string;
  readonly unit: string;
  readonly model: number;
  readonly simulated: number;
  /** Relative: model over simulation less one. */
  readonly difference: number;
  readonly tolerance: number;
  readonly passed: boolean;
}

/** Differences that each kind of figure may have: stated once, for every architecture. */
export const TOLERANCE = { mean: 0.01, ripple: 0.05, rms: 0.02, conduction: 0.03 } as const;

/** The rows of one finished run. */
export function rowsOf(circuit: CircuitCase, run: Run): Row[] {
  return circuit.figures.map(({ quantity, unit, model, tolerance, measure }) => {
    const simulated = measure(run);
    const difference = model / simulated - 1;
    const passed = Math.abs(difference) <= tolerance;
    return { case: circuit.name, quantity, unit, model, simulated, difference, tolerance, passed };
  });
}

/** Simulates every case in the WASM module, one after the other. */
export async function compareAll(cases: readonly CircuitCase[]): Promise<Row[]> {
  const rows: Row[] = [];
  for (const circuit of cases) rows.push(...rowsOf(circuit, await runWasm(circuit.netlist)));
  return rows;
}
