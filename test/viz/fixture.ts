/** An invented sweep for the view tests: plausible in shape, consistent in itself, with no claim to physics. */
import type { Assessment, DesignRecord, LossItem, PointReport, Trace } from '../../model/assessment.ts';
import type { Rail } from '../../model/rail/rail.ts';
import type { Architecture } from '../../model/stages/list.ts';
import type { Assessor, Movable, Verdict } from '../../viz/assessor.ts';
import type { Front, FrontDesign, NearMiss, PageData } from '../../viz/data.ts';
import { NO_TABLES } from '../support/tables.ts';

const FAMILIES: readonly (readonly [Architecture, number])[] = [
  ['buck-synchronous', 1],
  ['buck-synchronous', 2],
  ['buck-synchronous', 3],
  ['buck-synchronous', 4],
  ['buck-diode', 1],
  ['buck-diode', 2],
  ['two-switch-forward', 1],
];
const SWITCHES = ['SW-30-3m', 'SW-30-5m', 'SW-30-9m', 'SW-30-14m', 'SW-30-24m', 'SW-30-40m'];
const INDUCTORS = ['L-3mm', 'L-4mm', 'L-5mm', 'L-6mm', 'L-8mm', 'L-10mm'];
const CERAMICS = ['C-22u-X7R', 'C-47u-X5R'];
const CONTROLLERS = ['CT-A', 'CT-B'];
const LIMITS = [
  ['output-ripple', 'V'],
  ['load-step', 'V'],
  ['switch-temperature', 'K'],
  ['inductor-temperature', 'K'],
  ['saturation', 'A'],
  ['height', 'm'],
  ['volume', 'm³'],
] as const;

/** The sheet behind the invented sweep. */
export const RAIL: Rail = {
  name: 'buoy-sensors',
  currency: 'EUR',
  quantity: 1000,
  input: {
    minimum: 10.5,
    nominal: 12.8,
    maximum: 15,
    sourceResistance: 0.05,
    sourceInductance: 5e-7,
    takesPower: false,
  },
  output: { minimum: 3.3, nominal: 3.3, maximum: 3.3, current: 8, ripple: 0.02, battery: false },
  step: { current: 4, slew: 5e6, deviation: 0.1 },
  profile: [
    { fraction: 0.02, share: 0.4 },
    { fraction: 0.25, share: 0.3 },
    { fraction: 0.5, share: 0.2 },
    { fraction: 1, share: 0.1 },
  ],
  lightLoad: 'diode-emulation',
  ambient: 318.15,
  airSpeed: 0,
  coolingArea: 0.0025,
  limits: { height: 0.008, volume: 8e-6, efficiency: [{ load: 1, atLeast: 0.92 }] },
  avoid: [{ from: 485e3, to: 525e3, harmonics: 1 }],
  tolerances: { inductance: 0.2, capacitance: 0.2, oscillator: 0.1, onResistance: 0.1 },
  derating: { switchVoltage: 0.8, ceramicVoltage: 0.8, bulkVoltage: 0.9, rippleCurrent: 1, temperature: 10 },
  search: {
    architectures: ['buck-synchronous', 'buck-diode'],
    phases: { minimum: 1, maximum: 4 },
    frequency: { minimum: 30e3, maximum: 5e6 },
    inductance: { minimum: 1e-7, maximum: 1e-4 },
    parallelSwitches: 4,
    ceramics: 12,
    bulks: 4,
  },
  objectives: ['loss', 'volume', 'cost'],
  parts: { tables: ['built-in'], barred: [], preferred: [] },
  settings: { islands: 8, population: 200, epochGenerations: 10, frontSize: 500 },
};

/** A design is dropped only if another beats it by more than this in everything: the invented front is a thick one. */
const SLACK = 0.94;

/** A repeatable stream of numbers in 0 … 1 (Park and Miller's minimal generator). */
export function stream(seed: number): () => number {
  let state = seed % 2147483647 || 1;
  return () => {
    state = (state * 48271) % 2147483647;
    return state / 2147483647;
  };
}

/** A page of `designs` front designs and `points` cloud points. */
export function fixture(designs = 240, points = 3000, seed = 7): PageData {
  const draw = stream(seed);
  const assessor = fixtureAssessor();
  const everyone = explore(designs, draw);
  const feasible = everyone.filter((one) => one.feasible);
  const front: Front = {
    objectives: [
      { name: 'loss', unit: 'W' },
      { name: 'volume', unit: 'm³' },
      { name: 'cost', unit: 'EUR' },
    ],
    limits: LIMITS.map(([name, unit]) => ({ name, unit })),
    genes: assessor.genes.filter((gene) => gene.kind !== 'choice').map(({ name, unit }) => ({ name, unit })),
    designs: nonDominated(feasible)
      .slice(0, designs)
      .map(toFront)
      .sort((a, b) => (a.id < b.id ? -1 : 1)),
  };
  return { ...around(front, everyone), cloud: cloud(feasible, points, draw), front };
}

