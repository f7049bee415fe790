/** What-if: knobs for the open design and the rail on one side, what the move does on the other. */
import type { Assessment } from '../../model/assessment.ts';
import type { Rail } from '../../model/rail/rail.ts';
import type { Movable, Verdict } from '../assessor.ts';
import { capital, titled } from '../labels.ts';
import { clear, type Root } from '../marks/root.ts';
import { digits, marginPercent, percent, show, showDifference } from '../units.ts';
import { type DesignKnob, designKnobs, type RailKnob, railKnobs } from '../whatif.ts';
import { brokenLimits } from './limits.ts';

const whatIfDefaults = { steps: 400 };

type Knob = DesignKnob | RailKnob;
type Group = readonly [string, Knob[]];

/** Fills `root` with a knob for each thing that can move; a new design replaces them, a move keeps them. */
export function renderKnobs<E extends Element>(
  root: Root<E>,
  design: Assessment,
  rail: Rail,
  knobs: { readonly genes: readonly Movable[]; readonly own: Readonly<Record<string, number | string>> },
  changes: Readonly<Record<string, string>>,
  o = whatIfDefaults,
): void {
  if (root.attr('data-design') !== design.id) clear(root).attr('data-design', design.id);
  const groups: Group[] = [
    ['The design', [...designKnobs(knobs.own, knobs.genes)]],
    ['The rail', [...railKnobs(rail)]],
  ];
  const sets = root.selectAll<HTMLFieldSetElement, Group>('fieldset').data(groups, ([name]) => name);
  const fields = sets.join((enter) => {
    const set = enter.append('fieldset');
    set.append('legend').text(([name]) => name);
    return set;
  });
  fields
    .selectAll<HTMLDivElement, Knob>('div.knob')
    .data(
      ([, knobs]) => knobs,
      (knob) => knob.name,
    )
    .join((enter) => {
      const row = enter
        .append('div')
        .attr('class', 'knob')
        .attr('data-name', (knob) => knob.name);
      const label = row.append('label').attr('for', (knob) => `knob-${knob.name}`);
      label.append('span').text((knob) => titled('label' in knob ? knob.label : knob.name));
      row.each(function make(knob) {
        control(this, knob, o.steps);
      });
      row.append('output');
      return row;
    })
    .order()
    .each(function fill(this: HTMLDivElement, knob) {
      update(this, knob, changes[knob.name], o.steps);
    });
}

function control(row: HTMLDivElement, knob: DesignKnob | RailKnob, steps: number): void {
  const options = 'gene' in knob ? knob.gene.options : undefined;
  const made = row.ownerDocument.createElement(options === undefined ? 'input' : 'select');
  made.id = `knob-${knob.name}`;
  made.dataset.knob = knob.name;
  if (options === undefined) {
    const whole = isWhole(knob);
    made.setAttribute('type', 'range');
    made.setAttribute('min', whole ? String(spanOf(knob).low) : '0');
    made.setAttribute('max', whole ? String(spanOf(knob).high) : String(steps));
  }
  for (const option of options ?? []) {
    const item = row.ownerDocument.createElement('option');
    item.value = option;
    item.textContent = knob.name === 'architecture' ? titled(option) : option;
    made.append(item);
  }
  row.append(made);
}

function update(row: HTMLDivElement, knob: DesignKnob | RailKnob, change: string | undefined, steps: number): void {
  const own = 'own' in knob ? knob.own : knob.value;
  const value = change === undefined ? own : typeof own === 'number' ? Number(change) : change;
  row.classList.toggle('changed', change !== undefined);
  const input = row.querySelector<HTMLInputElement>('input');
  const select = row.querySelector<HTMLSelectElement>('select');
  const unit = 'gene' in knob ? knob.gene.unit : knob.unit;
  const text = typeof value === 'number' ? show(value, unit) : '';
  if (input !== null && typeof value === 'number') {
    const position = String(isWhole(knob) ? value : Math.round(placeOf(knob, value) * steps));
    if (input.value !== position) input.value = position;
    input.setAttribute('value', position);
    input.setAttribute('aria-valuetext', text);
  }
  if (select !== null) {
    for (const option of select.options) option.toggleAttribute('selected', option.value === value);
    if (select.value !== value) select.value = String(value);
  }
  const output = row.querySelector('output');
  if (output !== null)
    output.textContent = change === undefined || typeof own !== 'number' ? text : `${show(own, unit)} → ${text}`;
}

