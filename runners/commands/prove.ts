/** `chopfront prove`: simulates designs of a run and sets what the model predicted beside what the circuit shows. */
import type { Command } from 'commander';
import { refusal } from '../errors.ts';
import { examples, type SetStatus, wholeOption } from './shared.ts';

interface ProveOptions {
  readonly top?: number;
  readonly json?: boolean;
  readonly simulator?: string;
}

const MORE = `
The system's own simulator is used where it is on the PATH, else the packaged one. Results are kept in the run folder
as proof-<id>.json. A circuit of ideal switches proves waveforms, conduction and ripple, not switching or core loss.
`;

/** Adds the command to the program. */
export function defineProve(program: Command, _setStatus: SetStatus): void {
  program
    .command('prove')
    .description('simulate designs of a run in a circuit simulator')
    .argument('<run>', 'run folder')
    .argument('[designs...]', 'ids of designs, or how they begin')
    .option('--top <count>', 'the first of the front that are best in each objective, this many', wholeOption(1, 1000))
    .option('--simulator <kind>', 'native or packaged; either where left out')
    .option('--json', 'print machine-readable output and nothing else')
    .addHelpText('after', MORE)
    .addHelpText('after', examples(['prove runs/demo d4f2', 'prove runs/demo --top 5 --json']))
    .action(runProve);
}

async function runProve(folder: string, ids: readonly string[], options: ProveOptions): Promise<void> {
  const { chooseSimulator } = await import('../simulate/choose.ts');
  const { prove } = await import('../simulate/proof.ts');
  const { writeProof } = await import('../run-folder/proofs.ts');
  const { openDesign } = await import('../run-folder/design.ts');
  const { remark, sayJson, sayPainted } = await import('../terminal/output.ts');
  const { proofText } = await import('./prove-text.ts');
  const { painter } = await import('../terminal/colour.ts');
  const chosen = ids.length > 0 ? ids : await topOf(folder, options.top);
  const kind = options.simulator === 'native' || options.simulator === 'packaged' ? options.simulator : undefined;
  const opened = chosen.map((id) => openDesign(folder, id));
  const simulator = await chooseSimulator(kind);
  if (simulator === undefined) throw refusal('simulator-missing', {});
  const proofs = [];
  for (const [i, { problem, genes }] of opened.entries()) {
    const told = (text: string): void => remark(`${i + 1}/${opened.length} ${text}`);
    const proof = await prove(problem, genes, simulator, options.json === true ? undefined : told);
    writeProof(folder, proof);
    proofs.push(proof);
    if (options.json !== true) sayPainted(proofText(proof, painter(process.stdout)));
  }
  if (options.json === true) sayJson(proofs);
}

/** Ids of `count` designs: the best of each objective, then in the front's order. */
async function topOf(folder: string, count: number | undefined): Promise<string[]> {
  if (count === undefined) throw refusal('usage', { text: 'give the ids of designs, or --top', command: 'prove ' });
  const { readFront } = await import('../run-folder/front.ts');
  const { designs, objectives } = readFront(folder);
  const best = objectives.flatMap((_, k) => {
    const sorted = [...designs].sort((a, b) => (a.objectives[k] ?? 0) - (b.objectives[k] ?? 0));
    return sorted.slice(0, 1).map(({ id }) => id);
  });
  return [...new Set([...best, ...designs.map(({ id }) => id)])].slice(0, count);
}
