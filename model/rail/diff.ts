/** What changed between two rails, field by field, in units that people read. */
import { formatDifference, formatQuantity } from '../quantity/format.ts';
import type { Rail } from './rail.ts';

/** SI unit of each numeric field; fractions are shown in per cent, the rest as they are. */
const UNITS: Readonly<Record<string, string>> = {
  'input.minimum': 'V',
  'input.nominal': 'V',
  'input.maximum': 'V',
  'input.sourceResistance': 'Ω',
  'input.sourceInductance': 'H',
  'input.ripple': 'V',
  'input.sourceRipple': 'A',
  'output.minimum': 'V',
  'output.nominal': 'V',
  'output.maximum': 'V',
  'output.current': 'A',
  'output.ripple': 'V',
  'step.current': 'A',
  'step.slew': 'A/s',
  'step.deviation': 'V',
  'profile[].fraction': '%',
  'profile[].share': '%',
  ambient: 'K',
  airSpeed: 'm/s',
  coolingArea: 'm²',
  'limits.height': 'm',
  'limits.volume': 'm³',
  'limits.boardArea': 'm²',
  'limits.mass': 'kg',
  'limits.efficiency[].load': '%',
  'limits.efficiency[].atLeast': '%',
  'limits.noLoadPower': 'W',
  'limits.minimumOnTime': 's',
  'limits.life': 's',
  'avoid[].from': 'Hz',
  'avoid[].to': 'Hz',
  'tolerances.inductance': '%',
  'tolerances.capacitance': '%',
  'tolerances.oscillator': '%',
  'tolerances.onResistance': '%',
  'derating.switchVoltage': '%',
  'derating.ceramicVoltage': '%',
  'derating.bulkVoltage': '%',
  'derating.rippleCurrent': '%',
  'derating.temperature': 'ΔK',
  'search.frequency.minimum': 'Hz',
  'search.frequency.maximum': 'Hz',
  'search.inductance.minimum': 'H',
  'search.inductance.maximum': 'H',
};

/** One line for each field that differs, such as `output.ripple: 20 mV became 10 mV`; empty for equal rails. */
export function diffRails(before: Rail, after: Rail): string[] {
  const old = leavesOf(before);
  const now = leavesOf(after);
  const paths = new Set([...old.keys(), ...now.keys()]);
  return [...paths].flatMap((path) => {
    const a = old.get(path);
    const b = now.get(path);
    if (a === b) return [];
    const [from, to] = distinct(path, a, b);
    return [`${path}: ${from} became ${to}`];
  });
}

/** Two texts that differ: with all digits where four hide the difference. */
function distinct(path: string, a: Value, b: Value): readonly [string, string] {
  const from = shown(path, a);
  const to = shown(path, b);
  return from === to ? [`${from} (${String(a)})`, `${to} (${String(b)})`] : [from, to];
}

type Value = string | number | boolean | undefined;

function shown(path: string, value: Value): string {
  if (value === undefined) return 'nothing';
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (typeof value === 'string') return value;
  const unit = UNITS[path.replace(/\[\d+\]/g, '[]')];
  if (unit === '%') return `${formatQuantity(value * 100, '')} %`;
  return unit === 'ΔK' ? formatDifference(value, 'K') : formatQuantity(value, unit ?? '');
}

/** Every leaf by its path; entries of lists count from 1. */
function leavesOf(value: unknown, path = '', leaves = new Map<string, Value>()): Map<string, Value> {
  if (Array.isArray(value)) {
    for (const [i, entry] of value.entries()) leavesOf(entry, `${path}[${i + 1}]`, leaves);
  } else if (typeof value === 'object' && value !== null) {
    for (const [key, inner] of Object.entries(value)) leavesOf(inner, path === '' ? key : `${path}.${key}`, leaves);
  } else if (typeof value === 'string' || typeof value === 'number' || typeof value === 'boolean') {
    leaves.set(path, value);
  }
  return leaves;
}
