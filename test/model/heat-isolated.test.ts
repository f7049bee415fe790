/**
 * Laws of heat and conduction in transformer stages, on designs drawn at random from the shipped rail of 400 V and the built-in parts: each part
 * is as hot as its own loss through its own path makes it, and windings lose what the currents that are handed to whoever winds them would.
 */
import { describe, expect, it } from 'vitest';
import { type SolvedPoint, solveAt } from '../../model/handoff/solved-point.ts';
import { transformerCurrents } from '../../model/handoff/winding-currents.ts';
import { HOT } from '../../model/heat-balance.ts';
import { LOSS_SLOTS } from '../../model/ledger.ts';
import { createRailProblem } from '../../model/problem.ts';
import type { Architecture } from '../../model/stages/list.ts';
import { builtInTables, shippedRail } from './shipped.ts';
import { need, randomFrom, randomGenes } from './support.ts';

/** Switches on the input side, rectifiers, windings of the secondary in one phase (Hart, chapter 7, from memory). */
const COUNTS: readonly (readonly [Architecture, number, number, number])[] = [
  ['two-switch-forward', 2, 2, 1],
  ['half-bridge-centre-tap', 2, 2, 2],
  ['half-bridge-current-doubler', 2, 2, 1],
  ['full-bridge-centre-tap', 4, 2, 2],
  ['full-bridge-current-doubler', 4, 2, 1],
];
const DRAWN = 40;

/** Full load of random designs of `architecture` at 400 V to 12 V, those where no part has run away. */
function points(architecture: Architecture): SolvedPoint[] {
  const rail = shippedRail('hut-shelf');
  const search = { ...rail.search, architectures: [architecture] };
  const problem = need(createRailProblem({ ...rail, search }, builtInTables()));
  const next = randomFrom(11);
  const place = { inputVoltage: 400, outputVoltage: 12, load: 1, share: 0 };
  return Array.from({ length: DRAWN }, () => solveAt(problem, randomGenes(problem, next), place)).filter(
    ({ solver, state }) =>
      Math.max(...solver.heat.temperature, solver.heat.boardTemperature) < 450 && state.highShare < 1,
  );
}

/** Mean square of a forward stage's primary, A²: on each pulse the magnetizing current rises from nothing on top of the load's. */
function forwardSquare({ design, state }: SolvedPoint): number {
  const from = state.valleyCurrent / design.transformer.ratio;
  const to = state.peakCurrent / design.transformer.ratio + state.magnetizingPeak;
  return (state.highShare * (from * from + from * to + to * to)) / 3;
}

/**
 * Mean square that the leakage adds in a forward stage's primary, A²: a current that rises straight to I and one that falls straight from I
 * under V last Llk·I/V and bring I²/3 each; a body diode that still carries the choke adds its drop, carried over, to V.
 */
function forwardRamps({ design, state }: SolvedPoint): number {
  const { leakage, ratio } = design.transformer;
  const volts = state.inputVoltage + (design.gap > 0 ? ratio * design.low.bodyDrop : 0);
  const cubes = [state.valleyCurrent, state.peakCurrent].map((i) => (Math.max(0, i) / ratio) ** 3);
  return ((cubes[0] + cubes[1]) * leakage * state.frequency) / (3 * volts);
}

/** Watts of a part's effects together. */
function wattsOf({ solver }: SolvedPoint, part: string, effects?: readonly string[]): number {
  return LOSS_SLOTS.reduce((sum, [own, effect], i) => {
    return sum + (own === part && effects?.includes(effect) !== false ? (solver.ledger[i] ?? 0) : 0);
  }, 0);
}

describe.each(COUNTS)('%s', (architecture, switches, rectifiers, windings) => {
  const solved = points(architecture);

  it('is drawn often enough', () => expect(solved.length).toBeGreaterThan(4));

  it('switches and rectifiers stand over the board by their loss through their own path, shared among the pieces', () => {
    for (const point of solved) {
      const { design, solver, state } = point;
      const { temperature, boardTemperature } = solver.heat;
      const rise = (place: number): number => (temperature[place] ?? Number.NaN) - boardTemperature;
      const high = state.activePhases * switches * design.highParallel;
      const low = state.activePhases * rectifiers * design.lowParallel;
      expect(rise(HOT.high)).toBeCloseTo((wattsOf(point, 'highSwitch') * design.high.thermalResistance) / high, 6);
      expect(rise(HOT.low)).toBeCloseTo((wattsOf(point, 'lowSwitch') * design.low.thermalResistance) / low, 6);
    }
  });

  it('a transformer gives its own loss to the air, each phase by itself', () => {
    for (const point of solved) {
      const { design, solver, state, rail } = point;
      const watts = wattsOf(point, 'transformer') / state.activePhases;
      const rise = (solver.heat.temperature[HOT.transformer] ?? Number.NaN) - rail.ambient;
      expect(rise).toBeCloseTo(watts * design.transformer.surfaceResistance, 6);
    }
  });

  it('the two halves of a divider share the primary current, and no other stage has one', () => {
    for (const point of solved) {
      const { design, state } = point;
      const [primary] = transformerCurrents(point);
      const half = 0.5 * (primary?.rms ?? Number.NaN);
      const each = architecture.startsWith('half') ? 2 * half * half * design.dividerResistance : 0;
      expect(wattsOf(point, 'dividerCeramic')).toBeCloseTo(state.activePhases * each, 9);
    }
  });

  it('windings lose I²·R of the currents in their order sheet', () => {
    for (const point of solved) {
      const { design, state } = point;
      // Between the pulses of a shifted bridge the primary still carries current.
      if (design.phaseShifted) continue;
      const [primary, secondary] = transformerCurrents(point).map(({ rms }) => rms * rms);
      const own = primary ?? Number.NaN;
      const each = own * state.primaryResistance + windings * (secondary ?? Number.NaN) * state.secondaryResistance;
      // Duty and resistances are a round of temperatures apart: a thousandth at most.
      const share = wattsOf(point, 'transformer', ['winding']) / (state.activePhases * each);
      expect(Math.abs(share - 1)).toBeLessThan(1e-3);
    }
  });

  if (architecture === 'two-switch-forward') {
    it('a primary carries pulses, magnetizing current and ramps', () => {
      for (const point of solved) {
        const [primary] = transformerCurrents(point);
        expect((primary.rms ?? Number.NaN) ** 2 / (forwardSquare(point) + forwardRamps(point))).toBeCloseTo(1, 9);
      }
    });
  }
});
