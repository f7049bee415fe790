/** `npm run demo`: sweeps the buoy-sensors sheet into runs/demo and shows four designs that represent its front. */
import { rmSync } from 'node:fs';
import { formatQuantity } from '../model/index.ts';
import { main } from './main.ts';
import { packagePath } from './package-path.ts';
import { RUN_FILES } from './run-folder/folder.ts';
import { type FrontDesign, readFront } from './run-folder/front.ts';
import { representatives } from './run-folder/representatives.ts';
import { say } from './terminal/output.ts';
import { table } from './terminal/table.ts';

const SHEET = packagePath('model', 'rails', 'buoy-sensors.yaml');
const FOLDER = packagePath('runs', 'demo');
/** About a minute on two cores. */
const EVALUATIONS = '1M';

rmSync(FOLDER, { recursive: true, force: true });
const status = await main(['sweep', SHEET, '--out', FOLDER, '--evaluations', EVALUATIONS, '--seed', 'demo']);
if (status === 0) showRepresentatives();
process.exitCode = status;

function showRepresentatives(): void {
  const front = readFront(FOLDER);
  const row = ({ title, design }: { title: string; design: FrontDesign }): string[] => [
    title,
    design.id,
    design.family,
    ...front.objectives.map(({ unit }, i) => formatQuantity(design.objectives[i] ?? Number.NaN, unit)),
  ];
  const names = front.objectives.map(({ name }) => ({ head: name, right: true }));
  const lines = table(
    [{ head: '' }, { head: 'design' }, { head: 'family' }, ...names],
    representatives(front).map(row),
  );
  say(['', `${front.designs.length} designs on the front; four of them:`, ...lines, ''].join('\n'));
  say(`Open the page in a browser: ${FOLDER}/${RUN_FILES.page}`);
}
