/** Errors as values: what reading a sheet, a table or a spec gives back, and what one problem in it looks like. */

/** One problem in a text that a person wrote, with all that is needed to mend it. */
export interface Finding {
  /** File as the person named it. */
  readonly file: string;
  /** Line in the file, from 1; 0 where the problem is the whole file. */
  readonly line: number;
  /** Column in the line, from 1; 0 where unknown. */
  readonly column: number;
  /** Path of the field, such as `input.voltage.max`, or the column's name in a table; empty for the whole file. */
  readonly field: string;
  /** What stands there, shortened to a readable length. */
  readonly found: string;
  /** What may stand there. */
  readonly allowed: string;
  /** Nearest known key or name, where one is close. */
  readonly nearest?: string;
}

/** Either a value, with remarks that do not forbid it, or every problem found. */
export type Outcome<T> =
  | { readonly ok: true; readonly value: T; readonly remarks: readonly Finding[] }
  | { readonly ok: false; readonly findings: readonly Finding[] };

/** The outcome that carries `value`. */
export function good<T>(value: T, remarks: readonly Finding[] = []): Outcome<T> {
  return { ok: true, value, remarks };
}

/** The outcome that carries problems. */
export function bad<T>(findings: readonly Finding[]): Outcome<T> {
  return { ok: false, findings };
}

/** One line for a person: file, line, column, field, found, allowed, nearest. */
export function describeFinding(finding: Finding): string {
  const place = [finding.file, finding.line, finding.column].filter((part) => part !== 0 && part !== '').join(':');
  const field = finding.field === '' ? '' : ` ${cut(finding.field)}:`;
  const nearest = finding.nearest === undefined ? '' : `; nearest known: ${finding.nearest}`;
  return `${place}:${field} found ${finding.found}; allowed: ${finding.allowed}${nearest}`;
}

/** Longest path of a field in a message; a key that a person wrote can be of any length. */
const LONGEST_FIELD = 120;

function cut(field: string): string {
  return field.length <= LONGEST_FIELD ? field : `${field.slice(0, LONGEST_FIELD - 1)}…`;
}
