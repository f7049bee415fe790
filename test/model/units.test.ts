/**
 * Units proved, not promised: metre, kilogram, second, ampere and kelvin are rescaled by odd factors, and each formula's
 * result must scale as its stated unit says. A missing frequency, or a current times a resistance posing as watts, fails.
 */
import { describe, expect, it } from 'vitest';
import * as capacitors from '../../model/capacitors/index.ts';
import * as control from '../../model/control/index.ts';
import * as heat from '../../model/heat/index.ts';
import { filterInductance } from '../../model/input-filter.ts';
import * as magnetics from '../../model/magnetics/index.ts';
import { buckBlocking, buckDuty } from '../../model/stages/buck.ts';
import { isolatedDuty, rectifierVoltage } from '../../model/stages/isolated.ts';
import * as switches from '../../model/switches/index.ts';
import { type Base, FACTORS, factorOf } from './dimensions.ts';

interface Row {
  readonly of: string;
  readonly run: (...values: number[]) => number;
  /** Unit and value of each input, in order. */
  readonly inputs: readonly (readonly [string, number])[];
  readonly output: string;
  /** What a constant inside the formula keeps from being rescaled. */
  readonly keeps?: Base;
}

function row(
  of: string,
  run: (...values: number[]) => number,
  inputs: string,
  output: string,
  keeps?: Row['keeps'],
): Row {
  const pairs = inputs.split(', ').map((text): readonly [string, number] => {
    const [value, unit] = text.split(' ');
    return [unit ?? '1', Number(value)];
  });
  return { of, run, inputs: pairs, output, keeps };
}

const s = switches;
const c = capacitors;
const m = magnetics;
const k = control;
const h = heat;

/** A half bridge with a centre tap: its numbers have no unit. */
const HALF = { share: 0.5, inSeries: 1, doubleEnded: true, doubler: false, centreTap: true };

