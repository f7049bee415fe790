/** Every limit binds where it should, by the fraction it should, and what cannot be computed never passes. */
import { describe, expect, it } from 'vitest';
import type { LimitFigure } from '../../model/assessment.ts';
import { LimitBook } from '../../model/limits/book.ts';
import type { Rail } from '../../model/rail/rail.ts';
import { assessMade, type HandMade, plainRail, type Where } from './support.ts';

const PLACE: Where = { input: 12, output: 3.3, current: 8 };
const MADE: HandMade = { frequency: 500e3, inductor: { inductance: 2.2e-6 } };

/** The limit `name` of a hand-made design. */
function limit(name: string, made: Partial<HandMade>, over: Partial<Rail> = {}, where = PLACE): LimitFigure {
  const { limits } = assessMade({ ...MADE, ...made }, plainRail(where, over));
  const found = limits.find((figure) => figure.name === name);
  if (found === undefined) throw new Error(`no limit ${name} among ${limits.map((figure) => figure.name).join(', ')}`);
  return found;
}

describe('the book of limits', () => {
  const book = (): LimitBook => {
    const made = new LimitBook([{ name: 'heat', unit: 'K', sense: 'most' }]);
    made.clear();
    return made;
  };
  const missed = (made: LimitBook): number => {
    const into = new Float64Array(1);
    made.violations(into);
    return into[0];
  };

  it('keeps the worst of all corners, in either order', () => {
    for (const values of [
      [80, 120, 90],
      [120, 80, 90],
    ]) {
      const made = book();
      for (const value of values) made.judge(0, value, 100, 0);
      expect(missed(made)).toBeCloseTo(0.2, 12);
    }
  });

  it('a value that cannot be computed at one corner is never a pass, whatever comes after it', () => {
    for (const values of [
      [Number.NaN, 50],
      [50, Number.NaN],
    ]) {
      const made = book();
      for (const value of values) made.judge(0, value, 100, 0);
      expect(missed(made)).toBeNaN();
    }
  });
});

describe('on-time and off-time', () => {
  const fast: Where = { input: 48, output: 1, current: 10 };
  const at = (frequency: number, controller: HandMade['controller']): HandMade => ({
    frequency,
    inductor: { inductance: 1e-6 },
    controller,
  });

  it('48 V to 1 V at 1 MHz has 20.8 ns (computed): a controller of 50 ns misses, one of 20 ns holds', () => {
    const missed = limit('minimumOnTime', at(1e6, { minimumOnTime: 50e-9 }), {}, fast);
    // Board copper of 0.25 mΩ lengthens it by a quarter of a per cent.
    expect(missed.value * 1e9).toBeCloseTo(20.8, 0);
    expect(missed.violation).toBeCloseTo(1 - 20.8 / 50, 2);
    expect(limit('minimumOnTime', at(1e6, { minimumOnTime: 20e-9 }), {}, fast).violation).toBe(0);
    expect(limit('minimumOnTime', at(300e3, { minimumOnTime: 50e-9 }), {}, fast).violation).toBe(0);
  });

  it('an oscillator that runs fast shortens it', () => {
    const tolerances = { inductance: 0, capacitance: 0, oscillator: 0.1, onResistance: 0 };
    const usual = limit('minimumOnTime', at(1e6, { minimumOnTime: 50e-9 }), {}, fast);
    const worst = limit('minimumOnTime', at(1e6, { minimumOnTime: 50e-9 }), { tolerances }, fast);
    expect(worst.value / usual.value).toBeCloseTo(1 / 1.1, 6);
  });

  it('skipped pulses hold it by construction, whatever the oscillator does', () => {
    const tolerances = { inductance: 0, capacitance: 0, oscillator: 0.1, onResistance: 0 };
    const made = { controller: { minimumOnTime: 200e-9 } };
    // 12 V to 3.3 V has 550 ns at 500 kHz: only the light load is below the shortest pulse.
    const where = { ...PLACE, load: 0.005 };
    const figure = limit('minimumOnTime', made, { lightLoad: 'diode-emulation', tolerances }, where);
    expect(figure.violation).toBe(0);
  });

  it('a high duty runs into the shortest off-time', () => {
    const where: Where = { input: 12, output: 11.4, current: 5 };
    // 5 % of 1 µs is 50 ns.
    const figure = limit('minimumOffTime', at(1e6, { minimumOffTime: 100e-9 }), {}, where);
    expect(figure.violation).toBeCloseTo(0.5, 2);
    expect(limit('minimumOffTime', at(200e3, { minimumOffTime: 100e-9 }), {}, where).violation).toBe(0);
  });
});

