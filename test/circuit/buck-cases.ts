/** Bucks for the circuit simulator, each with the element values and the timing that the model has. */
import { measure, sample, type Waveform } from '../../model/waveform/index.ts';
import { type Group, type Resistances, rippleOf, solveStage, summed } from '../model/stage-support.ts';
import type { HandMade, Where } from '../model/support.ts';
import { type CircuitCase, type Figure, TOLERANCE } from './case.ts';
import { meanOf, powerOf, rippleOfRun, rmsOf, vector } from './measure.ts';
import { Netlist } from './netlist.ts';

/** Drop of the body diodes, which conduct only while both switches are off, V. */
const BODY_DROP = 0.7;

interface BuckCase {
  readonly name: string;
  readonly phases: number;
  readonly frequency: number;
  readonly inductance: number;
  readonly where: Where;
  readonly ohms: Required<Resistances>;
  /** Forward drop where the low position is a diode, V. */
  readonly drop?: number;
  /** Whether the low switch turns off at zero current. */
  readonly emulates?: boolean;
  readonly bank: readonly [Group] | readonly [Group, Group];
}

const CASES: readonly BuckCase[] = [
  {
    name: 'buck ×1, continuous, 12 V to 3.3 V, 10 A',
    phases: 1,
    frequency: 500e3,
    inductance: 1.5e-6,
    where: { input: 12, output: 3.3, current: 10 },
    ohms: { high: 10e-3, low: 6e-3, path: 5e-3 },
    bank: [[47e-6, 2e-3, 0]],
  },
  {
    name: 'buck ×2, continuous, 12 V to 1.8 V, 30 A',
    phases: 2,
    frequency: 400e3,
    inductance: 0.6e-6,
    where: { input: 12, output: 1.8, current: 30 },
    ohms: { high: 6e-3, low: 3e-3, path: 2e-3 },
    bank: [[100e-6, 1e-3, 0]],
  },
  {
    name: 'buck ×3, continuous, 12 V to 1.2 V, 45 A',
    phases: 3,
    frequency: 600e3,
    inductance: 0.3e-6,
    where: { input: 12, output: 1.2, current: 45 },
    ohms: { high: 4e-3, low: 2e-3, path: 1e-3 },
    bank: [[150e-6, 0.5e-3, 0]],
  },
  {
    name: 'buck ×4, continuous, 48 V to 9 V, 40 A',
    phases: 4,
    frequency: 200e3,
    inductance: 8e-6,
    where: { input: 48, output: 9, current: 40 },
    ohms: { high: 12e-3, low: 8e-3, path: 6e-3 },
    bank: [[40e-6, 2e-3, 0]],
  },
  {
    name: 'buck ×1, diode, continuous, 24 V to 5 V, 3 A',
    phases: 1,
    frequency: 250e3,
    inductance: 15e-6,
    where: { input: 24, output: 5, current: 3 },
    ohms: { high: 50e-3, low: 20e-3, path: 25e-3 },
    drop: 0.4,
    bank: [[47e-6, 5e-3, 0]],
  },
  {
    name: 'buck ×1, diode, discontinuous, 12 V to 5 V, 0.5 A',
    phases: 1,
    frequency: 200e3,
    inductance: 4.7e-6,
    where: { input: 12, output: 5, current: 0.5 },
    ohms: { high: 50e-3, low: 20e-3, path: 25e-3 },
    drop: 0.4,
    bank: [[22e-6, 5e-3, 0]],
  },
  {
    name: 'buck ×1, diode emulation, discontinuous, 12 V to 3.3 V, 0.6 A',
    phases: 1,
    frequency: 500e3,
    inductance: 1.5e-6,
    where: { input: 12, output: 3.3, current: 0.6 },
    ohms: { high: 10e-3, low: 6e-3, path: 5e-3 },
    emulates: true,
    bank: [[22e-6, 2e-3, 0]],
  },
  {
    name: 'buck ×1, forced continuous with a negative valley, 12 V to 3.3 V, 0.5 A',
    phases: 1,
    frequency: 500e3,
    inductance: 1.5e-6,
    where: { input: 12, output: 3.3, current: 0.5 },
    ohms: { high: 10e-3, low: 6e-3, path: 5e-3 },
    bank: [[47e-6, 2e-3, 0]],
  },
  {
    name: 'buck ×2, reverse, 12.8 V back to 48 V, 20 A',
    phases: 2,
    frequency: 100e3,
    inductance: 10e-6,
    where: { input: 48, output: 12.8, current: 20, load: -1 },
    ohms: { high: 8e-3, low: 6e-3, path: 5e-3 },
    bank: [[100e-6, 3e-3, 0]],
  },
  {
    name: 'buck ×2, ceramic and bulk at the output, 12 V to 5 V, 16 A',
    phases: 2,
    frequency: 300e3,
    inductance: 2.2e-6,
    where: { input: 12, output: 5, current: 16 },
    ohms: { high: 10e-3, low: 8e-3, path: 5e-3 },
    bank: [
      [20e-6, 1e-3, 0],
      [100e-6, 12e-3, 0],
    ],
  },
  {
    // The bank's steps reach a load of 0.36 Ω: the model leaves out the ripple current that the load itself takes (at 15 A,
    // 0.12 Ω, that would be 5 % of the ripple).
    name: 'buck ×1, capacitor with 1 nH, 12 V to 1.8 V, 5 A',
    phases: 1,
    frequency: 500e3,
    inductance: 0.6e-6,
    where: { input: 12, output: 1.8, current: 5 },
    ohms: { high: 6e-3, low: 3e-3, path: 2e-3 },
    bank: [[100e-6, 2e-3, 1e-9]],
  },
];

