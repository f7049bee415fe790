/** One run by the built command for all browser tests: swept, spread, its page opened from disk. */
import { execFileSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { JSDOM } from 'jsdom';
import type { PageData } from '../../viz/data.ts';
import { unpack } from '../../viz/pack.ts';

const ROOT = fileURLToPath(new URL('../..', import.meta.url));
const COMMAND = join(ROOT, 'dist/runners/chopfront.js');

/** A run in a folder of the system's temporary place. */
export interface SweptRun {
  /** Where the run lies. */
  readonly run: string;
  /** `page.html` as a browser asks for it. */
  readonly address: string;
  /** The island of the page, as it stands in the file, and what it holds. */
  readonly island: string;
  readonly data: PageData;
  /** Runs the built command beside the run; gives what it printed. */
  command(...words: string[]): string;
  /** A path beside the run. */
  beside(name: string): string;
  remove(): void;
}

/** Sweeps the demo rail, gives its designs their yields, draws its page. */
export function sweptRun(): SweptRun {
  const folder = mkdtempSync(join(tmpdir(), 'chopfront-run-'));
  const run = join(folder, 'run');
  const command = (...words: string[]): string =>
    execFileSync(process.execPath, [COMMAND, ...words], {
      cwd: folder,
      encoding: 'utf8',
      stdio: ['ignore', 'pipe', 'pipe'],
    });
  const sheet = join(ROOT, 'model/rails/buoy-sensors.yaml');
  command('sweep', sheet, '--out', run, '--evaluations', '20000', '--seed', '1', '--no-page');
  command('spread', run, '--samples', '8');
  command('page', run);
  const page = join(run, 'page.html');
  const island = new JSDOM(readFileSync(page, 'utf8')).window.document.getElementById('data')?.textContent ?? '';
  return {
    run,
    address: pathToFileURL(page).href,
    island,
    data: unpack(island),
    command,
    beside: (name) => join(folder, name),
    remove: () => rmSync(folder, { recursive: true, force: true }),
  };
}
