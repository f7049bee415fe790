/** Which reporter suits: a live block on a terminal, plain lines elsewhere, JSON lines where asked. All on stderr. */
import { blockReporter } from './block.ts';
import type { Reporter } from './figures.ts';
import { jsonReporter, plainReporter } from './lines.ts';

/** The reporter for this process. */
export function chooseReporter(log?: 'json'): Reporter {
  const { stderr } = process;
  const write = (text: string): void => {
    stderr.write(text);
  };
  if (log === 'json') return jsonReporter(write);
  return stderr.isTTY === true && process.env.TERM !== 'dumb' ? blockReporter(stderr) : plainReporter(write);
}
