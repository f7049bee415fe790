/** The open design's head: what it is, its figures, and what can be done with it. */
import type { Assessment } from '../../model/assessment.ts';
import type { Proof } from '../../model/handoff/proof.ts';
import { counted, spoken, spokenLimit } from '../labels.ts';
import { clear, type Root } from '../marks/root.ts';
import { marginPercent, percent, show } from '../units.ts';
import { familyMark, familyName } from './legend.ts';
import { brokenLimits } from './limits.ts';
import { verdictOf } from './proof.ts';

export interface OpenInput {
  readonly design: Assessment;
  readonly isPinned: boolean;
  readonly isLeft: boolean;
  readonly isIncumbent: boolean;
  /** How many others the model cannot tell from it. */
  readonly alike: number;
  /** Whether it is a near miss: it breaks a limit. */
  readonly isMiss: boolean;
  /** Share of samples within tolerances that keep every limit, where a spread was run. */
  readonly yield?: number | undefined;
  readonly proof?: Proof | undefined;
}

export function renderOpenHead<E extends Element>(root: Root<E>, input: OpenInput): void {
  const { design } = input;
  const head = clear(root).append('div').attr('class', 'card-head');
  const name = head.append('h2');
  name
    .append('span')
    .attr('class', 'kicker')
    .text(input.isMiss ? 'Open near miss' : 'Open design');
  name.append('bdi').attr('class', 'id').text(design.id);
  const actions = head.append('div').attr('class', 'controls');
  actions
    .append('button')
    .attr('type', 'button')
    .attr('data-act', 'pin')
    .attr('aria-pressed', String(input.isPinned))
    .text(input.isPinned ? 'Pinned' : 'Pin');
  actions
    .append('button')
    .attr('type', 'button')
    .attr('data-act', 'go')
    .attr('data-to', 'whatif-section')
    .text('What if …');
  const line = root.append('p').attr('class', 'family-line');
  familyMark(line, design.family);
  line.append('span').text(`${familyName(design.family)} · ${genesText(design)}`);
  for (const sentence of brokenLimits(design.limits))
    root.append('p').attr('class', 'flagged breaks').text(`Breaks a limit. ${sentence}.`);
  figures(root, input);
  if (input.proof !== undefined && !input.proof.agrees)
    root.append('p').attr('class', 'flagged').text(verdictOf(input.proof));
  root.append('p').attr('class', 'note').text(remarks(input));
}

/** `404 kHz, 10 µH`: the genes with a unit, in the record's order. */
function genesText(design: Assessment): string {
  const { frequency, inductance, phases } = design.design.genes;
  const words: string[] = [];
  if (frequency !== undefined) words.push(show(frequency, 'Hz'));
  if (inductance !== undefined) words.push(`${show(inductance, 'H')}${(phases ?? 1) > 1 ? ' a phase' : ''}`);
  return words.join(', ');
}

function figures<E extends Element>(root: Root<E>, { design, yield: share }: OpenInput): void {
  const list = root.append('dl').attr('class', 'figures');
  const full = design.points.find((point) => point.load === 1);
  const pairs = design.objectives.map((figure) => [shortly(figure.name), show(figure.value, figure.unit)]);
  if (full !== undefined) pairs.push(['efficiency at full load', percent(full.efficiency)]);
  if (share !== undefined) pairs.push(['yield within tolerances', percent(share)]);
  for (const [name = '', value = ''] of pairs) {
    const pair = list.append('div');
    pair.append('dt').text(name);
    pair.append('dd').text(value);
  }
}

/** `mean loss` for `loss, profile mean`. */
function shortly(name: string): string {
  const [what = '', of] = spoken(name).split(', profile ');
  return of === undefined ? what : `${of} ${what}`;
}

function remarks(input: OpenInput): string {
  const words = input.isMiss
    ? ['It is not on the front; “What each limit costs”, below, says what it would buy.']
    : [`Tightest margin ${marginPercent(input.design.worstMargin)}${tightest(input.design)}.`];
  if (input.alike > 0)
    words.push(
      `Within the model’s error ${counted(input.alike, 'other design')} ${input.alike === 1 ? 'is' : 'are'} as good.`,
    );
  if (!input.isLeft && !input.isMiss) words.push('It lies outside the ranges you set.');
  if (input.isIncumbent) words.push('It is one of the sheet’s existing designs.');
  if (input.proof?.agrees === true) words.push('A circuit simulation agrees with the model.');
  return words.join(' ');
}

/** ` in output ripple`: the limit that is closest as a fraction of what is allowed. */
function tightest({ limits, worstMargin }: Assessment): string {
  const found = limits.find((limit) => limit.slack === worstMargin);
  return found === undefined ? '' : `, in ${spokenLimit(found.name)}`;
}
