/** High step-down ratios: where arithmetic forbids the plain buck, and what a transformer is worth from 3.6 to 48. */
import type { Controller } from '../../model/parts/controller.ts';
import type { PartsTables } from '../../model/parts/tables.ts';
import type { Rail } from '../../model/rail/rail.ts';
import type { Architecture } from '../../model/stages/list.ts';
import { type Designs, hypervolumeOf } from '../../optimizer/index.ts';
import { plainRail } from '../model/support.ts';
import { builtInTables, type Sweep, spaceOf, sweep } from './spaces.ts';

/** Every architecture with a transformer. */
export const TRANSFORMER_FAMILIES: readonly Architecture[] = [
  'two-switch-forward',
  'half-bridge-centre-tap',
  'half-bridge-current-doubler',
  'full-bridge-centre-tap',
  'full-bridge-current-doubler',
];

/** The built-in tables with every controller changed alike. */
export function withControllers(over: (row: Controller) => Partial<Controller>): PartsTables {
  const tables = builtInTables();
  return { ...tables, controllers: tables.controllers.map((row) => ({ ...row, ...over(row) })) };
}

/** 40 V to 60 V in, 1 V 20 A out, 400 kHz and up, forced continuous, ordinary tolerances. */
export function handSheet(architectures: readonly Architecture[]): Rail {
  const plain = plainRail({ input: 48, output: 1, current: 20 });
  return {
    ...plain,
    name: 'high-ratio',
    quantity: 1000,
    input: { ...plain.input, minimum: 40, maximum: 60 },
    output: { ...plain.output, ripple: 30e-3 },
    profile: [
      { fraction: 1, share: 0.3 },
      { fraction: 0.5, share: 0.4 },
      { fraction: 0.1, share: 0.3 },
    ],
    ambient: 313.15,
    airSpeed: 2,
    coolingArea: 60e-4,
    tolerances: { inductance: 0.2, capacitance: 0.2, oscillator: 0.05, onResistance: 0.1 },
    derating: { switchVoltage: 0.8, ceramicVoltage: 0.8, bulkVoltage: 0.8, rippleCurrent: 0.8, temperature: 20 },
    search: {
      ...plain.search,
      architectures,
      phases: { minimum: 1, maximum: 2 },
      frequency: { minimum: 400e3, maximum: 2e6 },
      inductance: { minimum: 0.1e-6, maximum: 10e-6 },
      ceramics: 48,
      bulks: 8,
    },
  };
}

/** Sweeps the hand sheet with one set of architectures under controllers of one shortest on-time (s). */
export function handSweep(architectures: readonly Architecture[], shortest: number, evaluations: number): Sweep {
  const tables = withControllers(() => ({ minimumOnTime: shortest }));
  return sweep(spaceOf(handSheet(architectures), tables), evaluations);
}

/** One step-down ratio at 48 V and 60 W. */
export interface RatioGain {
  readonly ratio: number;
  /** Hypervolume of plain bucks alone, of transformer stages alone, of both fronts together, all above the bucks' reference point. */
  readonly buck: number;
  readonly transformer: number;
  readonly both: number;
  /** both/buck − 1. */
  readonly gain: number;
}

/** What allowing the transformer families gains at a step-down ratio; each side is given `evaluations`. */
export function ratioGain(ratio: number, evaluations: number): RatioGain {
  const bucks = sweep(spaceOf(ratioSheet(ratio, ['buck-synchronous'])), evaluations);
  const others = sweep(spaceOf(ratioSheet(ratio, TRANSFORMER_FAMILIES)), evaluations);
  const measured = (front: Designs): number => hypervolumeOf(bucks.problem, front);
  const [buck, transformer] = [measured(bucks.front), measured(others.front)];
  const both = measured(union(bucks.front, others.front));
  return { ratio, buck, transformer, both, gain: both / buck - 1 };
}

/** 48 V to 48 V/`ratio`, always 60 W, so that the objectives' references are the same at every ratio. */
function ratioSheet(ratio: number, architectures: readonly Architecture[]): Rail {
  const base = handSheet(architectures);
  const volts = 48 / ratio;
  return {
    ...base,
    name: `ratio-${ratio}`,
    input: { ...base.input, minimum: 43, maximum: 53 },
    output: {
      ...base.output,
      minimum: volts,
      nominal: volts,
      maximum: volts,
      current: 60 / volts,
      ripple: volts / 100,
    },
    limits: { efficiency: [], volume: 60e-6 },
    search: {
      ...base.search,
      phases: { minimum: 1, maximum: 4 },
      frequency: { minimum: 100e3, maximum: 2e6 },
      inductance: { minimum: 0.1e-6, maximum: 100e-6 },
    },
  };
}

/** The non-dominated designs of two fronts of the same objectives; genes and violations stay behind. */
function union(a: Designs, b: Designs): Designs {
  const rows = [...rowsOf(a), ...rowsOf(b)];
  const kept = rows.filter((row) => !rows.some((other) => dominates(other, row)));
  return {
    count: kept.length,
    genes: new Float64Array(0),
    objectives: Float64Array.from(kept.flat()),
    violations: new Float64Array(0),
  };
}

function rowsOf(front: Designs): number[][] {
  const m = front.count > 0 ? front.objectives.length / front.count : 0;
  return Array.from({ length: front.count }, (_, row) => [...front.objectives.subarray(row * m, (row + 1) * m)]);
}

/** Whether `a` is nowhere worse than `b` and somewhere better. */
export function dominates(a: readonly number[], b: readonly number[]): boolean {
  return a.every((value, i) => value <= b[i]) && a.some((value, i) => value < b[i]);
}
