/** `chopfront sweep`: searches a sheet's design space into a run folder. */
import { type Command, InvalidArgumentError, Option } from 'commander';
import { INDEX_VARIABLES } from '../cluster/shard.ts';
import type { SweepOptions } from '../sweep/options.ts';
import {
  countOption,
  durationOption,
  examples,
  type SetStatus,
  shardOption,
  shareOption,
  wholeOption,
} from './shared.ts';

const MORE = `
With no budget given, the sweep ends after 1M evaluations, or before that when the front is steady.
--time counts the hours of all resumptions together; the first budget reached wins.
--shards K splits the search into K closed groups of islands. One machine sweeps all of them; --shard I/K sweeps one
of them, and "chopfront merge" joins such runs. --shard auto takes I from the scheduler's variable:
  ${INDEX_VARIABLES.join(', ')}.
`;

/** Adds the command to the program. */
export function defineSweep(program: Command, setStatus: SetStatus): void {
  const command = program
    .command('sweep')
    .description('search the design space of a sheet into a run folder')
    .argument('[sheet]', 'rail sheet; may be left out with --resume')
    .requiredOption('--out <folder>', 'run folder: new, or with --resume the one to go on with')
    .option('--evaluations <count>', 'end after this many evaluations, such as 500k', countOption)
    .option('--time <duration>', 'end after this long, such as 90s, 30min or 8h', durationOption)
    .option('--until-steady <share>', 'end when the last tenth of the work gained less hypervolume', shareOption)
    .option('--seed <text>', 'start of the random numbers; same seed, same front (default: "1")')
    .option('--threads <count>', 'worker threads (default: one a core)', wholeOption(1, 1024))
    .option('--resume', 'go on with a run that was stopped');
  addScaling(command);
  command
    .option('--no-page', 'do not draw the page at the end')
    .option('--log <form>', 'json: progress as one JSON object a line', jsonOnly)
    .addOption(new Option('--checkpoint <duration>', 'save this often').argParser(durationOption).hideHelp())
    .addOption(new Option('--epoch-limit <duration>', 'longest an epoch may take').argParser(durationOption).hideHelp())
    .addHelpText('after', MORE)
    .addHelpText('after', examples(EXAMPLES))
    .action(async (sheet: string | undefined, options: SweepOptions) => {
      const { sweepCommand } = await import('../sweep/command.ts');
      setStatus(await sweepCommand(sheet, options));
    });
}

const EXAMPLES = [
  'sweep rail.yaml --out runs/night --time 8h',
  'sweep --out runs/night --resume',
  'sweep rail.yaml --out runs/big --on slurm --shards 16 --time 2h --partition batch --time-limit 03:00:00',
  'sweep rail.yaml --out runs/big/shard-00003 --shards 16 --shard 3/16',
];

function addScaling(command: Command): void {
  command
    .option('--shards <count>', 'split the search into this many closed groups of islands', wholeOption(1, 100_000))
    .option('--shard <I/K>', 'sweep only shard I of K, from 0; auto: take I from the scheduler', shardChoice)
    .option('--index-from <number>', 'with --shard auto: number the scheduler counts from', wholeOption(0, 1))
    .addOption(new Option('--on <scheduler>', 'submit the shards as an array job').choices(['slurm']))
    .option('--partition <name>', 'with --on slurm: partition to submit to')
    .option('--time-limit <time>', 'with --on slurm: time limit of each task, such as 08:00:00');
}

function shardChoice(text: string): SweepOptions['shard'] {
  return text === 'auto' ? 'auto' : shardOption(text);
}

function jsonOnly(text: string): 'json' {
  if (text !== 'json') throw new InvalidArgumentError('the only form is json.');
  return text;
}
