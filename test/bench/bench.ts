/**
 * `npm run bench`: how soon the command answers, how fast the model judges designs, how well the runner uses the machine and how fast the page draws, with machine,
 * Node version and commit beside the figures. `-- --json` prints one JSON object and nothing else; `--minutes 30` reads the memory of
 * a half-hour sweep, in the place of one minute; `--only runner` (or `start`, `model`, `page`) leaves the rest out.
 */
import { spawnSync } from 'node:child_process';
import { cpus } from 'node:os';
import { parseArgs } from 'node:util';
import { packagePath } from '../../runners/package-path.ts';
import { type ModelTiming, timeModel } from './model.ts';
import { type PageFigure, timePage } from './page.ts';
import { runnerLines, timeRunner } from './runner.ts';
import { startLines, timeStart } from './start.ts';

const { values } = parseArgs({
  options: {
    json: { type: 'boolean', default: false },
    minutes: { type: 'string', default: '1' },
    only: { type: 'string' },
  },
});
const machine = describeMachine();
const wanted = (part: string): boolean => values.only === undefined || values.only === part;
const start = wanted('start') ? timeStart() : [];
const model = wanted('model') ? await timeModel() : [];
const runner = wanted('runner') ? await timeRunner({ minutes: Number(values.minutes) }) : undefined;
const page = wanted('page') ? await timePage() : undefined;
if (values.json) process.stdout.write(`${JSON.stringify({ machine, start, model, runner, page })}\n`);
else {
  const parts = [
    startLines(start),
    model.flatMap(modelLines),
    runner === undefined ? [] : runnerLines(runner),
    pageLines(),
  ];
  process.stdout.write(`${[machineLine(), ...parts.flat()].join('\n')}\n`);
}

interface Machine {
  readonly processor: string;
  readonly processors: number;
  readonly node: string;
  readonly commit: string;
}

function describeMachine(): Machine {
  const { status, stdout } = spawnSync('git', ['rev-parse', '--short', 'HEAD'], {
    cwd: packagePath(),
    encoding: 'utf8',
  });
  return {
    processor: cpus()[0]?.model ?? 'unknown',
    processors: cpus().length,
    node: process.version,
    commit: status === 0 ? stdout.trim() : 'unknown',
  };
}

function machineLine(): string {
  return `${machine.processors} × ${machine.processor}, Node ${machine.node}, commit ${machine.commit}`;
}

function modelLines(timing: ModelTiming): string[] {
  const whole = (value: number): string => Math.round(value).toLocaleString('en');
  return [
    '',
    `${timing.reference}: three line × three load points, tolerance corners`,
    `  designs per second, one thread      ${whole(timing.perSecond)}`,
    `  the same per processor second       ${whole(timing.perProcessorSecond)}`,
    `  designs per second, ${timing.threads} threads       ${whole(timing.perSecondTogether)}`,
    `  elementary-function calls a design  ${timing.callsTogether.toFixed(1)}`,
    `  time over the bare calls' time      ${timing.overFloor.toFixed(2)}`,
    `  garbage a design, bytes             ${timing.garbage.toFixed(2)}`,
  ];
}

function pageLines(): string[] {
  if (page === undefined) return [];
  if (page.figures.length === 0) return ['', `page: not timed, ${page.note}`];
  const line = ({ name, value, unit, target }: PageFigure): string =>
    `  ${name.padEnd(40)}${Number(value.toPrecision(4))} ${unit} (${target})`;
  return [
    '',
    'page, headless with software drawing',
    ...page.figures.map(line),
    ...(page.note === '' ? [] : [page.note]),
  ];
}
