/**
 * The buck's waveforms against a general-purpose circuit simulator with the same element values: duty and timing come from
 * the model, so the simulated output voltage tells whether they were right. Ideal switches prove waveforms, conduction and
 * ripple, not switching or core loss.
 */
import { describe, expect, it } from 'vitest';
import { needs } from '../support/needs.ts';
import { buckCases } from './buck-cases.ts';
import { rowsOf } from './case.ts';
import { runNative, runWasm } from './simulator.ts';

describe.each(buckCases())('$name', (circuit) => {
  it('mean output within 1 %, ripple within 5 %, rms within 2 %, conduction loss within 3 %', async () => {
    const rows = rowsOf(circuit, await runWasm(circuit.netlist));
    expect(rows.length).toBeGreaterThanOrEqual(6);
    expect(rows.filter((row) => !row.passed)).toEqual([]);
  });
});

describe.runIf(needs('ngspice'))("the system's own simulator", () => {
  it.each(buckCases())('agrees: $name', (circuit) => {
    const rows = rowsOf(circuit, runNative(circuit.netlist));
    expect(rows.filter((row) => !row.passed)).toEqual([]);
  });
});
