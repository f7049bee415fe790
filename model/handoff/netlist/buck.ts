/** Interleaved buck phases with a switch or a diode in the low position. */
import { pauses } from '../../stages/state.ts';
import { sample } from '../../waveform/index.ts';
import type { SolvedPoint } from '../solved-point.ts';
import type { Instant, Lines } from './lines.ts';

/** When each gate of a phase whose cycle begins at 0 is on, s. */
interface Gating {
  /** Share of time that the high interval is lengthened by to make up for the gaps' drops, s. */
  readonly extra: number;
  readonly high: readonly [from: number, to: number];
  readonly low: readonly [from: number, to: number];
}

/** Gates of one phase: before each edge both are off for the gap; the current's sign says which body diode carries it. */
function buckGating(point: SolvedPoint): Gating {
  const { design, state } = point;
  const period = 1 / state.frequency;
  const gap = design.diode === undefined ? design.driver.deadTime : 0;
  const { valleyCurrent: a, peakCurrent: b } = state;
  const rests = pauses(state.mode);
  const extra = makeUp(point, gap);
  const on = state.highShare * period + extra;
  const high: [number, number] = [a < 0 && !rests ? gap : 0, b < 0 ? on - gap : on];
  if (rests && a < 0) return { extra, high: [gap, on], low: [period - state.lowShare * period, period] };
  const off = rests ? (state.highShare + state.lowShare) * period : a < 0 ? period : period - gap;
  return { extra, high, low: [b < 0 ? on : on + gap, off] };
}

/**
 * On-time that makes up for the drops of the body diodes in the gaps, s: the model's volt-second balance leaves them out and a
 * control loop would add it. Each gap with the low body diode takes (Vb − |i|·R) off the node, each with the high one adds it.
 */
function makeUp(point: SolvedPoint, gap: number): number {
  const { design, state } = point;
  const { valleyCurrent: a, peakCurrent: b } = state;
  if (gap === 0) return 0;
  const high = design.high.bodyDrop;
  const low = design.low.bodyDrop;
  if (pauses(state.mode)) {
    const power = Math.abs(state.outputVoltage * state.meanCurrent);
    const lost = low * Math.max(0, b) * gap * state.frequency;
    return power > 0 ? (0.5 * (state.highShare / state.frequency) * lost) / power : 0;
  }
  const drop = (i: number): number =>
    i > 0 ? low - i * state.lowResistance : -(high - Math.abs(i) * state.highResistance);
  return (gap * (drop(a) + drop(b))) / state.inputVoltage;
}

/** Writes all active phases. */
export function writeBuck(lines: Lines, point: SolvedPoint): void {
  const { design, state } = point;
  const period = 1 / state.frequency;
  const gating = buckGating(point);
  lines.parameter('duty', state.highShare, '', 'share of the period that the model gives the high interval');
  lines.parameter('tmakeup', gating.extra, 's', 'on-time a control loop adds for the drops in the dead times');
  lines.derived('ton', 'duty*tper+tmakeup', state.highShare * period + gating.extra, 's', 'high interval');
  if (design.diode === undefined) {
    lines.parameter('tdead', design.driver.deadTime, 's', 'dead time of the drivers at each edge');
  }
  writePartValues(lines, point);
  for (let k = 0; k < state.activePhases; k++) writePhase(lines, point, gating, k);
}

function writePartValues(lines: Lines, point: SolvedPoint): void {
  const { design, state } = point;
  lines.parameter('lchoke', state.effectiveInductance, 'H', 'choke at its current (bias taken off)');
  lines.parameter('rpath', state.pathResistance, 'ohm', 'choke winding at its temperature and board copper');
  lines.parameter('rhigh', state.highResistance, 'ohm', 'high position at its temperature, all dice');
  if (design.diode !== undefined) {
    lines.parameter('vdiode', design.diodeDrop(state.lowTemperature), 'V', 'diode drop at no current');
    lines.parameter('rdiode', state.lowResistance, 'ohm', 'diode slope resistance');
  } else {
    lines.parameter('rlow', state.lowResistance, 'ohm', 'low position at its temperature, all dice');
    lines.parameter('vbodylow', design.low.bodyDrop, 'V', 'body diode of the low switch');
  }
  lines.parameter('vbodyhigh', design.high.bodyDrop, 'V', 'body diode of the high switch');
}

function writePhase(lines: Lines, point: SolvedPoint, gating: Gating, k: number): void {
  const { design, state } = point;
  const period: Instant = { text: 'tper', value: 1 / state.frequency };
  const shift = (k * period.value) / state.activePhases;
  const at = (text: string, value: number): Instant => ({ text: `${k}*tshift+${text}`, value: shift + value });
  lines.comment(`phase ${k + 1}`);
  const [h0, h1] = gating.high;
  const highFrom = h0 > 0 ? 'tdead' : '0';
  const highWidth = `ton${h0 > 0 ? '-tdead' : ''}${h1 < state.highShare * period.value + gating.extra ? '-tdead' : ''}`;
  lines.gate(`gh${k}`, at(highFrom, h0), { text: highWidth, value: h1 - h0 }, period);
  lines.meter(`mh${k}`, 'in', `dh${k}`);
  lines.switched(`h${k}`, `dh${k}`, `sw${k}`, `gh${k}`, 'rhigh');
  lines.diode(`bh${k}`, `sw${k}`, `dh${k}`, 'vbodyhigh');
  lines.meter(`ml${k}`, '0', `sl${k}`);
  if (design.diode !== undefined) lines.diode(`l${k}`, `sl${k}`, `sw${k}`, 'vdiode', 'rdiode');
  else writeLowSwitch(lines, point, gating, k);
  lines.element(`L${k} sw${k} x${k} {lchoke} IC=${sample(state.choke, period.value - shift)}`.replace('e+', 'e'));
  lines.meter(`mc${k}`, `x${k}`, `y${k}`);
  lines.element(`Rp${k} y${k} out {rpath}`);
}

function writeLowSwitch(lines: Lines, point: SolvedPoint, gating: Gating, k: number): void {
  const { state } = point;
  const period: Instant = { text: 'tper', value: 1 / state.frequency };
  const shift = (k * period.value) / state.activePhases;
  const [from, to] = gating.low;
  // Written by values, for they follow from the current's sign at each edge; ton and tdead move them where they can.
  const on = state.highShare * period.value + gating.extra;
  const start = from > on ? 'ton+tdead' : from === on ? 'ton' : String(from);
  const end = pauses(state.mode) ? String(to) : to < period.value ? 'tper-tdead' : 'tper';
  lines.gate(
    `gl${k}`,
    { text: `${k}*tshift+${start}`, value: shift + from },
    { text: `${end}-(${start})`, value: to - from },
    period,
  );
  lines.switched(`l${k}`, `sl${k}`, `sw${k}`, `gl${k}`, 'rlow');
  lines.diode(`bl${k}`, `sl${k}`, `sw${k}`, 'vbodylow');
}
