/** How `check` lays out what a sheet means. */
import { formatQuantity, type Rail, type RailExplanation } from '../../model/index.ts';
import { rounded } from '../progress/figures.ts';
import { painter } from '../terminal/colour.ts';
import { sayPainted } from '../terminal/output.ts';
import { table } from '../terminal/table.ts';
import { plain } from '../terminal/text.ts';

/** Facts are short sentences and are never cut. */
const FACT_WIDTH = 200;

/** Prints the explanation. */
export function showExplanation(rail: Rail, explanation: RailExplanation): void {
  const paint = painter(process.stdout);
  const { facts, architectures, baseline, spaceSize, cautions, notCovered } = explanation;
  const lines = [
    paint(plain(rail.name), 'bold'),
    '',
    ...table(
      [{ head: '' }, { head: '' }],
      facts.map((fact) => [fact.name, fact.text]),
      FACT_WIDTH,
    ),
    '',
    'Architectures',
    ...architectures.map((one) => architectureLine(one)),
    '',
    `Baseline: a series regulator would reach ${(100 * baseline.efficiency).toFixed(1)} % and turn ${formatQuantity(baseline.loss, 'W')} into heat.`,
    `Space: about ${sizeText(spaceSize)} designs.`,
    '',
    ...listed('Cautions', cautions),
    ...listed('Not covered', notCovered),
  ];
  sayPainted(lines.join('\n').trimEnd());
}

function architectureLine(one: RailExplanation['architectures'][number]): string {
  return `  ${one.possible ? 'can' : 'cannot'}  ${plain(one.name)}${one.reason === '' ? '' : `: ${plain(one.reason)}`}`;
}

function listed(head: string, texts: readonly string[]): string[] {
  return texts.length === 0 ? [] : [head, ...texts.map((text) => `  - ${plain(text)}`), ''];
}

function sizeText(size: number): string {
  return size < 1e6 ? rounded(size) : size.toExponential(1).replace(/e\+?(\d+)/, '·10^$1');
}
