/** Completion: the printed script is sound, and a real shell completes with it what stands where. */
import { spawnSync } from 'node:child_process';
import { mkdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, test } from 'vitest';
import { chopfront, newFolder } from './processes.ts';

const folder = newFolder();
const scripts: Record<string, string> = {};

beforeAll(async () => {
  for (const shell of ['bash', 'zsh', 'fish']) {
    const { stdout, status } = await chopfront('completion', shell);
    expect(status).toBe(0);
    scripts[shell] = stdout;
  }
  writeFileSync(join(folder, 'completion.bash'), scripts.bash ?? '');
  writeFileSync(join(folder, 'rail.yaml'), '');
  mkdirSync(join(folder, 'runs', 'night'), { recursive: true });
  // The second line is what a damaged or hostile file might hold: nothing of it may reach the shell.
  const rows = ['id,family', 'd01jm4qh9d2ek,buck', '$(touch owned),x', '`touch owned`,x', 'd06974xsemq8c,buck'];
  writeFileSync(join(folder, 'runs', 'night', 'front.csv'), `${rows.join('\n')}\n`);
});

/** What bash offers for the last of `words`, as if Tab was pressed behind it. */
function completed(...words: string[]): string[] {
  const list = ['chopfront', ...words].map((word) => `'${word}'`).join(' ');
  const lines = [
    'source ./completion.bash',
    `COMP_WORDS=(${list})`,
    `COMP_CWORD=${words.length}`,
    '_chopfront',
    'for one in "$' + '{COMPREPLY[@]}"; do printf "%s\\n" "$one"; done',
  ];
  const { stdout, stderr } = spawnSync('bash', ['--norc', '-c', lines.join('\n')], { cwd: folder, encoding: 'utf8' });
  expect(stderr).toBe('');
  return stdout.split('\n').filter((line) => line !== '');
}

describe('in bash', () => {
  test('the script is sound', () => {
    const { status, stderr } = spawnSync('bash', ['-n', 'completion.bash'], { cwd: folder, encoding: 'utf8' });
    expect([status, stderr]).toEqual([0, '']);
  });

  test.each<[string, string[], string[]]>([
    ['commands', ['co'], ['compare', 'completion']],
    ['commands below a command', ['parts', ''], ['check', 'template']],
    ['options of the command', ['draft', 'x.yaml', '--s'], ['--scenario']],
    ['scenario names', ['draft', 'x.yaml', '--scenario', 'hut'], ['hut-link', 'hut-shelf']],
    ['kinds of parts', ['parts', 'template', 'c'], ['ceramics', 'controllers', 'cores', 'conductors']],
    ['kinds behind an option with its value', ['parts', 'template', '--out', 'x.csv', 'di'], ['diodes']],
    ['files', ['check', 'ra'], ['rail.yaml']],
    ['folders for a run', ['page', 'r'], ['runs']],
    ['folders for every run of a merge', ['merge', 'a', 'b', 'c', 'r'], ['runs']],
    ['ids of the run', ['show', 'runs/night', 'd0'], ['d01jm4qh9d2ek', 'd06974xsemq8c']],
    ['ids though options stand between', ['handoff', '--out', 'hand', 'runs/night', 'd06'], ['d06974xsemq8c']],
    ['a file where assess wants a design', ['assess', 'rail.yaml', 'ra'], ['rail.yaml']],
    ['shells', ['completion', 'z'], ['zsh']],
    ['choices of an option', ['sweep', '--on', ''], ['slurm']],
    ['nothing behind an option that wants a number', ['sweep', '--seed', ''], []],
    ['nothing behind the last argument', ['page', 'runs/night', ''], []],
  ])('completes %s', (_, words, expected) => {
    expect(completed(...words)).toEqual(expected);
  });

  test('every command of the help completes, and so do all its options', async () => {
    const names = completed('');
    const help = (await chopfront('--help')).stdout;
    for (const name of names) expect(help).toMatch(new RegExp(`^  ${name}[ [<]`, 'm'));
    expect(names).toContain('sweep');
    for (const name of names) {
      const options = completed(name, '--');
      const text = (await chopfront(name, '--help')).stdout;
      const listed = [...text.matchAll(/^ {2}(?:-\w, )?(--[\w-]+)/gm)].map(([, option = '']) => option);
      expect(options.sort()).toEqual(listed.sort());
    }
  });

  test('nothing of a hostile front runs or is offered', () => {
    expect(completed('show', 'runs/night', '')).toEqual(['d01jm4qh9d2ek', 'd06974xsemq8c']);
    expect(completed('check', 'ow')).toEqual([]);
  });
});

describe('in the other shells', () => {
  test('zsh and fish get every command, scenario and kind too', () => {
    for (const shell of ['zsh', 'fish']) {
      for (const word of [...completed(''), 'buoy-sensors', 'hut-shelf', 'power-stages']) {
        expect(scripts[shell], `${shell}: ${word}`).toContain(word);
      }
    }
    expect(scripts.zsh).toMatch(/^#compdef chopfront\n/);
  });

  test('an unknown shell is refused with the known ones', async () => {
    const { status, stderr } = await chopfront('completion', 'tea');
    expect([status, stderr]).toEqual([2, 'chopfront: no completion for tea; there is one for: bash, zsh, fish\n']);
  });
});
