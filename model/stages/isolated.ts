/**
 * What every transformer stage has in common: the rectified secondary wave drives one or two chokes, so the choke is solved
 * as a buck's, and currents, flux and stresses are carried back through the turns ratio. The forms differ in a few numbers.
 */
import { expAt } from '../../optimizer/maths/index.ts';
import type { Design } from '../design.ts';
import { applyForward, ChokeSteadyState } from '../modes.ts';
import type { Rail } from '../rail/rail.ts';
import type { Transformer } from '../transformer.ts';
import { addSegment, clearWaveform } from '../waveform/index.ts';
import { solveBentChoke } from './choke.ts';
import { pauses, type StageState } from './state.ts';

/** The numbers that tell one transformer stage from another. */
export interface IsolatedForm {
  /** Share of the input that stands on the primary: 1, or 1/2 in a half bridge. */
  readonly share: number;
  /** Switches in series with the primary. */
  readonly inSeries: number;
  /** Whether pulses of both signs drive the transformer. */
  readonly doubleEnded: boolean;
  /** Whether two chokes of half the current each follow the secondary. */
  readonly doubler: boolean;
  /** Whether the rectifier is centre-tapped. */
  readonly centreTap: boolean;
}

const steady = new ChokeSteadyState();
/** Of the current that dies between pulses: mean square over that of its start, mean over its start. */
const decay = new Float64Array(2);

/** Why no transformer stage can serve `rail`; undefined where one can. */
export function isolatedRefusal(rail: Rail): string | undefined {
  if (rail.profile.some((point) => point.fraction < 0)) {
    return 'a transformer stage of this kind carries no power from output to input: its rectifiers only follow the primary';
  }
  return undefined;
}

/**
 * Solves one operating point of a transformer stage of `form`; see `Stage.solve`.
 * @source hart-2011, chapter 7: the rectified wave drives a buck's choke
 * @valid steady state; leakage time short beside the pulse
 */
export function solveIsolated(form: IsolatedForm, design: Design, state: StageState): void {
  const { transformer } = design;
  const chokes = form.doubler ? 2 : 1;
  const phaseCurrent = state.loadCurrent / state.activePhases;
  const current = phaseCurrent / chokes;
  state.meanCurrent = current;
  steady.frequency = design.frequency * (form.doubleEnded && !form.doubler ? 2 : 1);
  steady.current = current;
  // The chokes of a doubler couple through the winding: a pause in one is not a pause of the stage, so it always runs through.
  steady.blocking = design.emulates && !form.doubler;
  steady.shortestRise = design.shortestOnTime;
  voltages(form, transformer, state, phaseCurrent, current);
  rectifierGaps(form, design, state, current);
  solveBentChoke(design, state, steady);
  applyForward(steady, state);
  state.effectiveInductance = steady.inductance;
  writeCurrents(form, transformer, state, chokes, design.phaseShifted);
  writeFlux(form, design, transformer, state);
}

/**
 * Volts across the choke in both intervals, after the drops of switches, windings, rectifiers and choke. While it rises its current
 * also flows through the leakage, L/n² on its side, which takes its share of the volts: the rise lasts so much longer.
 * @source rashid-2014, section 13.2: Vo = (Vi − drops)/n − Vd; leakage as a divider of volts
 * @valid drops taken at the mean current; L ≫ Llk/n²
 */
function voltages(form: IsolatedForm, t: Transformer, state: StageState, phaseCurrent: number, current: number): void {
  const n = t.ratio;
  const pulse = current / n;
  const primaryDrop = pulse * (form.inSeries * state.highResistance + state.primaryResistance);
  const secondary = (form.share * state.inputVoltage - primaryDrop) / n;
  const path = current * state.pathResistance;
  const winding = current * state.secondaryResistance;
  const driving = form.doubler ? phaseCurrent : current;
  steady.rise = secondary - winding - driving * state.lowResistance - path - state.outputVoltage;
  const idle = form.centreTap
    ? 0.5 * current * (state.lowResistance + state.secondaryResistance)
    : current * state.lowResistance;
  steady.fall = state.outputVoltage + path + idle;
  // A secondary below the output cannot drive the choke: a duty of one and a broken limit tell, not a negative voltage.
  if (!(steady.rise > 1e-6 * state.inputVoltage)) steady.rise = 1e-6 * state.inputVoltage;
  steady.rise *= state.inductance / (state.inductance + t.leakage / (n * n));
  // While one choke of a doubler rises, the other falls through a rectifier that carries both.
  if (form.doubler) steady.fall += idle * Math.min(1, steady.fall / steady.rise);
}

