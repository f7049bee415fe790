/** `parts.csv`: the bill of materials for purchasing. Its total is the cost objective, line by line. */
import type { Assessment } from '../assessment.ts';
import type { Design } from '../design.ts';
import { quoteCell } from '../front-file.ts';
import type { Part } from '../parts/common.ts';
import { listParts, PartsList } from '../parts-list.ts';
import type { RailProblem } from '../problem.ts';
import { engineeringText, toEngineering } from '../quantity/index.ts';
import { boxText, type Requirement, requirementOf } from './requirements.ts';
import { judgedEvaluator } from './solved-point.ts';

/** The text of `parts.csv` for the design of snapped `genes`. */
export function partsCsv(problem: RailProblem, genes: Float64Array): string {
  const { rail } = problem;
  const assessment = problem.assess(genes);
  const { design } = judgedEvaluator(problem, genes);
  const rows = [
    header(rail.currency, rail.quantity),
    ...partRows(design, problem, assessment),
    ...otherRows(assessment),
    totalRow(assessment),
  ];
  return `${rows.map((row) => row.map(quoteCell).join(',')).join('\n')}\n`;
}

function header(currency: string, quantity: number): string[] {
  const money = `[${currency} at ${quantity} pieces]`;
  const needs = COLUMNS.map(({ title, unit }) => `${title} [${toEngineering(unit).unit}]`);
  return ['slot', 'part', 'count', `price of one ${money}`, `cost ${money}`, 'box [mm]', 'value', ...needs];
}

interface Column {
  readonly title: string;
  readonly unit: string;
  readonly read: (need: Requirement) => number | undefined;
}

const COLUMNS: readonly Column[] = [
  { title: 'rated voltage at least', unit: 'V', read: (need) => need.voltage },
  { title: 'saturation current at least', unit: 'A', read: (need) => need.saturation },
  { title: 'current at least', unit: 'A', read: (need) => need.current },
  { title: 'ripple current of one at least', unit: 'A', read: (need) => need.ripple },
  { title: 'resistance at most', unit: 'Ω', read: (need) => need.resistance },
  { title: 'height at most', unit: 'm', read: (need) => need.height },
];

function partRows(design: Design, problem: RailProblem, assessment: Assessment): string[][] {
  const list = new PartsList();
  listParts(list, design);
  const boxes = new Map<string, Part>();
  for (let i = 0; i < list.length; i++) {
    const part = list.parts[i];
    if (part !== undefined) boxes.set(list.slots[i], part);
  }
  return assessment.parts.map(({ slot, name, count, cost }) => {
    const need = requirementOf(design, problem.rail, assessment, slot);
    const part = boxes.get(slot);
    const value = need.value === undefined ? '' : valueText(need.value.amount, need.value.unit);
    const cells = COLUMNS.map(({ read, unit }) => cellText(read(need), unit));
    return [slot, name, String(count), String(cost / count), String(cost), part ? boxText(part) : '', value, ...cells];
  });
}

function valueText(amount: number, unit: string): string {
  return `${engineeringText(amount, unit)} ${toEngineering(unit).unit}`;
}

function cellText(amount: number | undefined, unit: string): string {
  return amount === undefined ? '' : engineeringText(Number(amount.toPrecision(4)), unit);
}

/** Board, placement, heat sink: costs that are no part. */
function otherRows(assessment: Assessment): string[][] {
  const slots = new Set(assessment.parts.map((part) => part.slot));
  return assessment.costs
    .filter(({ name }) => !slots.has(name))
    .map(({ name, value }) => [name, '', '', '', String(value), '', '', ...COLUMNS.map(() => '')]);
}

function totalRow(assessment: Assessment): string[] {
  const total = assessment.costs.reduce((sum, { value }) => sum + value, 0);
  return ['total', '', '', '', String(total), '', '', ...COLUMNS.map(() => '')];
}
