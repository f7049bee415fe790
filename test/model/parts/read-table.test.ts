import { randomBytes } from 'node:crypto';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { describeFinding } from '../../../model/outcome.ts';
import { readTable } from '../../../model/parts/read-table.ts';
import { PART_KINDS } from '../../../model/parts/schemas.ts';
import { tableTemplate } from '../../../model/parts/template.ts';
import { complaints, tableText } from './tables.ts';

const HEADER =
  'name,technology,capacitance [µF],tolerance [%],voltage [V],esr [mΩ],esl [nH],i_ripple [A],rated_rise [K],t_max [°C],life [h],' +
  'length [mm],width [mm],height [mm],mass [g],price_1 [EUR],price_1000 [EUR],stock';
const ROW = 'B1,polymer,330,20,2,6,1.8,4.9,20,105,2000,7.3,4.3,1.9,0.16,2.20,1.05,500';
const table = (...rows: readonly string[]): string => `${[HEADER, ...rows].join('\n')}\n`;
const COLUMNS =
  'name, technology, capacitance, tolerance, voltage, esr, esl, i_ripple, rated_rise, t_max, life, length, width, height, mass, stock, price_1';

describe('a table becomes rows in SI units', () => {
  const expected = {
    name: 'B1',
    technology: 'polymer',
    capacitance: 330e-6,
    tolerance: 0.2,
    voltageRating: 2,
    seriesResistance: 6e-3,
    seriesInductance: 1.8e-9,
    rippleRating: 4.9,
    ratedRise: 20,
    maximumTemperature: 378.15,
    ratedLife: 7.2e6,
    length: 7.3e-3,
    width: 4.3e-3,
    height: 1.9e-3,
    mass: 1.6e-4,
    prices: [
      { from: 1, price: 2.2 },
      { from: 1000, price: 1.05 },
    ],
    currency: 'EUR',
    stock: 500,
  };
  const rows = (text: string) => readTable('bulks', text, 'own.csv');

  test('every column in the usual unit', () => {
    expect(rows(table(ROW))).toEqual({ ok: true, value: [expected], remarks: [] });
  });

  test('any unit of the right dimension, any order of columns, comments, quotes, Windows line ends', () => {
    const header = HEADER.replace('capacitance [µF]', 'capacitance [nF]')
      .replace('life [h]', 'life [s]')
      .replace('esr [mΩ]', 'esr [ohm]');
    const row = ROW.replace('330', '330000').replace('2000', '7200000').replace(',6,', ',0.006,').replace('B1', '"B1"');
    const turned = (line: string): string => line.split(',').reverse().join(',');
    const text = `\uFEFF# my parts, "bought" in spring\n# with love\n${turned(header)}\n\n${turned(row)}\n`.replaceAll(
      '\n',
      '\r\n',
    );
    expect(rows(text)).toEqual({ ok: true, value: [expected], remarks: [] });
  });

  test('price breaks at any numbers; an empty cell is no break; stock may be left out', () => {
    const text = table(ROW.replace('2.20,1.05,500', ',1.05,')).replace('price_1000', 'price_250');
    const outcome = rows(text);
    expect(outcome.ok && outcome.value[0]?.prices).toEqual([{ from: 250, price: 1.05 }]);
    expect(outcome.ok && outcome.value[0]).not.toHaveProperty('stock');
  });
});

