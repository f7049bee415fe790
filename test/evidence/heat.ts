/** Heat against frequency. */
import type { Section } from '../reference/markdown.ts';
import { BOARDS, EIGHT_FREQUENCIES, type Smallest, smallestAt } from '../scenarios/heat-sink.ts';
import { percent, type Statement, stated } from '../scenarios/statement.ts';
import { line, section, TRADE } from './section.ts';

/** Evaluations of each of the sweeps at a frequency. */
const HEAT = 40_000;
/** More sweeps where small designs lie close together. */
const SEEDS = { open: ['a', 'b', 'c', 'd'], brick: ['a', 'b'] } as const;

/** A curve with what is said of it. */
interface Board {
  readonly where: string;
  readonly title: string;
  readonly curve: readonly Smallest[];
  /** Where the sink's share begins to rise at every step. */
  readonly from: 'the first sink' | 'the smallest design';
}

/** The curves of the smallest design over frequency on both boards, as a section. */
export function heatSection(): Section {
  const lead = `Smallest of ${SEEDS.open.length} and ${SEEDS.brick.length} sweeps of ${HEAT} evaluations at each fixed frequency; controllers without limits of their own. A choke gives part of its heat to the air by its own sides, so where frequency is low and chokes are bulky, more choke and more sink stand in for each other. On 60 cm² the board alone cools the smallest designs until switching loss outgrows it; on a quarter brick's outline chokes or a sink must help at every frequency.`;
  const boards: readonly Board[] = [
    { where: 'hot box', title: 'A board of 60 cm²', curve: curveOf('open'), from: 'the first sink' },
    {
      where: 'hot brick',
      title: "A quarter brick's outline, 58.4 mm by 36.8 mm",
      curve: curveOf('brick'),
      from: 'the smallest design',
    },
  ];
  return section(
    'Heat takes back what frequency gave: 48 V to 12 V, 500 W, still air',
    [
      lead,
      '',
      ...boards.flatMap(({ title, curve }) => [`${title}:`, '', ...HEAD, ...curve.map(heatLine), '']).slice(0, -1),
    ],
    boards.flatMap(statements),
  );
}

function curveOf(board: keyof typeof BOARDS): readonly Smallest[] {
  return EIGHT_FREQUENCIES.map((f) => smallestAt(f, HEAT, SEEDS[board], BOARDS[board]));
}

const HEAD = [
  '| kHz | volume, cm³ | heat sink, cm³ | its share | chokes, cm³ | loss, W | family |',
  '|---:|---:|---:|---:|---:|---:|---|',
];

function statements({ where, curve, from }: Board): Statement[] {
  const volumes = curve.map(({ volume }) => volume);
  const least = volumes.indexOf(Math.min(...volumes));
  const shares = curve.map(({ sink, volume }) => sink / volume);
  const place = `${((curve[least]?.frequency ?? Number.NaN) / 1e3).toFixed(0)} kHz`;
  // What frequency gave is taken back past the smallest design; where a board cools, no design before it has a sink either.
  const judged = from === 'the smallest design' ? shares.slice(least) : shares;
  const none = judged.findIndex((share) => share > 0) - 1;
  return [
    stated(
      where,
      'the smallest design lies between 50 kHz and 3.2 MHz',
      place,
      least > 0 && least < curve.length - 1,
      TRADE,
    ),
    stated(
      where,
      `the heat sink's share rises with frequency: from ${from} on at every step${from === 'the first sink' ? ', and it never falls' : ''}`,
      shares.map(percent).join(', '),
      judged.every((share, k) => k <= none || k === 0 || share > (judged[k - 1] ?? Number.NaN)) &&
        (judged.at(-1) ?? 0) > 0,
      TRADE,
    ),
  ];
}

function heatLine({ frequency, volume, sink, chokes, loss, family }: Smallest): string {
  const cm = (value: number): string => (value * 1e6).toPrecision(3);
  return line([
    `${Number((frequency / 1e3).toPrecision(3))}`,
    cm(volume),
    cm(sink),
    percent(sink / volume),
    cm(chokes),
    loss.toPrecision(3),
    family,
  ]);
}
