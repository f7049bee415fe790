/** The five sheets and the demo's front, at budgets of a minute. */
import type { Section } from '../reference/markdown.ts';
import { SHEETS, sheetStatements } from '../scenarios/five-sheets.ts';
import { dominates } from '../scenarios/high-ratio.ts';
import { type Sweep, shippedRail, spaceOf, sweep } from '../scenarios/spaces.ts';
import { percent, stated } from '../scenarios/statement.ts';
import { chosenFrequencies, lossesByFrequency, lossShares, shareWithin } from '../scenarios/trade.ts';
import { line, section, TRADE } from './section.ts';

/** Evaluations of the demo sheet, of each other sheet, of each side question. */
const DEMO = 1_000_000;
const SHEET = 60_000;
const SIDE = 12_000;

/** What the sheets' rows say, then the demo's front. */
export function sheetSections(): readonly Section[] {
  const demo = sweep(spaceOf(shippedRail('buoy-sensors')), DEMO, 'demo');
  return [sheetSection(demo), demoSection(demo)];
}

function sheetSection(demo: Sweep): Section {
  const statements = Object.keys(SHEETS).flatMap((name) => {
    const found = name === 'buoy-sensors' ? demo : sweep(spaceOf(shippedRail(name)), SHEET);
    return sheetStatements(name, found, SIDE);
  });
  const lead = `One sweep a sheet: ${DEMO} evaluations of buoy-sensors, ${SHEET} of each other; ${SIDE} for each side question.`;
  return section('The five sheets', [lead], statements);
}

function demoSection(demo: Sweep): Section {
  const { members, problem, hypervolume } = demo;
  const limits = members.filter(({ genes }) => problem.judge(genes).feasible).length;
  const beaten = members.filter((one) => members.some((other) => dominates(other.objectives, one.objectives))).length;
  const ids = new Set(members.map(({ genes }) => problem.id(genes))).size;
  const same = members.filter(({ genes, objectives }) =>
    problem.assess(genes).objectives.every(({ value }, i) => value === objectives[i]),
  ).length;
  const of = `of ${members.length}`;
  const loss = lossShares(demo);
  const frequencies = chosenFrequencies(demo, 40);
  const inside = shareWithin(frequencies, 100e3, 1e6);
  const statements = [
    stated('demo', 'the front holds 100 designs or more', `${members.length}`, members.length >= 100, 'the sheet'),
    stated('demo', 'every row keeps every limit', `${limits} ${of}`, limits === members.length, 'the sheet'),
    stated('demo', 'no row dominates another', `${beaten} ${of} dominated`, beaten === 0, 'the sheet'),
    stated('demo', 'ids are unique', `${ids} ${of}`, ids === members.length, 'the sheet'),
    stated(
      'demo',
      'assessed again, every row gives the same objectives',
      `${same} ${of}`,
      same === members.length,
      'the sheet',
    ),
    stated(
      'demo',
      'best-efficiency design: loss under a tenth at half load and above',
      percent(loss.best),
      loss.best < 0.1,
      TRADE,
    ),
    stated(
      'demo',
      'balanced design: loss under a tenth at half load and above',
      percent(loss.balanced),
      loss.balanced < 0.1,
      TRADE,
    ),
    stated(
      'demo',
      'most of 40 hypervolume-chosen designs lie between 100 kHz and 1 MHz',
      percent(inside),
      inside > 0.5,
      TRADE,
    ),
  ];
  const lead = `${demo.evaluations} evaluations, hypervolume ${hypervolume.toFixed(4)}. Frequencies of the 40 chosen designs, in kHz: ${frequencies.map((f) => Number((f / 1e3).toPrecision(3))).join(', ')}.`;
  return section('The demo sheet and the facts of the trade', [lead, '', ...frequencyTable(demo)], statements);
}

/** Where the chosen designs' full-load losses go, by frequency: what sets the spread. */
function frequencyTable(demo: Sweep): string[] {
  const rows = lossesByFrequency(demo, 40).map(({ from, to, count, switching, winding, conduction, volume }) =>
    line([
      `${from / 1e3} to ${to / 1e3}`,
      `${count}`,
      percent(switching),
      percent(winding),
      percent(conduction),
      (volume * 1e6).toPrecision(3),
    ]),
  );
  return [
    'Mean shares of the full-load loss in the chosen designs. Going faster buys volume and pays in switching loss, until the efficiency limit stops it; going slower buys nothing once the choke loses what the switches save.',
    '',
    '| kHz | designs | switching, dead time, gate | choke | switch conduction | mean volume, cm³ |',
    '|---|---:|---:|---:|---:|---:|',
    ...rows,
  ];
}
