/** Every default of a sheet, in the sheet's own words and with its reason: the one table of them. */
import type { Tree } from './document.ts';

/** A default. */
export interface SheetDefault {
  /** Path of the key. */
  readonly key: string;
  readonly value: string | readonly string[];
  readonly why: string;
}

export const DEFAULTS: readonly SheetDefault[] = [
  { key: 'currency', value: 'EUR', why: 'the built-in tables are priced in it' },
  { key: 'quantity', value: '1000', why: 'a usual first series' },
  { key: 'input.source.resistance', value: '10 mΩ', why: 'a short supply cable' },
  { key: 'input.source.inductance', value: '0.5 µH', why: 'half a metre of supply cable' },
  { key: 'input.takes-power', value: 'no', why: 'most sources cannot take power back' },
  { key: 'output.battery', value: 'no', why: 'most outputs are loads' },
  { key: 'load-profile', value: 'average-25-50-75-100', why: 'the published average of four loads' },
  { key: 'light-load', value: 'diode-emulation', why: 'the least loss at light load of a plain stage' },
  { key: 'environment.ambient', value: '40 °C', why: 'inside an enclosure in a warm room' },
  { key: 'environment.air', value: 'still', why: 'no fan is counted on' },
  { key: 'environment.board-area', value: '25 cm²', why: 'a board of 5 cm by 5 cm' },
  { key: 'tolerances.inductance', value: '20 %', why: 'the usual tolerance of stocked inductors' },
  {
    key: 'tolerances.capacitance',
    value: '10 %',
    why: 'the tolerance of common ceramic capacitors; a wider one of a row counts',
  },
  { key: 'tolerances.oscillator', value: '10 %', why: 'usual for a resistor-set oscillator' },
  { key: 'tolerances.on-resistance', value: '10 %', why: 'beside the highest value of the row' },
  { key: 'derating.switch-voltage', value: '80 %', why: 'the usual reading of derating guides' },
  { key: 'derating.ceramic-voltage', value: '80 %', why: 'IPC-9592' },
  { key: 'derating.bulk-voltage', value: '80 %', why: 'IPC-9592' },
  { key: 'derating.ripple-current', value: '70 %', why: 'IPC-9592' },
  { key: 'derating.temperature', value: '15 K', why: 'between 10 K for capacitors (IPC-9592) and 25 K for switches' },
  { key: 'search.architectures', value: ['buck-synchronous', 'buck-diode'], why: 'the plain stages' },
  { key: 'search.phases.from', value: '1', why: 'the plain stage' },
  { key: 'search.phases.to', value: '4', why: 'more pay above tens of amperes' },
  { key: 'search.frequency.from', value: '50 kHz', why: 'below, inductors grow past stock' },
  { key: 'search.frequency.to', value: '2 MHz', why: 'above, few controllers' },
  { key: 'search.inductance.from', value: '0.1 µH', why: 'the smallest in stock' },
  { key: 'search.inductance.to', value: '100 µH', why: 'the largest in stock at power' },
  { key: 'search.wound-chokes', value: 'no', why: 'stocked inductors come first' },
  { key: 'search.parallel-switches', value: '4', why: 'more do not share well' },
  { key: 'search.ceramics', value: '12', why: 'a board has room for that many' },
  { key: 'search.bulks', value: '4', why: 'a board has room for that many' },
  { key: 'objectives', value: ['loss', 'volume', 'cost'], why: 'the three that rails are bought by' },
  { key: 'parts.tables', value: ['built-in'], why: 'the shipped, invented parts' },
  { key: 'parts.bar', value: [], why: 'none' },
  { key: 'parts.prefer', value: [], why: 'none' },
  { key: 'limits.efficiency', value: [], why: 'none asked' },
  { key: 'limits.life', value: '20000 h', why: 'more than two years of running before a wet electrolytic dries out' },
  { key: 'avoid', value: [], why: 'none' },
  { key: 'incumbents', value: [], why: 'none' },
  { key: 'advanced.islands', value: '8', why: 'enough for every family of designs' },
  {
    key: 'advanced.population',
    value: '50',
    why: 'measured on published problems: the archive holds what a larger one would',
  },
  { key: 'advanced.epoch-generations', value: '20', why: 'islands meet often enough, threads wait rarely' },
  { key: 'advanced.front-size', value: '500', why: 'a page draws that many at once' },
];

/** The tree with every default filled in where its key is absent, and the keys that were filled. */
export function withDefaults(tree: Tree): { readonly tree: Tree; readonly filled: readonly string[] } {
  const filled: string[] = [];
  let full = tree;
  for (const { key, value } of DEFAULTS) {
    const next = fill(full, key.split('.'), value);
    if (next === full) continue;
    full = next;
    filled.push(key);
  }
  return { tree: full, filled };
}

/** The same tree where the key is there or its parent is no map; else a new one. A section left empty counts as absent. */
function fill(tree: Tree, [key = '', ...rest]: readonly string[], value: Tree): Tree {
  if (typeof tree !== 'object' || tree === null || Array.isArray(tree)) return tree;
  const map = tree as { readonly [key: string]: Tree };
  const emptied = map[key] === null && (rest.length > 0 || (Array.isArray(value) && value.length === 0));
  const present = Object.hasOwn(map, key) && !emptied;
  if (rest.length === 0) return present ? tree : { ...map, [key]: value };
  const inner: Tree = present ? (map[key] ?? null) : {};
  const full = fill(inner, rest, value);
  return present && full === inner ? tree : { ...map, [key]: full };
}
