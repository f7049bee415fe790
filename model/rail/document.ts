/** A sheet's text as a plain tree of maps, lists and texts, with the place of every node: what the checks and messages work on. */
import { isAlias, isMap, isScalar, isSeq, LineCounter, type Node, type Pair, parseDocument } from 'yaml';
import type { Finding } from '../outcome.ts';
import { shorten } from '../quantity/parse.ts';

/** A node: a text as written, nothing, a list or a map. */
export type Tree = string | null | readonly Tree[] | { readonly [key: string]: Tree };

/** A place in the text, from 1. */
export interface Place {
  readonly line: number;
  readonly column: number;
}

/** A sheet as data. */
export interface SheetDocument {
  readonly tree: Tree;
  /** Where the value at a path stands; the nearest ancestor's key where it is missing. */
  valuePlace(path: string): Place;
  /** Where the key of a path stands. */
  keyPlace(path: string): Place;
}

/** Largest sheet read, characters; a person's is a few thousand. */
export const LARGEST_SHEET = 65536;
/** Deepest nesting that any sheet needs, with room. */
const DEEPEST = 8;

const TOO_DEEP = ['maps in maps too deep', 'the keys of a rail sheet'] as const;

/** The document and the problems of form that do not keep it from being read; or, without a document, the one that does. */
export interface Opened {
  readonly document?: SheetDocument;
  readonly findings: readonly Finding[];
}

/** Path of a child: `input.voltage`, `load-profile[1]` (entries count from 1). */
export function childPath(path: string, key: string | number): string {
  if (typeof key === 'number') return `${path}[${key + 1}]`;
  return path === '' ? key : `${path}.${key}`;
}

/** Path of a zod issue. */
export function pathText(path: readonly PropertyKey[]): string {
  return path.reduce<string>((text, key) => childPath(text, typeof key === 'number' ? key : String(key)), '');
}

/** Opens a sheet. Never throws. */
export function openSheet(text: string, file: string): Opened {
  const whole = (found: string, allowed: string): Opened => ({
    findings: [{ file, line: 0, column: 0, field: '', found, allowed }],
  });
  if (text.length > LARGEST_SHEET) {
    return whole(`${text.length} characters`, `a rail sheet of at most ${LARGEST_SHEET} characters`);
  }
  if (/[\0\uFFFD]/.test(text)) return whole('bytes that are no text', 'a rail sheet in YAML, in UTF-8');
  try {
    return compose(text, file);
  } catch {
    // The YAML library meets texts, such as tens of thousands of brackets, that exhaust its stack.
    return whole(...TOO_DEEP);
  }
}

function compose(text: string, file: string): Opened {
  const counter = new LineCounter();
  const document = parseDocument(text, { lineCounter: counter, prettyErrors: false, stringKeys: true });
  const place = (offset: number): Place => {
    const { line, col } = counter.linePos(offset);
    return { line: Math.max(line, 1), column: Math.max(col, 1) };
  };
  const findings: Finding[] = [];
  const report = (offset: number, field: string, found: string, allowed: string): void => {
    findings.push({ file, ...place(offset), field, found, allowed });
  };
  const broken = document.errors.find(({ code }) => code !== 'DUPLICATE_KEY');
  if (broken !== undefined) {
    if (broken.message.includes('call stack'))
      return { findings: [{ file, line: 0, column: 0, field: '', found: TOO_DEEP[0], allowed: TOO_DEEP[1] }] };
    report(broken.pos[0], '', lineAt(text, broken.pos[0]), `YAML: ${firstSentence(broken.message)}`);
    return { findings };
  }
  const walker: Walker = { values: new Map(), keys: new Map(), report };
  const tree = isMap(document.contents) ? walk(document.contents, '', 0, walker) : null;
  if (!isMap(document.contents) || tree === undefined) {
    const found = text.trim() === '' ? 'nothing' : shorten(text.trim());
    if (findings.length === 0) report(0, '', found, 'a rail sheet in YAML, such as chopfront draft writes');
    return { findings };
  }
  return { document: { tree, ...placesOf(walker, place) }, findings };
}

interface Walker {
  readonly values: Map<string, number>;
  readonly keys: Map<string, number>;
  report(offset: number, field: string, found: string, allowed: string): void;
}

/** The plain tree below `node`; undefined where it holds what sheets must not. */
function walk(node: unknown, path: string, depth: number, walker: Walker): Tree | undefined {
  const offset = offsetOf(node);
  if (offset !== undefined) walker.values.set(path, offset);
  if (depth > DEEPEST) return refuse(walker, offset, path, ...TOO_DEEP);
  if (isAlias(node))
    return refuse(walker, offset, path, `the alias *${node.source}`, 'values written out, without aliases');
  if (isScalar(node)) return node.value === null ? null : textOf(node);
  if (isSeq(node)) {
    return node.items.flatMap((item, i) => {
      const child = walk(item, childPath(path, i), depth + 1, walker);
      return child === undefined ? [] : [child];
    });
  }
  return isMap(node) ? walkMap(node.items, path, depth, walker) : null;
}

function walkMap(items: readonly Pair[], path: string, depth: number, walker: Walker): Tree {
  const entries: [string, Tree][] = [];
  const seen = new Set<string>();
  for (const { key, value } of items) {
    const name = isScalar(key) ? String(key.value) : '?';
    const child = childPath(path, name);
    const offset = offsetOf(key) ?? 0;
    if (seen.has(name)) {
      walker.report(offset, child, `the key ${shorten(name)} twice`, 'each key once');
      continue;
    }
    seen.add(name);
    walker.keys.set(child, offset);
    const tree = walk(value, child, depth + 1, walker);
    if (tree !== undefined) entries.push([name, tree]);
  }
  return Object.fromEntries(entries);
}

function refuse(walker: Walker, offset: number | undefined, path: string, found: string, allowed: string): undefined {
  walker.report(offset ?? 0, path, found, allowed);
  return undefined;
}

/** A scalar as it is written. */
function textOf(node: { value: unknown; source?: string; type?: string }): string {
  return typeof node.value === 'string' ? node.value : (node.source ?? String(node.value));
}

function offsetOf(node: unknown): number | undefined {
  return (node as Node | null)?.range?.[0];
}

function placesOf(walker: Walker, place: (offset: number) => Place): Pick<SheetDocument, 'valuePlace' | 'keyPlace'> {
  const keyPlace = (path: string): Place => {
    const offset = walker.keys.get(path) ?? walker.values.get(path);
    if (offset !== undefined) return place(offset);
    return path === '' ? { line: 1, column: 1 } : keyPlace(parentOf(path));
  };
  const valuePlace = (path: string): Place => {
    const offset = walker.values.get(path);
    return offset === undefined ? keyPlace(path) : place(offset);
  };
  return { valuePlace, keyPlace };
}

/** The path one step up. */
function parentOf(path: string): string {
  return path.slice(0, Math.max(path.lastIndexOf('.'), path.lastIndexOf('['), 0));
}

function lineAt(text: string, offset: number): string {
  const from = text.lastIndexOf('\n', Math.max(0, offset - 1)) + 1;
  const end = text.indexOf('\n', offset);
  const line = text.slice(from, end < 0 ? undefined : end).trim();
  return line === '' ? 'an empty line' : shorten(line);
}

function firstSentence(message: string): string {
  return shorten(message.split(/[.\n]/)[0] ?? message);
}