/** Periods until the start is forgotten: the output filters below ring for about twenty and lose half in each ring. */
const PERIODS = 240;

/** Every buck as a circuit with the model's figures. */
export function buckCases(): CircuitCase[] {
  return CASES.map(buckCase);
}

function buckCase(buck: BuckCase): CircuitCase {
  const state = solved(buck);
  const period = 1 / state.frequency;
  const netlist = new Netlist();
  netlist.voltage('in', 'in', '0', buck.where.input);
  for (let k = 0; k < buck.phases; k++) addPhase(netlist, buck, state, k);
  addOutput(netlist, buck);
  return { name: buck.name, netlist: netlist.finish(buck.name, period, PERIODS), figures: figures(buck, state) };
}

type State = ReturnType<typeof solveStage>;

function solved(buck: BuckCase): State {
  const made: HandMade = {
    architecture: buck.drop === undefined ? 'buck-synchronous' : 'buck-diode',
    phases: buck.phases,
    frequency: buck.frequency,
    inductor: { inductance: buck.inductance },
    diode: { forwardDrop: buck.drop ?? 0 },
  };
  const lightLoad = buck.emulates === true ? 'diode-emulation' : 'forced-continuous';
  return solveStage(made, buck.where, buck.ohms, { lightLoad });
}

function addPhase(netlist: Netlist, buck: BuckCase, state: State, k: number): void {
  const { ohms } = buck;
  const period = 1 / state.frequency;
  const shift = (k * period) / buck.phases;
  const on = state.highShare * period;
  const off = (state.highShare + state.lowShare) * period;
  netlist.meter(`h${k}`, 'in', `in${k}`);
  netlist.gate(`gh${k}`, shift, shift + on, period);
  netlist.switched(`h${k}`, `in${k}`, `sw${k}`, `gh${k}`, ohms.high);
  netlist.meter(`l${k}`, `gnd${k}`, `sw${k}`);
  if (buck.drop !== undefined) netlist.diode(`l${k}`, '0', `gnd${k}`, buck.drop, ohms.low);
  else if (buck.emulates === true) {
    netlist.gate(`gl${k}`, shift + on, shift + off, period);
    netlist.switched(`l${k}`, '0', `gnd${k}`, `gl${k}`, ohms.low);
    netlist.diode(`bl${k}`, '0', `sw${k}`, BODY_DROP, 1e-3);
    netlist.diode(`bh${k}`, `sw${k}`, 'in', BODY_DROP, 1e-3);
  } else netlist.complement(`l${k}`, '0', `gnd${k}`, `gh${k}`, ohms.low);
  netlist.inductor(`${k}`, `sw${k}`, `x${k}`, buck.inductance, sample(state.choke, period - shift));
  netlist.meter(`c${k}`, `x${k}`, `y${k}`);
  netlist.resistor(`p${k}`, `y${k}`, 'out', ohms.path);
  for (const node of [`sw${k}`, `gnd${k}`, `y${k}`]) netlist.keep(node);
}

