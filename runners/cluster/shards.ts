/** The shards of a sweep that was spread over several folders. */
import { existsSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { RUN_RECORD } from '../run-folder/folder.ts';

const NAME = /^shard-\d{5,}$/;

/** Paths of the shard folders in `folder`, in order; undefined where it holds none or is a run itself. */
export function shardFoldersIn(folder: string): string[] | undefined {
  if (existsSync(join(folder, RUN_RECORD))) return undefined;
  const names = namesIn(folder)
    .filter((name) => NAME.test(name) && existsSync(join(folder, name, RUN_RECORD)))
    .sort();
  return names.length === 0 ? undefined : names.map((name) => join(folder, name));
}

/** What a folder holds; nothing where it is none or cannot be read, which whoever opens it as a run then says. */
function namesIn(folder: string): string[] {
  try {
    return readdirSync(folder);
  } catch {
    return [];
  }
}
