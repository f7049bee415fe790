/** How one design is laid out in the terminal. */
import {
  type Assessment,
  formatQuantity,
  type LossItem,
  type PointReport,
  type Rail,
  type RailProblem,
} from '../../model/index.ts';
import { spoken } from '../../viz/labels.ts';
import { percent } from '../progress/figures.ts';
import type { Paint } from '../terminal/colour.ts';
import { table } from '../terminal/table.ts';
import { plain } from '../terminal/text.ts';
import { stockLines } from './stock-text.ts';

/** The text, several sections, of what a design of `problem` is and how it stands. */
export function designText(assessment: Assessment, problem: RailProblem, paint: Paint): string {
  const { rail } = problem;
  const verdict = assessment.feasible ? paint('keeps every limit', 'good') : paint('breaks a limit', 'bad');
  const sections = [
    [`${paint(assessment.id, 'bold')}  ${plain(assessment.family)} for ${plain(rail.name)}: ${verdict}`],
    objectiveLines(assessment),
    valueLines(assessment),
    section('Parts', partLines(assessment, rail)),
    section('Short of stock', stockLines(assessment, problem)),
    section('Where the watts go (mean over the load profile, nominal input)', lossLines(assessment.losses)),
    section('Load points', pointLines(assessment.points)),
    section('Temperatures (hottest point)', temperatureLines(assessment.points)),
    section('Limits, tightest first', limitLines(assessment, problem, paint)),
    section(
      'Cautions',
      assessment.cautions.map((text) => `  - ${plain(text)}`),
    ),
  ];
  return sections
    .filter((lines) => lines.length > 0)
    .map((lines) => lines.join('\n'))
    .join('\n\n');
}

function section(head: string, lines: readonly string[]): string[] {
  return lines.length === 0 ? [] : [head, ...lines];
}

function objectiveLines(assessment: Assessment): string[] {
  const rows = assessment.objectives.map(({ name, value, unit }) => [spoken(name), formatQuantity(value, unit)]);
  return table([{ head: '' }, { head: '', right: true }], rows);
}

const UNITS: Readonly<Record<string, string>> = { frequency: 'Hz', inductance: 'H' };

function valueLines(assessment: Assessment): string[] {
  const rows = Object.entries(assessment.design.genes).map(([name, value]) => [
    spoken(name),
    UNITS[name] === undefined ? String(value) : formatQuantity(value, UNITS[name]),
  ]);
  return section('Values', table([{ head: '' }, { head: '', right: true }], rows));
}

function partLines(assessment: Assessment, rail: Rail): string[] {
  const rows = assessment.parts.map((part) => [
    spoken(part.slot),
    `${part.count} ×`,
    part.name,
    formatQuantity(part.volume, 'm³'),
    formatQuantity(part.cost, rail.currency),
  ]);
  const right = { head: '', right: true };
  return table(
    [{ head: '' }, right, { head: '' }, { head: 'volume', right: true }, { head: 'cost', right: true }],
    rows,
  );
}

function lossLines(losses: readonly LossItem[]): string[] {
  const total = losses.reduce((sum, item) => sum + item.watts, 0);
  const sorted = losses.filter((item) => item.watts > 0).sort((a, b) => b.watts - a.watts);
  const rows = sorted.map((item) => [
    spoken(item.part),
    spoken(item.effect),
    formatQuantity(item.watts, 'W'),
    percent(item.watts / total),
    '▪'.repeat(Math.round((20 * item.watts) / total)),
  ]);
  rows.push(['together', '', formatQuantity(total, 'W'), '', '']);
  const right = { head: '', right: true };
  return table([{ head: '' }, { head: '' }, right, right, { head: '' }], rows);
}

function pointLines(points: readonly PointReport[]): string[] {
  const rows = points
    .filter((point) => point.share > 0)
    .map((point) => [
      percent(point.load, 0),
      percent(point.share, 0),
      point.mode,
      String(point.activePhases),
      percent(point.dutyCycle),
      percent(point.efficiency),
      formatQuantity(point.loss, 'W'),
      formatQuantity(point.rippleCurrent, 'A'),
      formatQuantity(point.outputRipple, 'V'),
    ]);
  const heads = ['load', 'of time', 'mode', 'phases', 'duty', 'efficiency', 'loss', 'ripple A', 'ripple V'];
  return table(
    heads.map((head) => ({ head, right: head !== 'mode' })),
    rows,
  );
}

function temperatureLines(points: readonly PointReport[]): string[] {
  const hottest = new Map<string, number>();
  for (const point of points) {
    for (const [slot, value] of Object.entries(point.temperatures)) {
      hottest.set(slot, Math.max(value, hottest.get(slot) ?? 0));
    }
  }
  const rows = [...hottest]
    .sort((a, b) => b[1] - a[1])
    .map(([slot, value]) => [spoken(slot), formatQuantity(value, 'K')]);
  return table([{ head: '' }, { head: '', right: true }], rows);
}

function limitLines(assessment: Assessment, problem: RailProblem, paint: Paint): string[] {
  const senses = new Map(problem.limitDefinitions.map(({ name, sense }) => [name, sense]));
  const relative = (limit: Assessment['limits'][number]): number => limit.margin / (Math.abs(limit.allowed) || 1);
  const sorted = [...assessment.limits].sort((a, b) => b.violation - a.violation || relative(a) - relative(b));
  const rows = sorted.map((limit) => [
    limit.violation > 0 ? 'broken' : 'holds',
    spoken(limit.name),
    figure(limit.name, limit.value, limit.unit),
    `at ${senses.get(limit.name) ?? 'most'} ${figure(limit.name, limit.allowed, limit.unit)}`,
    limit.violation > 0 ? `misses by ${percent(limit.violation)}` : '',
    limit.corner === undefined
      ? ''
      : `at ${formatQuantity(limit.corner.inputVoltage, 'V')} in, load ${percent(limit.corner.load, 0)}`,
  ]);
  const right = (head: string): { head: string; right: boolean } => ({ head, right: true });
  const lines = table([{ head: '' }, { head: '' }, right('has'), right('allowed'), { head: '' }, { head: '' }], rows);
  return lines.map((line) => (line.startsWith('  broken') ? paint(line, 'bad') : line));
}

/** A limit's figure: efficiencies are shares, which people write in per cent. */
function figure(name: string, value: number, unit: string): string {
  return name.startsWith('efficiency@') ? percent(value) : formatQuantity(value, unit);
}
