/** Reads a rail sheet: YAML text to a rail in SI units, or every problem in it at once, each with its line and column. */
import type { z } from 'zod';
import { bad, type Finding, good, type Outcome } from '../outcome.ts';
import { nearest } from '../quantity/nearest.ts';
import { shorten } from '../quantity/parse.ts';
import { buildRail } from './build.ts';
import { crossChecks } from './cross-checks.ts';
import { withDefaults } from './defaults.ts';
import { childPath, openSheet, pathText, type SheetDocument } from './document.ts';
import { foundText } from './leaves.ts';
import type { Rail } from './rail.ts';
import { SHEET } from './schema.ts';

/** Most problems reported of one sheet. */
const MOST_FINDINGS = 100;

/** Reads `text`; `file` is its name in messages. Never throws. */
export function readRail(text: string, file: string): Outcome<Rail> {
  const { document, findings } = openSheet(text, file);
  if (document === undefined) return bad(findings);
  const { tree } = withDefaults(document.tree);
  const parsed = SHEET.safeParse(tree);
  const shape = parsed.success ? [] : parsed.error.issues.flatMap((issue) => findingsOf(issue, tree, document, file));
  const cross = crossChecks(tree).map(({ path, found, allowed }) => {
    return { file, ...document.valuePlace(path), field: path, found, allowed };
  });
  const all = inOrder([...findings, ...shape, ...cross]);
  if (parsed.success && all.length === 0) return good(buildRail(parsed.data));
  return bad(all.slice(0, MOST_FINDINGS));
}

function findingsOf(issue: z.core.$ZodIssue, tree: unknown, document: SheetDocument, file: string): readonly Finding[] {
  const path = pathText(issue.path);
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => {
      const field = childPath(path, key);
      const near = nearest(key, issue.message.split(', '));
      const finding = {
        file,
        ...document.keyPlace(field),
        field,
        found: `the unknown key ${shorten(key)}`,
        allowed: issue.message,
      };
      return near === undefined ? finding : { ...finding, nearest: near };
    });
  }
  const place = document.valuePlace(path);
  const params: Record<string, unknown> = issue.code === 'custom' ? (issue.params ?? {}) : {};
  const found = typeof params.found === 'string' ? params.found : foundText(nodeAt(tree, issue.path));
  const finding = { file, ...place, field: path, found, allowed: issue.message };
  return [typeof params.nearest === 'string' ? { ...finding, nearest: params.nearest } : finding];
}

function nodeAt(tree: unknown, path: readonly PropertyKey[]): unknown {
  let node = tree;
  for (const key of path) node = typeof node === 'object' && node !== null ? Reflect.get(node, key) : undefined;
  return node;
}

/** By place in the text, each once; the message of the shape before one that follows from it. */
function inOrder(findings: readonly Finding[]): readonly Finding[] {
  const seen = new Set<string>();
  const once = findings.filter(({ field, found }) => {
    const key = `${field}\n${found}`;
    if (seen.has(key)) return false;
    seen.add(key);
    return true;
  });
  return once.sort((a, b) => a.line - b.line || a.column - b.column);
}
