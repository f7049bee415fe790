/** The system's own circuit simulator, run as a short-lived child. */
import { spawn } from 'node:child_process';
import { accessSync, constants, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { delimiter, join } from 'node:path';
import { readRaw } from './raw.ts';
import { checkedRun, type Run, type Simulator, withoutMeasurements } from './run.ts';

/** Longest a simulation may take, ms. */
const PATIENCE = 120_000;
const PROGRAM = 'ngspice';

/** The program's path where it is on the PATH; else undefined. */
export function nativePath(): string | undefined {
  return (process.env.PATH ?? '')
    .split(delimiter)
    .filter((folder) => folder !== '')
    .map((folder) => join(folder, PROGRAM))
    .find(executable);
}

function executable(path: string): boolean {
  try {
    accessSync(path, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}

/** The simulator at `path`. */
export function nativeSimulator(path: string): Simulator {
  return { name: `${PROGRAM} (${path})`, run: (netlist) => simulate(path, netlist) };
}

async function simulate(path: string, netlist: string): Promise<Run> {
  const folder = mkdtempSync(join(tmpdir(), 'chopfront-'));
  try {
    const file = join(folder, 'stage.cir');
    const raw = join(folder, 'stage.raw');
    writeFileSync(file, withoutMeasurements(netlist));
    const said = await runChild(path, ['-b', '-r', raw, file], folder);
    try {
      return checkedRun(netlist, readRaw(readFileSync(raw)));
    } catch (error) {
      const reason = error instanceof Error ? error.message : String(error);
      throw new Error(`${reason}; it said: ${said.trim().split('\n').slice(-3).join(' | ')}`);
    }
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

function runChild(path: string, args: readonly string[], folder: string): Promise<string> {
  return new Promise((resolve, reject) => {
    const child = spawn(path, [...args], { cwd: folder, stdio: ['ignore', 'ignore', 'pipe'], timeout: PATIENCE });
    let said = '';
    child.stderr.on('data', (chunk: Buffer) => {
      said = `${said}${chunk.toString('latin1')}`.slice(-4000);
    });
    child.on('error', reject);
    child.on('close', () => resolve(said));
  });
}
