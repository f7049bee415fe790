/** What may reach a terminal: no character of a name can steer it, tables line up, durations read back. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { painter } from '../../runners/terminal/colour.ts';
import { readDuration, showDuration } from '../../runners/terminal/duration.ts';
import { table } from '../../runners/terminal/table.ts';
import { plain, short, widthOf } from '../../runners/terminal/text.ts';

// Control and format characters by their Unicode categories: C0, C1, bidirectional and zero-width marks, separators.
const STEERING = /[\p{Cc}\p{Cf}\p{Zl}\p{Zp}]/u;

describe('names in the terminal', () => {
  it('shows escape sequences and bidirectional marks as text', () => {
    expect(plain('a\u001b[2Jb')).toBe('a\\u{1b}[2Jb');
    expect(plain('evil\u202egnp.exe')).toBe('evil\\u{202e}gnp.exe');
    expect(plain('4.7 µH ±20 % Ω')).toBe('4.7 µH ±20 % Ω');
  });

  it('lets no steering character through, whatever the name', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 60 }), (name) => {
        expect(plain(name)).not.toMatch(STEERING);
        expect(widthOf(short(name, 20))).toBeLessThanOrEqual(20);
      }),
    );
  });

  it('cuts a name of 10,000 characters', () => {
    expect(short('x'.repeat(10_000), 12)).toBe('xxxxxxxxxxx…');
  });

  it('lines up the columns of a table and cuts wide cells', () => {
    const lines = table(
      [{ head: 'part' }, { head: 'cost', right: true }],
      [
        ['µ-inductor', '1.20'],
        ['b\u0007', '10'],
      ],
    );
    expect(lines).toEqual(['  part        cost', '  µ-inductor  1.20', '  b\\u{7}        10']);
  });

  it('paints only terminals, and not with NO_COLOR', () => {
    expect(painter({ isTTY: true }, {})('x', 'good')).toBe('\u001b[32mx\u001b[39m');
    expect(painter({ isTTY: true }, { NO_COLOR: '1' })('x', 'good')).toBe('x');
    expect(painter({ isTTY: true }, { TERM: 'dumb' })('x', 'good')).toBe('x');
    expect(painter({}, {})('x', 'good')).toBe('x');
  });
});

describe('durations', () => {
  it.each([
    ['90s', 90],
    ['90 min', 5400],
    ['8h', 28_800],
    ['1h30m', 5400],
    ['2 d 4 h', 187_200],
    ['0.5 h', 1800],
  ])('%s is %d s', (text, seconds) => expect(readDuration(text)).toBe(seconds));

  it.each(['', '8', 'h', '8 weeks', '-1 h', '0 s', '1h x', '1e3 s'])('"%s" is none', (text) => {
    expect(readDuration(text)).toBeUndefined();
  });

  it.each([
    [0, '0 s'],
    [59.6, '1 min'],
    [754, '12 min 34 s'],
    [12_000, '3 h 20 min'],
    [187_200, '2 d 4 h'],
    [Number.POSITIVE_INFINITY, '?'],
  ])('%d s reads %s', (seconds, text) => expect(showDuration(seconds)).toBe(text));
});