function isWhole(knob: DesignKnob | RailKnob): boolean {
  return 'gene' in knob && knob.gene.kind === 'whole';
}

function spanOf(knob: DesignKnob | RailKnob): { readonly low: number; readonly high: number; readonly log: boolean } {
  return 'gene' in knob
    ? { low: knob.gene.low, high: knob.gene.high, log: knob.gene.kind === 'log' }
    : { low: knob.low, high: knob.high, log: false };
}

function placeOf(knob: DesignKnob | RailKnob, value: number): number {
  const { low, high, log } = spanOf(knob);
  const share = log ? Math.log(value / low) / Math.log(high / low) : (value - low) / (high - low);
  return Math.max(0, Math.min(1, share));
}

/** The value at a knob's position, SI, rounded to three digits so that a person can repeat it. */
export function knobValue(knob: DesignKnob | RailKnob, position: number, steps = whatIfDefaults.steps): number {
  if (isWhole(knob)) return position;
  const { low, high, log } = spanOf(knob);
  const value = log ? low * (high / low) ** (position / steps) : low + ((high - low) * position) / steps;
  return Math.min(high, Math.max(low, Number(value.toPrecision(3))));
}

/** Before, after and the difference of each objective, then the limits that break. */
export function renderMove<E extends Element>(root: Root<E>, own: Assessment, moved: Verdict | undefined): void {
  clear(root);
  if (moved === undefined) {
    root
      .append('p')
      .attr('class', 'hint')
      .text('Move any knob: the moved design appears as a cross on the picture, and here is what changes.');
    verdict(root, own, 'As chosen it ');
    return;
  }
  if (!moved.ok) {
    root.append('p').attr('class', 'flagged').text(`Cannot be built: ${moved.why}`);
    return;
  }
  const table = root.append('table').attr('class', 'ledger move');
  table.append('caption').attr('class', 'unseen').text('Objectives of the open design and of the moved one');
  const head = table.append('thead').append('tr');
  for (const word of ['Objective', 'as chosen', 'moved', 'change']) head.append('th').attr('scope', 'col').text(word);
  const body = table.append('tbody');
  own.objectives.forEach((figure, k) => {
    const after = moved.value.objectives[k]?.value ?? Number.NaN;
    const row = body.append('tr').attr('class', after < figure.value ? 'gain' : after > figure.value ? 'worse' : '');
    row
      .append('th')
      .attr('scope', 'row')
      .text(titled(figure.name).split(',')[0] ?? '');
    row.append('td').text(show(figure.value, figure.unit));
    row.append('td').text(show(after, figure.unit));
    row
      .append('td')
      .text(
        after === figure.value
          ? 'none'
          : `${showDifference(after - figure.value, figure.unit)} (${changeWords(after / figure.value)})`,
      );
  });
  verdict(root, moved.value, '');
}

/** Whether every limit holds, and each that does not. A design as chosen that keeps them all needs no word. */
function verdict<E extends Element>(root: Root<E>, { limits, worstMargin }: Assessment, start: string): void {
  const broken = brokenLimits(limits);
  if (broken.length === 0) {
    if (start === '')
      root
        .append('p')
        .attr('class', 'kept')
        .text(`Keeps every limit; tightest margin ${marginPercent(worstMargin)}.`);
    return;
  }
  const words = `${start}breaks ${broken.length === 1 ? 'one limit' : `${digits(broken.length)} limits`}`;
  root.append('p').attr('class', 'flagged').text(capital(words));
  const list = root.append('ul').attr('class', 'broken');
  for (const sentence of broken) list.append('li').text(sentence);
}

/** `+12.0 %`; beyond tenfold `×65`. */
function changeWords(ratio: number): string {
  if (ratio >= 10) return `×${digits(Number(ratio.toPrecision(2)))}`;
  return `${ratio < 1 ? '' : '+'}${percent(ratio - 1)}`;
}
