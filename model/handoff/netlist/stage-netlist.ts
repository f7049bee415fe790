/** The netlist of a design at one operating point, with what the model predicts of it. */
import type { RailProblem } from '../../problem.ts';
import { formatQuantity } from '../../quantity/index.ts';
import { MODES, pauses } from '../../stages/state.ts';
import { MODEL_VERSION } from '../../version.ts';
import type { SolvedPoint } from '../solved-point.ts';
import { writeBuck } from './buck.ts';
import { writeIsolated } from './isolated.ts';
import { ascii, Lines, numberText } from './lines.ts';
import { BANDS, conductionOf, type LossTerm, lossTerms, type Prediction, predictionsOf } from './predictions.ts';
import { writeInput, writeOutput } from './surroundings.ts';

/** Time steps a period, at least; fewer cost ripple. More, up to a most, where the output's groups ring: so many a turn. */
const STEPS = 100;
const STEPS_MOST = 1000;
const STEPS_A_TURN = 20;
/** Time constants of the filter until its start is forgotten. */
const CONSTANTS = 5;
/** Fewest and most periods that a simulation is given to settle. */
const FEWEST = 25;
const MOST = 400;

/** A netlist with what goes with it. */
export interface StageNetlist {
  readonly text: string;
  readonly predictions: readonly Prediction[];
  readonly losses: readonly LossTerm[];
  /** W, what the model says that `losses` come to. */
  readonly conduction: number;
  /** Periods simulated; the last one is measured. */
  readonly periods: number;
  /** s, of the stage. */
  readonly period: number;
}

/** The netlist of `point`; `id` names the design. */
export function stageNetlist(problem: RailProblem, id: string, point: SolvedPoint): StageNetlist {
  const { design, state } = point;
  const lines = new Lines();
  const period = design.stage.chokeMultiple / state.frequency;
  const periods = settling(point, period);
  writeTimes(lines, point, period, periods);
  writeInput(lines, point);
  if (design.stage.form === undefined) writeBuck(lines, point);
  else writeIsolated(lines, point);
  writeOutput(lines, point);
  if (design.stage.form !== undefined) lines.leak();
  const predictions = predictionsOf(point);
  const losses = lossTerms(point);
  for (const { vectors } of [...predictions, ...losses]) for (const vector of vectors) lines.keep(vector);
  const conduction = conductionOf(point);
  const title = `chopfront ${MODEL_VERSION}: ${design.stage.architecture} x${state.activePhases}, design ${id} for ${problem.rail.name}`;
  const text = lines.text(title, head(point), tail(predictions, conduction, design.stage.form === undefined));
  return { text, predictions, losses, conduction, periods, period };
}

function head(point: SolvedPoint): string[] {
  const { state } = point;
  return [
    `${formatQuantity(state.inputVoltage, 'V')} in, ${formatQuantity(state.outputVoltage, 'V')} out, ${formatQuantity(state.loadCurrent, 'A')}, ${MODES[state.mode]}, usual values.`,
    'Units are SI base units: V, A, ohm, H, F, s. Gates run open loop with the duty that the model found.',
    'Ideal switches prove waveforms, conduction and ripple; switching, gate and core loss are not in this circuit.',
    `Agreement is within: mean output ${100 * BANDS.mean} %, ripple ${100 * BANDS.ripple} %, rms ${100 * BANDS.rms} %, conduction loss ${100 * BANDS.conduction} %.`,
  ];
}

function writeTimes(lines: Lines, point: SolvedPoint, period: number, periods: number): void {
  const { design, state } = point;
  const copies = state.activePhases * (design.stage.form?.doubleEnded === true ? 2 : 1);
  lines.parameter('fsw', 1 / period, 'Hz', 'switching frequency');
  lines.derived('tper', '1/fsw', period, 's', 'period');
  lines.derived('tshift', `tper/${copies}`, period / copies, 's', 'delay from phase to phase');
  lines.parameter('te', 1e-11, 's', 'edge of a gate; longer edges cost accuracy');
  lines.parameter('nper', periods, '', 'periods simulated; the last one is measured');
  const steps = stepsOf(point, period);
  lines.derived('tmax', `tper/${steps}`, period / steps, 's', 'longest time step');
  lines.derived('tstop', 'nper*tper', periods * period, 's', 'end');
  lines.derived('tfrom', 'tstop-tper', (periods - 1) * period, 's', 'start of what is measured');
}

