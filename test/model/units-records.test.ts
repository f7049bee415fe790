/**
 * The same proof of units for what works on records: a stage's operating point, its edges, heat, banks, load step. Every number that goes
 * in is rescaled as the unit of its field says, and every number that comes out must be. A field without a unit fails.
 */
import { describe, expect, it } from 'vitest';
import { createBank, setGroup1, setGroup2 } from '../../model/capacitors/index.ts';
import { Design } from '../../model/design.ts';
import * as edgeFigures from '../../model/edge-figures.ts';
import { diodeRecovery, EdgeFigures, lookUpBus, prepareEdges } from '../../model/edge-figures.ts';
import * as edges from '../../model/edges.ts';
import * as flavours from '../../model/flavour.ts';
import { Flavour, prepareResistances } from '../../model/flavour.ts';
import * as loop from '../../model/handoff/loop.ts';
import { loopAt, sourceBehind } from '../../model/handoff/loop.ts';
import * as pulses from '../../model/handoff/netlist/pulses.ts';
import { pulseTimes, startCurrents } from '../../model/handoff/netlist/pulses.ts';
import type { SolvedPoint } from '../../model/handoff/solved-point.ts';
import * as heatBalance from '../../model/heat-balance.ts';
import { HeatBalance, HOT_PARTS, solveHeat } from '../../model/heat-balance.ts';
import * as inputFilter from '../../model/input-filter.ts';
import { filterCurrent, findSourcePath, SourcePath } from '../../model/input-filter.ts';
import * as isolatedEdges from '../../model/isolated-edges.ts';
import { LOSS_SLOTS } from '../../model/ledger.ts';
import { createInductorAtFrequency, prepareInductor } from '../../model/magnetics/index.ts';
import * as modes from '../../model/modes.ts';
import { applyForward, applyReverse, ChokeSteadyState, settleGaps, solveChoke } from '../../model/modes.ts';
import * as legs from '../../model/parts/power-stage.ts';
import { legOf } from '../../model/parts/power-stage.ts';
import { SCHEMAS } from '../../model/parts/schemas.ts';
import type { PartKind } from '../../model/parts/tables.ts';
import { solvePoint } from '../../model/point.ts';
import * as pointBanks from '../../model/point-banks.ts';
import * as pointHeat from '../../model/point-heat.ts';
import * as pointLosses from '../../model/point-losses.ts';
import { PointSolver } from '../../model/point-solver.ts';
import { DIMENSIONS } from '../../model/quantity/dimension.ts';
import type { Rail } from '../../model/rail/rail.ts';
import * as buck from '../../model/stages/buck.ts';
import * as choke from '../../model/stages/choke.ts';
import * as isolated from '../../model/stages/isolated.ts';
import { type Architecture, stageOf } from '../../model/stages/list.ts';
import { StageState } from '../../model/stages/state.ts';
import * as stepResponse from '../../model/step-response.ts';
import { findStepExcursion, StepCase } from '../../model/step-response.ts';
import * as transformers from '../../model/transformer.ts';
import { Transformer } from '../../model/transformer.ts';
import * as woundChoke from '../../model/wound-choke.ts';
import { type Base, FACTORS, type FieldUnits, factorOf, misfits, rescaled } from './dimensions.ts';
import { builtInTables } from './shipped.ts';
import { plainRail } from './support.ts';

/** Units of `fields`, all the same. */
function all(unit: string, ...fields: string[]): FieldUnits {
  return Object.fromEntries(fields.map((field) => [field, unit]));
}

/** Units of a row of a parts table, from the table's own columns; boxes and fitted coefficients beside. */
function rowUnits(kind: PartKind): FieldUnits {
  const columns = Object.entries<{ dimension?: keyof typeof DIMENSIONS }>(SCHEMAS[kind].columns);
  const units = columns.map(([field, { dimension }]) => {
    const unit = dimension === undefined ? '' : DIMENSIONS[dimension].unit;
    return [field, unit === '' ? '1' : unit];
  });
  return Object.fromEntries(units);
}

