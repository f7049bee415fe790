import { randomBytes } from 'node:crypto';
import { describe, expect, test } from 'vitest';
import { starterSheet } from '../../../model/rail/starter.ts';
import { complaints, SOUND } from './sheets.ts';

const KEYS =
  'rail, currency, quantity, input, output, load-step, load-profile, light-load, environment, limits, avoid, tolerances, ' +
  'derating, search, objectives, parts, incumbents, advanced';
const PROFILES = 'full-load, average-25-50-75-100, points-10-20-50-100, cec, european';

describe('one mistake gives one message, with its place', () => {
  const cases: readonly (readonly [string, string, string])[] = [
    [
      'a missing unit',
      SOUND.replace('6 A', '6'),
      'rail.yaml:6:12: output.current: found 6 without a unit; allowed: a current such as 8 A',
    ],
    [
      'a wrong dimension',
      SOUND.replace('6 A', '6 V'),
      'rail.yaml:6:12: output.current: found 6 V, which is a voltage; allowed: a current such as 8 A',
    ],
    [
      'an unknown unit',
      SOUND.replace('30 mV', '30 mv'),
      'rail.yaml:7:11: output.ripple: found 30 mv with an unknown unit; allowed: a voltage such as 48 V; nearest known: mV',
    ],
    [
      'min above max',
      SOUND.replace('18 V', '40 V'),
      'rail.yaml:3:18: input.voltage.min: found 40 V; allowed: at most the max, 32 V',
    ],
    [
      'nominal outside',
      SOUND.replace('24 V', '33 V'),
      'rail.yaml:3:33: input.voltage.nominal: found 33 V; allowed: from the min, 18 V, to the max, 32 V',
    ],
    [
      'output above input',
      SOUND.replace(' 5 V', ' 48 V'),
      'rail.yaml:5:12: output.voltage: found 48 V; allowed: below the smallest input voltage, 18 V: every stage here steps down',
    ],
    [
      'an unknown key',
      `${SOUND}objectvies: [loss, cost]\n`,
      `rail.yaml:8:1: objectvies: found the unknown key objectvies; allowed: ${KEYS}; nearest known: objectives`,
    ],
    [
      'an unknown key inside',
      SOUND.replace('ripple', 'riple: 1 V\n  ripple'),
      'rail.yaml:7:3: output.riple: found the unknown key riple; allowed: voltage, current, ripple, battery; nearest known: ripple',
    ],
    [
      'an empty load profile',
      `${SOUND}load-profile: []\n`,
      `rail.yaml:8:15: load-profile: found an empty list; allowed: 1 or more loads with their shares of the time, or one of ${PROFILES}`,
    ],
    [
      'a load profile left out after its key',
      `${SOUND}load-profile:\n`,
      `rail.yaml:8:14: load-profile: found nothing; allowed: ${PROFILES}`,
    ],
    [
      'an unknown profile',
      `${SOUND}load-profile: ced\n`,
      `rail.yaml:8:15: load-profile: found ced; allowed: ${PROFILES}; nearest known: cec`,
    ],
    [
      'shares that do not fill the time',
      `${SOUND}load-profile:\n  - {load: 50 %, share: 30 %}\n  - {load: 100 %, share: 60 %}\n`,
      `rail.yaml:9:3: load-profile: found shares that sum to 90 %; allowed: shares that sum to 100 %, or one of ${PROFILES}`,
    ],
    [
      'the same load twice',
      `${SOUND}load-profile:\n  - {load: 50 %, share: 40 %}\n  - {load: 50 %, share: 60 %}\n`,
      'rail.yaml:10:12: load-profile[2].load: found 50 % twice; allowed: each once',
    ],
    [
      'a negative load without a battery',
      `${SOUND}load-profile:\n  - {load: -50 %, share: 40 %}\n  - {load: 50 %, share: 60 %}\n`,
      'rail.yaml:9:12: load-profile[1].load: found -50 %; allowed: 0 % to 100 %; below 0 only with output.battery: yes and input.takes-power: yes',
    ],
    [
      'a step larger than the load',
      `${SOUND}load-step: {current: 7 A, slew: 1 A/us, deviation: 100 mV}\n`,
      'rail.yaml:8:22: load-step.current: found 7 A; allowed: at most the full load, 6 A',
    ],
    [
      'a range turned round',
      `${SOUND}search:\n  frequency: {from: 2 MHz, to: 100 kHz}\n`,
      'rail.yaml:9:21: search.frequency.from: found 2 MHz; allowed: at most the to, 100 kHz',
    ],
    [
      'one objective',
      `${SOUND}objectives: [loss]\n`,
      'rail.yaml:8:13: objectives: found one entry; allowed: 2 to 4 different ones of loss, inefficiency, volume, cost, board-area, mass, full-load-loss',
    ],
    [
      'the same objective twice',
      `${SOUND}objectives: [loss, cost, loss]\n`,
      'rail.yaml:8:26: objectives[3]: found loss twice; allowed: each once',
    ],
    [
      'a part both barred and preferred',
      `${SOUND}parts: {bar: [A1], prefer: [A1]}\n`,
      'rail.yaml:8:29: parts.prefer[1]: found A1; allowed: a part that parts.bar does not name',
    ],
    [
      'efficiency at no load',
      `${SOUND}limits: {efficiency: [{load: 0 %, at-least: 90 %}]}\n`,
      'rail.yaml:8:30: limits.efficiency[1].load: found 0 %; allowed: a load other than 0: without load there is no efficiency',
    ],
    [
      'a cost in another currency',
      `${SOUND}limits: {cost: 12 CHF}\n`,
      "rail.yaml:8:16: limits.cost: found 12 CHF; allowed: a price in the sheet's currency, EUR",
    ],
    [
      'a value out of bounds',
      `${SOUND}environment: {ambient: 400 °C}\n`,
      'rail.yaml:8:24: environment.ambient: found 400 °C; allowed: a temperature such as 55 °C, at least -40 °C, at most 125 °C',
    ],
    [
      'a text where a map belongs',
      `${SOUND}limits: none\n`,
      'rail.yaml:8:9: limits: found none; allowed: a map with the keys height, volume, board-area, mass, cost, efficiency, no-load-power, minimum-on-time, life',
    ],
    ['a key twice', `${SOUND}rail: again\n`, 'rail.yaml:8:1: rail: found the key rail twice; allowed: each key once'],
    [
      'an alias',
      `${SOUND.replace('rail: test', 'rail: &name test')}currency: *name\n`,
      'rail.yaml:8:11: currency: found the alias *name; allowed: values written out, without aliases',
    ],
    [
      'not YAML',
      'rail: a: b',
      'rail.yaml:1:7: found rail: a: b; allowed: YAML: Nested mappings are not allowed in compact mappings',
    ],
    [
      'prose',
      'Please give me 5 V',
      'rail.yaml:1:1: found Please give me 5 V; allowed: a rail sheet in YAML, such as chopfront draft writes',
    ],
    [
      'an empty file',
      '',
      'rail.yaml:1:1: found nothing; allowed: a rail sheet in YAML, such as chopfront draft writes',
    ],
    [
      '10 MB of letters',
      'x'.repeat(1e7),
      'rail.yaml: found 10000000 characters; allowed: a rail sheet of at most 65536 characters',
    ],
    [
      '10 MB of noise',
      randomBytes(1e7).toString('latin1'),
      'rail.yaml: found 10000000 characters; allowed: a rail sheet of at most 65536 characters',
    ],
    ['bytes', `rail: a\0b`, 'rail.yaml: found bytes that are no text; allowed: a rail sheet in YAML, in UTF-8'],
    [
      'brackets in brackets',
      '{'.repeat(60000),
      'rail.yaml: found maps in maps too deep; allowed: the keys of a rail sheet',
    ],
  ];
  test.each(cases)('%s', (_name, text, message) => {
    expect(complaints(text)).toEqual([message]);
  });
});

