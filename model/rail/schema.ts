/** The shape of a rail sheet after its defaults are filled in: every key, what it holds, its bounds. */
import type { z } from 'zod';
import { readDecimal } from '../quantity/decimal.ts';
import { parseQuantity, shorten } from '../quantity/parse.ts';
import { ARCHITECTURES } from '../stages/list.ts';
import { amount, count, keyed, leaf, listOf, matching, oneOf, textOr, upTo, yesNo } from './leaves.ts';
import { PROFILE_NAMES } from './profiles.ts';
import { OBJECTIVES } from './rail.ts';

const MOST_VOLTS = 2000;
const MOST_AMPERES = 10000;

const voltage = upTo('voltage', MOST_VOLTS);
const voltages = textOr(
  voltage.transform((value) => ({ min: value, nominal: value, max: value })),
  keyed({ min: voltage, nominal: voltage, max: voltage }),
);
const share = amount('fraction', { above: 0, to: 1 });
const load = amount('fraction', { from: -1, to: 1 });
const name = matching(
  /^[\p{L}\p{N}][\p{L}\p{N} ._-]{0,59}$/u,
  'a name of at most 60 letters, digits, spaces and . _ -',
);
const partName = matching(/^[\p{L}\p{N}][\p{L}\p{N} ._+\-/#]{0,59}$/u, 'the name of a part');
const path = matching(/^[^\p{C}]{1,300}$/u, 'the path of a file');
const frequency = upTo('frequency', 100e6);
const inductance = upTo('inductance', 0.1);

/** Air over the board: `still` or a speed, m/s. */
const air = leaf<number>('still, or a speed such as 2 m/s', (text) => {
  if (text === 'still') return { value: 0 };
  const reading = parseQuantity(text, 'speed');
  if (reading.ok && reading.value >= 0 && reading.value <= 5) return { value: reading.value };
  const found = reading.ok ? shorten(text) : reading.found;
  return { complaint: { found, allowed: 'still, or a speed such as 2 m/s, at most 5 m/s' } };
});

/** An amount of money, with or without the currency of the sheet. */
const money = leaf<number>('a price such as 15 EUR', (text) => {
  const value = readDecimal(/^(.*?)(?: ?[A-Z]{3})?$/.exec(text)?.[1] ?? '');
  if (value > 0 && value <= 1e6) return { value };
  return { complaint: { found: shorten(text), allowed: 'a price such as 15 EUR, above 0, at most 1000000' } };
});

const profile = textOr(
  oneOf(PROFILE_NAMES),
  listOf(keyed({ load, share }), 1, 50, `loads with their shares of the time, or one of ${PROFILE_NAMES.join(', ')}`),
);

const limits = keyed({
  height: upTo('length', 0.5).optional(),
  volume: upTo('volume', 1).optional(),
  'board-area': upTo('area', 1).optional(),
  mass: upTo('mass', 1000).optional(),
  cost: money.optional(),
  efficiency: listOf(keyed({ load, 'at-least': share }), 0, 20, 'loads with the least efficiency there'),
  'no-load-power': upTo('power', 1e5).optional(),
  'minimum-on-time': upTo('time', 1e-3).optional(),
  life: upTo('time', 3.6e9).optional(),
});

const search = keyed({
  architectures: listOf(oneOf(ARCHITECTURES), 1, ARCHITECTURES.length, ARCHITECTURES.join(', ')),
  phases: keyed({ from: count(1, 8), to: count(1, 8) }),
  frequency: keyed({ from: frequency, to: frequency }),
  inductance: keyed({ from: inductance, to: inductance }),
  'wound-chokes': yesNo(),
  'parallel-switches': count(1, 8),
  ceramics: count(1, 64),
  bulks: count(0, 32),
});

/** The sheet. */
export const SHEET = keyed({
  rail: name,
  currency: matching(/^[A-Z]{3}$/, 'three capital letters such as EUR'),
  quantity: count(1, 1e9),
  input: keyed({
    voltage: voltages,
    source: keyed({
      resistance: amount('resistance', { from: 0, to: 100 }),
      inductance: amount('inductance', { from: 0, to: 1e-3 }),
    }),
    ripple: upTo('voltage', MOST_VOLTS).optional(),
    'source-ripple': upTo('current', MOST_AMPERES).optional(),
    'takes-power': yesNo(),
  }),
  output: keyed({
    voltage: voltages,
    current: upTo('current', MOST_AMPERES),
    ripple: upTo('voltage', MOST_VOLTS),
    battery: yesNo(),
  }),
  'load-step': keyed({
    current: upTo('current', MOST_AMPERES),
    slew: upTo('slew', 1e12),
    deviation: upTo('voltage', MOST_VOLTS),
  }).optional(),
  'load-profile': profile,
  'light-load': oneOf(['forced-continuous', 'diode-emulation', 'phase-shedding']),
  environment: keyed({
    ambient: amount('temperature', { from: 233.15, to: 398.15 }),
    air,
    'board-area': upTo('area', 10),
  }),
  limits,
  avoid: listOf(
    keyed({ from: frequency, to: frequency, harmonics: count(1, 50).default(1) }),
    0,
    20,
    'bands with from and to',
  ),
  tolerances: keyed({
    inductance: amount('fraction', { from: 0, to: 0.5 }),
    capacitance: amount('fraction', { from: 0, to: 0.8 }),
    oscillator: amount('fraction', { from: 0, to: 0.5 }),
    'on-resistance': amount('fraction', { from: 0, to: 1 }),
  }),
  derating: keyed({
    'switch-voltage': share,
    'ceramic-voltage': share,
    'bulk-voltage': share,
    'ripple-current': share,
    temperature: amount('temperature difference', { from: 0, to: 100 }),
  }),
  search,
  objectives: listOf(oneOf(OBJECTIVES), 2, 4, `different ones of ${OBJECTIVES.join(', ')}`),
  parts: keyed({
    tables: listOf(path, 1, 50, 'built-in and names of table files'),
    bar: listOf(partName, 0, 10000, 'names of parts'),
    prefer: listOf(partName, 0, 10000, 'names of parts'),
  }),
  incumbents: listOf(path, 0, 50, 'names of spec files'),
  advanced: keyed({
    islands: count(2, 256),
    population: count(8, 10000),
    'epoch-generations': count(1, 1000),
    'front-size': count(10, 10000),
  }),
});

/** A sheet of good shape, SI values under the sheet's own keys. */
export type Sheet = z.output<typeof SHEET>;