function explore(designs: number, draw: () => number): readonly Assessment[] {
  const byId = new Map<string, Assessment>();
  const add = (one: Assessment) => byId.set(one.id, one);
  for (let i = 0; i < designs * 4; i++) add(judge(record(draw), RAIL));
  for (let round = 0; round < 40; round++) {
    const best = nonDominated([...byId.values()].filter((one) => one.feasible));
    if (best.length >= designs) break;
    for (let i = 0; i < designs; i++) add(judge(neighbour(pick(best, draw).design, draw), RAIL));
  }
  return [...byId.values()];
}

function neighbour(design: DesignRecord, draw: () => number): DesignRecord {
  const other = record(draw);
  const parts = Object.keys(design.parts);
  const genes = Object.keys(design.genes).slice(1);
  const slot = pick([...parts, ...genes], draw);
  if (parts.includes(slot))
    return { ...design, parts: { ...design.parts, [slot]: other.parts[slot] ?? design.parts[slot] ?? '' } };
  const frequency = Math.round(((design.genes.frequency ?? 3e5) * (0.8 + 0.4 * draw())) / 1000) * 1000;
  return { ...design, genes: { ...design.genes, [slot]: slot === 'frequency' ? frequency : (other.genes[slot] ?? 1) } };
}

function around(front: Front, everyone: readonly Assessment[]): Omit<PageData, 'front' | 'cloud'> {
  return {
    run: {
      status: 'done',
      seed: '1',
      evaluations: 240000,
      epochs: 40,
      seconds: 61.2,
      threads: 2,
      feasibleShare: 0.31,
      hypervolume: 0.6612,
      agreement: [0.9992, 0.9987, 0.9971, 0.9995],
      version: '0.1.0',
      railHash: 'a3f1c09d2b',
      partsHash: '77e0b1445c',
      built: '2026-12-01T09:00:00Z',
    },
    rail: RAIL,
    tables: NO_TABLES,
    history: Array.from({ length: 40 }, (_, epoch) => ({
      evaluations: (epoch + 1) * 6000,
      hypervolume: 0.6612 * (1 - Math.exp(-(epoch + 2) / 6)),
      islands: [0, 1, 2, 3].map((island) => 0.655 * (1 - Math.exp(-(epoch + 1) / (7 + island)))),
    })),
    nearMisses: nearMisses(everyone),
    relaxations: {
      steps: [0.025, 0.1, 0.25],
      limits: ['outputRipple', 'loadStep', 'highJunction', 'height'],
      evaluations: 1846,
      level: [],
    },
    families: FAMILIES.map(([architecture, phases]) => familyNote(`${architecture} ×${phases}`, front, everyone)),
    cautions: ['Every figure comes from a model with stated tolerances: build and measure before release.'],
    notCovered: [
      'two-stage buses',
      'resonant stages',
      'coupled inductors',
      'isolation design',
      'electromagnetic compliance',
      'layout',
    ],
    incumbents: [],
  };
}

function familyNote(family: string, front: Front, everyone: readonly Assessment[]) {
  const mine = everyone.filter((one) => one.family === family);
  const count = front.designs.filter((design) => design.family === family).length;
  return {
    family,
    evaluated: mine.length,
    feasible: mine.filter((one) => one.feasible).length,
    front: count,
    reason:
      count > 0
        ? `holds ${count} designs of the front`
        : 'keeps every limit only with losses that a synchronous stage halves',
  };
}

function nearMisses(everyone: readonly Assessment[]): readonly NearMiss[] {
  const close = everyone.flatMap((one) => {
    const broken = one.limits.filter((limit) => limit.violation > 0);
    const first = broken[0];
    return broken.length === 1 && first !== undefined && first.violation < 0.25
      ? [
          {
            limit: first.name,
            value: first.value,
            allowed: first.allowed,
            violation: first.violation,
            design: toFront(one),
          },
        ]
      : [];
  });
  return close.slice(0, 60);
}