const STATE: FieldUnits = {
  ...all('V', 'inputVoltage', 'outputVoltage', 'rectifierVoltage'),
  ...all('A', 'loadCurrent', 'meanCurrent', 'rippleCurrent', 'peakCurrent', 'valleyCurrent'),
  ...all('A', 'lowMean', 'highMean', 'magnetizingPeak'),
  ...all('A²', 'chokeMeanSquare', 'highMeanSquare', 'lowMeanSquare', 'primaryMeanSquare', 'secondaryMeanSquare'),
  ...all('H', 'inductance', 'effectiveInductance'),
  ...all('Ω', 'highResistance', 'lowResistance', 'pathResistance', 'primaryResistance', 'secondaryResistance'),
  ...all('K', 'highTemperature', 'lowTemperature', 'inductorTemperature', 'transformerTemperature', 'boardTemperature'),
  ...all('1', 'activePhases', 'resistanceScale', 'mode', 'highShare', 'lowShare', 'dutyCycle', 'fluxRamp', 'lostDuty'),
  ...all('1', 'highDevices', 'lowDevices', 'chokes', 'drawCopies'),
  frequency: 'Hz',
  fluxSwing: 'T',
};
const CURRENT_WAVE: FieldUnits = { period: 's', count: '1', duration: 's', start: 'A', end: 'A' };
const STEADY: FieldUnits = {
  ...all('V', 'rise', 'fall', 'gapFall', 'gapRise', 'gapVolts'),
  ...all('A', 'current', 'gapCurrent', 'waitCurrent', 'ripple'),
  ...all('Hz', 'frequency', 'effectiveFrequency'),
  ...all('1', 'mode', 'riseShare', 'fallShare', 'dutyCycle'),
  gapTurn: 'Ω',
  inductance: 'H',
  shortestRise: 's',
};
const EDGES: FieldUnits = {
  ...all('s', 'onTime', 'offTime'),
  ...all('s/A', 'onSlope', 'offSlope'),
  ...all('C', 'gateCharge', 'gateSpared', 'charge'),
  ...all('V', 'bodyDrop', 'volts'),
  ...all('1', 'dice', 'exponent', 'inverseExponent', 'known'),
  energy: 'J',
  recovery: 'C/A',
};
const HEAT: FieldUnits = {
  ...all('W', 'constant', 'boardConstant', 'total'),
  ...all('W/K', 'slope', 'faces', 'boardSlope', 'conductance', 'sinkNeeded'),
  ...all('K/W', 'resistance'),
  ...all('K', 'allowed', 'boardAllowed', 'outputBulkRise', 'inputBulkRise', 'ambient', 'temperature'),
  ...all('K', 'boardTemperature'),
  runaway: '1',
};
const RIPPLE: FieldUnits = { ...all('V', 'highest', 'lowest', 'ripple'), ...all('A²', 'meanSquare1', 'meanSquare2') };
const BANK: FieldUnits = { ...all('F', 'c1', 'c2'), ...all('Ω', 'r1', 'r2'), ...all('H', 'l1', 'l2') };
const TRANSFORMER: FieldUnits = {
  ...all('m', 'length', 'width', 'height'),
  ...all('m²', 'area', 'minimumArea'),
  ...all('H', 'magnetizing', 'leakage'),
  ...all('Ω', 'primaryResistance', 'secondaryResistance'),
  ...all('1', 'primaryTurns', 'secondaryTurns', 'ratio', 'primaryFactor', 'secondaryFactor', 'fill'),
  ...all('1', 'frequencyExponent', 'fluxExponent', 'primaryParallel', 'secondaryParallel'),
  mass: 'kg',
  // Fitted: rescaled beside, where it plays a part.
  coreScale: '1',
  surfaceResistance: 'K/W',
  maximumTemperature: 'K',
};
const LEDGER: FieldUnits = { watts: 'W' };

const tables = builtInTables();
const first = <T>(rows: readonly T[], suits: (row: T) => boolean): T => {
  const row = rows.find(suits);
  if (row === undefined) throw new Error('no row of the built-in tables suits');
  return row;
};
const SWITCH = first(tables.switches, (row) => row.technology === 'si' && row.voltageRating === 60);
const DIODE = first(tables.diodes, (row) => row.technology === 'junction' && row.recoveryCharge > 0);
const INDUCTOR = first(tables.inductors, (row) => row.inductance > 3e-6 && row.saturationCurrent > 15);
const CONTROLLER = first(tables.controllers, (row) => row.linearDriveSupply);
const MATERIAL = first(tables.materials, (row) => row.kind === 'MnZn');

