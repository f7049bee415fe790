/** How close the design comes to each limit: tightest first, with the corner where it was judged worst. */
import type { Assessment, Corner, LimitFigure } from '../../model/assessment.ts';
import { capital, spokenLimit } from '../labels.ts';
import { bar } from '../marks/bar.ts';
import { clear, type Root } from '../marks/root.ts';
import { digits, percent, show, showDifference } from '../units.ts';

export const limitsDefaults = {
  /** Margins below this share of what is allowed are called tight. */
  tight: 0.05,
  /** Rows shown, the tightest first. */
  most: Number.POSITIVE_INFINITY,
};

export function renderLimits<E extends Element>(root: Root<E>, design: Assessment, options = limitsDefaults): void {
  const rows = [...design.limits]
    .sort((a, b) => bindingRank(a) - bindingRank(b) || a.slack - b.slack)
    .slice(0, options.most);
  const table = clear(root).append('table').attr('class', 'ledger limits');
  table
    .append('caption')
    .attr('class', 'unseen')
    .text('Every limit with what the design has, what is allowed, the margin and the worst corner');
  const head = table.append('thead').append('tr');
  for (const word of ['Limit', 'has', 'allowed', 'margin', 'worst at'])
    head
      .append('th')
      .attr('scope', 'col')
      .attr('class', word === 'worst at' ? 'words' : null)
      .text(word);
  const body = table.append('tbody');
  for (const limit of rows) {
    const state = verdict(limit, options.tight);
    const row = body.append('tr').attr('class', `whole ${state}`);
    const name = row
      .append('th')
      .attr('scope', 'row')
      .text(capital(spokenLimit(limit.name)));
    if (state !== 'holds')
      name
        .append('span')
        .attr('class', 'flag')
        .text(state === 'broken' ? 'broken' : 'tight');
    row.append('td').text(written(limit, limit.value));
    row.append('td').text(`${sense(limit.name)}${written(limit, limit.allowed)}`);
    bar(row.append('td').text(marginWords(limit)), Math.abs(limit.slack), state);
    row
      .append('td')
      .attr('class', 'where')
      .text(limit.corner === undefined ? 'everywhere' : cornerText(limit.corner));
  }
}

/** Broken limits as a list of sentences; empty where every limit holds. */
export function brokenLimits(limits: readonly LimitFigure[]): readonly string[] {
  return limits
    .filter((limit) => limit.violation > 0)
    .sort((a, b) => b.violation - a.violation)
    .map((limit) => `${capital(spokenLimit(limit.name))}: ${brokenWords(limit)}`);
}

/** `30 mV where 20 mV is allowed, missed by 50.0 %`. */
function brokenWords(limit: LimitFigure): string {
  if (limit.name === 'avoidedBands') return `${show(-limit.value, limit.unit)} inside a band that the sheet avoids`;
  if (isAnswer(limit.name)) return written(limit, limit.value);
  const [least, asked] = isLeast(limit.name) ? ['at least ', 'asked'] : ['', 'allowed'];
  return `${written(limit, limit.value)} where ${least}${written(limit, limit.allowed)} is ${asked}${missedWords(limit)}`;
}

/** By how much; an efficiency in points. */
function missedWords(limit: LimitFigure): string {
  if (limit.name.startsWith('efficiency')) return `, short by ${digits(-100 * limit.margin)} points`;
  return `, missed by ${percent(limit.violation, limit.violation < 1 ? 1 : 0)}`;
}

/** Fractions that people write in percent; efficiencies too. */
const SHARES = new Set(['chokeWindow', 'transformerWindow', 'transformerDuty']);
/** How far outside a range, as a fraction of it; 0 is inside. */
const RANGES = new Set(['chokeReach', 'chokeMaterial', 'transformerMaterial']);
/** 1 is yes, 0 is no. */
const ANSWERS = new Set(['filterChoke', 'controllerAbilities']);

type Named = Pick<LimitFigure, 'unit' | 'name'>;

function isAnswer(name: string): boolean {
  return ANSWERS.has(name) || RANGES.has(name);
}

function isShare({ unit, name }: Named): boolean {
  return unit === '' && (name.startsWith('efficiency') || SHARES.has(name));
}

/** A limit's value for people. */
export function written(limit: Named, value: number): string {
  if (ANSWERS.has(limit.name)) return value >= 1 ? 'yes' : 'no';
  if (RANGES.has(limit.name)) return value <= 0 ? 'yes' : `${percent(value)} outside`;
  return isShare(limit) ? percent(value, limit.name.startsWith('efficiency') ? 2 : 1) : show(value, limit.unit);
}

function marginWords(limit: LimitFigure): string {
  if (isAnswer(limit.name)) return limit.margin < 0 ? 'missing' : 'met';
  const places = limit.name.startsWith('efficiency') ? 2 : 1;
  if (isShare(limit)) return `${limit.margin < 0 ? '' : '+'}${percent(limit.margin, places)}`;
  return showDifference(limit.margin, limit.unit);
}

/** Limits that are kept by having more; efficiencies too. */
const LEAST = new Set([
  'filterChoke',
  'minimumOnTime',
  'minimumOffTime',
  'bulkLife',
  'driveVoltage',
  'controllerLowestFrequency',
  'controllerAbilities',
  'avoidedBands',
]);

/** Whether more of the limit's quantity is better. */
export function isLeast(name: string): boolean {
  return LEAST.has(name) || name.startsWith('efficiency@');
}

/** `≤ ` where less is better, `≥ ` where more is; nothing where the answer is yes or no. */
function sense(name: string): string {
  if (isAnswer(name)) return '';
  return isLeast(name) ? '≥\u00a0' : '≤\u00a0';
}

/** A count that is just met is no close call: such limits stand last. */
function bindingRank(limit: LimitFigure): number {
  return limit.unit === '' && limit.margin === 0 ? 1 : 0;
}

function verdict(limit: LimitFigure, tight: number): 'broken' | 'tight' | 'holds' {
  if (limit.violation > 0) return 'broken';
  return limit.slack < tight && bindingRank(limit) === 0 ? 'tight' : 'holds';
}

function cornerText(corner: Corner): string {
  return `${show(corner.inputVoltage, 'V')} in, ${percent(corner.load, 0)}`;
}
