/**
 * What more of a cause does: scaling laws and trade facts that hold for the buck without any search. Where a fact has no
 * source it is marked as common practice.
 */
import { describe, expect, it } from 'vitest';
import type { PointReport } from '../../model/assessment.ts';
import { createRailProblem } from '../../model/problem.ts';
import { buckDiode, buckSynchronous } from '../../model/stages/buck.ts';
import { builtInTables } from './shipped.ts';
import { type HandMade, momentsOf, plainRail, pointOf, traceOf, type Where, watts } from './support.ts';

const PLACE: Where = { input: 12, output: 3.3, current: 8 };

/** A switch with every switching effect. Its body diode drops what the channel does at 8 A: the gaps then leave the duty alone. */
const SWITCH = {
  onResistance: 5e-3,
  gateCharge: 10e-9,
  gateChargeSwitch: 1e-9,
  gateDrainCharge: 2e-9,
  outputCharge: 8e-9,
  outputEnergy: 8e-9 * 50 * 0.3,
  recoveryCharge: 10e-9,
  recoveryCurrent: 10,
  bodyDrop: 40e-3,
};
const DRIVER = { driverSourceResistance: 1.5, driverSinkResistance: 0.8, deadTime: 20e-9 };

/** The same ripple current at any frequency: L·f is kept. */
const keptRipple = (frequency: number, over: Partial<HandMade> = {}): PointReport =>
  pointOf(
    {
      frequency,
      high: SWITCH,
      low: SWITCH,
      controller: DRIVER,
      ...over,
      inductor: { ...over.inductor, inductance: 1.1 / frequency },
    },
    PLACE,
  );

describe('frequency at fixed ripple current', () => {
  const [slow, fast] = [keptRipple(200e3), keptRipple(800e3)];
  const ratio = (part: string, effect: string): number =>
    watts(fast.losses, part, effect) / watts(slow.losses, part, effect);

  it.each([
    ['highSwitch', 'overlap'],
    ['highSwitch', 'outputCharge'],
    ['highSwitch', 'recovery'],
    ['highSwitch', 'gate'],
    ['lowSwitch', 'gate'],
    ['lowSwitch', 'deadTime'],
  ])('%s %s rises in proportion to f', (part, effect) => {
    expect(ratio(part, effect)).toBeCloseTo(4, 6);
  });

  it('conduction does not change', () => {
    expect(ratio('highSwitch', 'conduction')).toBeCloseTo(1, 6);
  });

  it('voltage ripple of a capacitor falls as 1/f (common practice, no source)', () => {
    expect(slow.outputRipple / fast.outputRipple).toBeCloseTo(4, 6);
  });

  it('ripple across a series resistance does not change; the step across a series inductance rises with f', () => {
    const resistive = { outputCeramic: { capacitance: 1, seriesResistance: 5e-3 } };
    expect(keptRipple(800e3, resistive).outputRipple / keptRipple(200e3, resistive).outputRipple).toBeCloseTo(1, 3);
    // ESL·Vi/L (standard; computed): L falls with f here, so the step rises.
    const inductive = { outputCeramic: { capacitance: 1, seriesInductance: 1e-9 } };
    expect(keptRipple(800e3, inductive).outputRipple / keptRipple(200e3, inductive).outputRipple).toBeCloseTo(4, 2);
  });

  it('skin and proximity loss rise with f, and proximity with the layers', () => {
    const wire = (layers: number) => ({ inductor: { dcResistance: 5e-3, conductorThickness: 0.2e-3, layers } });
    const ac = (frequency: number, layers: number): number =>
      watts(keptRipple(frequency, wire(layers)).losses, 'inductor', 'windingAc');
    // Dowell's first term alone for one layer, the layer term beside it for four; for thin layers both go as f² (Dowell 1966).
    expect(ac(200e3, 1)).toBeGreaterThan(ac(100e3, 1));
    expect(ac(200e3, 4)).toBeGreaterThan(ac(100e3, 4));
    expect(ac(200e3, 4)).toBeGreaterThan(5 * ac(200e3, 1));
  });

  it('core loss rises as f^α at fixed swing', () => {
    const core = { inductor: { coreCoefficient: 1e-9, coreFrequencyExponent: 1.4, coreSwingExponent: 2.5 } };
    const loss = (f: number): number => watts(keptRipple(f, core).losses, 'inductor', 'core');
    expect(loss(800e3) / loss(200e3)).toBeCloseTo(4 ** 1.4, 4);
  });
});

