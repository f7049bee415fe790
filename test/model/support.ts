/**
 * Designs built by hand: parts of which every effect is nothing until a test sets it, rails that ask for nothing but what a
 * test asks, and one operating point of one design through the model's own path, so that a published example can be put in
 * as it is printed.
 */
import type { Assessment, LossItem, PointReport, Trace } from '../../model/assessment.ts';
import type { Outcome } from '../../model/outcome.ts';
import { describeFinding } from '../../model/outcome.ts';
import type { Bulk } from '../../model/parts/bulk.ts';
import type { Ceramic } from '../../model/parts/ceramic.ts';
import type { Controller } from '../../model/parts/controller.ts';
import type { Diode } from '../../model/parts/diode.ts';
import type { Inductor } from '../../model/parts/inductor.ts';
import type { Switch } from '../../model/parts/switch.ts';
import type { PartsTables } from '../../model/parts/tables.ts';
import { createRailProblem, type RailProblem } from '../../model/problem.ts';
import type { Rail } from '../../model/rail/rail.ts';
import type { Architecture } from '../../model/stages/list.ts';
import { NO_TABLES } from '../support/tables.ts';

/** The value of an outcome; its findings as an error, so that a test shows them. */
export function need<T>(outcome: Outcome<T>): T {
  if (outcome.ok) return outcome.value;
  throw new Error(outcome.findings.map(describeFinding).join('\n'));
}

const box = { length: 1e-3, width: 1e-3, height: 1e-3, mass: 1e-6, prices: [{ from: 1, price: 0.1 }] };

/** A switch without any loss: what a test does not set costs nothing. */
export function idealSwitch(over: Partial<Switch> = {}): Switch {
  return {
    ...box,
    name: 'switch',
    technology: 'si',
    voltageRating: 100,
    currentRating: 1e4,
    onResistance: 0,
    resistanceTempco: 0,
    dynamicFactor: 1,
    driveVoltage: 5,
    gateRating: 20,
    plateauVoltage: 2.5,
    gateCharge: 0,
    gateChargeSwitch: 0,
    gateDrainCharge: 0,
    gateResistance: 0,
    outputCharge: 0,
    outputEnergy: 0,
    outputTestVoltage: 50,
    recoveryCharge: 0,
    recoveryCurrent: 1,
    recoveryHoldsOutput: false,
    bodyDrop: 0,
    commonSourceInductance: 0,
    thermalResistance: 1,
    maximumJunction: 448.15,
    ...over,
  };
}

/** A diode without drop, charge or leakage. */
function idealDiode(over: Partial<Diode> = {}): Diode {
  return {
    ...box,
    name: 'diode',
    technology: 'schottky',
    voltageRating: 100,
    currentRating: 1e4,
    forwardDrop: 0,
    slopeResistance: 0,
    dropTempco: 0,
    junctionCharge: 0,
    chargeVoltage: 50,
    recoveryCharge: 0,
    recoveryCurrent: 1,
    leakage: 0,
    leakageDoubling: 10,
    thermalResistance: 1,
    maximumJunction: 448.15,
    ...over,
  };
}

/** An inductor without loss that never saturates. */
function idealInductor(over: Partial<Inductor> = {}): Inductor {
  return {
    ...box,
    name: 'choke',
    series: 'chokes',
    inductance: 1e-6,
    tolerance: 0,
    saturationCurrent: 1e6,
    saturationDrop: 0.2,
    saturationExponent: 2,
    dcResistance: 1e-12,
    conductorThickness: 1e-6,
    layers: 1,
    coreCoefficient: 0,
    coreFrequencyExponent: 1.5,
    coreSwingExponent: 2.5,
    ratedCurrent: 1e4,
    ratedRise: 40,
    maximumTemperature: 428.15,
    ...over,
  };
}

/** A ceramic capacitor that neither bias nor age changes. */
function idealCeramic(over: Partial<Ceramic> = {}): Ceramic {
  return {
    ...box,
    name: 'ceramic',
    dielectric: 'C0G',
    capacitance: 100e-6,
    tolerance: 0,
    voltageRating: 100,
    halvingVoltage: 1e9,
    biasExponent: 2,
    smallSignalFactor: 1,
    temperatureDrop: 0,
    ageing: 0,
    seriesResistance: 0,
    seriesInductance: 0,
    rippleRating: 1e4,
    ...over,
  };
}

