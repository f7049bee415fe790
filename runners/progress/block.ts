/** Progress on a terminal: one live block of a bar and a few lines that are redrawn in place. */
import { MultiBar, type SingleBar } from 'cli-progress';
import { showDuration } from '../terminal/duration.ts';
import { plainLines } from '../terminal/text.ts';
import { blockLines, type Progress, percent, type Reporter } from './figures.ts';

const WHOLE = 1000;

/** A live block on `stream`, a terminal. */
export function blockReporter(stream: NodeJS.WriteStream): Reporter {
  const bars = new MultiBar({
    stream,
    format: '{text}',
    barCompleteChar: '█',
    barIncompleteChar: '░',
    barsize: 30,
    hideCursor: true,
    clearOnComplete: false,
    stopOnComplete: false,
    emptyOnZero: true,
    forceRedraw: true,
    gracefulExit: false,
  });
  let made: SingleBar[] = [];
  return {
    show(progress: Progress): void {
      const lines = blockLines(progress);
      if (made.length === 0) made = makeBars(bars, lines.length);
      made[0]?.update(Math.round(WHOLE * progress.share), { text: headLine(progress) });
      for (const [i, text] of lines.entries()) made[i + 1]?.update(0, { text });
      bars.update();
    },
    say(line: string): void {
      if (made.length === 0) stream.write(`${plainLines(line)}\n`);
      else bars.log(`${plainLines(line)}\n`);
    },
    end: () => bars.stop(),
  };
}

function makeBars(bars: MultiBar, lines: number): SingleBar[] {
  const first = bars.create(WHOLE, 0, { text: '' }, { format: 'sweep       {bar} {text}' });
  return [first, ...Array.from({ length: lines }, () => bars.create(WHOLE, 0, { text: '' }, { format: '{text}' }))];
}

function headLine(progress: Progress): string {
  const left = progress.secondsLeft === undefined ? '' : `, about ${showDuration(progress.secondsLeft)} left`;
  return `${percent(progress.share)}${left}`;
}
