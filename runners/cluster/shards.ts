/** The shards of a sweep that was spread over several folders. */
import { existsSync, readdirSync } from 'node:fs';
import { join } from 'node:path';

const NAME = /^shard-\d{5,}$/;

/** Paths of the shard folders in `folder`, in order; undefined where it holds none or is a run itself. */
export function shardFoldersIn(folder: string): string[] | undefined {
  if (!existsSync(folder) || existsSync(join(folder, 'run.json'))) return undefined;
  const names = readdirSync(folder)
    .filter((name) => NAME.test(name) && existsSync(join(folder, name, 'run.json')))
    .sort();
  return names.length === 0 ? undefined : names.map((name) => join(folder, name));
}