describe('every problem has its line, column and words', () => {
  const cases: readonly (readonly [string, string, readonly string[]])[] = [
    [
      'a number that is none',
      table(ROW.replace('330', '330u')),
      ['own.csv:2:12: capacitance: found 330u; allowed: a number (a capacitance such as 22 µF)'],
    ],
    [
      'a value out of bounds',
      table(ROW.replace('1.8', '-1.8')),
      ['own.csv:2:23: esl: found -1.8; allowed: above 0, at most 1 µH in the unit of the header'],
    ],
    [
      'an empty cell',
      table(ROW.replace('4.9', '')),
      ['own.csv:2:27: i_ripple: found nothing; allowed: a number (a current such as 8 A)'],
    ],
    [
      'an unknown choice',
      table(ROW.replace('polymer', 'polymers')),
      ['own.csv:2:4: technology: found polymers; allowed: polymer, electrolytic, film'],
    ],
    [
      'an unknown column',
      table(ROW).replace('esr', 'ers'),
      [
        'own.csv:1: esr: found no such column; allowed: the column esr [mΩ]',
        `own.csv:1:60: ers: found the unknown column ers [mΩ]; allowed: ${COLUMNS}; nearest known: esr`,
      ],
    ],
    [
      'a missing unit',
      table(ROW).replace('esr [mΩ]', 'esr'),
      ['own.csv:1:60: esr: found no unit; allowed: the unit of a resistance such as 2.8 mΩ, as in esr [mΩ]'],
    ],
    [
      'a wrong unit',
      table(ROW).replace('esr [mΩ]', 'esr [mV]'),
      ['own.csv:1:60: esr: found the unit mV; allowed: the unit of a resistance such as 2.8 mΩ, as in esr [mΩ]'],
    ],
    [
      'a column twice',
      table(`${ROW},1`).replace('stock', 'stock,stock'),
      ['own.csv:1:207: stock: found the column stock twice; allowed: each column once'],
    ],
    [
      'two currencies',
      table(ROW).replace('price_1000 [EUR]', 'price_1000 [CHF]'),
      ['own.csv:1:184: price_1000: found the currency CHF; allowed: one currency in a table: EUR'],
    ],
    [
      'no price at all',
      table(ROW.replace('2.20,1.05', ',')),
      ['own.csv:2:60: price_1: found no price; allowed: a price in one column at least'],
    ],
    [
      'a short row',
      table(ROW.replace(',500', '')),
      ['own.csv:2: found 17 cells; allowed: 18 cells, as the header has'],
    ],
    ['a name twice', table(ROW, ROW), ['own.csv:3:1: name: found B1, which line 2 has too; allowed: each name once']],
    [
      'a name that a spreadsheet would run',
      table(ROW.replace('B1', '=B1')),
      [
        'own.csv:2:1: name: found =B1; allowed: a name of at most 60 letters, digits, spaces and . _ + - / #, starting with a letter or digit',
      ],
    ],
    [
      'a broken law',
      table(ROW.replace(',2,6', ',200,6')),
      ['own.csv:2:12: capacitance: found 330; allowed: a stored energy of at most 3 mJ in each mm³ of the box'],
    ],
    [
      'half a piece in stock',
      table(ROW.replace('500', '0.5')),
      ['own.csv:2:70: stock: found 0.5; allowed: a whole number of pieces, or nothing'],
    ],
    ['no rows', table(), ['own.csv:1: found a header without rows; allowed: one row for each part']],
    ['nothing', '', ['own.csv: found nothing; allowed: a header row and one row for each part']],
    [
      'a quotation mark left open',
      table(ROW.replace('B1', '"B1')),
      [
        'own.csv:2: found a quotation mark that is never closed; allowed: cells in quotation marks closed on their line',
      ],
    ],
    [
      'semicolons',
      table(ROW).replaceAll(',', ';'),
      [
        `own.csv:1: found name;technology;capacitance [µF];tolerance [%];voltage [V…; allowed: a header with the columns ${COLUMNS}, with commas between the columns`,
      ],
    ],
    [
      '10 MB of noise',
      randomBytes(1e7).toString('latin1'),
      ['own.csv: found 10.0 million characters; allowed: a table of at most 4 million characters'],
    ],
    ['bytes', 'a\0b', ['own.csv: found bytes that are no text; allowed: a CSV table in UTF-8']],
  ];
  test.each(cases)('%s', (_name, text, messages) => {
    expect([...complaints('bulks', text)].sort()).toEqual([...messages].sort());
  });

  test('problems of several rows come together', () => {
    const text = table(
      ROW.replace('330', 'x'),
      ROW.replace('B1', 'B2'),
      ROW.replace('B1', 'B3').replace('105', '1000'),
    );
    expect(complaints('bulks', text).map((line) => line.replace(/ found.*/, ''))).toEqual([
      'own.csv:2:12: capacitance:',
      'own.csv:4:34: t_max:',
    ]);
  });

  test('a thousand problems are cut to a hundred and one', () => {
    const rows = Array.from({ length: 1000 }, (_, i) => ROW.replace('B1', `B${i}`).replace('330', 'x'));
    expect(complaints('bulks', table(...rows))).toHaveLength(101);
  });
});