const ROWS: readonly Row[] = [
  row('buckDuty', buckDuty, '12 V, 3.3 V', '1'),
  row('buckBlocking', buckBlocking, '12 V', 'V'),
  row('isolatedDuty', (a, b, n) => isolatedDuty(HALF, a, b, n), '400 V, 12 V, 15', '1'),
  row('rectifierVoltage', (a, n) => rectifierVoltage(HALF, a, n), '400 V, 15', 'V'),
  row('filterInductance', filterInductance, '0.1 V, 5e5 Hz, 0.01 A', 'H'),
  row('onResistance', s.onResistance, '0.01 Ω, 0.005 1/K, 1.2, 350 K, 2', 'Ω', 'kelvin'),
  row('conductionLoss', s.conductionLoss, '350 A², 0.002 Ω', 'W'),
  row('edgeTime', s.edgeTime, '2e-9 C, 3e-9 C, 2 V, 2 Ω, 1e-10 H, 20 A', 's'),
  row('sharedGateResistance', s.sharedGateResistance, '2 Ω, 1.5 Ω, 3', 'Ω'),
  row('overlapEnergy', s.overlapEnergy, '12 V, 3 A, 1e-8 s', 'J'),
  row('overlapLossMiller', s.overlapLossMiller, '10 V, 2 A, 2 Ω, 1e-10 F, 5 V, 2.5 V, 1e6 Hz', 'W'),
  row('chargeExponent', s.chargeExponent, '1.5e-8 C, 3e-7 J, 60 V', '1'),
  row('hardEdgeEnergy', s.hardEdgeEnergy, '1e-8 C, 2e-7 J, 1e-7 J, 48 V', 'J'),
  row('chargeCapacitance', s.chargeCapacitance, '1e-8 C, 48 V', 'F'),
  row('energyCapacitance', s.energyCapacitance, '2e-7 J, 48 V', 'F'),
  row('swingFraction by charge', s.swingFraction, '-1 A, 1e-5 H, 2e-8 C, 48 V, 30 V, 1e-8 s', '1'),
  row('swingFraction by energy', s.swingFraction, '-0.5 A, 1e-7 H, 2e-8 C, 48 V, 12 V, 1e-6 s', '1'),
  row('zeroVoltageCurrent', s.zeroVoltageCurrent, '1e-8 C, 48 V, 12 V, 1e-6 H', 'A'),
  row('recoveryCharge', (a, b, d, e) => s.recoveryCharge(a, b, true, d, e), '4e-8 C, 20 A, 1e-8 C, 10 A', 'C'),
  row('recoveryLoss', s.recoveryLoss, '12 V, 1e-8 C, 1e6 Hz', 'W'),
  row('recoveryLossTriangle', s.recoveryLossTriangle, '12 V, 2 A, 1e-8 s, 1e6 Hz', 'W'),
  row('deadTimeEnergy', s.deadTimeEnergy, '0.5 V, 3 A, 3e-8 s, 1e-8 s', 'J'),
  row('transitionTime', s.transitionTime, '2e-8 C, -4 A, 1e-7 s', 's'),
  row('gateLoss', s.gateLoss, '1e-9 C, 5 V, 2e6 Hz', 'W'),
  row('gateChargeAfterSwing', s.gateChargeAfterSwing, '5e-9 C, 1e-9 C, 0.5', 'C'),
  row('gateChargeAt', s.gateChargeAt, '1e-8 C, 5 V, 6 V', 'C'),
  row('loopEnergy', s.loopEnergy, '1e-9 H, 20 A', 'J'),
  row('overshoot', s.overshoot, '10 A, 1e-9 H, 1e-9 F', 'V'),
  row('diodeForwardLoss', s.diodeForwardLoss, '0.4 V, -1e-3 V/K, 0.02 Ω, 5 A, 30 A², 340 K', 'W', 'kelvin'),
  row('diodeDrop', s.diodeDrop, '0.4 V, -1e-3 V/K, 0.02 Ω, 5 A, 340 K', 'V', 'kelvin'),
  row('diodeLeakageLoss', s.diodeLeakageLoss, '30 V, 1e-4 A, 12 K, 0.5, 340 K', 'W', 'kelvin'),
  row('diodeChargeEnergy', s.diodeChargeEnergy, '2e-8 C, 40 V, 10 V', 'J'),
  row('ceramicCapacitance', c.ceramicCapacitance, '1e-5 F, 0.8, 10 V, 1.6, 6 V', 'F'),
  row('capacitiveRipple', c.capacitiveRipple, '2 A, 5e5 Hz, 1e-4 F', 'V'),
  row('cancellation', c.cancellation, '3, 0.2', '1'),
  row('inputMeanSquare', c.inputMeanSquare, '2, 0.2, 10 A, 3 A', 'A²'),
  row('inputChargeRipple', c.inputChargeRipple, '20 A, 0.3, 5e5 Hz, 1e-4 F', 'V'),
  row('seriesLoss', c.seriesLoss, '4 A², 0.002 Ω', 'W'),
  row('selfHeating', c.selfHeating, '1 A², 2 A, 20 K', 'K'),
  row('electrolyticLife', c.electrolyticLife, '7e6 s, 378 K, 350 K', 's', 'kelvin'),
  row('wireResistance', m.wireResistance, '1.7e-8 Ω·m, 2 m, 1e-6 m²', 'Ω'),
  row('skinDepth', m.skinDepth, '1.7e-8 Ω·m, 1e5 Hz', 'm', 'permeability'),
  row('roundWireThickness', m.roundWireThickness, '1e-3 m, 1.2e-3 m, 3e-4 m', '1'),
  row('roundWireSkin', m.roundWireSkin, '1e-3 m, 3e-4 m', '1'),
  row('roundWireProximity', m.roundWireProximity, '1e-3 m, 3e-4 m', 'm²'),
  row('litzLoss', m.litzLoss, '100, 1e-4 m, 2e-3 m, 2e-4 m, 0.22 Ω/m, 10 A, 500 A/m', 'W/m'),
  row('tailBound', m.tailBound, '0.01 A², 1 A², 0.5, 2', 'A²'),
  row('effectiveResistanceFactor', m.effectiveResistanceFactor, '0.5, 2, 1e12 (A/s)², 30 A², 1e5 Hz', '1'),
  row('effectivePermeability', m.effectivePermeability, '2.35e-6 H, 0.072 m, 7.6e-5 m²', '1', 'permeability'),
  row('inductanceFactor', m.inductanceFactor, '1e-4 m², 1e-3 m, 1.2, 0.05 m, 1000', 'H', 'permeability'),
  row('fringingFactor', m.fringingFactor, '1e-3 m, 6.3e-5 m², 0.0108 m', '1'),
  row('gapFor', m.gapFor, '1.575e-5 H, 10, 6.3e-5 m², 0.0384 m, 1600, 0.0108 m', 'm', 'permeability'),
  row('leakageInductance', m.leakageInductance, '10, 0.05 m, 0.02 m, 3e-3 m, 1e-4 m, 1', 'H', 'permeability'),
  row('magnetizingInductance', m.magnetizingInductance, '4.4e-6 H, 4', 'H'),
  row('fluxOfCurrent', m.fluxOfCurrent, '1e-5 H, 10 A, 10, 1e-4 m²', 'T'),
  row('fluxSwing', m.fluxSwing, '48 V, 1e-6 s, 4, 1e-4 m²', 'T'),
  row('saturationFlux', m.saturationFlux, '0.49 T, 0.39 T, 350 K', 'T', 'kelvin'),
  row('windingResistance', m.windingResistance, '0.01 Ω, 350 K', 'Ω', 'kelvin'),
  row('inductorThermalResistance', m.inductorThermalResistance, '10 A, 40 K, 0.005 Ω', 'K/W', 'kelvin'),
  row('windowFill', m.windowFill, '4e-3 m, 1e-3 m, 6e-3 m', '1'),
  row('gapKeepOut', m.gapKeepOut, '5e-4 m', 'm'),
  row('hotSpotRise', m.hotSpotRise, '40 K', 'K'),
  row('pathTemperature', h.pathTemperature, '313 K, 2 W, 20 K/W', 'K'),
  row('parallelResistance', h.parallelResistance, '20 K/W, 30 K/W', 'K/W'),
  row('sideSurface', h.sideSurface, '0.03 m, 0.02 m, 0.01 m', 'm²'),
  row('boardPath', h.boardPath, '10 K/W, 0.05 W/K', 'K/W'),
  row('fixedPoint', h.fixedPoint, '313 K, 40 K/W, 1 W, 0.005 1/K', 'K', 'kelvin'),
  row('mixedFixedPoint', h.mixedFixedPoint, '313 K, 40 K/W, 0.5 W, 1 W, 0.005 1/K', 'K', 'kelvin'),
  row('sinkVolumeByIndex', h.sinkVolumeByIndex, '2 K/W, 2e4 W/(K·m³)', 'm³'),
  row('stepExcursion by charge', k.stepExcursion, '10 A, 1e-6 H, 1.5 V, 8e-4 F, 1e-3 Ω', 'V'),
  row('stepExcursion by resistance', k.stepExcursion, '5 A, 1e-7 H, 3.3 V, 8e-4 F, 1e-2 Ω', 'V'),
  row('slewedExcursion', k.slewedExcursion, '20 A, 1e8 A/s, 5e6 A/s, 5e-7 s, 1e-3 F, 5e-4 Ω, 1e-10 H, 3 A', 'V'),
  row('bandwidthExcursion', k.bandwidthExcursion, '10 A, 5e4 Hz, 1e-3 F', 'V'),
  row('crossoverLimit', k.crossoverLimit, '3e5 Hz, 2, 0.1', 'Hz'),
  row('jitterCurrent', k.jitterCurrent, '48 V, 1e-9 s, 1e-6 H', 'A'),
  row('rightHalfPlaneZero', k.rightHalfPlaneZero, '12 V, 120 W, 1e-6 H', 'Hz'),
  row('filterImpedance', k.filterImpedance, '1e-6 H, 1e-4 F', 'Ω'),
  row('filterCorner', k.filterCorner, '1e-6 H, 1e-4 F', 'Hz'),
  row('dampedPeak', k.dampedPeak, '0.1 Ω, 4', 'Ω'),
  row('dampingResistance', k.dampingResistance, '0.1 Ω, 4', 'Ω'),
  row('filterImpedanceLimit', k.filterImpedanceLimit, '36 V, 100 W', 'Ω'),
  row('filteredRipple', k.filteredRipple, '0.2 V, 3e5 Hz, 3e4 Hz', 'V'),
];

