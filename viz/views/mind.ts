/** Cautions and what the model leaves out, in plain words. */
import { clear, type Root } from '../marks/root.ts';

export function renderMind<E extends Element>(
  root: Root<E>,
  cautions: readonly string[],
  notCovered: readonly string[],
): void {
  clear(root);
  const list = root.append('ul').attr('class', 'cautions');
  for (const caution of cautions) list.append('li').text(caution);
  if (notCovered.length > 0) root.append('p').text(`Not covered here: ${notCovered.join(', ')}.`);
  root.append('p').text('This tool plans; it does not certify. Local codes and licensed practice come first.');
}
