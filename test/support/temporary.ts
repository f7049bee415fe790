/** One folder for everything that tests write outside the project, removed with all it holds when they end. */
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

/** Makes the folder and points the temporary folder of this process and its children at it; returns what removes it again. */
export default function setup(): () => void {
  const folder = mkdtempSync(join(tmpdir(), 'chopfront-tests-'));
  process.env.TMPDIR = folder;
  return () => rmSync(folder, { recursive: true, force: true, maxRetries: 10 });
}
