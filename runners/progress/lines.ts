/** Progress where nobody watches a terminal: a plain line every so often, or one JSON object a line. */
import { plainLines } from '../terminal/text.ts';
import { type Progress, plainLine, type Reporter } from './figures.ts';

/** Where lines go. */
export type Write = (text: string) => void;

const OFTEN = 10;
const LATER = 60;

/** A plain line every 10 s in the first minutes, every minute later. */
export function plainReporter(write: Write): Reporter {
  let next = 0;
  return {
    show(progress: Progress): void {
      if (progress.seconds < next || progress.evaluations === 0) return;
      next = progress.seconds + (progress.seconds < 5 * LATER ? OFTEN : LATER);
      write(`${plainLine(progress)}\n`);
    },
    say: (line) => write(`${plainLines(line)}\n`),
    end: () => {},
  };
}

/** One JSON object a line: `{"event":"progress",…}` about once a second, `{"event":"message","text":…}`. */
export function jsonReporter(write: Write): Reporter {
  return {
    show: (progress) => write(`${JSON.stringify({ event: 'progress', ...progress })}\n`),
    say: (text) => write(`${JSON.stringify({ event: 'message', text })}\n`),
    end: () => {},
  };
}
