/**
 * The table of architectures, row by row: conversion, frequency of the summed ripple, shift from phase to phase, what switches and rectifiers
 * block, and what each refuses. Figures of worked examples stand in `test/reference/transformer.ts`.
 */
import { describe, expect, it } from 'vitest';
import { stageNetlist } from '../../model/handoff/netlist/stage-netlist.ts';
import { solveAt } from '../../model/handoff/solved-point.ts';
import { createRailProblem, type RailProblem } from '../../model/problem.ts';
import type { Rail } from '../../model/rail/rail.ts';
import { ARCHITECTURES, type Architecture, stageOf } from '../../model/stages/list.ts';
import { type Example, solvedExample, together } from '../reference/ideal-stage.ts';
import { builtInTables, shippedRail } from './shipped.ts';
import { need, randomFrom, randomGenes } from './support.ts';

/** One row of the table, for 48 V in, turns 4 and a duty of one switch of 0.3. */
interface Row {
  readonly architecture: Architecture;
  /** Vo/Vi. */
  readonly conversion: number;
  /** Summed ripple of N phases over N·f. */
  readonly ripple: number;
  /** Periods of the phases' shift times N: a double-ended stage looks alike after half a period. */
  readonly shift: number;
  /** Rectifier over the input. */
  readonly rectifier: number;
  /** Longest duty of one switch: all of the period, what leaves room to reset, or half less the gaps. */
  readonly longest: readonly [number, number];
  readonly reverse: boolean;
}

const row = (
  architecture: Architecture,
  conversion: number,
  [ripple, shift]: readonly [number, number],
  rectifier: number,
  longest: readonly [number, number],
  reverse = false,
): Row => ({ architecture, conversion, ripple, shift, rectifier, longest, reverse });

// From memory: Hart, Power Electronics, chapter 7; Balogh's note on the doubler. D = δ/2 = 0.3, n = 4.
const TABLE: readonly Row[] = [
  row('buck-synchronous', 0.3, [1, 1], 1, [1, 1], true),
  row('buck-diode', 0.3, [1, 1], 1, [1, 1]),
  row('two-switch-forward', 0.3 / 4, [1, 1], 1 / 4, [0.45, 0.48]),
  row('half-bridge-centre-tap', 0.3 / 4, [2, 0.5], 1 / 4, [0.45, 0.5]),
  row('half-bridge-current-doubler', 0.15 / 4, [2, 0.5], 1 / 8, [0.45, 0.5]),
  row('full-bridge-centre-tap', 0.6 / 4, [2, 0.5], 2 / 4, [0.45, 0.5]),
  row('full-bridge-current-doubler', 0.3 / 4, [2, 0.5], 1 / 4, [0.45, 0.5]),
];

const named = TABLE.map((item) => [item.architecture, item] as const);
const ofOne = (architecture: Architecture): number => (architecture.endsWith('centre-tap') ? 0.5 : 1);

function exampleOf({ architecture, conversion }: Row, phases = 1): Example {
  const place = { frequency: 2e5, input: 48, output: 48 * conversion, current: 10 * phases };
  return { architecture, phases, ...place, ratio: architecture.startsWith('buck') ? 1 : 4, inductance: 1e-5 };
}

/** A rail of 360 to 420 V for every architecture, with the output low enough for each. */
const shelf = shippedRail('hut-shelf');

function problemOf(architecture: Architecture, over: Partial<Rail> = {}): RailProblem {
  const search = { ...shelf.search, architectures: [architecture], phases: { minimum: 2, maximum: 4 } };
  return need(createRailProblem({ ...shelf, search, ...over }, builtInTables()));
}

describe('every architecture', () => {
  it('has its row', () => expect(TABLE.map(({ architecture }) => architecture)).toEqual([...ARCHITECTURES]));
});

describe('conversion: a duty of one switch of 0.3 gives the ideal output', () => {
  it.each(named)('%s', (architecture, item) => {
    const state = solvedExample(exampleOf(item));
    expect(state.dutyCycle * ofOne(architecture)).toBeCloseTo(0.3, 9);
    const ideal = stageOf(architecture)?.idealDuty(48, 48 * item.conversion, exampleOf(item).ratio ?? 1) ?? Number.NaN;
    expect(ideal).toBeCloseTo(state.dutyCycle, 9);
  });
});

describe('interleaving', () => {
  const cases = TABLE.flatMap((item) => [1, 2, 3, 4].map((n) => [`${item.architecture} ×${n}`, item, n] as const));
  it.each(cases)('%s ripples at the frequency of the table', (_, item, n) => {
    const sum = together(solvedExample(exampleOf(item, n)));
    expect(1 / sum.period / (2e5 * n)).toBeCloseTo(item.ripple, 9);
  });

  it.each(named)('%s: netlists delay each phase by the shift of the table', (architecture, item) => {
    const problem = problemOf(architecture);
    const next = randomFrom(3);
    for (let i = 0; i < 4; i++) {
      const genes = randomGenes(problem, next);
      const point = solveAt(problem, genes, { inputVoltage: 400, outputVoltage: 12, load: 1, share: 0 });
      const { text } = stageNetlist(problem, 'drawn', point);
      const divisor = Number(text.match(/tshift=\{?tper\/(\d+)/)?.[1]);
      expect(1 / divisor).toBeCloseTo(item.shift / point.state.activePhases, 12);
    }
  });
});

describe('stresses', () => {
  it.each(named)('%s: rectifiers or low switches block what the table says', (architecture, item) => {
    expect((stageOf(architecture)?.lowBlocking(48, 4) ?? Number.NaN) / 48).toBeCloseTo(
      item.architecture.startsWith('buck') ? 1 : item.rectifier,
      12,
    );
  });

  it.each(named)('%s: a switch on the input side blocks the whole input', (architecture) => {
    const problem = problemOf(architecture);
    const { limits } = problem.assess(randomGenes(problem, randomFrom(5)));
    const [high, low] = ['highVoltage', 'lowVoltage'].map((name) => limits.find((limit) => limit.name === name)?.value);
    // A buck's high switch rings on top, by no more than its loop allows.
    expect(high).toBeGreaterThanOrEqual(420);
    if (!architecture.startsWith('buck')) expect(high).toBe(420);
    else expect(low).toBe(420);
  });

  it.each(named)('%s: the longest duty of one switch leaves what the table leaves', (architecture, { longest }) => {
    const duty = (stageOf(architecture)?.highestDuty ?? Number.NaN) * ofOne(architecture);
    expect(duty).toBeGreaterThanOrEqual(longest[0]);
    expect(duty).toBeLessThanOrEqual(longest[1]);
  });
});

describe('power from output to input', () => {
  const back: Rail = { ...shelf, profile: [...shelf.profile, { fraction: -0.5, share: 0 }] };
  it.each(named)('%s', (architecture, { reverse }) => {
    const stage = stageOf(architecture);
    expect(stage?.twoWay).toBe(reverse);
    expect(stage?.refusal(shelf)).toBeUndefined();
    const refusal = stage?.refusal(back);
    if (reverse) expect(refusal).toBeUndefined();
    else expect(refusal).toMatch(/a diode carries no current back|carries no power from output to input/);
  });
});