/** Where a stage is put to the test, on 48 V; half bridges on twice that. */
interface Setting {
  readonly what: string;
  readonly architecture: Architecture;
  /** Load of two phases, A. */
  readonly load: number;
  readonly emulates?: boolean;
  readonly shifted?: boolean;
  /** s. */
  readonly shortestOnTime?: number;
}

const ISOLATED: readonly Architecture[] = [
  'two-switch-forward',
  'half-bridge-centre-tap',
  'half-bridge-current-doubler',
  'full-bridge-centre-tap',
  'full-bridge-current-doubler',
];

const SETTINGS: readonly Setting[] = [
  { what: 'continuous', architecture: 'buck-synchronous', load: 20 },
  { what: 'below zero at the valley', architecture: 'buck-synchronous', load: 2 },
  { what: 'discontinuous', architecture: 'buck-synchronous', load: 1, emulates: true },
  { what: 'skipping', architecture: 'buck-synchronous', load: 0.02, emulates: true, shortestOnTime: 3e-7 },
  { what: 'reverse', architecture: 'buck-synchronous', load: -14 },
  { what: 'continuous', architecture: 'buck-diode', load: 20 },
  { what: 'discontinuous', architecture: 'buck-diode', load: 1 },
  ...ISOLATED.flatMap((architecture): Setting[] => [
    { what: 'continuous', architecture, load: 20 },
    { what: 'light load', architecture, load: 1.5, emulates: true },
  ]),
  { what: 'shifted', architecture: 'full-bridge-centre-tap', load: 20, shifted: true },
  { what: 'shifted', architecture: 'full-bridge-current-doubler', load: 20, shifted: true },
];

/** Everything that a stage is solved with, rescaled. */
interface Bench {
  readonly design: Design;
  readonly state: StageState;
}

function transformerOf(base: Base): Transformer {
  const t = Object.assign(new Transformer(), {
    ratio: 3,
    primaryTurns: 9,
    secondaryTurns: 3,
    area: 1e-4,
    minimumArea: 9e-5,
    magnetizing: 4e-4,
    leakage: 3e-7,
    primaryResistance: 0.012,
    secondaryResistance: 2e-3,
    primaryFactor: 1.8,
    secondaryFactor: 2.2,
    fluxExponent: 2.5,
    frequencyExponent: 1.4,
    surfaceResistance: 12,
  });
  const copy = rescaled(t, TRANSFORMER, base);
  // W at 1 T: what is fitted in SI units scales with the power of flux that it leaves out.
  copy.coreScale = 60 * factorOf('W', FACTORS[base]) * factorOf('T', FACTORS[base]) ** -2.5;
  return copy;
}

function inductorOf(base: Base) {
  const row = rescaled(INDUCTOR, { ...rowUnits('inductors'), coreCoefficient: '1' }, base);
  const fitted = factorOf('W', FACTORS[base]) * factorOf('A', FACTORS[base]) ** -INDUCTOR.coreSwingExponent;
  return { ...row, coreCoefficient: row.coreCoefficient * fitted };
}

function designOf(setting: Setting, base: Base): Design {
  const by = (value: number, unit: string): number => value * factorOf(unit, FACTORS[base]);
  const stage = stageOf(setting.architecture);
  if (stage === undefined) throw new Error(`no stage ${setting.architecture}`);
  const row = rescaled(SWITCH, rowUnits('switches'), base);
  const driver = rescaled(CONTROLLER, rowUnits('controllers'), base);
  const inductor = inductorOf(base);
  const inductorAt = createInductorAtFrequency();
  prepareInductor(inductor, by(stage.chokeMultiple * 3e5, 'Hz'), 330, inductorAt);
  const design: Design = Object.assign(Object.create(Design.prototype), {
    stage,
    phases: 2,
    frequency: by(3e5, 'Hz'),
    inductor,
    inductance: inductor.inductance,
    inductorAt,
    inductorThermalResistance: by(30, 'K/W'),
    inductorFaces: by(0.004, 'W/K'),
    high: row,
    highParallel: 1,
    low: row,
    lowParallel: 2,
    diode: stage.diode ? rescaled(DIODE, rowUnits('diodes'), base) : undefined,
    controller: driver,
    driver,
    shortestOnTime: by(setting.shortestOnTime ?? 0, 's'),
    gap: stage.diode ? 0 : by(2e-8, 's'),
    gapCurrent: by(1.5, 'A'),
    emulates: setting.emulates ?? false,
    phaseShifted: setting.shifted ?? false,
    transformer: transformerOf(base),
    transformerChoice: stage.form === undefined ? undefined : { material: MATERIAL },
    dividerCount: stage.form?.share === 0.5 ? 4 : 0,
    dividerResistance: by(5e-4, 'Ω'),
    highEdges: new EdgeFigures(),
    lowEdges: new EdgeFigures(),
  });
  prepareEdges(design.highEdges, row, design.highParallel, driver);
  prepareEdges(design.lowEdges, row, design.lowParallel, driver);
  return design;
}

