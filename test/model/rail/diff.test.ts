import { expect, test } from 'vitest';
import { diffRails } from '../../../model/rail/diff.ts';
import { railOf, shipped } from './sheets.ts';

test('equal rails do not differ', () => {
  const text = shipped('hut-link.yaml');
  expect(diffRails(railOf(text), railOf(text.replace('1.0 L', '1000 cm³')))).toEqual([]);
});

test('every changed field is spelled out in the units of its kind', () => {
  const before = shipped('buoy-sensors.yaml');
  const after = before
    .replace('ripple: 20 mV', 'ripple: 10 mV')
    .replace('45 °C', '50 °C')
    .replace('air: still', 'air: 1 m/s')
    .replace('at-least: 92 %', 'at-least: 93 %')
    .replace('  volume: 8 cm³\n', '')
    .replace('to: 5 MHz', 'to: 2 MHz')
    .replace('[buck-synchronous, buck-diode]', '[buck-synchronous]');
  expect(diffRails(railOf(before), railOf(after))).toEqual([
    'output.ripple: 20 mV became 10 mV',
    'ambient: 45 °C became 50 °C',
    'airSpeed: 0 m/s became 1 m/s',
    'limits.volume: 8 cm³ became nothing',
    'limits.efficiency[1].atLeast: 92 % became 93 %',
    'search.architectures[2]: buck-diode became nothing',
    'search.frequency.maximum: 5 MHz became 2 MHz',
  ]);
});

test('a difference beyond four digits is shown with all of them', () => {
  const before = shipped('buoy-sensors.yaml');
  const lines = diffRails(railOf(before), railOf(before.replace('max: 15 V', 'max: 15.00001 V')));
  expect(lines).toEqual(['input.maximum: 15 V (15) became 15 V (15.00001)']);
});