/** Fitted laws and laws of fixed materials or air: their coefficients carry units, so they are left out, by name and reason. */
const EXEMPT: Readonly<Record<string, string>> = {
  steinmetz: 'fitted exponents of frequency and flux',
  igseConstant: 'fitted exponents',
  igseConstantApproximate: 'fitted exponents',
  cosinePowerIntegral: 'a pure number of a pure number',
  triangleLossDensity: 'fitted exponents',
  trapezoidLossDensity: 'fitted exponents',
  gamma: 'a pure number of a pure number',
  dowell: 'a pure number of pure numbers',
  optimumThickness: 'a pure number of a pure number',
  idleLayerFactor: 'a pure number of pure numbers',
  copperResistivity: 'resistivity of one metal',
  copperMass: 'density of one metal',
  gaugeDiameter: 'a table by number',
  roundArea: 'area of a circle, no other unit',
  woundCost: 'prices',
  electrolyticCost: 'fitted prices',
  filmCost: 'fitted prices',
  ceramicWorstFactor: 'fractions and decades of hours',
  naturalConvection: 'fit for air',
  forcedConvection: 'fit for air',
  radiation: 'one natural constant of W, m and K',
  surfaceCoefficient: 'fit for air',
  surfaceRise: 'fit for air',
  surfacePower: 'fit for air',
  boardConductance: 'fit for air',
  volumetricResistance: 'table by air speed',
  sinkVolume: 'table by air speed',
  sinkMass: 'density of one metal',
  sinkCost: 'price',
};