/** Output for a duty near 0.3 of one switch. */
function outputOf({ architecture }: Setting): number {
  if (architecture.startsWith('buck')) return 14;
  return architecture.endsWith('centre-tap') ? 9 : 4.5;
}

function inputOf({ architecture }: Setting): number {
  return architecture.startsWith('half') ? 96 : 48;
}

function benchOf(setting: Setting, base: Base): Bench {
  const design = designOf(setting, base);
  const state = Object.assign(new StageState(), {
    inputVoltage: inputOf(setting),
    outputVoltage: outputOf(setting),
    loadCurrent: setting.load,
    activePhases: 2,
    inductance: INDUCTOR.inductance * 0.9,
    highResistance: 0.012,
    lowResistance: 0.004,
    pathResistance: 0.006,
    primaryResistance: 0.02,
    secondaryResistance: 0.004,
  });
  const { choke, draw, ...numbers } = rescaled(state, STATE, base);
  Object.assign(state, numbers);
  design.stage.solve(design, state);
  return { design, state };
}

/** Waveforms of a state, with its numbers. */
function misfitsOfState(plain: StageState, other: StageState, base: Base): string[] {
  return [
    ...misfits(plain, other, STATE, base),
    ...misfits(plain.choke, other.choke, CURRENT_WAVE, base).map((text) => `choke ${text}`),
    ...misfits(plain.draw, other.draw, CURRENT_WAVE, base).map((text) => `draw ${text}`),
  ];
}

const named = SETTINGS.map((setting) => [`${setting.architecture}, ${setting.what}`, setting] as const);

describe('A solved stage scales field by field', () => {
  it.each(named)('%s', (_, setting) => {
    const plain = benchOf(setting, 'plain').state;
    expect(misfitsOfState(plain, benchOf(setting, 'kelvin').state, 'kelvin')).toEqual([]);
  });

  it('the settings reach every mode', () => {
    const modes = new Set(SETTINGS.map((setting) => benchOf(setting, 'plain').state.mode));
    expect([...modes].sort()).toEqual([0, 1, 2, 3, 4]);
  });

  it('and a current posing as a voltage is noticed', () => {
    const plain = benchOf(SETTINGS[0], 'plain').state;
    const other = benchOf(SETTINGS[0], 'kelvin').state;
    expect(misfits(plain, other, { ...STATE, peakCurrent: 'V' }, 'kelvin')).toHaveLength(1);
  });
});

describe('Switching losses of a stage scale as watts, its loop inductance held', () => {
  it.each(named)('%s', (_, setting) => {
    const lossesOf = (base: Base): { watts: Float64Array } => {
      const { design, state } = benchOf(setting, base);
      const watts = new Float64Array(LOSS_SLOTS.length);
      design.stage.addEdgeLosses(design, state, watts);
      return { watts };
    };
    const plain = lossesOf('plain');
    expect(plain.watts.some((watts) => watts > 0)).toBe(true);
    expect(misfits(plain, lossesOf('henry'), LEDGER, 'henry')).toEqual([]);
  });
});

