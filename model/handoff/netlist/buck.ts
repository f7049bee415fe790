/** Interleaved buck phases with a switch or a diode in the low position. */
import { pauses } from '../../stages/state.ts';
import { sample } from '../../waveform/index.ts';
import type { SolvedPoint } from '../solved-point.ts';
import type { Instant, Lines } from './lines.ts';

/** When each gate of a phase whose cycle begins at 0 is on, s. */
interface Gating {
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
  const on = state.highShare * period;
  const high: [number, number] = [a < 0 && !rests ? gap : 0, b < 0 ? on - gap : on];
  if (rests && a < 0) return { high: [gap, on], low: [period - state.lowShare * period, period] };
  const off = rests ? (state.highShare + state.lowShare) * period : a < 0 ? period : period - gap;
  return { high, low: [b < 0 ? on : on + gap, off] };
}

/** Writes all active phases. */
export function writeBuck(lines: Lines, point: SolvedPoint): void {
  const { design, state } = point;
  const period = 1 / state.frequency;
  const gating = buckGating(point);
  lines.parameter('duty', state.highShare, '', 'share of the period that the model gives the high interval');
  lines.derived('ton', 'duty*tper', state.highShare * period, 's', 'high interval');
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
  const highWidth = `ton${h0 > 0 ? '-tdead' : ''}${h1 < state.highShare * period.value ? '-tdead' : ''}`;
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
  const on = state.highShare * period.value;
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
