/** Page data as a compact island: columns as base64 of little-endian numbers, so that thousands of designs stay small. */
import type { Cloud, Front, FrontDesign, NearMiss, PageData } from './data.ts';

/** Packed columns of designs that share genes, parts and limits. */
interface PackedDesigns {
  readonly ids: readonly string[];
  readonly families: readonly string[];
  readonly family: string;
  readonly genes: Readonly<Record<string, string>>;
  readonly names: readonly string[];
  readonly parts: Readonly<Record<string, string>>;
  readonly objectives: readonly string[];
  readonly margins: Readonly<Record<string, string>>;
  readonly worstMargin: string;
  /** Absent where no design has one. */
  readonly yields?: string;
}

interface Packed {
  readonly plain: Omit<PageData, 'front' | 'cloud' | 'nearMisses'>;
  readonly columns: Omit<Front, 'designs'>;
  readonly designs: PackedDesigns;
  readonly misses: readonly Omit<NearMiss, 'design'>[];
  readonly missDesigns: PackedDesigns;
  readonly cloud: {
    readonly families: readonly string[];
    readonly family: string;
    readonly low: readonly number[];
    readonly step: readonly number[];
    readonly objectives: readonly string[];
  };
}

/** The island's text; safe inside a script element: no `<`, no line separators that scripts choke on. */
export function pack(data: PageData): string {
  const { front, cloud, nearMisses, ...plain } = data;
  const { designs, ...columns } = front;
  const packed: Packed = {
    plain,
    columns,
    designs: packDesigns(designs, front),
    misses: nearMisses.map(({ limit, value, allowed, violation }) => ({ limit, value, allowed, violation })),
    missDesigns: packDesigns(
      nearMisses.map((miss) => miss.design),
      front,
    ),
    cloud: packCloud(cloud, front.objectives.length),
  };
  return JSON.stringify(packed).replace(
    /[<\u2028\u2029]/g,
    (sign) => `\\u${sign.charCodeAt(0).toString(16).padStart(4, '0')}`,
  );
}

/** What `pack` was given; cloud objectives to within 1/65535 of their range, margins to single precision. */
export function unpack(text: string): PageData {
  const packed = JSON.parse(text) as Packed;
  const misses = unpackDesigns(packed.missDesigns);
  return {
    ...packed.plain,
    front: { ...packed.columns, designs: unpackDesigns(packed.designs) },
    nearMisses: packed.misses.flatMap((miss, i) => {
      const design = misses[i];
      return design === undefined ? [] : [{ ...miss, design }];
    }),
    cloud: unpackCloud(packed.cloud),
  };
}

function packDesigns(designs: readonly FrontDesign[], front: Front): PackedDesigns {
  const families = [...new Set(designs.map((design) => design.family))];
  const names = [...new Set(designs.flatMap((design) => Object.values(design.parts)))];
  const rank = new Map(names.map((name, i) => [name, i]));
  const slots = [...new Set(designs.flatMap((design) => Object.keys(design.parts)))];
  const genes = [...new Set(designs.flatMap((design) => Object.keys(design.genes)))];
  const doubles = (value: (design: FrontDesign) => number | undefined) =>
    base64(Float64Array.from(designs, (design) => value(design) ?? Number.NaN));
  return {
    ids: designs.map((design) => design.id),
    families,
    family: base64(Uint16Array.from(designs, (design) => families.indexOf(design.family))),
    genes: Object.fromEntries(genes.map((name) => [name, doubles((design) => design.genes[name])])),
    names,
    parts: Object.fromEntries(
      slots.map((slot) => [slot, base64(Uint16Array.from(designs, (design) => partRank(rank, design.parts[slot])))]),
    ),
    objectives: front.objectives.map((_, k) => doubles((design) => design.objectives[k])),
    margins: Object.fromEntries(
      front.limits.map(({ name }) => [
        name,
        base64(Float32Array.from(designs, (design) => design.margins[name] ?? Number.NaN)),
      ]),
    ),
    worstMargin: doubles((design) => design.worstMargin),
    ...(designs.some((design) => design.yield !== undefined) ? { yields: doubles((design) => design.yield) } : {}),
  };
}

