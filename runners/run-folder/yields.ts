/** Yields of a run's front: `yields.json`, and the column that the front files get from it. */
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { z } from 'zod';
import { type FrontFile, frontCsv } from '../../model/index.ts';
import { readText, writeWhole } from './files.ts';
import { runFile } from './folder.ts';

const YIELDS = z.object({
  format: z.literal('chopfront-yields'),
  seed: z.string(),
  samples: z.number(),
  /** Share of samples that keep every limit, by design id. */
  yields: z.record(z.string(), z.number()),
});

export type Yields = z.infer<typeof YIELDS>;

const NAME = 'yields.json';

/** Writes `yields.json`. */
export function writeYields(folder: string, yields: Yields): void {
  writeWhole(join(folder, NAME), `${JSON.stringify(yields, undefined, 1)}\n`);
}

/** Yields of a run by design id; empty where none were drawn or the file cannot be understood. */
export function readYields(folder: string): Readonly<Record<string, number>> {
  const path = join(folder, NAME);
  if (!existsSync(path)) return {};
  try {
    const parsed = YIELDS.safeParse(JSON.parse(readText(path, 'the yields of a run')));
    return parsed.success ? parsed.data.yields : {};
  } catch {
    return {};
  }
}

/** The front with the yield of each design that has one. */
export function withYields(front: FrontFile, yields: Readonly<Record<string, number>>): FrontFile {
  const designs = front.designs.map((design) => {
    const share = yields[design.id];
    return share === undefined ? design : { ...design, yield: share };
  });
  return { ...front, designs };
}

/** Writes `front.json` and `front.csv` anew with the yields. */
export function publishYields(folder: string, front: FrontFile, yields: Readonly<Record<string, number>>): void {
  const whole = withYields(front, yields);
  writeWhole(runFile(folder, 'frontJson'), `${JSON.stringify(whole, undefined, 1)}\n`);
  writeWhole(runFile(folder, 'frontCsv'), frontCsv(whole));
}