describe('many mistakes give all their messages at once, in the order of the text', () => {
  test('ten in one sheet', () => {
    const text = starterSheet()
      .replace('rail: my-rail', 'rial: my-rail')
      .replace('min: 18 V', 'min: 40 V')
      .replace('current: 6 A ', 'current: 6 V ')
      .replace('ripple: 30 mV', 'ripple: 30')
      .replace('ambient', 'ambeint')
      .replace('light-load: diode-emulation', 'light-load: diode-emulate')
      .replace('share: 20 %', 'share: 10 %')
      .replace('[loss, volume, cost]', '[loss]');
    expect(complaints(text).map((line) => line.replace(/; allowed.*/, ''))).toEqual([
      'rail.yaml:11:1: rail: found nothing',
      'rail.yaml:11:1: rial: found the unknown key rial',
      'rail.yaml:16:18: input.voltage.min: found 40 V',
      'rail.yaml:24:12: output.current: found 6 V, which is a voltage',
      'rail.yaml:25:11: output.ripple: found 30 without a unit',
      'rail.yaml:35:3: load-profile: found shares that sum to 90 %',
      'rail.yaml:39:13: light-load: found diode-emulate',
      'rail.yaml:42:3: environment.ambeint: found the unknown key ambeint',
      'rail.yaml:83:13: objectives: found one entry',
    ]);
  });

  test('what is missing is named where it belongs', () => {
    expect(complaints('rail: a\noutput: {voltage: 5 V}\n')).toEqual([
      'rail.yaml:1:1: input.voltage: found nothing; allowed: a voltage such as 48 V',
      'rail.yaml:2:1: output.current: found nothing; allowed: a current such as 8 A',
      'rail.yaml:2:1: output.ripple: found nothing; allowed: a voltage such as 48 V',
    ]);
  });
});
