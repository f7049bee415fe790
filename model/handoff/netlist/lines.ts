/**
 * A netlist in the SPICE subset that common general-purpose simulators share, while it is written: parameters first, each with
 * its unit in a comment, then elements that name them. Plain ASCII: some simulators stop at anything else.
 */

/** A time as an expression of parameters, with its value, s, by which the writer decides how a pulse wraps. */
export interface Instant {
  readonly text: string;
  readonly value: number;
}

/** A netlist being written. */
export class Lines {
  private readonly parameters: string[] = [];
  private readonly elements: string[] = [];
  private readonly models = new Map<string, string>();
  private readonly gates: string[] = [];
  private readonly kept: string[] = [];
  private readonly values = new Map<string, number>();

  /** A parameter `name` (lower case) with its unit in words; returns its value. */
  parameter(name: string, value: number, unit: string, meaning: string): number {
    this.values.set(name, value);
    this.parameters.push(`* ${ascii(meaning)}${unit === '' ? '' : `, ${unit}`}`, `.param ${name}=${numberText(value)}`);
    return value;
  }

  /** A parameter that follows from others by `expression`; `value` is what it comes to. */
  derived(name: string, expression: string, value: number, unit: string, meaning: string): number {
    this.values.set(name, value);
    this.parameters.push(`* ${ascii(meaning)}${unit === '' ? '' : `, ${unit}`}`, `.param ${name}={${expression}}`);
    return value;
  }

  /** Value of a parameter; NaN where there is none. */
  value(name: string): number {
    return this.values.get(name) ?? Number.NaN;
  }

  /** A comment line before the elements that follow. */
  comment(text: string): void {
    this.elements.push(`* ${ascii(text)}`);
  }

  /** Any element line. */
  element(text: string): void {
    this.elements.push(text);
  }

  /** A `.model` line, written once. */
  model(name: string, text: string): void {
    this.models.set(name, `.model ${name} ${text}`);
  }

  /** A wire from `a` to `b` whose current is kept under the name `i(v<name>)`. */
  meter(name: string, a: string, b: string): void {
    this.elements.push(`V${name} ${a} ${b} DC 0`);
    this.keep(`i(v${name})`);
  }

  /** Keeps a vector in the result. */
  keep(vector: string): void {
    if (!this.kept.includes(vector)) this.kept.push(vector);
  }

  /** A switch with `resistance` (a parameter) from `a` to `b` while `gate` is high. */
  switched(name: string, a: string, b: string, gate: string, resistance: string): void {
    this.model(`sw_${resistance}`, `SW(VT=0.5 VH=0 RON={${resistance}} ROFF=1e7)`);
    this.elements.push(`S${name} ${a} ${b} ${gate} 0 sw_${resistance}`);
  }

  /** A diode with next to no drop of its own, in series with the drop `volts` and, where given, `resistance` (parameters). */
  diode(name: string, anode: string, cathode: string, volts: string, resistance?: string): void {
    this.model('dideal', 'D(IS=1e-9 N=0.01 RS=1e-4)');
    const end = resistance === undefined ? cathode : `r${name}`;
    this.elements.push(`D${name} ${anode} d${name} dideal`, `VD${name} d${name} ${end} DC {${volts}}`);
    if (resistance !== undefined) this.elements.push(`RD${name} ${end} ${cathode} {${resistance}}`);
  }

  /**
   * A gate of 1 V that is high from `from` for `width` in every period `period`. The start may lie anywhere; a pulse across
   * the end of the period is written as the gap in a high gate, for not every simulator takes a start below zero.
   */
  gate(node: string, from: Instant, width: Instant, period: Instant): void {
    const turns = Math.floor(from.value / period.value);
    const start = turns === 0 ? from.text : `${from.text}-(${turns})*${period.text}`;
    const place = from.value - turns * period.value;
    const wraps = place + width.value > period.value;
    const pulse = wraps
      ? `1 0 {${start}+${width.text}-${period.text}} {te} {te} {${period.text}-(${width.text})-te} {${period.text}}`
      : `0 1 {${start}} {te} {te} {${width.text}-te} {${period.text}}`;
    this.gates.push(node);
    this.elements.push(`V${node} ${node} 0 PULSE(${pulse})`);
  }

  /**
   * Ties every node but those of gates to ground by what carries nothing beside the circuit's currents: while all switches of a stage
   * are off its nodes hang in the air, and a simulator may not find where they stand.
   */
  leak(): void {
    const nodes = new Set<string>();
    for (const element of this.elements) {
      for (const node of /^[VRLCDS]\S* (\S+) (\S+)/.exec(element)?.slice(1) ?? []) nodes.add(node);
    }
    for (const node of ['0', ...this.gates]) nodes.delete(node);
    this.parameter('rleak', 1e8, 'ohm', 'leak of each node to ground, so that none hangs in the air');
    for (const node of nodes) this.elements.push(`Rleak_${node} ${node} 0 {rleak}`);
  }

  /** The text: `title` and `head` as comments, then everything written, then `tail`. */
  text(title: string, head: readonly string[], tail: readonly string[]): string {
    return [
      `* ${ascii(title)}`,
      ...head.map((line) => `* ${ascii(line)}`),
      '',
      ...this.parameters,
      '',
      ...this.elements,
      '',
      ...this.models.values(),
      `.save ${this.kept.join(' ')}`,
      ...tail,
      '.end',
      '',
    ].join('\n');
  }
}

/** Shortest digits that read back, as every simulator takes them. */
export function numberText(value: number): string {
  return String(value).replace('e+', 'e');
}

const WORDS: readonly (readonly [RegExp, string])[] = [
  [/×/g, 'x'],
  [/Ω/g, 'ohm'],
  [/µ/g, 'u'],
  [/°/g, 'deg '],
  [/−/g, '-'],
  [/²/g, '2'],
  [/³/g, '3'],
];

/** `text` on one line and in plain ASCII. */
export function ascii(text: string): string {
  const spelt = WORDS.reduce((line, [from, to]) => line.replace(from, to), text);
  return spelt.replace(/[^ -~]/g, '?');
}
