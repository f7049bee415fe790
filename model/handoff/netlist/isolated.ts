/** Transformer stages: primary switches, coupled inductors with their leakage, rectifiers, chokes. */
import { pauses } from '../../stages/state.ts';
import type { SolvedPoint } from '../solved-point.ts';
import { type Instant, type Lines, numberText } from './lines.ts';
import type { PhaseSite } from './phase-site.ts';
import { writePrimary } from './primary.ts';
import { type PulseTimes, pulseTimes, startCurrents } from './pulses.ts';

/** Coupling of the windings beside the leakage inductance, which is written as its own inductor. */
const COUPLING = 0.99999;

/** Writes all active phases. */
export function writeIsolated(lines: Lines, point: SolvedPoint): void {
  const { state, design } = point;
  const times = pulseTimes(point);
  writeValues(lines, point, times);
  const copies = state.activePhases * (design.stage.form?.doubleEnded === true ? 2 : 1);
  for (let k = 0; k < state.activePhases; k++) {
    writePhase({ lines, point, times, k, shift: (k * times.period) / copies });
  }
}

function writeValues(lines: Lines, point: SolvedPoint, times: PulseTimes): void {
  const { state, design } = point;
  const t = design.transformer;
  lines.parameter(
    'duty',
    state.highShare,
    '',
    'share of the rectified period that the model gives the rising interval',
  );
  lines.parameter('tcommute', times.commutation, 's', 'on-time whose volt-seconds the leakage takes');
  lines.parameter('tdead', times.gap, 's', 'dead time of the drivers at each edge');
  const share = design.stage.chokeMultiple === 2 ? 'duty*tper/2' : 'duty*tper';
  lines.derived('ton', `${share}+tcommute`, times.pulse, 's', 'length of a pulse at the primary');
  lines.parameter('lchoke', state.effectiveInductance, 'H', 'choke at its current (bias taken off)');
  lines.parameter('rpath', state.pathResistance, 'ohm', 'choke winding at its temperature and board copper');
  lines.parameter('rhigh', state.highResistance, 'ohm', 'one primary switch position at its temperature, all dice');
  lines.parameter('rlow', state.lowResistance, 'ohm', 'one rectifier position at its temperature, all dice');
  lines.parameter('vbodyhigh', design.high.bodyDrop, 'V', 'body diode of a primary switch');
  lines.parameter('vbodylow', design.low.bodyDrop, 'V', 'body diode of a rectifier');
  lines.parameter('vnone', 0, 'V', 'drop of an ideal rectifier');
  lines.parameter('nratio', t.ratio, '', `turns ratio, ${t.primaryTurns} to ${t.secondaryTurns}`);
  lines.parameter('lmag', t.magnetizing, 'H', 'magnetizing inductance, primary side');
  lines.parameter('lleak', t.leakage, 'H', 'leakage inductance, primary side');
  lines.parameter('rpri', state.primaryResistance, 'ohm', 'primary winding at its temperature, ac loss included');
  lines.parameter('rsec', state.secondaryResistance, 'ohm', 'one secondary winding, likewise');
  lines.parameter('kwind', COUPLING, '', 'coupling of the windings beside lleak');
}

function writePhase(site: PhaseSite): void {
  const { lines, point, k, times, shift } = site;
  const { form } = point.design.stage;
  if (form === undefined) return;
  lines.comment(`phase ${k + 1}`);
  writePrimary(site);
  const ago = times.period - shift - Math.floor((times.period - shift) / times.period) * times.period;
  const start = startCurrents(point, times, ago);
  lines.meter(`mp${k}`, `pa${k}`, `pr${k}`);
  lines.element(`Rpri${k} pr${k} pl${k} {rpri}`);
  lines.element(`Llk${k} pl${k} pm${k} {max(lleak-2*(1-kwind)*lmag,lleak/100)} IC=${numberText(start.primary)}`);
  lines.element(`Lp${k} pm${k} pb${k} {lmag} IC=${numberText(start.primary)}`);
  if (form.centreTap) writeCentreTap(site, start.first, start.winding);
  else if (form.doubler) writeDoubler(site, start.winding, start.first, start.second);
  else writeForward(site, start.winding, start.first);
}

