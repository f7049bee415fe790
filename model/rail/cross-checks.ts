/** What must hold between the fields of a sheet. Each check looks at what can be read, whatever else is wrong. */
import { DIMENSIONS, type Dimension } from '../quantity/dimension.ts';
import { formatQuantity } from '../quantity/format.ts';
import { parseQuantity, shorten } from '../quantity/parse.ts';
import { childPath, type Tree } from './document.ts';
import { PROFILE_NAMES } from './profiles.ts';

/** A problem between fields, at a path. */
export interface CrossFinding {
  readonly path: string;
  readonly found: string;
  readonly allowed: string;
}

/** All problems between the fields of `tree`, in the order of the sheet. */
export function crossChecks(tree: Tree): readonly CrossFinding[] {
  return [
    voltageOrder,
    stepDown,
    ripples,
    loadStep,
    profile,
    reverse,
    efficiencies,
    cost,
    ranges,
    parts,
    repeats,
  ].flatMap((check) => check(tree));
}

/** Rounding that shares may leave: 3 × 33.3 %. */
export const SHARE_ROUNDING = 0.005;

function voltageOrder(tree: Tree): CrossFinding[] {
  return ['input.voltage', 'output.voltage'].flatMap((path) => {
    const { min, nominal, max } = voltages(tree, path);
    if (min === undefined || max === undefined) return [];
    if (min > max) return [{ path: `${path}.min`, found: volts(min), allowed: `at most the max, ${volts(max)}` }];
    if (nominal === undefined || (nominal >= min && nominal <= max)) return [];
    const allowed = `from the min, ${volts(min)}, to the max, ${volts(max)}`;
    return [{ path: `${path}.nominal`, found: volts(nominal), allowed }];
  });
}

function stepDown(tree: Tree): CrossFinding[] {
  const { min } = voltages(tree, 'input.voltage');
  const { max } = voltages(tree, 'output.voltage');
  if (min === undefined || max === undefined || max < min) return [];
  const path = typeof at(tree, 'output.voltage') === 'string' ? 'output.voltage' : 'output.voltage.max';
  const allowed = `below the smallest input voltage, ${volts(min)}: every stage here steps down`;
  return [{ path, found: volts(max), allowed }];
}

function ripples(tree: Tree): CrossFinding[] {
  const found: CrossFinding[] = [];
  const below = (path: string, most: number | undefined, what: string): void => {
    const value = read(tree, path, 'voltage');
    if (value === undefined || most === undefined || value < most) return;
    found.push({ path, found: volts(value), allowed: `below ${what}, ${volts(most)}` });
  };
  const output = voltages(tree, 'output.voltage').min;
  below('input.ripple', voltages(tree, 'input.voltage').min, 'the smallest input voltage');
  below('output.ripple', output, 'the smallest output voltage');
  below('load-step.deviation', output, 'the smallest output voltage');
  return found;
}

function loadStep(tree: Tree): CrossFinding[] {
  const step = read(tree, 'load-step.current', 'current');
  const full = read(tree, 'output.current', 'current');
  if (step === undefined || full === undefined || step <= full) return [];
  const allowed = `at most the full load, ${formatQuantity(full, 'A')}`;
  return [{ path: 'load-step.current', found: formatQuantity(step, 'A'), allowed }];
}

function profile(tree: Tree): CrossFinding[] {
  const list = at(tree, 'load-profile');
  if (!isList(list) || list.length === 0) return [];
  const shares = list.map((_, i) => read(tree, `${childPath('load-profile', i)}.share`, 'fraction'));
  const sum = shares.reduce<number>((total, value) => total + (value ?? Number.NaN), 0);
  if (!(Math.abs(sum - 1) > SHARE_ROUNDING)) return [];
  const found = `shares that sum to ${formatQuantity(sum * 100, '')} %`;
  return [{ path: 'load-profile', found, allowed: `shares that sum to 100 %, or one of ${PROFILE_NAMES.join(', ')}` }];
}

/** Negative loads ask for an output that gives power and an input that takes it. */
function reverse(tree: Tree): CrossFinding[] {
  const both = isYes(at(tree, 'output.battery')) && isYes(at(tree, 'input.takes-power'));
  if (both) return [];
  const allowed = '0 % to 100 %; below 0 only with output.battery: yes and input.takes-power: yes';
  return loads(tree)
    .filter(({ value }) => value < 0)
    .map(({ path, value }) => ({ path, found: `${formatQuantity(value * 100, '')} %`, allowed }));
}

function efficiencies(tree: Tree): CrossFinding[] {
  return loads(tree)
    .filter(({ path, value }) => path.startsWith('limits.') && value === 0)
    .map(({ path }) => ({ path, found: '0 %', allowed: 'a load other than 0: without load there is no efficiency' }));
}

