/** The price of a ripple limit. */
import type { Section } from '../reference/markdown.ts';
import { wholeAndQuarter } from '../scenarios/ripple-limit.ts';
import { percent, stated } from '../scenarios/statement.ts';
import { line, section } from './section.ts';

const RIPPLE = 25_000;

/** The winch with its ripple limit and with a quarter of it, as a section. */
export function rippleSection(): Section {
  const [whole, quarter] = wholeAndQuarter(RIPPLE);
  const dearer =
    quarter.phases > whole.phases || quarter.capacitance > whole.capacitance || quarter.volume > whole.volume;
  const rows = [
    ['5 mV', whole],
    ['1.25 mV', quarter],
  ] as const;
  const lines = rows.map(([limit, { phases, capacitance, volume, hypervolume }]) =>
    line([
      limit,
      `${phases}`,
      (capacitance * 1e6).toPrecision(3),
      (volume * 1e6).toPrecision(3),
      hypervolume.toFixed(4),
    ]),
  );
  const head = [
    '| ripple limit | phases | output capacitance, µF | volume, cm³ | hypervolume of the front |',
    '|---|---:|---:|---:|---:|',
  ];
  const lost = 1 - quarter.hypervolume / whole.hypervolume;
  return section(
    'The price of a ripple limit: the smallest design of buoy-winch',
    [...head, ...lines],
    [
      stated(
        'buoy-winch',
        'a quarter of the ripple costs phases, capacitance or volume',
        `${quarter.phases} phases, ${(quarter.capacitance * 1e6).toPrecision(3)} µF`,
        dearer,
      ),
      stated('buoy-winch', 'a quarter of the ripple costs hypervolume', percent(lost), lost > 0),
    ],
  );
}
