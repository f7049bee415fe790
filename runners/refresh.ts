/**
 * Rebuilds the files of a running sweep that people look at, in a process of its own that ends at once: drawing a page
 * takes memory that the sweep must not keep. Arguments: the run folder, and `page` where the page is due. Writes the processor
 * seconds that the files took, the page apart, so that the sweep can keep their share of the machine small.
 */
import { reasonOf } from './errors.ts';
import { problemOf } from './inputs.ts';
import { readFound } from './run-folder/found.ts';
import { writePage } from './run-folder/page.ts';
import { publish } from './run-folder/publish.ts';
import { readRecord } from './run-folder/record.ts';
import { readSnapshot } from './run-folder/snapshot.ts';

const [folder = '', wanted] = process.argv.slice(2);
try {
  const problem = problemOf(readSnapshot(folder, readRecord(folder)));
  publish(folder, problem, readFound(folder));
  const { user, system } = process.cpuUsage();
  process.stdout.write(`${(user + system) / 1e6}\n`);
  if (wanted === 'page') await writePage(folder);
} catch (error) {
  process.stderr.write(`${reasonOf(error)}\n`);
  process.exitCode = 1;
}