describe('frequency at fixed inductance', () => {
  const at = (frequency: number): PointReport =>
    pointOf(
      {
        frequency,
        inductor: { inductance: 4.7e-6, coreCoefficient: 1e-9, coreFrequencyExponent: 1.4, coreSwingExponent: 2.5 },
      },
      PLACE,
    );
  const [slow, fast] = [at(200e3), at(800e3)];

  it('ripple current falls as 1/f (common practice, no source), the ripple of a capacitor as 1/f²', () => {
    expect(slow.rippleCurrent / fast.rippleCurrent).toBeCloseTo(4, 6);
    expect(slow.outputRipple / fast.outputRipple).toBeCloseTo(16, 4);
  });

  it('core loss falls as f^(α − β)', () => {
    const loss = (point: PointReport): number => watts(point.losses, 'inductor', 'core');
    expect(loss(fast) / loss(slow)).toBeCloseTo(4 ** (1.4 - 2.5), 5);
  });
});

describe('discontinuous operation', () => {
  it('conducts and turns off at a higher cost in the high switch than the small-ripple continuous stage at the same load', () => {
    // 2 A through a diode stage: 0.5 µH leaves gaps, 100 µH next to no ripple.
    const high = (inductance: number): number => {
      const made: HandMade = {
        architecture: 'buck-diode',
        frequency: 300e3,
        inductor: { inductance },
        high: SWITCH,
        controller: DRIVER,
      };
      const point = pointOf(made, { ...PLACE, current: 2 });
      expect(point.mode).toBe(inductance < 1e-6 ? 'discontinuous' : 'continuous');
      return watts(point.losses, 'highSwitch', 'conduction') + watts(point.losses, 'highSwitch', 'overlap');
    };
    expect(high(0.5e-6)).toBeGreaterThan(1.5 * high(100e-6));
  });
});

describe('two phases with equal currents (common practice, no source)', () => {
  const at = (phases: number, output: number): PointReport =>
    pointOf({ phases, frequency: 500e3, inductor: { inductance: 2.2e-6 } }, { input: 12, output, current: 8 * phases });

  it.each([1.2, 3.3, 9])('double the frequency of the summed ripple and shrink its size at 12 V to %d V', (output) => {
    const [one, two] = [at(1, output), at(2, output)].map((point) => traceOf(point, 'summedCurrent'));
    expect(two.period).toBeCloseTo(one.period / 2, 15);
    const size = (trace: typeof one): number => momentsOf(trace).peak - momentsOf(trace).valley;
    expect(size(two)).toBeLessThan(size(one));
  });

  it('and cancel it at D = 0.5', () => {
    const { peak, valley } = momentsOf(traceOf(at(2, 6), 'summedCurrent'));
    expect(peak - valley).toBeLessThan(0.01 * at(1, 6).rippleCurrent);
  });
});

describe('N phases of a 1/N rating', () => {
  // Each phase: N times the resistance, 1/N of every charge, N times the inductance: the same silicon and the same stored energy.
  const at = (n: number, count = 1): PointReport => {
    const row = {
      ...SWITCH,
      onResistance: n * SWITCH.onResistance,
      gateCharge: SWITCH.gateCharge / n,
      gateChargeSwitch: SWITCH.gateChargeSwitch / n,
      gateDrainCharge: SWITCH.gateDrainCharge / n,
      outputCharge: SWITCH.outputCharge / n,
      outputEnergy: SWITCH.outputEnergy / n,
      recoveryCharge: SWITCH.recoveryCharge / n,
      recoveryCurrent: SWITCH.recoveryCurrent / n,
    };
    const made: HandMade = {
      phases: n,
      frequency: 500e3,
      high: row,
      low: row,
      controller: DRIVER,
      inductor: { inductance: n * 1e-6 },
      outputCeramic: { capacitance: 10e-6 },
      outputCount: count,
    };
    return pointOf(made, { input: 12, output: 1.8, current: 20 });
  };
  const switching = (point: PointReport): number =>
    point.losses
      .filter(({ part, effect }) => part.endsWith('Switch') && effect !== 'conduction')
      .reduce((sum, item) => sum + item.watts, 0);

  it.each([2, 3, 4])('%d phases need a smaller bank and pay no more switching loss', (n) => {
    const whole = at(1, 12);
    let count = 12;
    while (count > 1 && at(n, count - 1).outputRipple <= whole.outputRipple) count--;
    expect(count).toBeLessThan(12);
    expect(switching(at(n))).toBeLessThanOrEqual(switching(at(1)) * (1 + 1e-9));
  });
});