describe('The choke between two voltages', () => {
  const cases = { continuous: [4, false, 0], forced: [0.2, false, 0], discontinuous: [0.2, true, 0] } as const;
  const more = { skipping: [0.05, true, 6e-7] } as const;
  const solved = ([current, blocking, shortestRise]: readonly [number, boolean, number], base: Base) => {
    const s = Object.assign(new ChokeSteadyState(), { rise: 30, fall: 12, current, inductance: 1e-5, frequency: 4e5 });
    Object.assign(s, { blocking, shortestRise, gapFall: 0.01, gapRise: 0.012, gapCurrent: 0.5, waitCurrent: 0.1 });
    s.gapTurn = 0.002;
    const copy = rescaled(s, STEADY, base);
    solveChoke(copy);
    settleGaps(copy);
    solveChoke(copy);
    const [forward, reverse] = [new StageState(), new StageState()];
    applyForward(copy, forward);
    applyReverse(copy, reverse);
    return { copy, forward, reverse };
  };
  /** What the two copies write. */
  const written = ({ valleyCurrent, peakCurrent, rippleCurrent, highShare, lowShare, frequency }: StageState) => {
    return { valleyCurrent, peakCurrent, rippleCurrent, highShare, lowShare, frequency };
  };
  it.each(Object.entries({ ...cases, ...more }))('%s', (_, given) => {
    const plain = solved(given, 'plain');
    const other = solved(given, 'free');
    expect(misfits(plain.copy, other.copy, STEADY, 'free')).toEqual([]);
    expect(misfits(written(plain.forward), written(other.forward), STATE, 'free')).toEqual([]);
    expect(misfits(written(plain.reverse), written(other.reverse), STATE, 'free')).toEqual([]);
  });
});

describe('Edge figures of a switch position', () => {
  const figures = (base: Base): EdgeFigures => {
    const f = new EdgeFigures();
    const driver = rescaled(CONTROLLER, rowUnits('controllers'), base);
    prepareEdges(f, rescaled(SWITCH, rowUnits('switches'), base), 3, driver);
    f.volts = 37 * factorOf('V', FACTORS[base]);
    lookUpBus(f);
    // Numbers of unlike unit in one array: looked at as the fields that they are copied to.
    f.kept.fill(0);
    return f;
  };
  it('scale field by field', () => {
    expect(misfits(figures('plain'), figures('free'), { ...EDGES, kept: '1' }, 'free')).toEqual([]);
  });
  it('and the recovery charge of a diode over its current', () => {
    const other = diodeRecovery(rescaled(DIODE, rowUnits('diodes'), 'free'));
    expect(other / (diodeRecovery(DIODE) * factorOf('C/A', FACTORS.free))).toBeCloseTo(1, 12);
  });
  it('a power stage told as a leg keeps its edge times', () => {
    const row = tables.powerStages[0];
    const leg = legOf(row);
    const f = new EdgeFigures();
    prepareEdges(f, leg.high, 1, leg.driver);
    expect(f.onTime / row.turnOnTime).toBeCloseTo(1, 9);
    expect(f.offTime / row.turnOffTime).toBeCloseTo(1, 9);
  });
});

describe('The balance of heat', () => {
  const solved = (base: Base): HeatBalance => {
    const h = new HeatBalance();
    h.constant.set([3, 2, 1.5, 0.8]);
    h.slope.set([0.01, 0.006, 0.004, 0.001]);
    h.resistance.set([3, 2, 12, 15]);
    h.faces.set([0, 0, 0.01, 0]);
    h.allowed.set([350, 360, 370, 400].slice(0, HOT_PARTS));
    h.toAir[3] = 1;
    Object.assign(h, { boardConstant: 0.7, boardSlope: 0.002, boardAllowed: 378, conductance: 0.15, ambient: 310 });
    const copy = rescaled(h, HEAT, base);
    solveHeat(copy);
    return copy;
  };
  it('scales field by field', () => {
    const plain = solved('plain');
    expect(plain.sinkNeeded).toBeGreaterThan(0);
    expect(misfits(plain, solved('kelvin'), HEAT, 'kelvin')).toEqual([]);
  });
});

/** A bank of one group, or of two. */
function bankOf(two: boolean, base: Base) {
  const bank = createBank();
  setGroup1(bank, 4, 2.2e-5, 3e-3, 5e-10);
  if (two) setGroup2(bank, 1, 4.7e-4, 1.2e-2, 3e-9);
  return rescaled(bank, BANK, base);
}

