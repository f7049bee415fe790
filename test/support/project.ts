/** The project's own files as git tracks them, for the tests that read them as text. */
import { execFileSync } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** The project's folder. */
export const ROOT = fileURLToPath(new URL('../..', import.meta.url));

/** A tracked file and its text. */
export interface TextFile {
  /** Path from the project's folder, with `/`. */
  readonly path: string;
  readonly text: string;
}

/** Paths of all files that git tracks and that are there. */
export function trackedPaths(): readonly string[] {
  const listed = execFileSync('git', ['ls-files', '-z'], { cwd: ROOT, encoding: 'utf8' });
  return listed.split('\0').filter((path) => path !== '' && existsSync(join(ROOT, path)));
}

/** The tracked files whose path fits `pattern`. */
export function trackedTexts(pattern: RegExp): readonly TextFile[] {
  return trackedPaths()
    .filter((path) => pattern.test(path))
    .map((path) => ({ path, text: readText(path) }));
}

/** Text of one file of the project. */
export function readText(path: string): string {
  return readFileSync(join(ROOT, path), 'utf8');
}