function addOutput(netlist: Netlist, buck: BuckCase): void {
  const { output, current, load = 1 } = buck.where;
  for (const [g, [farads, ohms, henries]] of buck.bank.entries()) {
    netlist.capacitor(`o${g}`, `o${g}`, '0', farads, output);
    const end = henries > 0 ? `oe${g}` : 'out';
    netlist.resistor(`o${g}`, end, `o${g}`, ohms);
    if (henries > 0) netlist.inductor(`o${g}`, 'out', end, henries, 0);
  }
  // A load takes current as a resistance, which damps the filter; a source of power drives it as a current with the same damping.
  const sink = (load * current) / output;
  if (sink > 0) netlist.resistor('load', 'out', '0', 1 / sink);
  else {
    const damping = output / current;
    netlist.resistor('load', 'out', '0', damping);
    netlist.current('source', '0', 'out', -load * current + output / damping);
  }
  netlist.keep('out');
  netlist.keep('in');
}

function figures(buck: BuckCase, state: State): Figure[] {
  const n = buck.phases;
  const phases = Array.from({ length: n }, (_, k) => k);
  const [first, second] = buck.bank;
  const { ohms, drop = 0 } = buck;
  const loss =
    state.highMeanSquare * ohms.high +
    state.lowMeanSquare * ohms.low +
    state.chokeMeanSquare * ohms.path +
    state.lowMean * drop;
  const rms = (quantity: string, model: number, meter: string): Figure => ({
    quantity,
    unit: 'A',
    model,
    tolerance: TOLERANCE.rms,
    measure: (run) => rmsOf(run, vector(run, `i(v${meter}0)`)),
  });
  return [
    {
      quantity: 'mean output voltage',
      unit: 'V',
      model: buck.where.output,
      tolerance: TOLERANCE.mean,
      measure: (run) => meanOf(run, vector(run, 'v(out)')),
    },
    {
      quantity: 'output ripple',
      unit: 'V',
      model: rippleOf(summed(state.choke, n), first, second).ripple,
      tolerance: TOLERANCE.ripple,
      measure: (run) => rippleOfRun(vector(run, 'v(out)')),
    },
    {
      quantity: 'inductor ripple',
      unit: 'A',
      model: swing(state.choke),
      tolerance: TOLERANCE.ripple,
      measure: (run) => rippleOfRun(vector(run, 'i(vc0)')),
    },
    rms('inductor rms', Math.sqrt(state.chokeMeanSquare), 'c'),
    rms('high switch rms', Math.sqrt(state.highMeanSquare), 'h'),
    rms(drop > 0 ? 'diode rms' : 'low switch rms', Math.sqrt(state.lowMeanSquare), 'l'),
    {
      quantity: 'conduction loss',
      unit: 'W',
      model: n * loss,
      tolerance: TOLERANCE.conduction,
      measure: (run) => {
        const v = (node: string): readonly number[] => vector(run, `v(${node})`);
        const ground = v('out').map(() => 0);
        const one = (k: number): number =>
          powerOf(run, v('in'), v(`sw${k}`), vector(run, `i(vh${k})`)) +
          powerOf(run, ground, v(`gnd${k}`), vector(run, `i(vl${k})`)) +
          powerOf(run, v(`y${k}`), v('out'), vector(run, `i(vc${k})`));
        return phases.reduce((sum, k) => sum + one(k), 0);
      },
    },
  ];
}

function swing(w: Waveform): number {
  const into = new Float64Array(4);
  measure(w, into);
  return into[2] - into[3];
}