describe('The load step', () => {
  const excursion = (two: boolean, base: Base): object => {
    const by = (value: number, unit: string): number => value * factorOf(unit, FACTORS[base]);
    const at = Object.assign(new StepCase(), {
      inputVoltage: by(48, 'V'),
      outputVoltage: by(14, 'V'),
      inductance: by(5e-6, 'H'),
      ripple: by(0.05, 'V'),
      bank: bankOf(two, base),
    });
    const step = { current: by(8, 'A'), slew: by(4e6, 'A/s'), deviation: by(0.5, 'V') };
    findStepExcursion(designOf(SETTINGS[0], base), step, at);
    return { excursion: at.excursion, release: at.release, bandwidth: at.bandwidth };
  };
  it.each([false, true])('scales as volts (two groups: %s)', (two) => {
    const units = all('V', 'excursion', 'release', 'bandwidth');
    expect(misfits(excursion(two, 'plain'), excursion(two, 'kelvin'), units, 'kelvin')).toEqual([]);
  });
});

/** The plain rail at one place, rescaled. */
function railOf(setting: Setting, base: Base): Rail {
  const by = (value: number, unit: string): number => value * factorOf(unit, FACTORS[base]);
  const where = { input: by(inputOf(setting), 'V'), output: by(outputOf(setting), 'V'), current: by(20, 'A') };
  const rail = plainRail(where);
  const source = { sourceResistance: by(0.02, 'Ω'), sourceInductance: by(2e-7, 'H') };
  return { ...rail, input: { ...rail.input, ...source } };
}

describe('The input filter', () => {
  const found = (base: Base): object => {
    const path = new SourcePath();
    const design = Object.assign(designOf(SETTINGS[0], base), { filterChoke: inductorOf(base) });
    const rail = railOf(SETTINGS[0], base);
    findSourcePath(path, design, rail, bankOf(true, base));
    return { ...path, current: filterCurrent(rail) };
  };
  it('scales field by field', () => {
    const units = { ...all('Ω', 'resistance', 'peak'), inductance: 'H', current: 'A' };
    expect(misfits(found('plain'), found('kelvin'), units, 'kelvin')).toEqual([]);
  });
});

describe('A whole operating point with its heat: rescaled by the ampere, for board copper, windings and core loss are fitted in SI units', () => {
  const solved = (setting: Setting, base: Base): PointSolver => {
    const by = (value: number, unit: string): number => value * factorOf(unit, FACTORS[base]);
    const design = designOf(setting, base);
    const solver = new PointSolver(railOf(setting, base), new HeatBalance());
    solver.conductance = by(0.4, 'W/K');
    const { choke, draw, ...untouched } = rescaled(new StageState(), STATE, base);
    Object.assign(solver.state, untouched);
    const flavour = new Flavour(true);
    flavour.inductance = 0.9 * design.inductance;
    flavour.resistanceScale = 1.2;
    Object.assign(flavour.output, bankOf(true, base));
    Object.assign(flavour.input, bankOf(false, base));
    prepareResistances(flavour, design);
    const place = { inputVoltage: by(inputOf(setting), 'V'), outputVoltage: by(outputOf(setting), 'V') };
    solvePoint(solver, design, flavour, { ...place, load: setting.load / 20, share: 1 }, 2);
    return solver;
  };
  it.each(named)('%s', (_, setting) => {
    const [plain, other] = [solved(setting, 'plain'), solved(setting, 'ampere')];
    expect(plain.loss).toBeGreaterThan(0);
    expect([
      ...misfits({ watts: plain.ledger }, { watts: other.ledger }, LEDGER, 'ampere'),
      ...misfits(plain.heat, other.heat, HEAT, 'ampere'),
      ...misfits(plain.outputRipple, other.outputRipple, RIPPLE, 'ampere'),
      ...misfits(plain.inputRipple, other.inputRipple, RIPPLE, 'ampere'),
      ...misfitsOfState(plain.state, other.state, 'ampere'),
    ]).toEqual([]);
  });
});

/** What the hand-off reads of a solved point. */
function pointOf(setting: Setting, base: Base): SolvedPoint {
  const { design, state } = benchOf(setting, base);
  const rail = railOf(setting, base);
  const solver = new PointSolver(rail, new HeatBalance());
  const planned = { inputVoltage: state.inputVoltage, outputVoltage: state.outputVoltage, load: 1, share: 1 };
  const [output, input] = [bankOf(true, base), bankOf(false, base)];
  return { rail, design, planned, state, solver, flavour: new Flavour(false), output, input };
}

