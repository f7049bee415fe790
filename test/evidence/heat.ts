/** Heat against frequency. */
import type { Section } from '../reference/markdown.ts';
import { EIGHT_FREQUENCIES, type Smallest, smallestAt } from '../scenarios/heat-sink.ts';
import { percent, stated } from '../scenarios/statement.ts';
import { line, section, TRADE } from './section.ts';

/** Evaluations of each of the sweeps at a frequency. */
const HEAT = 15_000;
const HEAT_SEEDS = ['a', 'b', 'c', 'd', 'e', 'f'];

/** The curve of the smallest design over frequency, as a section. */
export function heatSection(): Section {
  const curve = EIGHT_FREQUENCIES.map((f) => smallestAt(f, HEAT, HEAT_SEEDS));
  const volumes = curve.map(({ volume }) => volume);
  const least = volumes.indexOf(Math.min(...volumes));
  const shares = curve.map(({ sink, volume }) => sink / volume);
  const above = shares.filter((_, k) => curve[k].frequency > 500e3);
  const rising = above.every((share, k) => k === 0 || share > above[k - 1]);
  const lead = `Smallest of ${HEAT_SEEDS.length} sweeps of ${HEAT} evaluations at each fixed frequency; controllers without limits of their own, 60 cm² of board. Below 150 kHz it is the large chokes' own heat that asks for a sink; between lies a flat valley where a little sink and a little choke are worth the same.`;
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
        "the heat sink's share rises at every step above 500 kHz",
        above.map(percent).join(', '),
        rising,
        TRADE,
      ),
      stated(
        'hot box',
        'it is largest at 3.2 MHz',
        percent(shares[shares.length - 1]),
        Math.max(...shares) === shares[shares.length - 1],
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
