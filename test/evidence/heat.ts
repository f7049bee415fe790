/** Heat against frequency. */
import type { Section } from '../reference/markdown.ts';
import { EIGHT_FREQUENCIES, type Smallest, smallestAt } from '../scenarios/heat-sink.ts';
import { percent, stated } from '../scenarios/statement.ts';
import { line, section, TRADE } from './section.ts';

/** Evaluations of each of the sweeps at a frequency. */
const HEAT = 40_000;
const HEAT_SEEDS = ['a', 'b', 'c', 'd'];

/** The curve of the smallest design over frequency, as a section. */
export function heatSection(): Section {
  const curve = EIGHT_FREQUENCIES.map((f) => smallestAt(f, HEAT, HEAT_SEEDS));
  const volumes = curve.map(({ volume }) => volume);
  const least = volumes.indexOf(Math.min(...volumes));
  const shares = curve.map(({ sink, volume }) => sink / volume);
  // Once a sink is worth its volume its share must grow; before that there is none to grow.
  const rising = shares.every((share, k) => k === 0 || share > shares[k - 1] || (share === 0 && shares[k - 1] === 0));
  const lead = `Smallest of ${HEAT_SEEDS.length} sweeps of ${HEAT} evaluations at each fixed frequency; controllers without limits of their own, 60 cm² of board, which cool the smallest design alone until switching loss outgrows them. A choke gives part of its heat to the air by its own sides.`;
  const head = [
    '| kHz | volume, cm³ | heat sink, cm³ | its share | chokes, cm³ | loss, W | family |',
    '|---:|---:|---:|---:|---:|---:|---|',
  ];
  const place = `${(curve[least].frequency / 1e3).toFixed(0)} kHz`;
  return section(
    'Heat takes back what frequency gave: 48 V to 12 V, 500 W, still air',
    [lead, '', ...head, ...curve.map(heatLine)],
    [
      stated(
        'hot box',
        'the smallest design lies between 50 kHz and 3.2 MHz',
        place,
        least > 0 && least < curve.length - 1,
        TRADE,
      ),
      stated(
        'hot box',
        "the heat sink's share rises with frequency: from the first sink on at every step, and it never falls",
        shares.map(percent).join(', '),
        rising && shares[shares.length - 1] > 0,
        TRADE,
      ),
    ],
  );
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