function cloud(feasible: readonly Assessment[], points: number, draw: () => number): PageData['cloud'] {
  const families = FAMILIES.map(([architecture, phases]) => `${architecture} ×${phases}`);
  const family = new Uint8Array(points);
  const objectives = new Float64Array(points * 3);
  for (let point = 0; point < points; point++) {
    const one = feasible[Math.floor(draw() * feasible.length)];
    if (one === undefined) continue;
    family[point] = families.indexOf(one.family);
    one.objectives.forEach((figure, k) => {
      objectives[3 * point + k] = figure.value * (1 + 0.25 * draw() * draw());
    });
  }
  return { families, family, objectives };
}

function nonDominated(all: readonly Assessment[]): readonly Assessment[] {
  const values = all.map((one) => one.objectives.map((figure) => figure.value));
  return all.filter((_, i) => !values.some((other, j) => j !== i && beats(other, values[i] ?? [])));
}

function beats(a: readonly number[], b: readonly number[]): boolean {
  return a.every((value, k) => value <= SLACK * (b[k] ?? 0));
}

function toFront(one: Assessment): FrontDesign {
  return {
    id: one.id,
    family: one.family,
    genes: one.design.genes,
    parts: one.design.parts,
    objectives: one.objectives.map((figure) => figure.value),
    margins: Object.fromEntries(one.limits.map((limit) => [limit.name, limit.margin])),
    worstMargin: one.worstMargin,
  };
}

function record(draw: () => number): DesignRecord {
  const [architecture, phases] = pick(FAMILIES, draw);
  return {
    architecture,
    genes: {
      phases,
      frequency: Math.round(10 ** (4.6 + 1.7 * draw()) / 1000) * 1000,
      inductance: pick([1e-6, 2.2e-6, 3.3e-6, 4.7e-6, 6.8e-6, 1e-5, 2.2e-5], draw),
      outputCeramicCount: 2 + Math.floor(draw() * 10),
      inputCeramicCount: 1 + Math.floor(draw() * 4),
    },
    parts: {
      highSwitch: pick(SWITCHES, draw),
      ...(architecture === 'buck-diode' ? {} : { lowSwitch: pick(SWITCHES, draw) }),
      inductor: pick(INDUCTORS, draw),
      outputCeramic: pick(CERAMICS, draw),
      inputCeramic: pick(CERAMICS, draw),
      controller: pick(CONTROLLERS, draw),
    },
  };
}

function pick<T>(items: readonly T[], draw: () => number): T {
  const item = items[Math.floor(draw() * items.length)];
  if (item === undefined) throw new Error('nothing to pick from');
  return item;
}

/** The invented model behind the page's face of one. */
export function fixtureAssessor(): Assessor {
  return {
    assess: (design, rail, moves): Verdict => {
      const moved = withMoves(design, moves);
      return (moved.genes.frequency ?? 0) > rail.search.frequency.maximum
        ? { ok: false, why: 'frequency above the sheet’s range' }
        : { ok: true, value: judge(moved, rail) };
    },
    values: (design) => ({ ...design.genes, ...design.parts }),
    genes: movables(),
    files: ['spec.json', 'parts.csv'],
    takeAway: (design) => [
      { name: 'spec.json', text: `${JSON.stringify(design)}\n` },
      { name: 'parts.csv', text: 'part,count\n' },
    ],
    frontCsv: (ids) => `id\n${[...ids].join('\n')}\n`,
  };
}

function withMoves(design: DesignRecord, moves: Readonly<Record<string, number | string>>): DesignRecord {
  const genes: Record<string, number> = { ...design.genes };
  const parts: Record<string, string> = { ...design.parts };
  for (const [name, value] of Object.entries(moves)) {
    if (typeof value === 'number') genes[name] = value;
    else parts[name] = value;
  }
  return { ...design, genes, parts };
}

function movables(): readonly Movable[] {
  return [
    { name: 'phases', unit: '', kind: 'whole', low: 1, high: 4 },
    { name: 'frequency', unit: 'Hz', kind: 'log', low: 30e3, high: 5e6 },
    { name: 'inductance', unit: 'H', kind: 'log', low: 1e-7, high: 1e-4 },
    { name: 'outputCeramicCount', unit: '', kind: 'whole', low: 1, high: 12 },
    { name: 'inputCeramicCount', unit: '', kind: 'whole', low: 1, high: 12 },
    choice('highSwitch', SWITCHES),
    choice('lowSwitch', SWITCHES),
    choice('inductor', INDUCTORS),
    choice('outputCeramic', CERAMICS),
    choice('inputCeramic', CERAMICS),
    choice('controller', CONTROLLERS),
  ];
}

function choice(name: string, options: readonly string[]): Movable {
  return { name, unit: '', kind: 'choice', low: 0, high: options.length - 1, options };
}