describe('physical laws between the cells of a row', () => {
  const with_ = (
    kind: 'switches' | 'diodes' | 'inductors' | 'controllers',
    column: string,
    value: string,
  ): readonly string[] => {
    const lines = tableText(kind)
      .split('\n')
      .filter((line) => !line.startsWith('#'));
    const place = (lines[0] ?? '').split(',').findIndex((cell) => cell.split(' ')[0] === column);
    const cells = (lines[1] ?? '').split(',');
    cells[place] = value;
    return complaints(kind, `${lines[0]}\n${cells.join(',')}\n`).map((line) => line.replace(/^\S+ /, ''));
  };
  test.each([
    ['switches', 'q_gd', '40', 'q_gd: found 40; allowed: together with q_gs2 less than the total gate charge q_g'],
    [
      'switches',
      'e_oss',
      '300',
      'e_oss: found 300; allowed: at most q_oss × v_oss / 2, which a constant capacitance would store',
    ],
    ['switches', 'v_oss', '30', 'v_oss: found 30; allowed: at most the rated voltage'],
    ['switches', 'gate_max', '4', 'gate_max: found 4; allowed: at least the drive voltage'],
    ['diodes', 'q_rr', '10', 'q_rr: found 10; allowed: 0 for a Schottky diode'],
    ['inductors', 'i_sat', '100', 'i_sat: found 100; allowed: a stored energy of at most 5 µJ in each mm³ of the box'],
    ['inductors', 'layers', '2.5', 'layers: found 2.5; allowed: a whole number 1 to 40'],
    ['controllers', 'v_in_min', '20', 'v_in_max: found 18; allowed: above v_in_min'],
    ['controllers', 'stages', 'buck+boost', 'stages: found buck+boost; allowed: buck, forward, bridge, joined by +'],
  ] as const)('%s: %s = %s', (kind, column, value, message) => {
    expect(with_(kind, column, value)).toContain(message);
  });
});

describe('templates and fuzz', () => {
  test.each(PART_KINDS)('the template of %s is a header that the reader takes', (kind) => {
    expect(complaints(kind, tableTemplate(kind))).toEqual([
      'own.csv:1: found a header without rows; allowed: one row for each part',
    ]);
  });

  test('2000 tables with pieces cut out and nasty ones put in never throw', () => {
    const texts = PART_KINDS.map((kind) => ({ kind, text: tableText(kind).split('\n').slice(0, 16).join('\n') }));
    const nasty = fc.oneof(
      fc.constantFrom(
        '',
        ',',
        '"',
        '""',
        '\n',
        '#',
        ';',
        '[',
        ']',
        'NaN',
        '1e999',
        '-1',
        '\0',
        '__proto__',
        '=1+1',
        '\r',
      ),
      fc.string({ unit: 'binary', maxLength: 10 }),
    );
    const edit = fc.record({ at: fc.double({ min: 0, max: 1, noNaN: true }), cut: fc.nat(20), put: nasty });
    fc.assert(
      fc.property(
        fc.constantFrom(...texts),
        fc.array(edit, { minLength: 1, maxLength: 5 }),
        ({ kind, text }, edits) => {
          const broken = edits.reduce((now, { at, cut, put }) => {
            const from = Math.floor(at * now.length);
            return now.slice(0, from) + put + now.slice(from + cut);
          }, text);
          const outcome = readTable(kind, broken, 'own.csv');
          for (const finding of outcome.ok ? [] : outcome.findings) {
            expect(describeFinding(finding)).not.toMatch(/[\0\n]|undefined|\[object/);
          }
        },
      ),
      { numRuns: 2000 },
    );
  });
});
