/** How a proof is laid out in the terminal. */
import { formatQuantity, type Proof } from '../../model/index.ts';
import { percent } from '../progress/figures.ts';
import type { Paint } from '../terminal/colour.ts';
import { table } from '../terminal/table.ts';

/** The proof in words and tables. */
export function proofText(proof: Proof, paint: Paint): string {
  const verdict = proof.agrees ? paint('agrees', 'good') : paint('disagrees somewhere', 'bad');
  return [
    `${paint(proof.id, 'bold')}  simulated with ${proof.simulator}: ${verdict}`,
    ...proof.corners.flatMap((corner) => ['', ...cornerLines(corner, paint)]),
    '',
    ...proof.limits.map(({ name, unit, simulated, allowed, holds }) => {
      const text = `  ${name}: ${formatQuantity(simulated, unit)} of ${formatQuantity(allowed, unit)} ${holds ? 'holds' : 'does not hold'}`;
      return holds ? text : paint(text, 'bad');
    }),
    '',
    'Ideal switches prove waveforms, conduction and ripple; they cannot prove switching or core loss.',
  ].join('\n');
}

function cornerLines(corner: Proof['corners'][number], paint: Paint): string[] {
  const head = `${formatQuantity(corner.inputVoltage, 'V')} in, ${formatQuantity(corner.outputVoltage, 'V')} out, load ${percent(corner.load, 0)}`;
  if (corner.failure !== undefined) return [head, paint(`  not simulated: ${corner.failure}`, 'bad')];
  const rows = corner.figures.map(({ name, unit, predicted, simulated, difference, band, agrees }) => [
    name,
    formatQuantity(predicted, unit),
    formatQuantity(simulated, unit),
    `${difference < 0 ? '−' : '+'}${percent(Math.abs(difference), 2)}`,
    `± ${percent(band)}`,
    agrees ? '' : 'beyond',
  ]);
  const right = (title: string): { head: string; right: boolean } => ({ head: title, right: true });
  const heads = [
    { head: '' },
    right('predicted'),
    right('simulated'),
    right('difference'),
    right('band'),
    { head: '' },
  ];
  return [head, ...table(heads, rows).map((line) => (line.includes('beyond') ? paint(line, 'bad') : line))];
}