/** Judges one invented design. */
function judge(design: DesignRecord, rail: Rail): Assessment {
  const inputs = [rail.input.nominal, rail.input.minimum, rail.input.maximum];
  const points = inputs.flatMap((input) =>
    rail.profile.map((load) => pointAt(design, rail, input, load.fraction, load.share)),
  );
  const nominal = points.slice(0, rail.profile.length);
  const losses = weighted(nominal);
  const parts = partsOf(design);
  const volumes = [...parts.map((part) => ({ name: part.slot, value: part.volume })), { name: 'board', value: 0.9e-6 }];
  const costs = [...parts.map((part) => ({ name: part.slot, value: part.cost })), { name: 'assembly', value: 0.42 }];
  const limits = limitsOf(
    design,
    rail,
    points,
    volumes.reduce((sum, share) => sum + share.value, 0),
  );
  return {
    id: identify(design),
    family: `${design.architecture} ×${design.genes.phases}`,
    design,
    feasible: limits.every((limit) => limit.violation === 0),
    objectives: [
      { name: 'loss', unit: 'W', value: losses.reduce((sum, item) => sum + item.watts, 0) },
      { name: 'volume', unit: 'm³', value: volumes.reduce((sum, share) => sum + share.value, 0) },
      { name: 'cost', unit: rail.currency, value: costs.reduce((sum, share) => sum + share.value, 0) },
    ],
    limits,
    worstMargin: Math.min(...limits.map((limit) => limit.margin / limit.allowed)),
    points,
    losses,
    parts,
    volumes,
    costs,
    efficiencyCurves: inputs.toSorted((a, b) => a - b).map((input) => curve(design, rail, input)),
    cautions: [],
  };
}

function milliohms(name: string | undefined): number {
  return Number.parseFloat(name?.split('-')[2] ?? '9') / 1000;
}

function identify(design: DesignRecord): string {
  const text = JSON.stringify(design);
  let hash = 7;
  for (let i = 0; i < text.length; i++) hash = (hash * 31 + text.charCodeAt(i)) % 9007199254740881;
  return `d${hash.toString(36).padStart(10, '0').slice(-10)}`;
}

function curve(design: DesignRecord, rail: Rail, inputVoltage: number) {
  const load = Array.from({ length: 40 }, (_, i) => (i + 1) / 40);
  const efficiency = load.map((fraction) => pointAt(design, rail, inputVoltage, fraction, 0).efficiency);
  return { inputVoltage, load, efficiency };
}

function weighted(points: readonly PointReport[]): readonly LossItem[] {
  const first = points[0]?.losses ?? [];
  return first.map((item, i) => ({
    ...item,
    watts: points.reduce((sum, point) => sum + point.share * (point.losses[i]?.watts ?? 0), 0),
  }));
}

function pointAt(design: DesignRecord, rail: Rail, input: number, load: number, share: number): PointReport {
  const { phases = 1, frequency = 3e5, inductance = 4.7e-6 } = design.genes;
  const output = rail.output.nominal;
  const duty = output / input;
  const ripple = (output * (1 - duty)) / (inductance * frequency);
  const current = (load * rail.output.current) / phases;
  const rms2 = current * current + (ripple * ripple) / 12;
  const high = milliohms(design.parts.highSwitch);
  const side = 3 + INDUCTORS.indexOf(design.parts.inductor ?? '');
  const low =
    design.architecture === 'buck-synchronous'
      ? rms2 * (1 - duty) * milliohms(design.parts.lowSwitch) * phases
      : current * 0.45 * (1 - duty) * phases;
  const losses: LossItem[] = [
    { part: 'highSwitch', effect: 'conduction', watts: rms2 * duty * high * phases },
    {
      part: 'highSwitch',
      effect: 'overlap',
      watts: 0.5 * input * (current + 0.2) * (2e-9 + 4e-11 / high) * frequency * phases,
    },
    { part: 'highSwitch', effect: 'gate', watts: (1e-10 / high) * 5 * frequency * phases },
    { part: design.architecture === 'buck-synchronous' ? 'lowSwitch' : 'diode', effect: 'conduction', watts: low },
    { part: 'inductor', effect: 'winding', watts: rms2 * (0.0015 + (inductance * 60000) / side ** 2.4) * phases },
    { part: 'inductor', effect: 'core', watts: 2e-9 * frequency ** 1.2 * ripple ** 2.2 * phases },
    { part: 'outputCeramic', effect: 'seriesResistance', watts: (ripple * ripple) / 12 / phases ** 2 / 400 },
    { part: 'controller', effect: 'quiescent', watts: input * 1.6e-3 },
  ];
  const loss = losses.reduce((sum, item) => sum + item.watts, 0);
  const power = output * load * rail.output.current;
  return {
    inputVoltage: input,
    outputVoltage: output,
    load,
    share,
    mode: current > ripple / 2 ? 'continuous' : 'discontinuous',
    activePhases: phases,
    dutyCycle: duty,
    frequency,
    rippleCurrent: ripple,
    peakCurrent: current + ripple / 2,
    valleyCurrent: current - ripple / 2,
    outputRipple: rippleVoltage(design, ripple),
    inputRipple: 0.05,
    outputPower: power,
    inputPower: power + loss,
    loss,
    efficiency: power / (power + loss),
    losses,
    temperatures: heat(losses, rail),
    traces: traces(duty, 1 / frequency, current, ripple, phases),
  };
}

