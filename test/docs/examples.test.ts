/** Every `@example` line of a docstring is true: the function is called and gives what the line states, to its printed digits. */
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { ROOT, trackedTexts } from '../support/project.ts';

interface Example {
  readonly path: string;
  readonly name: string;
  readonly values: readonly unknown[];
  readonly stated: string;
}

const LINE = /^ *\* @example (.*)$/gm;
const files = trackedTexts(/^(model|optimizer)\/.*\.ts$/);
const lines = files.flatMap(({ path, text }) => [...text.matchAll(LINE)].map(([, line = '']) => ({ path, line })));
const examples = lines.map(({ path, line }) => read(path, line));

describe('examples in docstrings', () => {
  test('there are many, all of the form `name(numbers) = number`', () => {
    expect(examples.length).toBeGreaterThan(80);
  });

  test.each(examples)('$path: $name gives $stated', async ({ path, name, values, stated }) => {
    const module: Record<string, unknown> = await import(join(ROOT, path));
    const called = module[name];
    if (typeof called !== 'function') throw new Error(`${path} exports no function ${name}`);
    const value: unknown = called(...values);
    expect(value).toSatisfy(
      (result) => typeof result === 'number' && Math.abs(result - Number(stated)) <= slackOf(stated),
    );
  });

  test('the slack is half of the last printed digit, and none for a short value', () => {
    expect(slackOf('6.1240')).toBeCloseTo(5e-5, 12);
    expect(slackOf('2.266207e-8')).toBeCloseTo(5e-15, 20);
    expect(slackOf('0.7')).toBeLessThan(1e-12);
  });
});

function read(path: string, line: string): Example {
  const [, name = '', list = '', stated = ''] = /^(\w+)\(([^()]*)\) = (-?[\d.]+(?:e-?\d+)?)$/.exec(line) ?? [];
  if (name === '') throw new Error(`${path}: this example cannot be read: ${line}`);
  return { path, name, values: list.split(', ').map(argumentOf), stated };
}

function argumentOf(text: string): unknown {
  if (text === 'true' || text === 'false') return text === 'true';
  if (text === 'Infinity') return Number.POSITIVE_INFINITY;
  const value = Number(text);
  if (text === '' || Number.isNaN(value)) throw new Error(`no number in an example: ${text}`);
  return value;
}

/** Half of the last printed digit; a value of fewer than four digits is meant to be exact, to rounding. */
function slackOf(stated: string): number {
  const [digits = '', exponent = '0'] = stated.split('e');
  const significant = digits.replace(/[-.]/g, '').replace(/^0+/, '').length;
  if (significant < 4) return Math.abs(Number(stated)) * 1e-12 || 1e-300;
  const places = digits.split('.')[1]?.length ?? 0;
  return 0.5 * 10 ** (Number(exponent) - places);
}
