/** Exports that nothing imports and dependencies that nothing uses. */
import { isBuiltIn, packageOf, resolve, sourcesOf } from './rules.ts';
import type { Import, Syntax } from './syntax.ts';

/**
 * Exports that no other file takes, as `path: name`. A re-export counts only if it is itself taken; what `faces` export
 * (the library's entries) counts as taken from outside. A type is no leftover while its own file mentions it: it names
 * what an exported function takes or gives.
 */
export function unusedExports(files: readonly Syntax[], faces: readonly string[]): readonly string[] {
  const byPath = new Map(files.map((file) => [file.path, file]));
  const taken = new Set<string>();
  const take = (path: string | undefined, name: string): void => {
    const file = path === undefined ? undefined : byPath.get(path);
    if (file === undefined || taken.has(`${path}: ${name}`)) return;
    taken.add(`${path}: ${name}`);
    if (name === '*') for (const each of namesOf(file)) take(path, each);
    for (const { from, names, as } of file.reexports) {
      if (as[0] === '*') take(resolve(file.path, from), name);
      else if (as[0] === name) take(resolve(file.path, from), names[0] ?? '*');
    }
  };
  const takeAll = (file: Syntax, { from, names }: Import): void => {
    for (const name of names) take(resolve(file.path, from), name);
  };
  for (const file of files) for (const statement of file.imports) takeAll(file, statement);
  for (const face of faces) take(face, '*');
  return files
    .flatMap((file) =>
      namesOf(file)
        .filter((name) => !file.mentionedTypes.includes(name))
        .map((name) => `${file.path}: ${name}`),
    )
    .filter((id) => !taken.has(id));
}

function namesOf(file: Syntax): readonly string[] {
  return [...file.exports, ...file.reexports.flatMap(({ as }) => as).filter((name) => name !== '*')];
}

/** Packages that `files` import, Node's own modules left out. */
export function packagesOf(files: readonly Syntax[]): ReadonlySet<string> {
  const sources = files.flatMap(sourcesOf).filter((from) => !from.startsWith('.') && !isBuiltIn(from));
  return new Set(sources.map(packageOf));
}
