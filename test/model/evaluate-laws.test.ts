/** Laws that every operating point of every buck keeps: energy, sums, signs, heat. Designs are drawn at random. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { PointReport } from '../../model/assessment.ts';
import { surfaceCoefficient } from '../../model/heat/index.ts';
import type { Rail } from '../../model/rail/rail.ts';
import { anyCase, type Case } from './real-parts.ts';
import { momentsOf, pointOf, traceOf, watts } from './support.ts';

const RUNS = { numRuns: 200, seed: 1 };
/** Losses here are up to a quarter of the power; a big board keeps most of them from running away. */
const COOL: Partial<Rail> = { coolingArea: 10 };

/** The first point of a case, where no part is more than 100 K over ambient: hotter ones break limits of their own. */
function settled({ made, where }: Case, over: Partial<Rail> = {}): PointReport {
  const point = pointOf(made, where, { ...COOL, ...over });
  fc.pre(Math.max(...Object.values(point.temperatures)) < 398.15);
  return point;
}

/** Losses that a current waveform can see: those of resistances and drops in its path. */
function conduction(point: PointReport): number {
  const list: [string, string][] = [
    ['highSwitch', 'conduction'],
    ['lowSwitch', 'conduction'],
    ['diode', 'conduction'],
    ['inductor', 'winding'],
    ['board', 'copper'],
  ];
  return list.reduce((sum, [part, effect]) => sum + watts(point.losses, part, effect), 0);
}

/** Share of a resistance's loss that the ripple causes, R·ΔI²/12 of R·(I² + ΔI²/12): straight segments do not see it. */
function rippleShare(point: PointReport): number {
  const { peakCurrent, valleyCurrent, rippleCurrent } = point;
  const middle = 0.5 * (peakCurrent + valleyCurrent);
  const ripple = rippleCurrent ** 2 / 12;
  return ripple / (middle * middle + ripple);
}

/** Output power and conduction losses less the input power of the waveform, W. */
function lack(point: PointReport): number {
  return point.outputPower + conduction(point) - point.inputVoltage * momentsOf(traceOf(point, 'inputCurrent')).mean;
}

/**
 * What the body diodes burn in the gaps as the waveform sees it, W: all of it where both edges carry far more current than moves the
 * node, less what the on-resistance, taken over the whole interval, has counted already; elsewhere something up to `band`.
 */
function gapsSeen({ made }: Case, point: PointReport): { loss: number; band: number } {
  const { valleyCurrent: a, peakCurrent: b, frequency } = point;
  const gap = made.controller?.deadTime ?? 0;
  const charge =
    (made.highParallel ?? 1) * (made.high?.outputCharge ?? 0) + (made.lowParallel ?? 1) * (made.low?.outputCharge ?? 0);
  const burnt = watts(point.losses, 'lowSwitch', 'deadTime') + watts(point.losses, 'highSwitch', 'deadTime');
  const drops = (made.high?.bodyDrop ?? 0) + (made.low?.bodyDrop ?? 0);
  const each = (made.phases ?? 1) * frequency * drops;
  if (Math.min(a, b) * gap >= charge || Math.max(a, b) * gap <= -charge) {
    // The band: how much charge the node takes at this voltage before the diode conducts at the soft edge.
    const carrier = a > 0 ? 'lowSwitch' : 'highSwitch';
    const counted = (2 * gap * frequency * watts(point.losses, carrier, 'conduction')) / (1 - point.dutyCycle);
    return { loss: burnt - counted, band: each * charge };
  }
  return { loss: 0, band: burnt + each * gap * Math.max(Math.abs(a), Math.abs(b)) };
}

describe('energy: mean of Vi·i(t) against Po plus the conduction losses that the waveform can see', () => {
  // Duty is solved with the resistances of the round before the last temperatures: a hundredth of the losses remains.
  const ROUNDS = 0.01;
  const balanced = (drawn: Case, point: PointReport): void => {
    const seen = conduction(point);
    const gaps = gapsSeen(drawn, point);
    const slack = ROUNDS * (seen + gaps.loss) + gaps.band + 1e-9 * Math.abs(point.outputPower);
    expect(Math.abs(lack(point) + gaps.loss - rippleShare(point) * seen)).toBeLessThanOrEqual(slack);
  };

  it('synchronous, forced continuous, both directions', () => {
    fc.assert(
      fc.property(anyCase('buck-synchronous', -1, 1), (drawn) => balanced(drawn, settled(drawn))),
      RUNS,
    );
  });

  it('synchronous with diode emulation: continuous, discontinuous, skipping', () => {
    const over: Partial<Rail> = { lightLoad: 'diode-emulation' };
    fc.assert(
      fc.property(anyCase('buck-synchronous', 0.001, 1), (drawn) => balanced(drawn, settled(drawn, over))),
      RUNS,
    );
  });

  it('with a diode: the straight part of its drop is seen whole, the ripple term lies between nothing and all', () => {
    fc.assert(
      fc.property(anyCase('buck-diode', 0.001, 1), (drawn) => {
        const point = settled(drawn);
        const seen = conduction(point);
        expect(lack(point)).toBeGreaterThanOrEqual(-ROUNDS * seen);
        expect(lack(point)).toBeLessThanOrEqual((rippleShare(point) + ROUNDS) * seen);
      }),
      RUNS,
    );
  });
});

