/** Whether the parts that a sheet bars or prefers are in its tables at all: a name with a slip in it would change nothing, silently. */
import type { Finding } from './outcome.ts';
import { PART_KINDS } from './parts/schemas.ts';
import type { PartsTables } from './parts/tables.ts';
import { nearest } from './quantity/nearest.ts';
import { childPath, openSheet } from './rail/document.ts';
import type { Rail } from './rail/rail.ts';

/** The sheet as it was read: its text and the name that messages use. */
export interface SheetText {
  readonly text: string;
  readonly file: string;
}

/** A finding at the sheet's line for each name in `parts.bar` and `parts.prefer` that no table holds. */
export function unknownPartNames(sheet: SheetText, rail: Rail, tables: PartsTables): readonly Finding[] {
  const { barred, preferred } = rail.parts;
  if (barred.length + preferred.length === 0) return [];
  const names = PART_KINDS.flatMap((kind) => tables[kind].map((row: { readonly name: string }) => row.name));
  const known = new Set(names);
  const { document } = openSheet(sheet.text, sheet.file);
  const lists = [
    ['parts.bar', barred],
    ['parts.prefer', preferred],
  ] as const;
  return lists.flatMap(([list, wanted]) =>
    wanted.flatMap((name, i): Finding[] => {
      if (known.has(name)) return [];
      const field = childPath(list, i);
      const place = document?.valuePlace(field) ?? { line: 0, column: 0 };
      const near = nearest(name, names);
      const finding = { file: sheet.file, ...place, field, found: `${name}, which no table holds`, allowed: ALLOWED };
      return [near === undefined ? finding : { ...finding, nearest: near }];
    }),
  );
}

const ALLOWED = "the name of a part in one of the sheet's tables";
