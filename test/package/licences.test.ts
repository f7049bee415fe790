/** Everything that is installed with the package may be used by anyone: permissive licences alone, and the README lists the direct ones. */
import { expect, test } from 'vitest';
import { readText } from '../support/project.ts';

/** SPDX names of licences that ask for no more than their own text. */
const PERMISSIVE = [
  'MIT',
  'MIT-0',
  'ISC',
  'BSD-2-Clause',
  'BSD-3-Clause',
  'Apache-2.0',
  '0BSD',
  'BlueOak-1.0.0',
].concat(['CC0-1.0', 'Unlicense']);

interface Locked {
  readonly license?: string;
  readonly dev?: boolean;
}

const locked: Record<string, Locked> = JSON.parse(readText('package-lock.json')).packages;
const manifest = JSON.parse(readText('package.json'));
const installed = Object.entries(locked).filter(([path, { dev }]) => path !== '' && dev !== true);

test('every package that comes with this one, direct or not, is permissive', () => {
  expect(installed.length).toBeGreaterThan(50);
  const others = installed.filter(([, { license }]) => !PERMISSIVE.includes(license ?? 'unknown'));
  expect(others.map(([path, { license }]) => `${path}: ${license}`)).toEqual([]);
});

test('the README lists the direct ones with their licences', () => {
  const names = [...Object.keys(manifest.dependencies), ...Object.keys(manifest.peerDependencies)];
  const readme = readText('README.md');
  const rows = names.map((name) => `| \`${name}\` | ${locked[`node_modules/${name}`]?.license} |`);
  expect(rows.filter((row) => !readme.includes(row))).toEqual([]);
});
