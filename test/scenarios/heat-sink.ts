/** Heat takes back what frequency gave: 48 V to 12 V, 500 W, still air, the smallest design at fixed frequencies. */
import type { Rail } from '../../model/rail/rail.ts';
import { handSheet, withControllers } from './high-ratio.ts';
import { least, objectiveIndex, spaceOf, sweep } from './spaces.ts';

/** Eight frequencies from 50 kHz to 3.2 MHz, evenly on a logarithmic line, Hz. */
export const EIGHT_FREQUENCIES: readonly number[] = Array.from({ length: 8 }, (_, k) =>
  Number((50e3 * 64 ** (k / 7)).toPrecision(3)),
);

/** The smallest design at one frequency. */
export interface Smallest {
  readonly frequency: number;
  /** m³. */
  readonly volume: number;
  readonly sink: number;
  readonly chokes: number;
  readonly family: string;
  /** W at full load, the only load of the sheet. */
  readonly loss: number;
}

/** Board that cools, m²: a board of its own, and the outline of a quarter brick, 58.4 mm by 36.8 mm (common practice, no source). */
export const BOARDS = { open: 60e-4, brick: 58.4e-3 * 36.8e-3 } as const;

/** The smallest design at one fixed frequency over several sweeps, on `coolingArea` m²: one sweep alone may stop at a local optimum. */
export function smallestAt(
  frequency: number,
  evaluations: number,
  seeds: readonly string[],
  coolingArea: number = BOARDS.open,
): Smallest {
  const all = seeds.map((seed) => smallestOf(frequency, evaluations, seed, coolingArea));
  return all.reduce((best, one) => (one.volume < best.volume ? one : best));
}

function smallestOf(frequency: number, evaluations: number, seed: string, coolingArea: number): Smallest {
  // The study is of size and heat: no controller's own limits of frequency or on-time may end the curve.
  const tables = withControllers(() => ({
    frequencyMinimum: 20e3,
    frequencyMaximum: 5e6,
    minimumOnTime: 15e-9,
    minimumOffTime: 50e-9,
  }));
  const found = sweep(spaceOf(hotSheet(frequency, coolingArea), tables), evaluations, seed);
  const member = least(found, 'volume');
  const { volumes, points } = found.problem.assess(member.genes);
  const share = (name: string): number => volumes.find((item) => item.name === name)?.value ?? 0;
  return {
    frequency,
    volume: member.objectives[objectiveIndex(found.problem, 'volume')],
    sink: share('heatSink'),
    chokes: share('inductor'),
    family: member.family,
    loss: points.find((point) => point.share > 0)?.loss ?? Number.NaN,
  };
}

function hotSheet(frequency: number, coolingArea: number): Rail {
  const base = handSheet(['buck-synchronous']);
  return {
    ...base,
    name: 'hot-box',
    input: { ...base.input, minimum: 44, maximum: 53, ripple: 0.5 },
    output: { ...base.output, minimum: 12, nominal: 12, maximum: 12, current: 500 / 12, ripple: 0.12 },
    profile: [{ fraction: 1, share: 1 }],
    ambient: 308.15,
    airSpeed: 0,
    coolingArea,
    // The search wants two; mass goes with volume, so that the whole budget looks for the smallest.
    objectives: ['volume', 'mass'],
    search: {
      ...base.search,
      phases: { minimum: 1, maximum: 8 },
      frequency: { minimum: frequency, maximum: frequency },
      inductance: { minimum: 0.1e-6, maximum: 100e-6 },
      parallelSwitches: 6,
    },
  };
}
