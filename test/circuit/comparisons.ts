/** Every comparison with the circuit simulator, as rows of the evidence table. Another architecture adds its cases here. */
import { buckCases } from './buck-cases.ts';
import { type CircuitCase, compareAll, type Row } from './case.ts';

/** All cases of all architectures. */
function circuitCases(): CircuitCase[] {
  return [...buckCases()];
}

/** Runs them all. Ideal switches prove waveforms, conduction and ripple; they cannot prove switching or core loss. */
export function simulatorComparisons(): Promise<Row[]> {
  return compareAll(circuitCases());
}
