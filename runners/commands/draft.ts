/** `chopfront draft`: writes a commented starter sheet, or one of the shipped ones. */
import type { Command } from 'commander';
import { SHIPPED_RAILS } from '../../model/rail/shipped.ts';
import { refusal } from '../errors.ts';
import { examples, type SetStatus } from './shared.ts';

interface DraftOptions {
  readonly scenario?: string;
  readonly force?: boolean;
}

/** What each shipped sheet is for, in the order of `SHIPPED_RAILS`. */
const SCENARIOS: Readonly<Record<string, string>> = {
  'buoy-sensors': '12 V battery to 3.3 V 8 A, asleep most of the time, one band to avoid',
  'buoy-processor': '48 V to 1 V 60 A with fast load steps; transformer stages beside the buck',
  'hut-link': '48 V bus to and from a 12 V battery, 60 A both ways',
  'hut-shelf': '400 V to 12 V 40 A with a transformer',
  'buoy-winch': '24 V to 5 V 12 A, 5 mV of ripple, under a lid of 3.5 mm',
};

/** Names of the scenarios, for `--help` and completion. */
export const SCENARIO_NAMES: readonly string[] = SHIPPED_RAILS.map((file) => file.replace(/\.yaml$/, ''));

const MORE = `
Nothing is asked: the sheet explains itself in its comments. Without --scenario it is a complete small rail to change.

Scenarios, all invented:
${SCENARIO_NAMES.map((name) => `  ${name.padEnd(14)}  ${SCENARIOS[name] ?? ''}`).join('\n')}`;

/** Adds the command to the program. */
export function defineDraft(program: Command, _setStatus: SetStatus): void {
  program
    .command('draft')
    .description('write a commented sheet to start from')
    .argument('<sheet>', 'file to write, such as rail.yaml')
    .option('--scenario <name>', 'start from one of the shipped sheets instead, listed below')
    .option('--force', 'replace the file if it exists')
    .addHelpText('after', MORE)
    .addHelpText('after', examples(['draft rail.yaml', 'draft winch.yaml --scenario buoy-winch']))
    .action(runDraft);
}

async function runDraft(path: string, options: DraftOptions): Promise<void> {
  const { starterSheet } = await import('../../model/rail/starter.ts');
  const { writeNew } = await import('./write-new.ts');
  const { remark } = await import('../terminal/output.ts');
  const text = options.scenario === undefined ? starterSheet() : await scenario(options.scenario);
  writeNew(path, text, options.force === true);
  remark(`${path}: written; edit it, then look at what it means with: chopfront check ${path}`);
}

async function scenario(name: string): Promise<string> {
  const { packagePath } = await import('../package-path.ts');
  const { readText } = await import('../run-folder/files.ts');
  const bare = name.replace(/\.yaml$/, '');
  if (SCENARIO_NAMES.includes(bare)) {
    return readText(packagePath('model', 'rails', `${bare}.yaml`), 'a shipped sheet');
  }
  const { nearest } = await import('../../model/quantity/nearest.ts');
  const near = nearest(bare, SCENARIO_NAMES);
  const hint = near === undefined ? '' : `; did you mean ${near}?`;
  throw refusal('unknown-scenario', { name, names: SCENARIO_NAMES.join(', '), nearest: hint });
}
