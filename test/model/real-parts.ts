/**
 * Hand-made designs with every effect at an ordinary size, drawn at random: what laws are held to. Resistances, inductance
 * and core loss are drawn in proportion to the place where the design works, so that most draws are converters that someone
 * could build.
 */
import fc from 'fast-check';
import type { HandMade, Where } from './support.ts';

/** A design and where it works. */
export interface Case {
  readonly made: HandMade;
  readonly where: Where;
}

/** One set of shares, all drawn between 0 and 1: what `caseOf` turns into a design and its place. */
const shares = fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { minLength: 80, maxLength: 80 });

/**
 * A buck of `architecture` with 1 to 4 phases: 8 V to 60 V in, a twentieth to nine tenths of it out, 1 A to 40 A, at a load
 * between the given fractions.
 */
export function anyCase(
  architecture: 'buck-synchronous' | 'buck-diode',
  leastLoad: number,
  mostLoad: number,
): fc.Arbitrary<Case> {
  return shares.map((drawn) => caseOf(architecture, leastLoad, mostLoad, drawn));
}

function caseOf(architecture: 'buck-synchronous' | 'buck-diode', least: number, most: number, drawn: number[]): Case {
  let next = 0;
  const real = (from: number, to: number): number => from + (to - from) * drawn[next++];
  const log = (from: number, to: number): number => from * (to / from) ** drawn[next++];
  const whole = (from: number, to: number): number => Math.min(to, Math.floor(real(from, to + 1)));
  const input = real(8, 60);
  const output = real(0.05, 0.9) * input;
  const current = log(1, 40);
  const where = { input, output, current, load: real(least, most) };
  const phases = whole(1, 4);
  const each = current / phases;
  const frequency = log(5e4, 2e6);
  const ripple = each * log(0.1, 4);
  const load = output / each;
  const resistance = (): number => load * log(1e-3, 2e-2);
  const transistor = () => {
    const outputCharge = log(1e-9, 40e-9);
    const gateCharge = log(3e-9, 60e-9);
    return {
      onResistance: resistance(),
      resistanceTempco: real(0.003, 0.008),
      gateCharge,
      gateChargeSwitch: gateCharge * real(0.05, 0.2),
      gateDrainCharge: gateCharge * real(0.1, 0.5),
      gateResistance: real(0.3, 2),
      outputCharge,
      // From a superjunction's charge law to a linear capacitance.
      outputEnergy: outputCharge * 50 * real(0.1, 0.5),
      recoveryCharge: log(1e-9, 40e-9),
      recoveryCurrent: real(5, 20),
      bodyDrop: real(0.6, 2.5),
      commonSourceInductance: real(0, 0.2e-9),
      thermalResistance: real(0.2, 2),
    };
  };
  const alpha = real(1.2, 1.7);
  const beta = real(2, 2.7);
  const made: HandMade = {
    architecture,
    phases,
    frequency,
    inductor: {
      inductance: (output * (1 - output / input)) / (ripple * frequency),
      saturationCurrent: (each + ripple) * real(0.8, 3),
      saturationExponent: real(2, 8),
      dcResistance: resistance(),
      conductorThickness: real(0.1e-3, 0.4e-3),
      layers: whole(1, 4),
      coreCoefficient: (each * output * log(1e-4, 1e-2)) / (frequency ** alpha * ripple ** beta),
      coreFrequencyExponent: alpha,
      coreSwingExponent: beta,
      ratedCurrent: each * real(1, 3),
    },
    high: transistor(),
    highParallel: whole(1, 3),
    low: transistor(),
    lowParallel: whole(1, 3),
    diode: {
      forwardDrop: real(0.2, 0.6),
      slopeResistance: resistance(),
      dropTempco: real(-2e-3, -0.5e-3),
      junctionCharge: log(2e-9, 30e-9),
      recoveryCharge: real(0, 20e-9),
      recoveryCurrent: real(5, 20),
      leakage: log(1e-6, 1e-4),
      leakageDoubling: real(9, 14),
      thermalResistance: real(0.2, 2),
    },
    controller: {
      linearDriveSupply: drawn[next++] < 0.5,
      driverSourceResistance: real(0.5, 3),
      driverSinkResistance: real(0.3, 2),
      deadTime: real(5e-9, 40e-9),
      minimumOnTime: real(0, 0.3) / frequency,
      quiescentCurrent: real(0.1e-3, 2e-3),
    },
    outputCeramic: {
      capacitance: Math.max(1e-6, (20 * ripple) / frequency),
      seriesResistance: log(0.5e-3, 20e-3),
      seriesInductance: log(0.1e-9, 2e-9),
    },
    outputCount: whole(1, 8),
    inputCeramic: {
      capacitance: Math.max(1e-6, (20 * each) / frequency),
      seriesResistance: log(0.5e-3, 20e-3),
      seriesInductance: log(0.1e-9, 2e-9),
    },
    inputCount: whole(1, 8),
  };
  return { made, where };
}
