/** What following a recipe of DEVELOPERS.md does to the tree: files written, lines put into others. */
import { appendFileSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';

/** One file written anew, or, with an anchor that stands once in a file, lines put beside it or in its place. */
export interface Edit {
  readonly path: string;
  readonly text: string;
  readonly before?: string;
  readonly after?: string;
  readonly instead?: string;
  /** Put at the end of the file. */
  readonly end?: boolean;
}

/** A recipe, followed with an example. */
export interface Recipe {
  /** Its heading in DEVELOPERS.md. */
  readonly heading: string;
  readonly edits: readonly Edit[];
  /** What the recipe names besides: for other cases than this example, or to be read. */
  readonly besides: readonly string[];
}

/** Makes `edits` in `folder`. Throws where an anchor does not stand exactly once, or a new file is there already. */
export function makeEdits(folder: string, edits: readonly Edit[]): void {
  for (const edit of edits) {
    const file = join(folder, edit.path);
    if (edit.end === true) appendFileSync(file, edit.text);
    else if (isNew(edit)) {
      mkdirSync(dirname(file), { recursive: true });
      writeFileSync(file, edit.text, { flag: 'wx' });
    } else writeFileSync(file, changed(readFileSync(file, 'utf8'), edit));
  }
}

/** Whether an edit writes a file of its own. */
export function isNew({ before, after, instead, end }: Edit): boolean {
  return before === undefined && after === undefined && instead === undefined && end !== true;
}

function changed(whole: string, { path, text, before, after, instead }: Edit): string {
  const anchor = before ?? after ?? instead ?? '';
  const pieces = whole.split(anchor);
  if (pieces.length !== 2) throw new Error(`${path}: ${pieces.length - 1} places hold ${JSON.stringify(anchor)}`);
  return pieces.join(`${after ?? ''}${text}${before ?? ''}`);
}
