/** What the row of each shipped sheet says that the sheet shows, asked of a sweep of that sheet. */
import { processor } from './sheets/buoy-processor.ts';
import { sensors } from './sheets/buoy-sensors.ts';
import { winch } from './sheets/buoy-winch.ts';
import { link } from './sheets/hut-link.ts';
import { shelf } from './sheets/hut-shelf.ts';
import type { Sweep } from './spaces.ts';
import { type Statement, stated, tally } from './statement.ts';

/** Names of the shipped sheets with what is asked of each. */
export const SHEETS: Readonly<Record<string, (found: Sweep, evaluations: number) => readonly Statement[]>> = {
  'buoy-sensors': sensors,
  'buoy-processor': processor,
  'hut-link': link,
  'hut-shelf': shelf,
  'buoy-winch': winch,
};

/** The statements about one sheet: those of its row, and that it has designs. `evaluations` are spent on each side search. */
export function sheetStatements(name: string, found: Sweep, evaluations: number): readonly Statement[] {
  const families = tally(found.members.map((member) => member.family));
  const feasible = stated(name, 'has designs that keep every limit', families, found.members.length > 0, 'the sheet');
  return [feasible, ...SHEETS[name](found, evaluations)];
}