function writeCentreTap(site: PhaseSite, choke: number, winding: number): void {
  const { lines, k } = site;
  lines.element(`Lsa${k} ct${k} ea${k} {lmag/(nratio*nratio)} IC=${numberText(-0.5 * (choke + winding))}`);
  lines.element(`Lsb${k} eb${k} ct${k} {lmag/(nratio*nratio)} IC=${numberText(0.5 * (choke - winding))}`);
  lines.element(`Kpa${k} Lp${k} Lsa${k} {kwind}`);
  lines.element(`Kpb${k} Lp${k} Lsb${k} {kwind}`);
  lines.element(`Kab${k} Lsa${k} Lsb${k} {kwind}`);
  lines.element(`Rsa${k} fa${k} ea${k} {rsec}`);
  lines.element(`Rsb${k} fb${k} eb${k} {rsec}`);
  writeRectifier(site, `a${k}`, `fa${k}`, true);
  writeRectifier(site, `b${k}`, `fb${k}`, false);
  writeChoke(site, '', `ct${k}`, choke);
}

function writeDoubler(site: PhaseSite, winding: number, first: number, second: number): void {
  const { lines, k } = site;
  lines.meter(`ms${k}`, `wa${k}`, `na${k}`);
  lines.element(`Rsa${k} va${k} wa${k} {rsec}`);
  lines.element(`Lsa${k} va${k} nb${k} {lmag/(nratio*nratio)} IC=${numberText(-winding)}`);
  lines.element(`Kpa${k} Lp${k} Lsa${k} {kwind}`);
  writeRectifier(site, `a${k}`, `na${k}`, false);
  writeRectifier(site, `b${k}`, `nb${k}`, true);
  writeChoke(site, 'a', `na${k}`, first);
  writeChoke(site, 'b', `nb${k}`, second);
}

function writeForward(site: PhaseSite, winding: number, choke: number): void {
  const { lines, k, times } = site;
  lines.meter(`ms${k}`, `wa${k}`, `x${k}`);
  lines.element(`Rsa${k} va${k} wa${k} {rsec}`);
  lines.element(`Lsa${k} va${k} nb${k} {lmag/(nratio*nratio)} IC=${numberText(-winding)}`);
  lines.element(`Kpa${k} Lp${k} Lsa${k} {kwind}`);
  if (!pauses(site.point.state.mode)) {
    const period = periodOf(times);
    const on: Instant = { text: 'ton', value: times.pulse };
    lines.gate(`gra${k}`, { text: `${k}*tshift`, value: site.shift }, on, period);
  }
  writeRectifierPart(site, `a${k}`, `nb${k}`);
  writeRectifier(site, `b${k}`, `x${k}`, true);
  writeChoke(site, '', `x${k}`, choke);
}

/** A rectifier from ground to `node`, off while its own pulse blocks it: the first of the period (`first`: for the winding that leads). */
function writeRectifier(site: PhaseSite, name: string, node: string, leads: boolean): void {
  const { lines, point, times, k, shift } = site;
  if (!pauses(point.state.mode)) {
    // Which pulse blocks it: the positive one blocks the end that does not lead.
    const { form } = point.design.stage;
    const positive = form?.centreTap === true || form?.doubler === true ? !leads : true;
    const half = positive ? 0 : 0.5 * times.period;
    const from: Instant = {
      text: `${k}*tshift+${positive ? '0' : 'tper/2'}+ton+tdead`,
      value: shift + half + times.pulse + times.gap,
    };
    const width: Instant = { text: 'tper-ton-2*tdead', value: times.period - times.pulse - 2 * times.gap };
    lines.gate(`gr${name}`, from, width, periodOf(times));
  }
  writeRectifierPart(site, name, node);
}

/** The rectifier itself: a switch with its body diode, or where the current rests an ideal diode with the same resistance. */
function writeRectifierPart(site: PhaseSite, name: string, node: string): void {
  const { lines, point } = site;
  lines.meter(`ml${name}`, '0', `sl${name}`);
  if (pauses(point.state.mode)) {
    lines.diode(`l${name}`, `sl${name}`, node, 'vnone', 'rlow');
    return;
  }
  lines.switched(`l${name}`, `sl${name}`, node, `gr${name}`, 'rlow');
  lines.diode(`bl${name}`, `sl${name}`, node, 'vbodylow');
}

function writeChoke(site: PhaseSite, side: string, node: string, current: number): void {
  const { lines, k } = site;
  const name = `${side}${k}`;
  lines.element(`L${name} ${node} xc${name} {lchoke} IC=${numberText(current)}`);
  lines.meter(`mc${name}`, `xc${name}`, `y${name}`);
  lines.element(`Rp${name} y${name} out {rpath}`);
}

/** The transformer's period as an instant. */
function periodOf(times: PulseTimes): Instant {
  return { text: 'tper', value: times.period };
}