describe('sums and signs', () => {
  const policy = fc.constantFrom('forced-continuous' as const, 'diode-emulation' as const, 'phase-shedding' as const);
  const buck = fc.oneof(anyCase('buck-synchronous', -1, 1), anyCase('buck-diode', 0, 1));

  it("the parts' losses sum to the total, none is negative, all is finite", () => {
    fc.assert(
      fc.property(buck, policy, (drawn, lightLoad) => {
        const point = settled(drawn, { lightLoad });
        const sum = point.losses.reduce((total, item) => total + item.watts, 0);
        expect(Math.abs(sum / point.loss - 1)).toBeLessThan(1e-12);
        for (const item of point.losses) expect(item.watts).toBeGreaterThanOrEqual(0);
        const figures = [point.loss, point.dutyCycle, point.frequency, point.outputRipple, point.inputRipple];
        expect([...figures, ...Object.values(point.temperatures)].every(Number.isFinite)).toBe(true);
      }),
      RUNS,
    );
  });

  it('the phase current has no jump and carries its share of the load', () => {
    fc.assert(
      fc.property(buck, policy, (drawn, lightLoad) => {
        const point = settled(drawn, { lightLoad });
        const { time, value } = traceOf(point, 'phaseCurrent');
        const { mean } = momentsOf(traceOf(point, 'phaseCurrent'));
        const size = Math.max(...value.map(Math.abs));
        const { load = 1, current } = drawn.where;
        // A blocking stage at no load is solved with a millionth of full load.
        const wanted = (load * current) / point.activePhases;
        expect(Math.abs(mean - wanted)).toBeLessThanOrEqual(1e-9 * size + 2e-6 * current);
        for (let i = 0; i + 1 < time.length; i++) {
          if (time[i + 1] === time[i]) expect(Math.abs(value[i + 1] - value[i])).toBeLessThanOrEqual(1e-9 * size);
        }
        expect(Math.abs((value.at(-1) ?? 0) - value[0])).toBeLessThanOrEqual(1e-9 * size);
      }),
      RUNS,
    );
  });

  it('every part is as hot as its own loss through its own path makes it', () => {
    fc.assert(
      fc.property(anyCase('buck-synchronous', -1, 1), (drawn) => {
        const { made } = drawn;
        const point = settled(drawn);
        const { highSwitch, lowSwitch, board } = point.temperatures;
        const rise = (part: string, row: HasResistance | undefined, dice = 1): number => {
          const own = point.losses.filter((item) => item.part === part).reduce((sum, item) => sum + item.watts, 0);
          return ((row?.thermalResistance ?? 0) * own) / ((made.phases ?? 1) * dice);
        };
        // Eleven digits of a temperature in kelvin: the difference of two has no more.
        expect(Math.abs(highSwitch - board - rise('highSwitch', made.high, made.highParallel))).toBeLessThan(3e-9);
        expect(Math.abs(lowSwitch - board - rise('lowSwitch', made.low, made.lowParallel))).toBeLessThan(3e-9);
      }),
      RUNS,
    );
  });

  it('what is lost leaves by the board or by the sides of the chokes: the rest over the rise of the board is one conductance', () => {
    // Boxes of 1 mm: four sides; the top stands for the board that the base covers.
    const sides = 4e-6 * surfaceCoefficient(40, 1e-3, 0, 298.15);
    const conductances: number[] = [];
    fc.assert(
      fc.property(anyCase('buck-synchronous', -1, 1), (drawn) => {
        const point = settled(drawn);
        const { inductor, board } = point.temperatures;
        const bySides = (drawn.made.phases ?? 1) * sides * (inductor - 298.15);
        conductances.push((point.loss - bySides) / (board - 298.15));
      }),
      RUNS,
    );
    expect(Math.max(...conductances) / Math.min(...conductances)).toBeCloseTo(1, 6);
  });

  it('more load, more loss, while the valley stays above zero (output charge aside: a larger peak recovers more of it)', () => {
    const bare = { outputCharge: 0, outputEnergy: 0 };
    fc.assert(
      fc.property(anyCase('buck-synchronous', 1, 1), ({ made, where }) => {
        const charged = { ...made, high: { ...made.high, ...bare }, low: { ...made.low, ...bare } };
        const full = settled({ made: charged, where });
        fc.pre(full.valleyCurrent > 0.1 * full.peakCurrent);
        expect(full.loss).toBeGreaterThan(settled({ made: charged, where: { ...where, load: 0.95 } }).loss);
      }),
      RUNS,
    );
  });
});

interface HasResistance {
  readonly thermalResistance?: number;
}