const NO_PART = 0xffff;

function partRank(rank: ReadonlyMap<string, number>, name: string | undefined): number {
  return name === undefined ? NO_PART : (rank.get(name) ?? NO_PART);
}

function unpackDesigns(packed: PackedDesigns): readonly FrontDesign[] {
  const family = new Uint16Array(bytes(packed.family));
  const genes = Object.entries(packed.genes).map(([name, text]) => [name, new Float64Array(bytes(text))] as const);
  const parts = Object.entries(packed.parts).map(([slot, text]) => [slot, new Uint16Array(bytes(text))] as const);
  const objectives = packed.objectives.map((text) => new Float64Array(bytes(text)));
  const margins = Object.entries(packed.margins).map(([name, text]) => [name, new Float32Array(bytes(text))] as const);
  const worst = new Float64Array(bytes(packed.worstMargin));
  const yields = packed.yields === undefined ? undefined : new Float64Array(bytes(packed.yields));
  return packed.ids.map((id, i) => ({
    id,
    family: packed.families[family[i] ?? 0] ?? '',
    genes: present(genes.map(([name, values]) => [name, values[i] ?? Number.NaN])),
    parts: Object.fromEntries(
      parts.flatMap(([slot, ranks]) => {
        const name = packed.names[ranks[i] ?? NO_PART];
        return name === undefined ? [] : [[slot, name]];
      }),
    ),
    objectives: objectives.map((values) => values[i] ?? Number.NaN),
    margins: present(margins.map(([name, values]) => [name, values[i] ?? Number.NaN])),
    worstMargin: worst[i] ?? Number.NaN,
    ...present([['yield', yields?.[i] ?? Number.NaN]]),
  }));
}

function present(entries: readonly (readonly [string, number])[]): Record<string, number> {
  return Object.fromEntries(entries.filter(([, value]) => !Number.isNaN(value)));
}

function packCloud(cloud: Cloud, count: number): Packed['cloud'] {
  const points = cloud.family.length;
  const columns = Array.from({ length: count }, (_, k) =>
    Float64Array.from({ length: points }, (_, i) => cloud.objectives[i * count + k] ?? 0),
  );
  const low = columns.map((column) =>
    column.reduce((least, value) => Math.min(least, value), Number.POSITIVE_INFINITY),
  );
  const high = columns.map((column) => column.reduce((most, value) => Math.max(most, value), Number.NEGATIVE_INFINITY));
  const step = low.map((least, k) => ((high[k] ?? least) - least) / 65535 || 1);
  return {
    families: cloud.families,
    family: base64(Uint8Array.from(cloud.family)),
    low: points === 0 ? low.map(() => 0) : low,
    step: points === 0 ? step.map(() => 1) : step,
    objectives: columns.map((column, k) =>
      base64(Uint16Array.from(column, (value) => Math.round((value - (low[k] ?? 0)) / (step[k] ?? 1)))),
    ),
  };
}

function unpackCloud(packed: Packed['cloud']): Cloud {
  const family = new Uint8Array(bytes(packed.family));
  const count = packed.objectives.length;
  const objectives = new Float64Array(family.length * count);
  packed.objectives.forEach((text, k) => {
    const steps = new Uint16Array(bytes(text));
    for (let i = 0; i < steps.length; i++)
      objectives[i * count + k] = (packed.low[k] ?? 0) + (steps[i] ?? 0) * (packed.step[k] ?? 1);
  });
  return { families: packed.families, family, objectives };
}

/** Base64 of an array's bytes; every engine that runs this is little-endian. */
function base64(array: Uint8Array | Uint16Array | Float32Array | Float64Array): string {
  const all = new Uint8Array(array.buffer, array.byteOffset, array.byteLength);
  let text = '';
  for (let from = 0; from < all.length; from += 8192) text += String.fromCharCode(...all.subarray(from, from + 8192));
  return btoa(text);
}

function bytes(text: string): ArrayBuffer {
  const signs = atob(text);
  const all = new Uint8Array(signs.length);
  for (let i = 0; i < signs.length; i++) all[i] = signs.charCodeAt(i);
  return all.buffer;
}
