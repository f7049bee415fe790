/** `chopfront spread`: how many of a design would keep every limit, and which tolerance matters most. */
import type { Command } from 'commander';
import { countOption, examples, type SetStatus, wholeOption } from './shared.ts';

interface SpreadOptions {
  readonly samples?: number;
  readonly seed?: string;
  readonly threads?: number;
  readonly json?: boolean;
}

const MORE = `
With no design named, the whole front is sampled and its yields become a column of front.csv, front.json and the page.
`;
/** Samples where none are asked for: of one design, and of each design of a whole front. */
const SAMPLES = { one: 2000, front: 400 } as const;

/** Adds the command to the program. */
export function defineSpread(program: Command, _setStatus: SetStatus): void {
  program
    .command('spread')
    .description('sample tolerances, temperature and line of designs: yield, percentiles, what matters most')
    .argument('<run>', 'run folder')
    .argument('[designs...]', 'ids of designs, or how they begin; the whole front where none is named')
    .option('--samples <count>', 'samples of each design', countOption)
    .option('--seed <text>', 'start of the random numbers; same seed, same samples', '1')
    .option('--threads <count>', 'worker threads', wholeOption(1, 1024))
    .option('--json', 'print machine-readable output and nothing else')
    .addHelpText('after', MORE)
    .addHelpText('after', examples(['spread runs/demo d4f2 --samples 5000', 'spread runs/demo --threads 2']))
    .action(runSpread);
}

async function runSpread(folder: string, ids: readonly string[], options: SpreadOptions): Promise<void> {
  const { openRun } = await import('../spread/open.ts');
  const { drawSpread } = await import('../spread/blocks.ts');
  const { publishYields, writeYields } = await import('../run-folder/yields.ts');
  const { remark, sayJson, sayPainted } = await import('../terminal/output.ts');
  const run = openRun(folder, ids, options.threads ?? 1);
  const samples = options.samples ?? (ids.length > 0 ? SAMPLES.one : SAMPLES.front);
  const seed = options.seed ?? '1';
  const spreads = [];
  try {
    for (const [i, genes] of run.designs.entries()) {
      if (options.json !== true && run.designs.length > 1 && i % 10 === 0) remark(`${i + 1}/${run.designs.length}`);
      spreads.push(await drawSpread(run.drawer, run.problem, genes, samples, seed));
    }
  } finally {
    await run.drawer.close();
  }
  if (ids.length === 0) {
    const yields = Object.fromEntries(spreads.map((one) => [one.id, one.yields[0]?.share ?? Number.NaN]));
    writeYields(folder, { format: 'chopfront-yields', seed, samples, yields });
    publishYields(folder, run.front, yields);
  }
  if (options.json === true) {
    sayJson(spreads);
    return;
  }
  if (ids.length === 0) {
    remark(`${folder}: yields of ${spreads.length} designs written into front.csv and front.json`);
    return;
  }
  const { spreadText } = await import('./spread-text.ts');
  const { painter } = await import('../terminal/colour.ts');
  for (const spread of spreads) sayPainted(spreadText(spread, painter(process.stdout)));
}
