import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { describeFinding } from '../../../model/outcome.ts';
import { readRail } from '../../../model/rail/read.ts';
import { SHIPPED_RAILS } from '../../../model/rail/shipped.ts';
import { starterSheet } from '../../../model/rail/starter.ts';
import { shipped } from './sheets.ts';

const SHEETS = [starterSheet(), ...SHIPPED_RAILS.map(shipped)];
const NASTY = [
  '',
  ' ',
  '\n',
  '\t',
  ':',
  '- ',
  '[',
  ']',
  '{',
  '}',
  '&a ',
  '*a',
  '!!js/function x',
  '!!binary x',
  '<<: ',
  '|',
  '>',
  '"',
  "'",
  '%',
  '#',
  '\0',
  '\uFEFF',
  '\uD800',
  'NaN',
  '.inf',
  '1e400 V',
  '-0',
  '__proto__: 1',
  'constructor',
  '? ',
  '---\n',
  '...\n',
  '~',
  'null',
  '0x7 V',
  '9'.repeat(400),
];

/** Every outcome is a rail or a bounded list of findings that a person can read. */
function sound(text: string): void {
  const outcome = readRail(text, 'rail.yaml');
  if (outcome.ok) return;
  expect(outcome.findings.length).toBeGreaterThan(0);
  expect(outcome.findings.length).toBeLessThanOrEqual(100);
  for (const finding of outcome.findings) {
    const line = describeFinding(finding);
    expect(line.length).toBeLessThan(2000);
    expect(line).not.toMatch(/[\0\n]|undefined|\[object|Error:/);
  }
}

describe('no text makes the reader throw', () => {
  test('3000 sheets with pieces cut out and nasty ones put in', () => {
    const edit = fc.record({
      at: fc.double({ min: 0, max: 1, noNaN: true }),
      cut: fc.nat(30),
      put: fc.oneof(fc.constantFrom(...NASTY), fc.string({ unit: 'binary', maxLength: 12 })),
    });
    fc.assert(
      fc.property(fc.constantFrom(...SHEETS), fc.array(edit, { minLength: 1, maxLength: 6 }), (sheet, edits) => {
        let text = sheet;
        for (const { at, cut, put } of edits) {
          const from = Math.floor(at * text.length);
          text = text.slice(0, from) + put + text.slice(from + cut);
        }
        sound(text);
      }),
      { numRuns: 3000 },
    );
  });

  test('1000 texts of any kind', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 400 }), (text) => sound(text)),
      { numRuns: 1000 },
    );
  });

  test('1000 trees of any shape', () => {
    fc.assert(
      fc.property(fc.json({ maxDepth: 5 }), (text) => sound(text)),
      { numRuns: 1000 },
    );
  });

  test('texts that make readers slow or deep', () => {
    for (const text of [
      '['.repeat(60000),
      '- '.repeat(30000),
      '? '.repeat(30000),
      '"'.repeat(60000),
      'a: '.repeat(20000),
      '{a: '.repeat(15000),
    ]) {
      sound(text);
    }
    const bomb = Array.from(
      { length: 20 },
      (_, i) =>
        `k${i}: &a${i} [${
          i === 0
            ? 'x'
            : Array(9)
                .fill(`*a${i - 1}`)
                .join(', ')
        }]`,
    ).join('\n');
    sound(bomb);
  });
});