describe('two directions', () => {
  it('a boost from the output gives Vi = Vo/(1 − duty of the low side)', () => {
    for (const ratio of [0.1, 0.25, 0.6]) {
      const point = pointOf(
        { frequency: 100e3, inductor: { inductance: 1e-3 } },
        { input: 48, output: 48 * ratio, current: 0.01, load: -1 },
      );
      expect(point.mode).toBe('reverse');
      expect(point.outputPower).toBeLessThan(0);
      expect((48 * ratio) / (1 - point.dutyCycle)).toBeCloseTo(48, 3);
    }
  });

  it('in reverse the low switch pays for the hard edge and the recovery', () => {
    const made: HandMade = {
      frequency: 300e3,
      inductor: { inductance: 10e-6 },
      high: SWITCH,
      low: SWITCH,
      controller: DRIVER,
    };
    const [forward, reverse] = [1, -1].map((load) => pointOf(made, { input: 48, output: 12, current: 10, load }));
    expect(watts(forward.losses, 'highSwitch', 'overlap')).toBeGreaterThan(0);
    expect(watts(forward.losses, 'lowSwitch', 'overlap')).toBe(0);
    expect(watts(forward.losses, 'lowSwitch', 'recovery')).toBe(0);
    expect(watts(reverse.losses, 'lowSwitch', 'overlap')).toBeGreaterThan(0);
    expect(watts(reverse.losses, 'lowSwitch', 'recovery')).toBeGreaterThan(0);
    expect(watts(reverse.losses, 'highSwitch', 'overlap')).toBe(0);
    expect(watts(reverse.losses, 'highSwitch', 'recovery')).toBe(0);
  });

  it('a diode stage refuses a battery and every negative load, in words', () => {
    const rail = plainRail({ input: 48, output: 12, current: 10 });
    const battery = { ...rail, output: { ...rail.output, battery: true } };
    const charging = {
      ...rail,
      profile: [
        { fraction: 1, share: 0.5 },
        { fraction: -0.5, share: 0.5 },
      ],
    };
    expect(buckDiode.refusal(rail)).toBeUndefined();
    expect(buckDiode.refusal(battery)).toMatch(/battery/);
    expect(buckDiode.refusal(charging)).toMatch(/diode/);
    expect(buckSynchronous.refusal(battery)).toBeUndefined();
    expect(buckSynchronous.refusal(charging)).toBeUndefined();
    const alone = { ...charging, search: { ...rail.search, architectures: ['buck-diode' as const] } };
    const refused = createRailProblem(alone, builtInTables());
    expect(refused.ok).toBe(false);
    if (!refused.ok) expect(refused.findings[0].allowed).toMatch(/diode/);
  });
});

describe('size of the passives, from the built-in tables, which no test tunes', () => {
  const tables = builtInTables();
  const box = (row: { length: number; width: number; height: number }): number => row.length * row.width * row.height;

  /** Volume of the smallest stocked inductor of at least `henries` that carries `peak` A; infinite where there is none. */
  const smallest = (henries: number, peak: number): number =>
    Math.min(...tables.inductors.filter((row) => row.inductance >= henries && row.saturationCurrent >= peak).map(box));

  /** Volume of the smallest stack of one ceramic row of 10 V or more with `farads` in all, zero bias. */
  const stack = (farads: number): number =>
    Math.min(
      ...tables.ceramics
        .filter((row) => row.voltageRating >= 10)
        .map((row) => Math.ceil(farads / (row.capacitance * row.smallSignalFactor)) * box(row)),
    );

  it('passive volume falls with frequency at fixed ripple current and ripple voltage', () => {
    // 12 V to 3.3 V, 8 A, 2.5 A of ripple, 10 mV; SLVA057: L = Vo(1 − D)/(ΔI·f), C = ΔI/(8·f·ΔV), both seen.
    const volumes = [50e3, 100e3, 200e3, 400e3, 800e3, 1.6e6].map(
      (f) => smallest((3.3 * (1 - 0.275)) / (2.5 * f), 8 + 1.25) + stack(2.5 / (8 * f * 0.01)),
    );
    for (let i = 1; i < volumes.length; i++) expect(volumes[i]).toBeLessThanOrEqual(volumes[i - 1]);
    expect(volumes[volumes.length - 1]).toBeLessThan(0.3 * volumes[0]);
  });

  it('L·Ipk² sizes the inductor: 16 times the energy takes 4 times the box or more, whether L or Ipk brings it', () => {
    // Volume goes as the area product to ¾ (standard, from memory): 16 times the energy is 8 times the volume; the steps of a
    // stocked series, a factor of two at most, are allowed for.
    for (const [henries, peak] of [
      [0.47e-6, 5],
      [1e-6, 4],
      [2.2e-6, 3],
      [4.7e-6, 2],
    ]) {
      const one = smallest(henries, peak);
      expect(smallest(16 * henries, peak)).toBeGreaterThan(4 * one);
      expect(smallest(henries, 4 * peak)).toBeGreaterThan(4 * one);
    }
  });

  it('keeping continuous operation down to light load at a high ratio makes it bulky', () => {
    // Lmin = Vo·(1 − D)/(2·I·f) (SLVA057 section 2.3, seen) at a tenth of 10 A, 300 kHz, against a ripple of 40 %.
    const continuous = (ratio: number): number => smallest((3.3 * (1 - 1 / ratio)) / (2 * 1 * 300e3), 11);
    const usual = (ratio: number): number => smallest((3.3 * (1 - 1 / ratio)) / (4 * 300e3), 12);
    expect(continuous(15)).toBeGreaterThan(continuous(1.5));
    expect(continuous(15)).toBeGreaterThan(usual(15));
  });
});
