/** The rail in one sentence, and what the sweep found, before anything else. */
import type { Rail } from '../../model/rail/rail.ts';
import type { RunRecord } from '../data.ts';
import { listed, spoken, thousands } from '../labels.ts';
import { clear, type Root } from '../marks/root.ts';
import { loadWords, percent, show } from '../units.ts';

export function renderMasthead<E extends Element>(
  root: Root<E>,
  rail: Rail,
  run: RunRecord,
  front: number,
  objectives: readonly string[],
): void {
  clear(root);
  const head = root.append('div').attr('class', 'rail');
  head.append('h1').append('bdi').text(rail.name);
  head.append('p').text(requirement(rail));
  const found = root.append('p').attr('class', 'found');
  found.append('strong').text(`${thousands(front)} designs to choose from.`);
  found
    .append('span')
    .text(
      ` Of ${thousands(run.evaluations)} judged, ${percent(run.feasibleShare, 0)} keep every limit; none of these is beaten by another in ${listed(objectives.map((name) => spoken(name).split(',')[0] ?? ''))} at once.`,
    );
}

/** `10.5 to 15 V in (12.8 V usual) → 3.3 V at 8 A; …`. */
function requirement(rail: Rail): string {
  const { input, output } = rail;
  const out =
    output.minimum === output.maximum
      ? show(output.nominal, 'V')
      : `${show(output.minimum, 'V')} to ${show(output.maximum, 'V')}`;
  const words = [
    `${show(input.minimum, 'V')} to ${show(input.maximum, 'V')} in, usually ${show(input.nominal, 'V')}`,
    `${out} at ${show(output.current, 'A')} out`,
    `ripple under ${show(output.ripple, 'V')}`,
  ];
  if (rail.step !== undefined)
    words.push(`a ${show(rail.step.current, 'A')} step within ±${show(rail.step.deviation, 'V')}`);
  if (rail.profile.some((point) => point.fraction < 0)) words.push('power flows both ways');
  words.push(
    `${show(rail.ambient, 'K')} ambient, ${rail.airSpeed === 0 ? 'still air' : `air at ${rail.airSpeed}\u00a0m/s`}`,
  );
  return `${words.join(' · ')}`;
}

/** Load profile in words: `40 % of the time at 2 % load, …`. */
export function profileWords(rail: Rail): string {
  return listed(rail.profile.map((point) => `${percent(point.share, 0)} of the time at ${loadWords(point.fraction)}`));
}
