/** Take-away: one button a file, with what it is for. */
import { counted } from '../labels.ts';
import { clear, type Root } from '../marks/root.ts';

/** What each file is for, by name. */
const PURPOSE: Readonly<Record<string, string>> = {
  'spec.json': 'every chosen value, for programs and for later',
  'stage.cir': 'netlist for a circuit simulator',
  'parts.csv': 'parts list for purchasing',
  'magnetics.md': 'order sheet for the wound parts',
  'note.html': 'design note that prints well',
  'note.md': 'the same note as plain text',
};

export function renderAway<E extends Element>(root: Root<E>, id: string, files: readonly string[], left: number): void {
  clear(root);
  const list = root.append('ul').attr('class', 'away');
  for (const name of files) item(list, name, `${PURPOSE[name] ?? 'file'} · design ${id}`);
  item(list, 'front.csv', `${counted(left, 'design')} left, for a spreadsheet`);
  root
    .append('p')
    .attr('class', 'hint')
    .text(
      'The address of this page holds the view: copy it to return here. Print for a paper record of the open design.',
    );
}

function item(list: Root<HTMLUListElement>, name: string, words: string): void {
  const line = list.append('li');
  line.append('button').attr('type', 'button').attr('data-act', 'away').attr('data-file', name).text(name);
  line.append('span').text(words);
}
