/**
 * What some tests need beyond Node and git. A test that lacks it is left out by name and with its reason, so that
 * `npm test` passes on a bare machine; with CHOPFRONT_NO_SKIP set (as in `.ci/run`) the same lack is a failure.
 *
 * `describe.runIf(needs('ngspice'))('the netlist in a native simulator', …)`
 */
import { accessSync, constants } from 'node:fs';
import { delimiter, join } from 'node:path';

/** Each tool by the programs it consists of: all of a list's inner names count as one program under several names. */
const TOOLS = {
  chromium: [['chromium', 'chromium-browser', 'google-chrome']],
  ngspice: [['ngspice']],
  slurm: [['slurmctld'], ['slurmd'], ['sbatch'], ['squeue'], ['munged']],
} as const satisfies Record<string, readonly (readonly string[])[]>;

export type Tool = keyof typeof TOOLS;

/** Whether every program of `tool` is here. Where not, says so once (see `lacking`). */
export function needs(tool: Tool): boolean {
  const missing = TOOLS[tool].filter((names) => programPath(...names) === undefined).map((names) => names[0]);
  return missing.length === 0 || lacking(tool, `not on this machine: ${missing.join(', ')}`);
}

/** Leaves out what needs `name`, because of `reason`: prints both and answers false; throws where nothing may be left out. */
export function lacking(name: string, reason: string): false {
  const text = `left out, needs ${name}: ${reason}`;
  if (process.env.CHOPFRONT_NO_SKIP) throw new Error(`${text} (CHOPFRONT_NO_SKIP is set: nothing may be left out)`);
  process.stderr.write(`${text}\n`);
  return false;
}

/** Full path of the first of `names` that is an executable file in PATH or in the system's own folders. */
function programPath(...names: string[]): string | undefined {
  const folders = [...(process.env.PATH ?? '').split(delimiter), '/usr/bin', '/usr/sbin', '/usr/local/bin'];
  return names.flatMap((name) => folders.map((folder) => join(folder, name))).find(executable);
}

function executable(path: string): boolean {
  try {
    accessSync(path, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}