describe('life of wet electrolytics', () => {
  const bulk = {
    name: 'bulk',
    technology: 'electrolytic',
    capacitance: 470e-6,
    tolerance: 0.2,
    voltageRating: 10,
    seriesResistance: 0.1,
    seriesInductance: 0,
    rippleRating: 1e6,
    ratedRise: 5,
    maximumTemperature: 378.15,
    ratedLife: 2000 * 3600,
    length: 1e-3,
    width: 1e-3,
    height: 1e-3,
    mass: 1e-6,
    prices: [],
  } as const;
  const made = (technology: 'electrolytic' | 'polymer') => ({
    outputBulk: { ...bulk, technology },
    outputBulkCount: 1,
  });
  const limits = { efficiency: [], life: 40_000 * 3600 };

  it('2000 h at 105 °C are 64 000 h at 55 °C: they halve each 10 K (NCP5314 page 20, seen)', () => {
    // A big board and parts without loss: it stays at the ambient to a few hundredths of a kelvin.
    const figure = limit('bulkLife', made('electrolytic'), { limits, ambient: 328.15, coolingArea: 100 });
    expect(figure.value / 3600 / 64_000).toBeCloseTo(1, 2);
    expect(figure.violation).toBe(0);
  });

  it('10 K more halve it, and 40 000 h are missed by a fifth', () => {
    const figure = limit('bulkLife', made('electrolytic'), { limits, ambient: 338.15, coolingArea: 100 });
    expect(figure.violation).toBeCloseTo(0.2, 2);
  });

  it('only wet ones dry out: a polymer has no such limit', () => {
    expect(() => limit('bulkLife', made('polymer'), { limits, ambient: 338.15 })).toThrow();
  });
});

describe('currents', () => {
  it('saturation is judged at the current limit and not at the steady peak', () => {
    // Peak of 8 A with 2.18 A of ripple: 9.09 A; a limit that may sit 30 % high passes 11.8 A.
    const figure = limit('saturation', {
      inductor: { inductance: 2.2e-6, saturationCurrent: 10, saturationDrop: 1e-9 },
      controller: { currentLimitSpread: 1.3 },
    });
    expect(figure.value).toBeCloseTo(1.3 * (8 + 0.5 * 2.175), 1);
    expect(figure.violation).toBeCloseTo(figure.value / 10 - 1, 9);
  });

  it('unequal phases each carry their error: N phases are rated at (1 + ε)·Io/N + ΔI/2', () => {
    const equal = limit('saturation', { phases: 4 });
    const unequal = limit('saturation', { phases: 4, controller: { sharingError: 0.1 } });
    expect(unequal.value - equal.value).toBeCloseTo(0.1 * 2, 6);
  });

  it('jitter of the edge adds Vi·δt/L at the phase peak (computed: 12 V · 2 ns / 2.2 µH = 10.9 mA)', () => {
    const still = limit('saturation', {});
    const shaky = limit('saturation', { controller: { jitter: 2e-9 } });
    expect(shaky.value - still.value).toBeCloseTo(0.0109, 4);
  });

  it('a capacitor carries no more than its rating: 4 A at D = 0.275 put 3.57 A rms into the input', () => {
    const figure = limit('inputCeramicCurrent', { inductor: { inductance: 1 }, inputCeramic: { rippleRating: 2 } });
    // Io·√(D(1 − D)) (SLUS660H eq. 27, seen).
    expect(figure.value).toBeCloseTo(8 * Math.sqrt(0.275 * 0.725), 2);
    expect(
      limit('inputCeramicCurrent', { inductor: { inductance: 1 }, inputCeramic: { rippleRating: 2 }, inputCount: 2 })
        .value,
    ).toBeCloseTo(4 * Math.sqrt(0.275 * 0.725), 2);
  });
});

describe('ripple and load step', () => {
  it('an ideal capacitor leaves ΔI/(8·f·C) (SLVA057 section 5.1, seen): 2.175 A, 500 kHz, 100 µF leave 5.44 mV', () => {
    const figure = limit(
      'outputRipple',
      {},
      { output: { minimum: 3.3, nominal: 3.3, maximum: 3.3, current: 8, ripple: 5e-3, battery: false } },
    );
    expect(figure.value * 1e3).toBeCloseTo(5.44, 1);
    expect(figure.violation).toBeCloseTo(5.44 / 5 - 1, 3);
  });

  it('B3: 833 µF, 1 µH, 1.5 V release 10 A with at least the 40.0 mV of the strict closed form (computed), at most the 80 mV that SLUS660H prints', () => {
    const made: HandMade = {
      frequency: 5e6,
      inductor: { inductance: 1e-6 },
      outputCeramic: { capacitance: 833e-6 },
    };
    const figure = limit(
      'loadStep',
      made,
      { step: { current: 10, slew: 1e12, deviation: 0.08 } },
      { input: 12, output: 1.5, current: 20 },
    );
    expect(figure.value).toBeGreaterThan(0.04);
    expect(figure.value).toBeLessThan(0.08);
  });
});

