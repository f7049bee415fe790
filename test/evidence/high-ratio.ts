/** High ratios, as arithmetic and as search. */
import type { Section } from '../reference/markdown.ts';
import { handSweep, type RatioGain, ratioGain, TRANSFORMER_FAMILIES } from '../scenarios/high-ratio.ts';
import { percent, stated } from '../scenarios/statement.ts';
import { line, section, TRADE } from './section.ts';

const RATIO = 40_000;
const ARITHMETIC = 20_000;

/** Both, as one section. */
export function ratioSection(): Section {
  const gains = [3.6, 12, 24, 48].map((ratio) => ratioGain(ratio, RATIO));
  const gainOf = (ratio: number): number => gains.find((one) => one.ratio === ratio)?.gain ?? Number.NaN;
  const front = (architectures: typeof TRANSFORMER_FAMILIES, shortest: number): number =>
    handSweep(architectures, shortest, ARITHMETIC).members.length;
  const held = front(['buck-synchronous'], 50e-9);
  const freed = front(['buck-synchronous'], 0);
  const turns = front(TRANSFORMER_FAMILIES, 50e-9);
  const lead = `At 48 V and 60 W, ${RATIO} evaluations for plain bucks and as many for all transformer families; gain is both fronts together over bucks alone.`;
  const table = [
    '| ratio | bucks alone | transformer stages alone | together | gain |',
    '|---:|---:|---:|---:|---:|',
    ...gains.map(ratioLine),
  ];
  return section(
    'High step-down ratios',
    [lead, '', ...table],
    [
      stated(
        '60 V to 1 V, 400 kHz up',
        'an on-time of 50 ns or more leaves no plain buck',
        `${held} designs`,
        held === 0,
      ),
      stated('60 V to 1 V, 400 kHz up', 'a transformer stage has designs', `${turns} designs`, turns > 0),
      stated(
        '60 V to 1 V, 400 kHz up',
        'without a shortest on-time the buck comes back',
        `${freed} designs`,
        freed > 0,
      ),
      stated(
        '48 V, 60 W',
        'transformer families gain next to nothing at 3.6',
        percent(gainOf(3.6)),
        gainOf(3.6) < 0.02,
        TRADE,
      ),
      stated(
        '48 V, 60 W',
        'they gain more at 48 than at 3.6',
        percent(gainOf(48)),
        gainOf(48) > gainOf(3.6) + 0.05,
        TRADE,
      ),
    ],
  );
}

function ratioLine({ ratio, buck, transformer, both, gain }: RatioGain): string {
  return line([`${ratio}`, buck.toFixed(4), transformer.toFixed(4), both.toFixed(4), percent(gain)]);
}
