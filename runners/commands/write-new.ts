/** Writing a file that a person named on the command line: never over another one unasked, never half. */
import { existsSync } from 'node:fs';
import { reasonOf, refusal } from '../errors.ts';
import { writeWhole } from '../run-folder/files.ts';

/** Writes `text` to `path`. Throws the refusals `file-exists`, unless `replace` is set, and `file-unwritable`. */
export function writeNew(path: string, text: string, replace: boolean): void {
  if (existsSync(path) && !replace) throw refusal('file-exists', { file: path });
  try {
    writeWhole(path, text);
  } catch (error) {
    throw refusal('file-unwritable', { file: path, reason: reasonOf(error) });
  }
}