/**
 * Body diodes of the rectifiers: in the gaps before and after a pulse and while the current turns round in the leakage. A shifted
 * bridge waits out one of the gaps within that turn; a centre tap sees half of what one end of its winding drops.
 * @derivation the body diode's drop over the switch times the share of the period that the gaps and Llk·I/(n·V) take
 * @valid gaps short beside the pulses
 */
function rectifierGaps(form: IsolatedForm, design: Design, state: StageState, current: number): void {
  const t = design.transformer;
  const gap = design.gap;
  const rise = (t.leakage * current) / (t.ratio * form.share * state.inputVoltage);
  const time = design.phaseShifted ? gap + Math.max(gap, rise) + rise : 2 * gap + rise;
  const drop = design.low.bodyDrop - current * state.lowResistance;
  steady.gapFall = 0.5 * time * steady.frequency * (form.centreTap ? 0.5 : 1) * drop;
  steady.gapRise = 0;
  steady.gapCurrent = design.gapCurrent;
  steady.waitCurrent = 0;
}

/**
 * Moments of every current of one phase, and the waveforms of choke and input.
 * @source erickson-maksimovic-2001, chapter 6, winding currents
 * @source balogh-dn63, both rectifiers of a doubler
 * @valid straight segments; freewheeling current shared alike by a centre tap's halves
 */
function writeCurrents(form: IsolatedForm, t: Transformer, state: StageState, chokes: number, shifted: boolean): void {
  const { valleyCurrent: a, peakCurrent: b, highShare: h, lowShare: l } = state;
  const square = (a * a + a * b + b * b) / 3;
  const n2 = t.ratio * t.ratio;
  // Share of the switching period in which the primary carries a pulse.
  const driven = form.doubler ? 2 * h : h;
  // Mean square of what goes on in the primary of a shifted bridge between pulses, on the secondary side, over that time.
  decay.fill(0);
  if (shifted) findDecay(form, t, state);
  const left = decay[0] * b * b;
  const between = form.doubler ? 1 - 2 * h : l;
  state.primaryMeanSquare = (driven * square + between * left) / n2;
  state.highMeanSquare = form.doubleEnded ? 0.5 * state.primaryMeanSquare : state.primaryMeanSquare;
  if (form.doubler) {
    state.secondaryMeanSquare = driven * square + between * left;
    // It leaves one rectifier and adds to the other, whose choke carries less: the chokes stay half a period of fall apart.
    const apart = (0.5 * (b - a)) / Math.max(0.5, l);
    state.lowMeanSquare = 4 * h * square + between * Math.max(0, square + left - decay[1] * b * apart);
  } else if (form.centreTap) {
    state.secondaryMeanSquare = 0.5 * h * square + 0.25 * l * (square + left);
    state.lowMeanSquare = state.secondaryMeanSquare;
  } else {
    state.secondaryMeanSquare = square * h;
    state.lowMeanSquare = 0.5 * square * (h + l);
  }
  state.chokeMeanSquare = square * (h + l);
  state.highMean = (driven * 0.5 * (a + b) * form.share) / t.ratio;
  state.lowMean = 0.5 * (a + b) * 0.5 * (h + l) * chokes;
  state.highDevices = form.doubleEnded && form.inSeries === 2 ? 4 : 2;
  state.lowDevices = 2;
  state.chokes = chokes;
  state.drawCopies = state.activePhases;
  writeWaveforms(form, t, state);
}

/**
 * Mean square and mean over the time between pulses, as shares of what they begin with, of the current that circulates in the shorted
 * primary of a shifted bridge: it dies as e^(−t·R/L) in the leakage, so (1 − e^(−2x))/(2x) and (1 − e^(−x))/x with x the time in those
 * constants.
 * @derivation first-order decay of a current in L and R, integrated
 * @valid R·t/L ≥ 0; resistances constant over the pulse
 */
function findDecay(form: IsolatedForm, t: Transformer, state: StageState): void {
  const period = state.frequency > 0 ? 1 / state.frequency : 1;
  const time = form.doubler ? 0.5 * (1 - 2 * state.highShare) * period : state.lowShare * period;
  const secondary = state.secondaryResistance + (form.doubler ? 2 : 1) * state.lowResistance;
  const primary = form.inSeries * state.highResistance + state.primaryResistance;
  const resistance = primary + t.ratio * t.ratio * secondary;
  const x = (time * resistance) / t.leakage;
  decay.fill(1);
  if (!(x > 1e-6)) return;
  decay[1] = -x;
  expAt(decay, 1);
  const rest = decay[1];
  decay[0] = (1 - rest * rest) / (2 * x);
  decay[1] = (1 - rest) / x;
}

