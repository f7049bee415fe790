/** The two streams: results on stdout, all else on stderr; a reader that has gone away ends the program quietly. */
import { systemCode } from '../errors.ts';
import { HOSTILE, plainLines } from './text.ts';

/** Writes a result, made harmless, with a line end. */
export function say(text: string): void {
  process.stdout.write(`${plainLines(text)}\n`);
}

/** Writes lines that were painted already: callers make names harmless before painting. */
export function sayPainted(text: string): void {
  process.stdout.write(`${text}\n`);
}

/** Writes a remark to stderr. */
export function remark(text: string): void {
  process.stderr.write(`${plainLines(text)}\n`);
}

/** Writes a value as JSON and nothing else to stdout; characters that could steer a terminal are escaped as JSON allows. */
export function sayJson(value: unknown): void {
  const text = JSON.stringify(value, undefined, 2).split('\n').map(escaped).join('\n');
  process.stdout.write(`${text}\n`);
}

function escaped(line: string): string {
  return line.replace(HOSTILE, (found) =>
    [...Array(found.length).keys()].map((i) => `\\u${found.charCodeAt(i).toString(16).padStart(4, '0')}`).join(''),
  );
}

/** Ends the program with status 0 where whoever read our output stops reading, as `head` does. */
export function endOnClosedPipe(): void {
  for (const stream of [process.stdout, process.stderr]) {
    stream.on('error', (error) => {
      if (systemCode(error) === 'EPIPE') process.exit(0);
      throw error;
    });
  }
}