function rippleVoltage(design: DesignRecord, ripple: number): number {
  const { phases = 1, frequency = 3e5, outputCeramicCount = 4 } = design.genes;
  return ripple / phases ** 1.5 / (8 * frequency * phases * outputCeramicCount * 14e-6) + 0.001 * ripple;
}

function heat(losses: readonly LossItem[], rail: Rail): Record<string, number> {
  const kelvin: Record<string, number> = {};
  const total = losses.reduce((sum, item) => sum + item.watts, 0);
  for (const item of losses) kelvin[item.part] = (kelvin[item.part] ?? rail.ambient + 6 * total) + 22 * item.watts;
  return kelvin;
}

function traces(duty: number, period: number, current: number, ripple: number, phases: number): readonly Trace[] {
  const rise = [0, duty * period];
  return [
    { name: 'inductor current', unit: 'A', period, time: rise, value: [current - ripple / 2, current + ripple / 2] },
    {
      name: 'summed current',
      unit: 'A',
      period,
      time: rise,
      value: [phases * current - ripple / 3, phases * current + ripple / 3],
    },
    {
      name: 'output ripple',
      unit: 'V',
      period,
      time: [0, period / 4, period / 2, (3 * period) / 4],
      value: [0, 0.004, 0, -0.005],
    },
  ];
}

function partsOf(design: DesignRecord): Assessment['parts'] {
  const { phases = 1, outputCeramicCount = 4, inputCeramicCount = 2 } = design.genes;
  return Object.entries(design.parts).map(([slot, name]) => {
    const count =
      slot === 'outputCeramic'
        ? outputCeramicCount
        : slot === 'inputCeramic'
          ? inputCeramicCount
          : slot === 'controller'
            ? 1
            : phases;
    const size =
      slot === 'inductor' ? (3 + INDUCTORS.indexOf(name)) ** 2.6 * 4e-9 : slot.endsWith('Ceramic') ? 14e-9 : 26e-9;
    const price =
      slot === 'inductor'
        ? 0.2 + 0.05 * INDUCTORS.indexOf(name)
        : slot === 'controller'
          ? 0.9
          : slot.endsWith('Ceramic')
            ? 0.09
            : 0.1 + 0.0022 / milliohms(name);
    return {
      slot,
      name,
      count,
      volume: size * count,
      area: size * count * 400,
      height: 0.003,
      mass: 0.0002 * count,
      cost: price * count,
    };
  });
}

function limitsOf(
  design: DesignRecord,
  rail: Rail,
  points: readonly PointReport[],
  volume: number,
): Assessment['limits'] {
  const full = points.find((point) => point.inputVoltage === rail.input.maximum && point.load === 1) ?? points[0];
  if (full === undefined) return [];
  const { frequency = 3e5, inductance = 1e-6 } = design.genes;
  const figures = [
    [full.outputRipple, rail.output.ripple],
    [0.03 + 12000 / frequency + inductance * 4000, rail.step?.deviation ?? 1],
    [Math.max(...Object.values(full.temperatures)), 398.15],
    [full.temperatures.inductor ?? 300, 398.15],
    [full.peakCurrent, 5 + 1.1 * INDUCTORS.indexOf(design.parts.inductor ?? '')],
    [0.0022 + 0.001 * INDUCTORS.indexOf(design.parts.inductor ?? ''), rail.limits.height ?? 1],
    [volume, rail.limits.volume ?? 1],
  ];
  const corner = { inputVoltage: full.inputVoltage, outputVoltage: full.outputVoltage, load: full.load };
  return LIMITS.map(([name, unit], i) => {
    const [value = 0, allowed = 1] = figures[i] ?? [];
    const figure = {
      name,
      unit,
      value,
      allowed,
      margin: allowed - value,
      slack: 1 - value / allowed,
      violation: Math.max(0, value / allowed - 1),
    };
    return i < 5 ? { ...figure, corner } : figure;
  });
}
