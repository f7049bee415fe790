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
/** What the ramps in the leakage come to, on the secondary side: in a record, so that no double crosses a call. */
export class Turns {
  /** Peak magnetizing current that rides on each pulse of a double-ended stage, A. */
  magnetizing = 0.5;
  /** Current that a ramp before a pulse rises to, A. */
  start = 0.5;
  /** Current that a ramp falls from, once the input takes back what is left after a pulse, A. */
  back = 0.5;
  /** Duration of a ramp for each ampere, s/A. */
  pace = 0.5;
  /** Resistance that a choke's current meets while it rises, Ω at the secondary; written where it is asked for. */
  resistance = 0.5;
  /** Share of the period in which a shifted bridge turns its current round, 0 … 1. */
  turnShare = 0.5;
  /** Mean square that the ramps add, A². */
  turnSquare = 0.5;
  /** Mean that the ramps add, A; negative where more is taken back than drawn. */
  charge = 0.5;
}

const turns = new Turns();
/** Of the current that dies between pulses, over what it starts with: mean square (over the square), mean, what is left at the end. */
const decay = new Float64Array(3);

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
  const current = state.loadCurrent / state.activePhases / chokes;
  state.meanCurrent = current;
  steady.frequency = design.frequency * (form.doubleEnded && !form.doubler ? 2 : 1);
  steady.current = current;
  // The chokes of a doubler couple through the winding: a pause in one is not a pause of the stage, so it always runs through.
  steady.blocking = design.emulates && !form.doubler;
  steady.shortestRise = design.shortestOnTime;
  voltages(form, transformer, state);
  rectifierGaps(form, design, state);
  solveBentChoke(design, state, steady);
  applyForward(steady, state);
  state.effectiveInductance = steady.inductance;
  writeFlux(form, design, transformer, state);
  writeTurns(form, design, state);
  writeCurrents(form, transformer, state, chokes, design.phaseShifted);
  if (!form.doubleEnded) addMagnetizing(transformer, state);
  writeChoke(form, design, state);
  writeDraw(form, design, state);
}

/**
 * Volts across the choke in both intervals, after the drops of switches, windings, rectifiers and choke. While it rises its current
 * also flows through the leakage, L/n² on its side, which takes its share of the volts: the rise lasts so much longer.
 * @source rashid-2014, section 13.2: Vo = (Vi − drops)/n − Vd; leakage as a divider of volts
 * @valid drops taken at the mean current; L ≫ Llk/n²
 */