/**
 * The choke's waveform and what one phase draws from the input.
 * @derivation the choke's triangle, and its rising part times share/n at the input
 * @valid straight segments
 */
function writeWaveforms(form: IsolatedForm, t: Transformer, state: StageState): void {
  const { valleyCurrent: a, peakCurrent: b, highShare: h, lowShare: l } = state;
  const period = state.frequency > 0 ? 1 / state.frequency : 1;
  const idle = pauses(state.mode) ? (1 - h - l) * period : 0;
  clearWaveform(state.choke);
  addSegment(state.choke, h * period, a, b);
  addSegment(state.choke, l * period, b, a);
  if (idle > 0) addSegment(state.choke, idle, 0, 0);
  // The input sees one pulse each half period of a bridge: a doubler's choke alone runs at the switching frequency.
  const repeat = form.doubler ? 0.5 * period : period;
  const pulse = Math.min(h * period, repeat);
  const scale = form.share / t.ratio;
  clearWaveform(state.draw);
  addSegment(state.draw, pulse, a * scale, b * scale);
  addSegment(state.draw, repeat - pulse, 0, 0);
}

/**
 * Flux, magnetizing current, duty lost to leakage, rectifier stress.
 * @source ltc1698, page 16: V·ton/(Np·Ae)
 * @source sabate-1990: duty lost to leakage
 * @valid flux below saturation; magnetizing current small beside the load's
 */
function writeFlux(form: IsolatedForm, design: Design, t: Transformer, state: StageState): void {
  const on = form.doubleEnded && !form.doubler ? 0.5 * state.dutyCycle : state.dutyCycle;
  const volts = form.share * state.inputVoltage;
  // The leakage takes its share while the current rises.
  const voltSeconds = Math.max(0, (volts * on) / design.frequency - (t.leakage * state.rippleCurrent) / t.ratio);
  state.fluxSwing = voltSeconds / (t.primaryTurns * t.area);
  state.fluxRamp = on;
  const swing = voltSeconds / t.magnetizing;
  state.magnetizingPeak = form.doubleEnded ? 0.5 * swing : swing;
  // Sabaté 1990: a shifted bridge turns its current round through the whole swing, a hard-switched one from rest. From the valley on
  // the current rises with the choke's, which the duty itself allows for.
  const edges = form.doubleEnded && !form.doubler ? 2 : 1;
  const turned = Math.max(0, state.valleyCurrent) + (design.phaseShifted ? Math.max(0, state.peakCurrent) : 0);
  state.lostDuty = (edges * t.leakage * design.frequency * turned) / (t.ratio * volts);
  if (!form.doubleEnded) addMagnetizing(t, state);
  state.rectifierVoltage = rectifierVoltage(form, state.inputVoltage, t.ratio);
}

/**
 * The magnetizing current of a single-ended stage rises with each pulse: ∫(i + m)² − ∫i² over it, m from 0 to its peak.
 * @derivation ∫(i + m·t/ton)² − ∫i² over the pulse, i rising from valley to peak
 * @valid straight segments; the reset's current flows through the clamp diodes
 */
function addMagnetizing(t: Transformer, state: StageState): void {
  const m = state.magnetizingPeak;
  const late = (state.valleyCurrent + 2 * state.peakCurrent) / (3 * t.ratio);
  const more = (m * late + (m * m) / 3) * state.highShare;
  state.primaryMeanSquare += more;
  state.highMeanSquare += more;
}

/**
 * Volts that one rectifier blocks, without ringing. `inputVoltage` V, `ratio` Np/Ns.
 * @source hart-2011, chapter 7: a centre tap sees both halves of the winding
 * @valid no ringing: a limit adds that
 */
export function rectifierVoltage(form: IsolatedForm, inputVoltage: number, ratio: number): number {
  const secondary = (form.share * inputVoltage) / ratio;
  return form.centreTap ? 2 * secondary : secondary;
}

/**
 * Ideal duty of the choke's rising interval.
 * @source hart-2011, chapter 7: Vo = δ·share·Vi/n, half of it behind a doubler
 * @valid no drops
 */
export function isolatedDuty(form: IsolatedForm, inputVoltage: number, outputVoltage: number, ratio: number): number {
  return (outputVoltage * ratio) / (form.share * inputVoltage);
}