describe('avoided bands', () => {
  const avoid = [{ from: 485e3, to: 525e3, harmonics: 1 }];
  const tolerances = { inductance: 0, capacitance: 0, oscillator: 0.05, onResistance: 0 };
  const clear = (frequency: number, harmonics = 1): number =>
    limit('avoidedBands', { frequency }, { avoid: [{ ...avoid[0], harmonics }], tolerances }).violation;

  it('with the oscillator at either end of its tolerance', () => {
    // 485 kHz/1.05 = 461.9 kHz and 525 kHz/0.95 = 552.6 kHz.
    expect(clear(461e3)).toBe(0);
    expect(clear(463e3)).toBeGreaterThan(0);
    expect(clear(500e3)).toBeGreaterThan(0);
    expect(clear(552e3)).toBeGreaterThan(0);
    expect(clear(554e3)).toBe(0);
  });

  it('and with harmonics where the sheet asks for them', () => {
    expect(clear(250e3)).toBe(0);
    expect(clear(250e3, 2)).toBeGreaterThan(0);
    expect(clear(168e3, 2)).toBe(0);
    expect(clear(168e3, 3)).toBeGreaterThan(0);
  });
});

describe('parts that do not go together', () => {
  it.each<[string, Partial<HandMade>, number]>([
    ['driveVoltage', { high: { driveVoltage: 10 } }, 1 - 5 / 9],
    ['gateVoltage', { low: { gateRating: 4 } }, 0.25],
    ['phases', { phases: 4, controller: { phasesMaximum: 2 } }, 1],
    ['controllerFrequency', { controller: { frequencyMaximum: 250e3 } }, 1],
    ['controllerLowestFrequency', { controller: { frequencyMinimum: 1e6 } }, 0.5],
    ['controllerAbilities', { controller: { stages: ['bridge'] } }, 1],
  ])('%s is missed by its fraction', (name, made, fraction) => {
    expect(limit(name, made).violation).toBeCloseTo(fraction, 9);
    expect(limit(name, {}).violation).toBe(0);
  });
});

describe('what the sheet asks for', () => {
  it('efficiency and no-load power are judged at nominal input', () => {
    const limits = { efficiency: [{ load: 1, atLeast: 0.9 }], noLoadPower: 0.01 };
    const lossy = { high: { onResistance: 0.1 }, low: { onResistance: 0.1 }, controller: { quiescentCurrent: 2e-3 } };
    expect(limit('efficiency@100%', {}, { limits }).violation).toBe(0);
    expect(limit('efficiency@100%', lossy, { limits }).violation).toBeGreaterThan(0);
    // 12 V · 2 mA is 24 mW, beside the ripple's.
    expect(limit('noLoadPower', lossy, { limits }).value).toBeGreaterThan(0.024);
    expect(limit('noLoadPower', lossy, { limits }).violation).toBeGreaterThan(1.4);
  });

  it.each([
    ['volume', 'volume', 10e-9],
    ['boardArea', 'boardArea', 10e-6],
    ['mass', 'mass', 5e-6],
    ['cost', 'cost', 1],
  ])(
    '%s binds where it is a hundredth of what the design has, and not where it is a hundred times that',
    (name, key, about) => {
      const at = (value: number): LimitFigure => limit(name, {}, { limits: { efficiency: [], [key]: value } });
      expect(at(about * 100).violation).toBe(0);
      expect(at(about / 100).violation).toBeGreaterThan(0);
      expect(at(about * 100).value).toBeGreaterThan(0);
    },
  );
});

describe('height', () => {
  it('is that of the tallest part, and of the heat sink where one stands on the cooling board', () => {
    const limits = { efficiency: [], height: 5e-3 };
    expect(limit('height', {}, { limits }).value).toBe(1e-3);
    // 8² · 0.275 · 40 mΩ = 0.7 W on 1 cm², which carries some 3 mW/K: a sink of 700 cm³·K/W must add what 80 K ask for.
    const hot: Partial<HandMade> = { high: { onResistance: 40e-3 } };
    const tall = limit('height', hot, { limits, coolingArea: 1e-4 });
    expect(tall.value).toBeGreaterThan(5e-3);
    expect(tall.violation).toBeCloseTo(tall.value / 5e-3 - 1, 9);
    // The same watts on four times the board need less than a quarter of the height.
    expect(limit('height', hot, { limits, coolingArea: 4e-4 }).value).toBeLessThan(tall.value / 4);
  });
});

describe('heat', () => {
  const hot: Partial<HandMade> = {
    high: { onResistance: 20e-3, resistanceTempco: 0.005, thermalResistance: 40, maximumJunction: 398.15 },
  };

  it('a junction is missed by a fraction of the rise that was allowed', () => {
    // 8² · 0.275 · 20 mΩ = 0.352 W at 25 °C, 40 K/W: 14.1 K/(1 − 0.0704) = 15.2 K over the board.
    const figure = limit('highJunction', hot);
    expect(figure.value - 298.15).toBeGreaterThan(14);
    expect(figure.value - 298.15).toBeLessThan(16.5);
    const tight = limit('highJunction', { high: { ...hot.high, maximumJunction: 308.15 } });
    expect(tight.violation).toBeCloseTo((tight.value - 308.15) / 10, 6);
  });

  it('loss that feeds itself is its own limit: Rth·P0·a ≥ 1 runs away', () => {
    const figure = limit('thermalRunaway', { high: { ...hot.high, onResistance: 0.2, thermalResistance: 80 } });
    // 3.5 W · 80 K/W · 0.005 = 1.4.
    expect(figure.value).toBeGreaterThan(1);
    expect(figure.violation).toBeGreaterThan(0);
  });
});
