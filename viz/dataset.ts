/** The front as columns: every objective, variable and margin that an axis may show or a range may narrow. */
import type { Front, FrontDesign } from './data.ts';
import { spoken } from './labels.ts';
import { percent, show, showDifference } from './units.ts';

export type Group = 'objective' | 'variable' | 'margin';

/** One column over all designs. */
export interface Quantity {
  /** Stable key for state and addresses: `o.loss`, `v.frequency`, `m.output-ripple`. */
  readonly key: string;
  readonly group: Group;
  readonly name: string;
  readonly label: string;
  readonly unit: string;
  /** NaN where a design has no such gene. */
  readonly values: Float64Array;
  /** Smallest and largest finite value. */
  readonly low: number;
  readonly high: number;
  /** Whether it spans so much that a logarithmic scale reads better. */
  readonly log: boolean;
  readonly whole: boolean;
}

/** The front, ready for views. */
export interface Dataset {
  readonly designs: readonly FrontDesign[];
  readonly objectives: readonly Quantity[];
  readonly quantities: readonly Quantity[];
  readonly byKey: ReadonlyMap<string, Quantity>;
  readonly index: ReadonlyMap<string, number>;
  /** Families in the order of their names. */
  readonly families: readonly string[];
}

/** Columns of `front`. */
export function datasetOf(front: Front): Dataset {
  const { designs } = front;
  const objectives = front.objectives.map(({ name, unit }, k) =>
    quantity(
      'objective',
      name,
      unit,
      designs.map((design) => design.objectives[k] ?? Number.NaN),
    ),
  );
  const variables = front.genes.map(({ name, unit }) =>
    quantity(
      'variable',
      name,
      unit,
      designs.map((design) => design.genes[name] ?? Number.NaN),
    ),
  );
  const margins = front.limits.map(({ name, unit }) =>
    quantity(
      'margin',
      name,
      unit,
      designs.map((design) => design.margins[name] ?? Number.NaN),
    ),
  );
  const quantities = [...objectives, ...variables, ...margins];
  return {
    designs,
    objectives,
    quantities,
    byKey: new Map(quantities.map((column) => [column.key, column])),
    index: new Map(designs.map((design, i) => [design.id, i])),
    families: [...new Set(designs.map((design) => design.family))].sort(),
  };
}

function quantity(group: Group, name: string, unit: string, list: readonly number[]): Quantity {
  const values = Float64Array.from(list);
  const finite = list.filter((value) => Number.isFinite(value));
  const low = finite.reduce((least, value) => Math.min(least, value), Number.POSITIVE_INFINITY);
  const high = finite.reduce((most, value) => Math.max(most, value), Number.NEGATIVE_INFINITY);
  const label = group === 'margin' ? `${spoken(name)} margin` : spoken(name);
  const whole = unit === '' && finite.every((value) => Number.isInteger(value));
  const log = !whole && low > 0 && high / low > 12;
  return { key: `${group.charAt(0)}.${name}`, group, name, label, unit, values, low, high, log, whole };
}

/** A value of `quantity` for people; a margin is a distance, so kelvin stay kelvin, its sign shows, and efficiencies go in percent. */
export function shown(quantity: Quantity, value: number): string {
  if (quantity.group !== 'margin' || !Number.isFinite(value)) return show(value, quantity.unit);
  if (quantity.unit === '' && quantity.name.startsWith('efficiency'))
    return `${value < 0 ? '' : '+'}${percent(value, 2)}`;
  return showDifference(value, quantity.unit);
}

/** Whether a range on `quantity` can narrow anything. */
export function varies(quantity: Quantity): boolean {
  return quantity.high > quantity.low;
}
