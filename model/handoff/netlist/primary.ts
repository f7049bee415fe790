/** The primary side of a transformer stage: switches with body diodes, their gates, the divider of a half bridge. */
import type { Instant } from './lines.ts';
import type { PhaseSite } from './phase-site.ts';

/** Writes the primary of one phase between nodes `pa` and `pb`. */
export function writePrimary(site: PhaseSite): void {
  const { point, k } = site;
  const { form } = point.design.stage;
  if (form?.doubleEnded !== true) writeTwoSwitches(site);
  else {
    if (point.design.phaseShifted) shiftedGates(site);
    else pulseGates(site);
    leg(site, '1', '2', `pa${k}`);
    if (form.inSeries === 2) leg(site, '3', '4', `pb${k}`);
    else writeDivider(site);
  }
}

/** A leg: an upper and a lower switch around `node`. The current of the first upper one is kept. */
function leg(site: PhaseSite, upper: string, lower: string, node: string): void {
  position(site, upper, 'in', node, upper === '1');
  position(site, lower, node, '0', false);
}

function position(site: PhaseSite, name: string, drain: string, source: string, kept: boolean): void {
  const { lines, k } = site;
  const top = kept ? `dh${k}` : drain;
  if (kept) lines.meter(`mh${k}`, drain, top);
  lines.switched(`h${name}_${k}`, top, source, `gh${name}_${k}`, 'rhigh');
  lines.diode(`bh${name}_${k}`, source, top, 'vbodyhigh');
}

function writeTwoSwitches(site: PhaseSite): void {
  const { lines, k } = site;
  gate(site, '1', '0', 0, { text: 'ton', value: site.times.pulse });
  gate(site, '2', '0', 0, { text: 'ton', value: site.times.pulse });
  position(site, '1', 'in', `pa${k}`, true);
  position(site, '2', `pb${k}`, '0', false);
  lines.comment('clamp diodes: the core resets into the input');
  lines.diode(`ca${k}`, '0', `pa${k}`, 'vbodyhigh');
  lines.diode(`cb${k}`, `pb${k}`, 'in', 'vbodyhigh');
}

/** The half of the input that a capacitor divider holds, without ripple of its own: twice its current enters at half the voltage. */
function writeDivider(site: PhaseSite): void {
  const { lines, k } = site;
  lines.comment('capacitor divider, taken as large: a source at half the input that draws half its current from there');
  lines.element(`Emid${k} mid${k} 0 in 0 0.5`);
  lines.element(`Vmd${k} mid${k} pb${k} DC 0`);
  lines.element(`Fmid${k} in 0 Vmd${k} 0.5`);
}

/** Hard switched: diagonal pairs, or the two switches of a half bridge, on for one pulse each. */
function pulseGates(site: PhaseSite): void {
  const { times, point } = site;
  const half = 0.5 * times.period;
  const on: Instant = { text: 'ton', value: times.pulse };
  gate(site, '1', '0', 0, on);
  gate(site, '2', 'tper/2', half, on);
  if (point.design.stage.form?.inSeries !== 2) return;
  gate(site, '4', '0', 0, on);
  gate(site, '3', 'tper/2', half, on);
}

/** Shifted legs: each switch on for half a period less the dead time; the second leg follows the first by the pulse. */
function shiftedGates(site: PhaseSite): void {
  const { times } = site;
  const half = 0.5 * times.period;
  const on: Instant = { text: 'tper/2-tdead', value: half - times.gap };
  gate(site, '1', 'tdead', times.gap, on);
  gate(site, '2', 'tper/2+tdead', half + times.gap, on);
  gate(site, '4', 'ton+tdead-tper/2', times.pulse + times.gap - half, on);
  gate(site, '3', 'ton+tdead', times.pulse + times.gap, on);
}

function gate(site: PhaseSite, name: string, text: string, value: number, width: Instant): void {
  const { lines, k, shift, times } = site;
  const from: Instant = { text: `${k}*tshift+${text}`, value: shift + value };
  lines.gate(`gh${name}_${k}`, from, width, { text: 'tper', value: times.period });
}