function cost(tree: Tree): CrossFinding[] {
  const text = at(tree, 'limits.cost');
  const currency = at(tree, 'currency');
  const own = typeof text === 'string' ? /[A-Z]{3}$/.exec(text)?.[0] : undefined;
  if (typeof text !== 'string' || own === undefined || own === currency) return [];
  return [
    { path: 'limits.cost', found: shorten(text), allowed: `a price in the sheet's currency, ${String(currency)}` },
  ];
}

function ranges(tree: Tree): CrossFinding[] {
  const order = (path: string, dimension: Dimension, strict: boolean): CrossFinding[] => {
    const from = read(tree, `${path}.from`, dimension);
    const to = read(tree, `${path}.to`, dimension);
    if (from === undefined || to === undefined || from < to || (from === to && !strict)) return [];
    const { unit } = DIMENSIONS[dimension];
    const found = formatQuantity(from, unit);
    return [
      { path: `${path}.from`, found, allowed: `${strict ? 'below' : 'at most'} the to, ${formatQuantity(to, unit)}` },
    ];
  };
  const bands = at(tree, 'avoid');
  return [
    ...order('search.phases', 'number', false),
    ...order('search.frequency', 'frequency', false),
    ...order('search.inductance', 'inductance', false),
    ...(isList(bands) ? bands.flatMap((_, i) => order(childPath('avoid', i), 'frequency', true)) : []),
  ];
}

function parts(tree: Tree): CrossFinding[] {
  const barred = texts(at(tree, 'parts.bar'));
  return texts(at(tree, 'parts.prefer')).flatMap((name, i) =>
    name !== '' && barred.includes(name)
      ? [{ path: childPath('parts.prefer', i), found: shorten(name), allowed: 'a part that parts.bar does not name' }]
      : [],
  );
}

/** Lists in which nothing may stand twice. */
function repeats(tree: Tree): CrossFinding[] {
  const lists = ['search.architectures', 'objectives', 'parts.tables', 'parts.bar', 'parts.prefer', 'incumbents'];
  const named = lists.flatMap((path) =>
    texts(at(tree, path)).flatMap((text, i, all) =>
      text !== '' && all.indexOf(text) < i ? [twice(childPath(path, i), text)] : [],
    ),
  );
  const points = loads(tree).flatMap(({ path, value }, i, all) => {
    const list = path.slice(0, path.indexOf('['));
    const earlier = all.slice(0, i).some((other) => other.path.startsWith(list) && other.value === value);
    return earlier ? [twice(path, `${formatQuantity(value * 100, '')} %`)] : [];
  });
  return [...named, ...points];
}

function twice(path: string, text: string): CrossFinding {
  return { path, found: `${shorten(text)} twice`, allowed: 'each once' };
}

/** Every load that the profile and the efficiency limits name. */
function loads(tree: Tree): { readonly path: string; readonly value: number }[] {
  return ['load-profile', 'limits.efficiency'].flatMap((list) => {
    const entries = at(tree, list);
    if (!isList(entries)) return [];
    return entries.flatMap((_, i) => {
      const path = `${childPath(list, i)}.load`;
      const value = read(tree, path, 'fraction');
      return value === undefined ? [] : [{ path, value }];
    });
  });
}

function voltages(
  tree: Tree,
  path: string,
): { readonly min?: number; readonly nominal?: number; readonly max?: number } {
  const single = read(tree, path, 'voltage');
  if (single !== undefined) return { min: single, nominal: single, max: single };
  const min = read(tree, `${path}.min`, 'voltage');
  const nominal = read(tree, `${path}.nominal`, 'voltage');
  const max = read(tree, `${path}.max`, 'voltage');
  return {
    ...(min === undefined ? {} : { min }),
    ...(nominal === undefined ? {} : { nominal }),
    ...(max === undefined ? {} : { max }),
  };
}

/** The SI value at a path; undefined where none can be read. */
function read(tree: Tree, path: string, dimension: Dimension): number | undefined {
  const text = at(tree, path);
  if (typeof text !== 'string') return undefined;
  const reading = parseQuantity(text, dimension);
  return reading.ok ? reading.value : undefined;
}

/** The node at a path. */
function at(tree: Tree, path: string): Tree | undefined {
  let node: Tree | undefined = tree;
  for (const step of path.split(/[.[]/)) {
    if (isList(node)) node = node[Number.parseInt(step, 10) - 1];
    else if (typeof node === 'object' && node !== null && Object.hasOwn(node, step)) {
      node = (node as { readonly [key: string]: Tree })[step];
    } else return undefined;
  }
  return node;
}

function isList(node: Tree | undefined): node is readonly Tree[] {
  return Array.isArray(node);
}

function texts(node: Tree | undefined): readonly string[] {
  return isList(node) ? node.map((item) => (typeof item === 'string' ? item : '')) : [];
}

function isYes(node: Tree | undefined): boolean {
  return node === 'yes' || node === 'true';
}

function volts(value: number): string {
  return formatQuantity(value, 'V');
}
