/** What is wrong with a file of a run, in one line: where, and what must stand there. */
import { z } from 'zod';
import { reasonOf } from '../errors.ts';

const SHAPES: Readonly<Record<string, string>> = {
  string: 'a text',
  number: 'a number',
  int: 'a whole number',
  array: 'a list',
  object: 'a map',
  record: 'a map',
};

/** The first issue where zod complains, else the reason of any other error. */
export function issueText(error: unknown): string {
  if (!(error instanceof z.ZodError)) return reasonOf(error);
  const issue = error.issues[0];
  if (issue === undefined) return 'of no known shape';
  const where = issue.path.length === 0 ? 'the file' : issue.path.join('.');
  return `${where}: ${wanted(issue)} is missing or of another kind`;
}

function wanted(issue: z.core.$ZodIssue): string {
  if (issue.code === 'invalid_type') return SHAPES[issue.expected] ?? issue.expected;
  return issue.code === 'invalid_value' ? issue.values.map(String).join(' or ') : 'its value';
}