/**
 * Time steps a period: enough for what rings between the output's groups, the bulk's inductance with the ceramics.
 * @derivation the ringing's own period √(L·C) times 2π; what is damped beyond 0.7 of critical is over before it matters
 * @valid any bank
 */
function stepsOf({ output }: SolvedPoint, period: number): number {
  const inductance = output.l1 + output.l2;
  if (!(output.c2 > 0 && inductance > 0)) return STEPS;
  const capacitance = (output.c1 * output.c2) / (output.c1 + output.c2);
  const damping = 0.5 * (output.r1 + output.r2) * Math.sqrt(capacitance / inductance);
  if (damping > 0.7) return STEPS;
  const turn = 2 * Math.PI * Math.sqrt(inductance * capacitance);
  return Math.max(STEPS, Math.min(STEPS_MOST, Math.ceil((STEPS_A_TURN * period) / turn)));
}

/**
 * Periods until the output filter has forgotten its start.
 * @derivation real part of the output filter's poles
 * @valid second-order filter
 */
function settling(point: SolvedPoint, period: number): number {
  const { state, output, rail } = point;
  const load = Math.abs(state.outputVoltage / state.loadCurrent);
  const capacitance = output.c1 + output.c2;
  const copies = state.activePhases * state.chokes;
  // Real part of the filter's poles, 1/(2RC) + R/(2L); at rest between pulses the bank empties through the load alone.
  const inductance = state.effectiveInductance / copies;
  const damping = bankResistance(point) + (state.pathResistance + state.lowResistance) / copies;
  const filter = 0.5 / (load * capacitance) + (0.5 * damping) / inductance;
  const bare = 1 / (load * capacitance);
  const source = (2 * rail.input.sourceInductance) / Math.max(1e-6, rail.input.sourceResistance);
  const constant = Math.max(1 / (pauses(state.mode) ? bare : filter), Math.min(source, 100 * period));
  return Math.max(FEWEST, Math.min(MOST, Math.ceil((CONSTANTS * constant) / period)));
}

/** Series resistance of the whole output bank at the filter's own frequency, about: of the group that holds most charge, Ω. */
function bankResistance({ output }: SolvedPoint): number {
  return output.c2 > output.c1 ? output.r2 : output.r1;
}

/** `fine` asks for what a buck bears; its diodes need a little conductance while they block, for the simulator to find where their nodes stand. */
function tail(predictions: readonly Prediction[], conduction: number, fine: boolean): string[] {
  const lines = [
    `.options method=${fine ? 'gear' : 'trap'} reltol=1e-4 abstol=${fine ? '1e-6' : '1e-5'} vntol=${fine ? '1e-6 gmin=1e-9' : '1e-4'}`,
    '.tran {tmax} {tstop} {tfrom} {tmax} uic',
    '* what the model predicts, and the measurement beside it',
  ];
  const words = { mean: 'AVG', 'peak-to-peak': 'PP', rms: 'RMS' } as const;
  for (const { name, unit, value, reading, vectors } of predictions) {
    const many = vectors.length > 1;
    lines.push(
      `* ${ascii(name)}: ${numberText(Number(value.toPrecision(6)))} ${ascii(unit)}${many ? ' (root of the mean of the squares)' : ''}`,
    );
    for (const [i, vector] of vectors.entries()) {
      const label = `${name.replaceAll(' ', '_')}${many ? `_${i + 1}` : ''}`;
      lines.push(`.meas tran ${label} ${words[reading]} ${vector} FROM={tfrom} TO={tstop}`);
    }
  }
  lines.push(`* conduction loss, all phases: ${numberText(Number(conduction.toPrecision(6)))} W`);
  return lines;
}
