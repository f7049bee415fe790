/** The rules of the rooms, as pure functions from what was read to the list of what breaks them. */
import { builtinModules } from 'node:module';
import { posix } from 'node:path';
import type { Platform, Room } from './folder-map.ts';
import type { Syntax } from './syntax.ts';

/** Functions of Math on which every engine agrees to the last bit. */
const EXACT = new Set('sqrt abs min max floor ceil round trunc sign imul fround'.split(' '));

/** Names that belong to a part of the platform; where a room may not use it, it may not use them. */
const NAMES: Readonly<Record<Exclude<Platform, 'any development dependency'>, RegExp>> = {
  'the DOM':
    /^(document|window|self|navigator|location|history|localStorage|sessionStorage|fetch|XMLHttpRequest|matchMedia|getComputedStyle|requestAnimationFrame|alert|Document|Window|Element|Node|Event|(HTML|SVG|Canvas|DOM)\w+|\w+(Event|Observer))$/,
  'the clock': /^(Date|performance|Temporal)$/,
  Node: /^(process|Buffer|global|require|module|exports|__dirname|__filename|NodeJS|import\.meta|Worker|SharedArrayBuffer|Atomics)$/,
};

/** Rooms that every engine must run to the same bits: no chance, no waiting, no way to what the other rules cannot see. */
const PURE = ['optimizer/', 'model/'];
const IMPURE =
  /^(Math\.random|crypto|set(Timeout|Interval|Immediate)|clear(Timeout|Interval|Immediate)|queueMicrotask|globalThis|eval|Function|Intl|console|import\(…\))$/;

/** Imports that the folder map does not allow. */
export function forbiddenImports(files: readonly Syntax[], map: readonly Room[]): readonly string[] {
  return files.flatMap((file) => {
    const room = roomOf(file.path, map);
    if (room === undefined) return [`${file.path}: is in no folder of the map`];
    return sourcesOf(file)
      .filter((from) => !mayImport(file.path, from, room))
      .map((from) => `${file.path}: may not import ${from}`);
  });
}

function mayImport(path: string, from: string, room: Room): boolean {
  const target = resolve(path, from);
  if (target === undefined) return mayUse(from, room);
  return [room.folder, ...room.mayImport].some(
    (allowed) => target === allowed || (allowed.endsWith('/') && target.startsWith(allowed)),
  );
}

function mayUse(from: string, room: Room): boolean {
  if (room.platform.includes('any development dependency')) return true;
  if (isBuiltIn(from) && room.platform.includes('Node')) return true;
  return room.packages.includes(from) || room.packages.includes(packageOf(from));
}

/** Globals that the folder map does not allow where they are used. */
export function forbiddenNames(files: readonly Syntax[], map: readonly Room[]): readonly string[] {
  return files.flatMap((file) => {
    const room = roomOf(file.path, map);
    const closed = Object.entries(NAMES).filter(([platform]) => !room?.platform.includes(platform as Platform));
    const patterns = [...closed.map(([, pattern]) => pattern), ...(PURE.includes(room?.folder ?? '') ? [IMPURE] : [])];
    return [...file.globals]
      .filter((name) => patterns.some((pattern) => pattern.test(name)))
      .map((name) => `${file.path}: may not use ${name}`);
  });
}

/** Arithmetic in the pure rooms whose last bit differs between engines. */
export function unportableMaths(files: readonly Syntax[]): readonly string[] {
  return files
    .filter(({ path }) => PURE.some((folder) => path.startsWith(folder)))
    .flatMap((file) => [
      ...(file.raisesPowers ? [`${file.path}: may not use **`] : []),
      ...[...file.globals].filter(isUnportable).map((name) => `${file.path}: may not use ${name}`),
    ]);
}

function isUnportable(name: string): boolean {
  const [, member] = /^Math[.[ ](.*)$/.exec(name) ?? [];
  return member !== undefined && !EXACT.has(member) && !/^[A-Z][A-Z0-9_]*$/.test(member);
}

/** Files that import each other in a circle when the program runs; types may refer to each other both ways. */
export function cycles(files: readonly Syntax[]): readonly string[] {
  const known = new Map(files.map((file) => [file.path, file]));
  const state = new Map<string, 'open' | 'done'>();
  const found: string[] = [];
  const enter = (path: string, trail: readonly string[]): void => {
    if (state.get(path) === 'done') return;
    if (state.get(path) === 'open') {
      found.push([...trail.slice(trail.indexOf(path)), path].join(' → '));
      return;
    }
    state.set(path, 'open');
    for (const target of loadedBy(known.get(path))) if (known.has(target)) enter(target, [...trail, path]);
    state.set(path, 'done');
  };
  for (const { path } of files) enter(path, []);
  return found;
}

/** Relative imports that name no tracked file. */
export function brokenImports(files: readonly Syntax[], tracked: ReadonlySet<string>): readonly string[] {
  return files.flatMap((file) =>
    targetsOf(file)
      .filter((target) => !tracked.has(target))
      .map((target) => `${file.path}: imports ${target}, which is not tracked`),
  );
}

/** Name of the package that an import names. */
export function packageOf(from: string): string {
  return from
    .split('/')
    .slice(0, from.startsWith('@') ? 2 : 1)
    .join('/');
}

/** Whether an import names one of Node's own modules. */
export function isBuiltIn(from: string): boolean {
  return from.startsWith('node:') || builtinModules.includes(from);
}

/** Everything that a file imports or re-exports from, as written. */
export function sourcesOf(file: Syntax): readonly string[] {
  return [...file.imports, ...file.reexports].map(({ from }) => from);
}

/** The path that a relative import names; undefined where it names a package. */
export function resolve(path: string, from: string): string | undefined {
  return from.startsWith('.') ? posix.join(posix.dirname(path), from) : undefined;
}

/** The files that are loaded when `file` is. */
function loadedBy(file: Syntax | undefined): readonly string[] {
  if (file === undefined) return [];
  const kept = [...file.imports, ...file.reexports].filter(({ erased }) => !erased);
  return kept.flatMap(({ from }) => resolve(file.path, from) ?? []);
}

function targetsOf(file: Syntax | undefined): readonly string[] {
  return file === undefined ? [] : sourcesOf(file).flatMap((from) => resolve(file.path, from) ?? []);
}

function roomOf(path: string, map: readonly Room[]): Room | undefined {
  return map.find(({ folder }) => path.startsWith(folder));
}