function voltages(form: IsolatedForm, t: Transformer, state: StageState): void {
  const { current } = steady;
  const n = t.ratio;
  const pulse = current / n;
  const primaryDrop = pulse * (form.inSeries * state.highResistance + state.primaryResistance);
  const secondary = (form.share * state.inputVoltage - primaryDrop) / n;
  const path = current * state.pathResistance;
  const winding = current * state.secondaryResistance;
  const driving = form.doubler ? state.loadCurrent / state.activePhases : current;
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
function rectifierGaps(form: IsolatedForm, design: Design, state: StageState): void {
  const { current } = steady;
  const { gap } = design;
  const share = form.centreTap ? 0.5 : 1;
  findPace(form, design, state);
  const { pace } = turns;
  const time = design.phaseShifted ? gap + Math.max(gap, pace * current) : 2 * gap;
  const drop = share * (design.low.bodyDrop - current * state.lowResistance);
  steady.gapFall = 0.5 * time * steady.frequency * drop;
  steady.gapTurn = pace * steady.frequency * drop;
  steady.gapRise = 0;
  steady.gapCurrent = design.gapCurrent;
  steady.waitCurrent = 0;
}

/**
 * Time that one ampere of a choke takes to turn round in the leakage, s/A: L/n over the primary's volts, which the body diode that still
 * carries the choke helps.
 * @derivation as `findPace`
 * @valid gaps, so that a body diode carries the choke
 */
export function turnPace(form: IsolatedForm, design: Design, state: StageState): number {
  findPace(form, design, state);
  return turns.pace;
}

/**
 * Writes `pace` of the turns.
 * @derivation Llk·(I/n)/(V + n·drop), half of the drop where it stands across half a winding
 * @valid gaps, so that a body diode carries the choke
 */
function findPace(form: IsolatedForm, design: Design, state: StageState): void {
  const { leakage, ratio } = design.transformer;
  const drop = design.gap > 0 ? (form.centreTap ? 0.5 : 1) * design.low.bodyDrop : 0;
  turns.pace = leakage / (ratio * (form.share * state.inputVoltage + ratio * drop));
}

/**
 * Moments of every current of one phase, and the waveforms of choke and input.
 * @source erickson-maksimovic-2001, chapter 6, winding currents
 * @source balogh-dn63, both rectifiers of a doubler
 * @valid straight segments; freewheeling current shared alike by a centre tap's halves
 */
function writeCurrents(form: IsolatedForm, t: Transformer, state: StageState, chokes: number, shifted: boolean): void {
  const { valleyCurrent: a, peakCurrent: b, highShare: h, lowShare: l } = state;
  const { magnetizing: m, turnShare, turnSquare } = turns;
  const square = (a * a + a * b + b * b) / 3;
  const n2 = t.ratio * t.ratio;
  // Share of the switching period in which the primary carries a pulse.
  const driven = form.doubler ? 2 * h : h;
  // Mean square of what goes on in the primary of a shifted bridge between pulses, on the secondary side, over that time.
  const left = shifted ? decay[0] * b * b : 0;
  const leftPrimary = shifted ? decay[0] * (b + m) * (b + m) : 0;
  const between = Math.max(0, (form.doubler ? 1 - 2 * h : l) - turnShare);
  // The magnetizing current rises with the pulse, from one side of zero to the other.
  const pulse = square + ((b - a) * m + m * m) / 3;
  state.primaryMeanSquare = (driven * pulse + between * leftPrimary + turnSquare) / n2;
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
  state.highMean = ((driven * 0.5 * (a + b) + turns.charge) * form.share) / t.ratio;
  state.lowMean = 0.5 * (a + b) * 0.5 * (h + l) * chokes;
  state.highDevices = form.doubleEnded && form.inSeries === 2 ? 4 : 2;
  state.lowDevices = 2;
  state.chokes = chokes;
  state.drawCopies = state.activePhases;
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
  // The halves of a centre tap carry half of the difference each, against each other.
  const secondary =
    (form.centreTap ? 0.5 : 1) * (state.secondaryResistance + (form.doubler ? 2 : 1) * state.lowResistance);
  const primary = form.inSeries * state.highResistance + state.primaryResistance;
  const resistance = primary + t.ratio * t.ratio * secondary;
  const x = (time * resistance) / t.leakage;
  decay.fill(1);
  if (!(x > 1e-6)) return;
  decay[2] = -x;
  expAt(decay, 2);
  const rest = decay[2];
  decay[0] = (1 - rest * rest) / (2 * x);
  decay[1] = (1 - rest) / x;
}

/**
 * The ramps in the leakage at a solved operating point; the record is written anew by the next point.
 * @derivation as `writeTurns`
 * @valid `state` as `solveIsolated` left it
 */
export function leakageTurns(form: IsolatedForm, design: Design, state: StageState): Readonly<Turns> {
  findPace(form, design, state);
  writeTurns(form, design, state);
  return turns;
}

/**
 * Before a pulse reaches the choke's valley current turns round in the leakage, and after it what the primary carries dies against the
 * input, which takes it back; in a shifted bridge only once the next pulse begins.
 * @derivation straight ramps of L/n over the volts of `turnPace`: I²·pace/2 is a ramp's charge, I³·pace/3 its square
 * @valid ramps short beside the period
 */
function writeTurns(form: IsolatedForm, design: Design, state: StageState): void {
  const period = state.frequency > 0 ? 1 / state.frequency : 1;
  const { pace } = turns;
  const m = form.doubleEnded ? design.transformer.ratio * state.magnetizingPeak : 0;
  decay.fill(0);
  if (design.phaseShifted) findDecay(form, design.transformer, state);
  const start = Math.max(0, state.valleyCurrent - m);
  const back = (Math.max(0, state.peakCurrent) + m) * (design.phaseShifted ? decay[2] : 1);
  const each = (form.doubler ? 2 : 1) / period;
  turns.magnetizing = m;
  turns.start = start;
  turns.back = back;
  turns.turnShare = design.phaseShifted ? each * pace * (start + back) : 0;
  turns.turnSquare = (each * pace * (start * start * start + back * back * back)) / 3;
  turns.charge = 0.5 * each * pace * (start * start - back * back);
}

/**
 * The choke's waveform: a triangle. What several phases leave of each other's ripple is shaped by less than that, so with them it has more
 * corners: it falls faster while a body diode carries it, after a pulse for a gap and before one until the current has turned round (in a
 * shifted bridge the primary goes on carrying it after a pulse), and resistances bow its rise.
 * @derivation the volts that the gaps take, spread over the gaps; a rise whose slope falls by R·ΔI/L bows by R·ΔI·t/(8·L)
 * @valid straight segments; gaps short beside the fall, else they are spread over all of it
 */
function writeChoke(form: IsolatedForm, design: Design, state: StageState): void {
  const { valleyCurrent: a, peakCurrent: b, highShare: h, lowShare: l } = state;
  const period = state.frequency > 0 ? 1 / state.frequency : 1;
  const rests = pauses(state.mode);
  const { gap } = design;
  const first = design.phaseShifted ? 0 : gap;
  const last = gap * (design.phaseShifted ? 2 : 1) + turns.pace * Math.max(0, a);
  const several = state.activePhases > 1;
  const more = rests || a < 0 || !several ? 0 : (steady.gapVolts * period) / steady.inductance;
  const middle = l * period - first - last;
  clearWaveform(state.choke);
  if (several) {
    findDrivingResistance(form, design.transformer, state);
    const bow = (turns.resistance * (b - a) * h * period) / (8 * steady.inductance);
    addSegment(state.choke, 0.5 * h * period, a, 0.5 * (a + b) + bow);
    addSegment(state.choke, 0.5 * h * period, 0.5 * (a + b) + bow, b);
  } else addSegment(state.choke, h * period, a, b);
  if (more > 0 && middle > 0 && more < b - a) {
    const slope = (b - a - more) / (l * period);
    const high = b - slope * first - (more * first) / (first + last);
    const low = high - slope * middle;
    if (first > 0) addSegment(state.choke, first, b, high);
    addSegment(state.choke, middle, high, low);
    addSegment(state.choke, last, low, a);
  } else {
    addSegment(state.choke, l * period, b, a);
    if (rests) addSegment(state.choke, (1 - h - l) * period, 0, 0);
  }
}

/**
 * Writes the resistance that a choke's current meets while it rises, at the secondary.
 * @derivation the primary's resistances over n², the winding, the rectifiers, the choke
 * @valid as `solveIsolated`
 */
function findDrivingResistance(form: IsolatedForm, t: Transformer, state: StageState): void {
  const primary = (form.inSeries * state.highResistance + state.primaryResistance) / (t.ratio * t.ratio);
  turns.resistance = primary + state.secondaryResistance + state.lowResistance + state.pathResistance;
}

/**
 * What one phase draws from the input, of both signs. A ramp in the leakage is written as a block of two thirds of its height and three
 * quarters of its length, which has its charge and its square: edges are instant here, what series inductance makes of them is the layout's.
 * @derivation the choke's rise and the ramps of `writeTurns` times share/n; (2/3)·(3/4) = 1/2, (2/3)²·(3/4) = 1/3
 * @valid straight segments
 */
function writeDraw(form: IsolatedForm, design: Design, state: StageState): void {
  const { valleyCurrent: a, peakCurrent: b, highShare: h } = state;
  const period = state.frequency > 0 ? 1 / state.frequency : 1;
  // The input sees one pulse each half period of a bridge: a doubler's choke alone runs at the switching frequency.
  const repeat = form.doubler ? 0.5 * period : period;
  const { magnetizing: m, start, back, pace } = turns;
  const pulse = Math.min(h * period, repeat);
  const backTime = Math.min(0.75 * pace * back, repeat - pulse);
  const startTime = Math.min(0.75 * pace * start, repeat - pulse - backTime);
  const scale = form.share / design.transformer.ratio;
  const returned = (-2 / 3) * back * scale;
  const ramp = (2 / 3) * start * scale;
  // Written in place: so many doubles through calls would be boxed once the compiler stops inlining.
  const { draw } = state;
  const first = design.phaseShifted ? 0 : 2;
  const at = design.phaseShifted ? 1 : 0;
  const rest = repeat - pulse - startTime - backTime;
  draw.count = 4;
  draw.duration[first] = backTime;
  draw.start[first] = returned;
  draw.end[first] = returned;
  draw.duration[at] = startTime;
  draw.start[at] = ramp;
  draw.end[at] = ramp;
  draw.duration[at + 1] = pulse;
  draw.start[at + 1] = (a - m) * scale;
  draw.end[at + 1] = (b + m) * scale;
  draw.duration[3] = rest;
  draw.start[3] = 0;
  draw.end[3] = 0;
  draw.period = draw.duration[0] + draw.duration[1] + draw.duration[2] + rest;
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
