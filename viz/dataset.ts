/**
 * The front as columns: every objective, variable, margin and yield that an axis may show or a range may narrow. Near misses
 * stand behind the front's rows, so that one can be opened and pinned like any other; no range or pick counts them.
 */
import type { FrontDesign, NearMiss, PageData } from './data.ts';
import { spoken, spokenLimit } from './labels.ts';
import { percent, show, showDifference } from './units.ts';

export type Group = 'objective' | 'variable' | 'margin' | 'yield';

/** One column over all designs. */
export interface Quantity {
  /** Stable key for state and addresses: `o.loss`, `v.frequency`, `m.output-ripple`. */
  readonly key: string;
  readonly group: Group;
  readonly name: string;
  readonly label: string;
  readonly unit: string;
  /** By row; NaN where a design has no such gene. */
  readonly values: Float64Array;
  /** The front's rows alone. */
  readonly front: Float64Array;
  /** Smallest and largest finite value of the front. */
  readonly low: number;
  readonly high: number;
  /** Whether it spans so much that a logarithmic scale reads better. */
  readonly log: boolean;
  readonly whole: boolean;
}

/** The front, ready for views. */
export interface Dataset {
  /** Of the front. */
  readonly designs: readonly FrontDesign[];
  /** The front's designs, then the near misses. */
  readonly rows: readonly FrontDesign[];
  /** By row: what a near miss breaks; absent for the front's. */
  readonly misses: ReadonlyMap<number, NearMiss>;
  readonly objectives: readonly Quantity[];
  readonly quantities: readonly Quantity[];
  readonly byKey: ReadonlyMap<string, Quantity>;
  /** By row: what a reader should know of it at a glance, such as that it exists already; absent where there is nothing. */
  readonly remarks: ReadonlyMap<number, readonly string[]>;
  /** Row by id. */
  readonly index: ReadonlyMap<string, number>;
  /** Families in the order of their names. */
  readonly families: readonly string[];
}

/** Remark on a design about which a circuit simulation contradicts the model. */
export const DISPUTED = 'simulation disagrees';

/** Columns of a front, with the near misses as further rows. */
export function datasetOf(data: Pick<PageData, 'front' | 'nearMisses' | 'incumbents' | 'proofs'>): Dataset {
  const { front, nearMisses } = data;
  const { designs } = front;
  const ids = new Set(designs.map((design) => design.id));
  const others = nearMisses.filter(({ design }) => !ids.has(design.id) && ids.add(design.id));
  const rows = [...designs, ...others.map((miss) => miss.design)];
  const column = (group: Group, name: string, unit: string, value: (design: FrontDesign) => number | undefined) =>
    quantity(
      { group, name, unit },
      Float64Array.from(rows, (design) => value(design) ?? Number.NaN),
      designs.length,
    );
  const objectives = front.objectives.map(({ name, unit }, k) =>
    column('objective', name, unit, (design) => design.objectives[k]),
  );
  const quantities = [
    ...objectives,
    ...front.genes.map(({ name, unit }) => column('variable', name, unit, (design) => design.genes[name])),
    ...front.limits.map(({ name, unit }) => column('margin', name, unit, (design) => design.margins[name])),
    ...(designs.some((design) => design.yield !== undefined)
      ? [column('yield', 'yield', '', (design) => design.yield)]
      : []),
  ];
  const misses = new Map(others.map((miss, i) => [designs.length + i, miss]));
  return {
    designs,
    rows,
    misses,
    remarks: remarksOf(rows, misses, data),
    objectives,
    quantities,
    byKey: new Map(quantities.map((one) => [one.key, one])),
    index: new Map(rows.map((design, i) => [design.id, i])),
    families: [...new Set(designs.map((design) => design.family))].sort(),
  };
}

function remarksOf(
  rows: readonly FrontDesign[],
  misses: ReadonlyMap<number, NearMiss>,
  { incumbents = [], proofs = [] }: Pick<PageData, 'incumbents' | 'proofs'>,
): ReadonlyMap<number, readonly string[]> {
  const existing = new Set(incumbents);
  const disputed = new Set(proofs.filter((proof) => !proof.agrees).map((proof) => proof.id));
  const entries = rows.map(({ id }, i): [number, string[]] => {
    const miss = misses.get(i);
    return [
      i,
      [
        ...(miss === undefined ? [] : [`near miss: ${spokenLimit(miss.limit)}`]),
        ...(existing.has(id) ? ['exists already'] : []),
        ...(disputed.has(id) ? [DISPUTED] : []),
      ],
    ];
  });
  return new Map(entries.filter(([, words]) => words.length > 0));
}

/** The column of `values`, whose first `count` are the front's. */
function quantity(
  { group, name, unit }: Pick<Quantity, 'group' | 'name' | 'unit'>,
  values: Float64Array,
  count: number,
): Quantity {
  const front = values.subarray(0, count);
  const finite = front.filter((value) => Number.isFinite(value));
  const low = finite.reduce((least, value) => Math.min(least, value), Number.POSITIVE_INFINITY);
  const high = finite.reduce((most, value) => Math.max(most, value), Number.NEGATIVE_INFINITY);
  const label = group === 'margin' ? `${spokenLimit(name)}, margin` : spoken(name);
  const whole = unit === '' && group !== 'yield' && finite.every((value) => Number.isInteger(value));
  const log = !whole && group !== 'yield' && low > 0 && high / low > 12;
  return { key: `${group.charAt(0)}.${name}`, group, name, label, unit, values, front, low, high, log, whole };
}

/** A value of `quantity` for people; a margin is a distance, so kelvin stay kelvin and its sign shows; efficiencies and yields go in percent. */
export function shown(quantity: Quantity, value: number): string {
  if (quantity.group === 'yield') return percent(value);
  if (quantity.group !== 'margin' || !Number.isFinite(value)) return show(value, quantity.unit);
  if (quantity.unit === '' && quantity.name.startsWith('efficiency'))
    return `${value < 0 ? '' : '+'}${percent(value, 2)}`;
  return showDifference(value, quantity.unit);
}

/** Whether a range on `quantity` can narrow anything. */
export function varies(quantity: Quantity): boolean {
  return quantity.high > quantity.low;
}