/** A controller with ideal drivers and no limits; its gap is one picosecond, for a gap of nothing leaves nothing to divide by. */
function idealController(over: Partial<Controller> = {}): Controller {
  return {
    ...box,
    name: 'controller',
    stages: ['buck', 'forward', 'bridge'],
    inputMinimum: 0,
    inputMaximum: 1e3,
    outputMinimum: 0,
    outputMaximum: 1e3,
    phasesMaximum: 8,
    frequencyMinimum: 1e2,
    frequencyMaximum: 1e8,
    minimumOnTime: 0,
    minimumOffTime: 0,
    jitter: 0,
    driveVoltage: 5,
    linearDriveSupply: false,
    driverSourceResistance: 0,
    driverSinkResistance: 0,
    deadTime: 1e-12,
    quiescentCurrent: 0,
    sharingError: 0,
    currentLimitSpread: 1,
    diodeEmulation: true,
    phaseShedding: true,
    phasePriceShare: 0,
    ...over,
  };
}

/** What a hand-made design is made of. */
export interface HandMade {
  readonly architecture?: Architecture;
  readonly phases?: number;
  /** Hz. */
  readonly frequency: number;
  readonly inductor?: Partial<Inductor>;
  readonly high?: Partial<Switch>;
  readonly highParallel?: number;
  readonly low?: Partial<Switch>;
  readonly lowParallel?: number;
  readonly diode?: Partial<Diode>;
  readonly controller?: Partial<Controller>;
  readonly outputCeramic?: Partial<Ceramic>;
  readonly outputCount?: number;
  readonly outputBulk?: Bulk;
  readonly outputBulkCount?: number;
  readonly inputCeramic?: Partial<Ceramic>;
  readonly inputCount?: number;
}

/** Where it is to be looked at. */
export interface Where {
  /** V. */
  readonly input: number;
  readonly output: number;
  /** Full-load current of all phases, A. */
  readonly current: number;
  /** −1 … 1; 1 where absent. */
  readonly load?: number;
}

/** A rail that asks for nothing: no tolerances, no limits of the sheet, much board. */
export function plainRail(where: Where, over: Partial<Rail> = {}): Rail {
  const { input, output, current } = where;
  return {
    name: 'plain',
    currency: 'EUR',
    quantity: 1,
    input: {
      minimum: input,
      nominal: input,
      maximum: input,
      sourceResistance: 0,
      sourceInductance: 0,
      takesPower: true,
    },
    output: { minimum: output, nominal: output, maximum: output, current, ripple: 1, battery: false },
    profile: [{ fraction: where.load ?? 1, share: 1 }],
    lightLoad: 'forced-continuous',
    ambient: 298.15,
    airSpeed: 0,
    coolingArea: 1,
    limits: { efficiency: [] },
    avoid: [],
    tolerances: { inductance: 0, capacitance: 0, oscillator: 0, onResistance: 0 },
    derating: { switchVoltage: 1, ceramicVoltage: 1, bulkVoltage: 1, rippleCurrent: 1, temperature: 0 },
    search: {
      architectures: ['buck-synchronous'],
      phases: { minimum: 1, maximum: 8 },
      frequency: { minimum: 1e3, maximum: 1e8 },
      inductance: { minimum: 1e-9, maximum: 1e3 },
      parallelSwitches: 4,
      ceramics: 1000,
      bulks: 100,
    },
    objectives: ['loss', 'volume', 'cost'],
    parts: { tables: [], barred: [], preferred: [] },
    settings: { islands: 1, population: 8, epochGenerations: 1, frontSize: 10 },
    ...over,
  };
}