describe('A formula scales as its unit says', () => {
  it.each(ROWS.map((item) => [item.of, item] as const))('%s', (_, item) => {
    const base = FACTORS[item.keeps ?? 'free'];
    const plain = item.run(...item.inputs.map(([, value]) => value));
    const scaled = item.run(...item.inputs.map(([unit, value]) => value * factorOf(unit, base)));
    expect(plain, 'the example must exercise the formula').not.toBe(0);
    expect(scaled / (plain * factorOf(item.output, base))).toBeCloseTo(1, 9);
  });

  it('and the test notices a wrong unit', () => {
    const wrong = row('current times resistance as watts', (i, r) => i * r, '3 A, 2 Ω', 'W');
    const scaled = wrong.run(...wrong.inputs.map(([unit, value]) => value * factorOf(unit, FACTORS.free)));
    expect(Math.abs(scaled / (6 * factorOf('W', FACTORS.free)) - 1)).toBeGreaterThan(0.1);
  });
});

/** They take or fill records and arrays: waveforms, rows, plants. */
const RECORD_FUNCTIONS = [
  ...[
    'bankRipple',
    'bankCurrents',
    'bankTrace',
    'isPair',
    'pairTransient',
    'outputAt',
    'besselJ',
    'dowellHarmonics',
    'harmonicLoss',
    'triangleLoss',
    'stockedCoreLoss',
    'layWinding',
    'parallelThatFit',
  ],
  ...['prepareInductor', 'fluxLinkage', 'currentOfLinkage', 'coreTemperatureFactor', 'materialViolation'],
  ...['prepareWinding', 'materialConstants', 'knownConstants'],
  ...['effectiveParameters', 'toroidParameters', 'plantResponse', 'compensatorResponse', 'compensatorParts'],
  ...['amplifierResponse', 'designCompensator', 'loopMargin'],
];

describe('No formula of plain numbers is left out silently', () => {
  const covered = new Set([...ROWS.map(({ of }) => of.split(' ')[0]), ...Object.keys(EXEMPT)]);
  const rooms = { switches, capacitors, magnetics, control, heat };
  for (const [room, functions] of Object.entries(rooms)) {
    const names = Object.entries(functions).flatMap(([name, value]) =>
      typeof value === 'function' && !/^(create|set|add|clear)|At$/.test(name) ? [name] : [],
    );
    const records = new Set(RECORD_FUNCTIONS);
    it.each(names.filter((name) => !records.has(name)))(`${room}: %s`, (name) => expect([...covered]).toContain(name));
  }
});
