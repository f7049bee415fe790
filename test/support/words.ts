/** Words that no file of the project holds: machine paths, registry hosts, and where an idea was heard. */
import type { TextFile } from './project.ts';

// Put together from pieces, or this file would hold them itself.
const FOLDERS = ['work', 'tmp', 'root', 'home'].map((name) => `/${name}/`);
const HOSTS = [
  ['registry', 'npmjs'],
  ['registry', 'yarnpkg'],
  ['deb', 'debian', 'org'],
].map((parts) => parts.join('.'));
const ORIGINS = [
  ['seed', ' document'],
  ['lec', 'ture'],
  ['trans', 'cript'],
  ['vid', 'eo'],
].map((parts) => parts.join(''));

const PATTERN = new RegExp(
  [...FOLDERS, ...HOSTS, ...ORIGINS].map((word) => word.replaceAll('.', '\\.')).join('|'),
  'gi',
);

/** Each such word in `file`, with its line. */
export function wordsToAvoid({ path, text }: TextFile): readonly string[] {
  return text
    .split('\n')
    .flatMap((line, index) => [...line.matchAll(PATTERN)].map(([word]) => `${path}:${index + 1}: ${word}`));
}