describe('Figures of the hand-off', () => {
  const bridges = named.filter(([, { architecture }]) => !architecture.startsWith('buck'));
  it.each(bridges)('pulse times and starting currents: %s', (_, setting) => {
    const timed = (base: Base) => {
      const point = pointOf(setting, base);
      const times = pulseTimes(point);
      return { times, currents: startCurrents(point, times, 0.13 * times.period) };
    };
    const [plain, other] = [timed('plain'), timed('kelvin')];
    const times = all('s', 'period', 'pulse', 'commutation', 'gap');
    const currents = all('A', 'primary', 'magnetizing', 'first', 'second', 'winding');
    expect(misfits(plain.times, other.times, times, 'kelvin')).toEqual([]);
    expect(misfits(plain.currents, other.currents, currents, 'kelvin')).toEqual([]);
  });
  it('the loop, for a ramp of one volt', () => {
    const looped = (base: Base) => {
      const point = pointOf(SETTINGS[0], base);
      const { plant, crossover, phaseMargin } = loopAt(point);
      return { ...plant, crossover, phaseMargin, source: sourceBehind(point) };
    };
    const units = {
      ...all('Ω', 'seriesResistance', 'loadResistance', 'pathResistance'),
      ...all('V', 'gain', 'source'),
      inductance: 'H',
      capacitance: 'F',
      delay: 's',
      crossover: 'Hz',
      phaseMargin: '1',
    };
    expect(misfits(looped('plain'), looped('volt'), units, 'volt')).toEqual([]);
  });
});

/** What each function of the files on records is proved through, or why it cannot be rescaled. */
const PROVED: Readonly<Record<string, string>> = {
  solveChoke: 'The choke between two voltages',
  settleGaps: 'The choke between two voltages',
  applyForward: 'The choke between two voltages',
  applyReverse: 'The choke between two voltages',
  buckDuty: 'units.test.ts',
  buckBlocking: 'units.test.ts',
  isolatedDuty: 'units.test.ts',
  rectifierVoltage: 'units.test.ts',
  filterInductance: 'units.test.ts',
  solveBentChoke: 'A solved stage',
  solveIsolated: 'A solved stage',
  leakageTurns: 'A solved stage',
  turnPace: 'Figures of the hand-off',
  addEdgeLosses: 'Switching losses of a stage',
  addIsolatedEdges: 'Switching losses of a stage',
  prepareEdges: 'Edge figures',
  lookUpBus: 'Edge figures',
  diodeRecovery: 'Edge figures',
  legOf: 'Edge figures',
  solveHeat: 'The balance of heat',
  findStepExcursion: 'The load step',
  findSourcePath: 'The input filter',
  filterCurrent: 'The input filter',
  solveBanks: 'A whole operating point',
  addBanks: 'A whole operating point',
  prepareHeat: 'A whole operating point',
  takeResistances: 'A whole operating point',
  balanceHeat: 'A whole operating point',
  findBulkRises: 'A whole operating point',
  settleLosses: 'A whole operating point',
  addOtherLosses: 'A whole operating point',
  prepareResistances: 'A whole operating point',
  loopAt: 'Figures of the hand-off',
  sourceBehind: 'Figures of the hand-off',
  pulseTimes: 'Figures of the hand-off',
  startCurrents: 'Figures of the hand-off',
  windTransformer:
    'copper, air, permeability of nothing and insulation in metres fix all five units; its formulas stand in units.test.ts',
  windChoke: 'as windTransformer',
  windingDepth: 'resistivity of one metal',
  knownSurface: 'takes powers by surfacePower, which is a fit for air',
  prepareFlavour: 'takes capacitances by ceramicCapacitance, which stands in units.test.ts',
  isolatedRefusal: 'words',
  chooseFilterChoke: 'compares',
};

describe('No function on records is left out silently', () => {
  const files = [modes, buck, choke, isolated, edges, isolatedEdges, edgeFigures, heatBalance, stepResponse];
  const more = [
    inputFilter,
    pointBanks,
    pointHeat,
    pointLosses,
    flavours,
    transformers,
    woundChoke,
    loop,
    pulses,
    legs,
  ];
  const names = [...files, ...more].flatMap((file) =>
    Object.entries(file).flatMap(([name, value]) =>
      typeof value === 'function' && !/^class /.test(String(value)) ? [name] : [],
    ),
  );
  it.each(names)('%s', (name) => expect(Object.keys(PROVED)).toContain(name));
  it('and none is listed that is not there', () => {
    expect(Object.keys(PROVED).filter((name) => !names.includes(name))).toEqual([]);
  });
});
