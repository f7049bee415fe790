/** Every file that a design leaves as, the printable note among them: what the page's buttons and `handoff` both hand out. */
import { designNote, type HandoffContext } from '../../model/handoff/note.ts';
import { type NamedFile, takeAway } from '../../model/handoff/take-away.ts';
import type { RailProblem } from '../../model/problem.ts';
import { spoken, spokenLimit } from '../labels.ts';
import { noteHtml } from './html.ts';

/** Names of the files, in the order of `takeAwayFiles`. */
export const TAKE_AWAY = ['spec.json', 'stage.cir', 'parts.csv', 'magnetics.md', 'note.md', 'note.html'] as const;

/** The files of the design of `genes`, in the order in which they are offered. */
export function takeAwayFiles(problem: RailProblem, genes: Float64Array, context: HandoffContext = {}): NamedFile[] {
  const snapped = Float64Array.from(genes);
  problem.snap(snapped);
  const worded: HandoffContext = { ...context, words: { limit: spokenLimit, name: spoken } };
  return [
    ...takeAway(problem, snapped, worded),
    { name: 'note.html', text: noteHtml(designNote(problem, snapped, worded)) },
  ];
}
