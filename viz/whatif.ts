/** What-if as a pure step: the reader's changes as moves of genes and as a moved rail. */
import type { Rail } from '../model/rail/rail.ts';
import type { Movable } from './assessor.ts';

/** A quantity of the rail that what-if moves. */
export interface RailKnob {
  /** Key in the state's changes. */
  readonly name: string;
  readonly label: string;
  readonly unit: string;
  readonly low: number;
  readonly high: number;
  readonly value: number;
  /** The rail with this quantity at `value`. */
  readonly set: (rail: Rail, value: number) => Rail;
}

/** Input, load and ambient of `rail`, each over a sensible span about the sheet's own value. */
export function railKnobs(rail: Rail): readonly RailKnob[] {
  const { input, output } = rail;
  const volts = (name: 'minimum' | 'nominal' | 'maximum', label: string): RailKnob => ({
    name: `rail.${name}`,
    label,
    unit: 'V',
    low: input[name] * 0.6,
    high: input[name] * 1.5,
    value: input[name],
    set: (one, value) => ({ ...one, input: widened({ ...one.input, [name]: value }, name, value) }),
  });
  return [
    volts('minimum', 'input, lowest'),
    volts('nominal', 'input, usual'),
    volts('maximum', 'input, highest'),
    {
      name: 'rail.current',
      label: 'full load',
      unit: 'A',
      low: output.current * 0.25,
      high: output.current * 1.75,
      value: output.current,
      set: (one, value) => ({ ...one, output: { ...one.output, current: value } }),
    },
    {
      name: 'rail.ambient',
      label: 'ambient',
      unit: 'K',
      low: 253.15,
      high: 358.15,
      value: rail.ambient,
      set: (one, value) => ({ ...one, ambient: value }),
    },
  ];
}

/** Keeps lowest ≤ usual ≤ highest by moving the other two along. */
function widened(input: Rail['input'], moved: string, value: number): Rail['input'] {
  if (moved === 'minimum')
    return { ...input, nominal: Math.max(input.nominal, value), maximum: Math.max(input.maximum, value) };
  if (moved === 'maximum')
    return { ...input, nominal: Math.min(input.nominal, value), minimum: Math.min(input.minimum, value) };
  return { ...input, minimum: Math.min(input.minimum, value), maximum: Math.max(input.maximum, value) };
}

/** A knob for one gene of the open design. */
export interface DesignKnob {
  readonly name: string;
  readonly gene: Movable;
  /** The design's own number, or its part's name. */
  readonly own: number | string;
}

/** The genes that play a part in the open design and can take more than one value, numbers first. */
export function designKnobs(
  own: Readonly<Record<string, number | string>>,
  genes: readonly Movable[],
): readonly DesignKnob[] {
  const knobs = genes.flatMap((gene): DesignKnob[] => {
    const value = own[gene.name];
    return gene.high <= gene.low || value === undefined ? [] : [{ name: gene.name, gene, own: value }];
  });
  return [
    ...knobs.filter((knob) => knob.gene.options === undefined),
    ...knobs.filter((knob) => knob.gene.options !== undefined),
  ];
}

/** The moves among `changes` and the moved rail. Unknown names and unreadable numbers change nothing. */
export function applied(
  rail: Rail,
  genes: readonly Movable[],
  changes: Readonly<Record<string, string>>,
): { readonly moves: Readonly<Record<string, number | string>>; readonly rail: Rail } {
  const moves: Record<string, number | string> = {};
  let moved = rail;
  for (const [name, text] of Object.entries(changes)) {
    const value = Number(text);
    const knob = railKnobs(rail).find((one) => one.name === name);
    if (knob !== undefined && value >= knob.low && value <= knob.high) moved = knob.set(moved, value);
    const gene = genes.find((one) => one.name === name);
    if (gene?.options?.includes(text) === true) moves[name] = text;
    else if (gene !== undefined && gene.options === undefined && Number.isFinite(value)) {
      moves[name] = Math.max(gene.low, Math.min(gene.high, value));
    }
  }
  return { moves, rail: moved };
}
