/** Reading the front of a run, and finding a design in it by the beginning of its id. */
import { readFileSync } from 'node:fs';
import { z } from 'zod';
import type { FrontFile } from '../../model/index.ts';
import { refusal, systemCode } from '../errors.ts';
import { RUN_FILES, runFile } from './folder.ts';
import { issueText } from './issue.ts';

/** One design of a front. */
export type FrontDesign = FrontFile['designs'][number];

const NAMED = z.array(z.looseObject({ name: z.string(), unit: z.string() }));

/** What other files rely on in a front; more may stand in it. */
const SHAPE = z.looseObject({
  format: z.literal('chopfront-front'),
  objectives: NAMED,
  limits: NAMED,
  designs: z.array(
    z.looseObject({
      id: z.string(),
      family: z.string(),
      genes: z.record(z.string(), z.number()),
      parts: z.record(z.string(), z.string()),
      objectives: z.array(z.number()),
      margins: z.record(z.string(), z.number().nullable()),
    }),
  ),
});

/** `front.json` of a run. Throws the refusals `run-empty` and `run-damaged`. */
export function readFront(folder: string): FrontFile {
  try {
    const front: FrontFile = JSON.parse(readFileSync(runFile(folder, 'frontJson'), 'utf8'));
    SHAPE.parse(front);
    return front;
  } catch (error) {
    if (systemCode(error) === 'ENOENT') throw refusal('run-empty', { folder });
    throw refusal('run-damaged', { folder, file: RUN_FILES.frontJson, reason: issueText(error) });
  }
}

/**
 * The design whose id is, or begins with, `id`: of the front, or where that has none, of the near misses. Throws `unknown-design` and
 * `ambiguous-design`.
 */
export function findDesign(
  folder: string,
  front: FrontFile,
  id: string,
  nearMisses: () => readonly FrontDesign[],
): FrontDesign {
  const found = oneOf(folder, front.designs, id) ?? oneOf(folder, nearMisses(), id);
  if (found !== undefined) return found;
  const some = front.designs.slice(0, 3).map((design) => design.id);
  throw refusal('unknown-design', {
    folder,
    id,
    nearest: some.length === 0 ? '' : `; it holds, for example, ${some.join(', ')}`,
  });
}

/** The one design of that id or beginning; undefined where there is none. Throws `ambiguous-design`. */
function oneOf(folder: string, designs: readonly FrontDesign[], id: string): FrontDesign | undefined {
  const exact = designs.find((design) => design.id === id);
  if (exact !== undefined) return exact;
  const close = id.length < 2 ? [] : designs.filter((design) => design.id.startsWith(id));
  if (close.length < 2) return close[0];
  const ids = close.slice(0, 5).map((design) => design.id);
  throw refusal('ambiguous-design', { folder, id, ids: ids.join(', ') });
}

/** Whether objectives `a` dominate `b`: nowhere worse, somewhere better. */
export function dominates(a: readonly number[], b: readonly number[]): boolean {
  return a.every((value, i) => value <= (b[i] ?? value)) && a.some((value, i) => value < (b[i] ?? value));
}