/** A rail's problem whose tables hold the parts of one hand-made design alone, and that design's genes. */
export function handMade(made: HandMade, rail: Rail): { problem: RailProblem; genes: Float64Array } {
  const architecture = made.architecture ?? 'buck-synchronous';
  const suited: Rail = { ...rail, search: { ...rail.search, architectures: [architecture] } };
  // The ratings only have to let the parts into the catalogue: twice the voltage they see.
  const bus = 2 * rail.input.maximum;
  const out = 2 * rail.output.maximum;
  const high = idealSwitch({ voltageRating: bus, ...made.high, name: 'high' });
  const low = idealSwitch({ voltageRating: bus, ...made.low, name: 'low' });
  const tables: PartsTables = {
    ...NO_TABLES,
    switches: [high, low],
    diodes: [idealDiode({ voltageRating: bus, ...made.diode })],
    inductors: [idealInductor(made.inductor)],
    ceramics: [
      idealCeramic({ voltageRating: out, ...made.outputCeramic, name: 'out' }),
      idealCeramic({ voltageRating: bus, ...made.inputCeramic, name: 'in' }),
    ],
    bulks: made.outputBulk === undefined ? [] : [{ ...made.outputBulk, voltageRating: out, name: 'bulk' }],
    controllers: [idealController(made.controller)],
  };
  const problem = need(createRailProblem(suited, tables));
  const diode = architecture === 'buck-diode';
  const genes = need(
    problem.genesFrom({
      architecture,
      genes: {
        phases: made.phases ?? 1,
        frequency: made.frequency,
        highParallel: made.highParallel ?? 1,
        ...(diode ? {} : { lowParallel: made.lowParallel ?? 1 }),
        outputCeramicCount: made.outputCount ?? 1,
        outputBulkCount: made.outputBulkCount ?? 0,
        inputCeramicCount: made.inputCount ?? 1,
        inputBulkCount: 0,
      },
      parts: {
        highSwitch: 'high',
        ...(diode ? { diode: 'diode' } : { lowSwitch: 'low' }),
        inductor: 'choke',
        controller: 'controller',
        outputCeramic: 'out',
        ...(made.outputBulk === undefined ? {} : { outputBulk: 'bulk' }),
        inputCeramic: 'in',
      },
    }),
  );
  return { problem, genes };
}

/** The whole story of a hand-made design. */
export function assessMade(made: HandMade, rail: Rail): Assessment {
  const { problem, genes } = handMade(made, rail);
  return problem.assess(genes);
}

/** The operating point `where` of a hand-made design with usual values. */
export function pointOf(made: HandMade, where: Where, over: Partial<Rail> = {}): PointReport {
  return assessMade(made, plainRail(where, over)).points[0];
}

/** Watts of `part.effect` in a list of losses; 0 where it is not listed. */
export function watts(losses: readonly LossItem[], part: string, effect: string): number {
  return losses.find((item) => item.part === part && item.effect === effect)?.watts ?? 0;
}

/** The trace `name` of a point. */
export function traceOf(point: PointReport, name: string): Trace {
  const trace = point.traces.find((candidate) => candidate.name === name);
  if (trace === undefined) throw new Error(`no trace ${name}`);
  return trace;
}

/** Mean and rms over the period, and extremes, of a trace's straight lines. */
export function momentsOf(trace: Trace): { mean: number; rms: number; ac: number; peak: number; valley: number } {
  let sum = 0;
  let square = 0;
  const { time, value, period } = trace;
  for (let i = 0; i + 1 < time.length; i++) {
    const d = time[i + 1] - time[i];
    sum += 0.5 * d * (value[i] + value[i + 1]);
    square += (d * (value[i] ** 2 + value[i] * value[i + 1] + value[i + 1] ** 2)) / 3;
  }
  const mean = sum / period;
  const rms = Math.sqrt(square / period);
  const ac = Math.sqrt(Math.max(0, square / period - mean * mean));
  return { mean, rms, ac, peak: Math.max(...value), valley: Math.min(...value) };
}

/** A generator of numbers in [0, 1) that starts from `seed`: a linear congruence (Knuth's MMIX constants, high bits). */
export function randomFrom(seed: number): () => number {
  let state = BigInt(seed);
  return () => {
    state = (state * 6364136223846793005n + 1442695040888963407n) & 0xffffffffffffffffn;
    return Number(state >> 11n) / 2 ** 53;
  };
}

/** A random snapped design of `problem`. */
export function randomGenes(problem: RailProblem, next: () => number): Float64Array {
  const genes = Float64Array.from(problem.genes, ({ kind, low, high }) =>
    kind === 'log' ? low * (high / low) ** next() : low + next() * (high - low),
  );
  problem.snap(genes);
  return genes;
}
