/**
 * Netlists of switched circuits for a general-purpose circuit simulator: switches, diodes, R, L, C and gate pulses, written
 * so that the simulator's own errors stay below a part in a thousand: gate edges of 10 ps, a time step of at most T/100,
 * initial conditions from the model, only the last period kept.
 */

/** Gate edges, s. Edges of 1 ns cost 6 % of the ripple. */
const EDGE = 10e-12;
/** Time steps a period, at least. */
const STEPS = 100;

/** A netlist being written. Node names are any words; `0` is ground. Values are SI. */
export class Netlist {
  private readonly lines: string[] = [];
  private readonly kept: string[] = [];
  private readonly models = new Map<string, string>();

  /** A resistance, Ω; nothing is left out, so give more than 0. */
  resistor(name: string, a: string, b: string, ohms: number): void {
    this.lines.push(`R${name} ${a} ${b} ${text(ohms)}`);
  }

  /** An inductance, H, with its current at time 0, A, from `a` to `b`. */
  inductor(name: string, a: string, b: string, henries: number, start: number): void {
    this.lines.push(`L${name} ${a} ${b} ${text(henries)} IC=${text(start)}`);
  }

  /** A capacitance, F, with its voltage at time 0, V. */
  capacitor(name: string, a: string, b: string, farads: number, start: number): void {
    this.lines.push(`C${name} ${a} ${b} ${text(farads)} IC=${text(start)}`);
  }

  /** A coupling of two inductors, −1 … 1. */
  coupling(name: string, first: string, second: string, factor: number): void {
    this.lines.push(`K${name} L${first} L${second} ${text(factor)}`);
  }

  /** A constant voltage, V. */
  voltage(name: string, plus: string, minus: string, volts: number): void {
    this.lines.push(`V${name} ${plus} ${minus} DC ${text(volts)}`);
  }

  /** A constant current, A, from `a` through the source to `b`. */
  current(name: string, a: string, b: string, amperes: number): void {
    this.lines.push(`I${name} ${a} ${b} DC ${text(amperes)}`);
  }

  /** A wire whose current is kept under the name `i(v<name>)`, A from `a` to `b`. */
  meter(name: string, a: string, b: string): void {
    this.lines.push(`V${name} ${a} ${b} DC 0`);
    this.kept.push(`i(v${name})`);
  }

  /** Keeps the voltage of a node under the name `v(<node>)`. */
  keep(node: string): void {
    this.kept.push(`v(${node})`);
  }

  /** A gate that is high (1 V) from `from` to `to` within every period (s); either may lie outside 0 … period. */
  gate(node: string, from: number, to: number, exactPeriod: number): void {
    const period = picoseconds(exactPeriod);
    const width = picoseconds(to - from);
    const start = picoseconds(from - Math.floor(from / exactPeriod) * exactPeriod);
    // A pulse across the end of the period is written as the gap in a high gate: not every simulator takes a start below 0.
    const wraps = start + width > period;
    const levels = wraps ? [1, 0] : [0, 1];
    const [at, lasts] = wraps ? [start + width - period, period - width] : [start, width];
    const pulse = [...levels, at, EDGE, EDGE, lasts - EDGE, period].map(text).join(' ');
    this.lines.push(`V${node} ${node} 0 PULSE(${pulse})`);
  }

  /** A switch with `ohms` while the gate node is high. */
  switched(name: string, a: string, b: string, gate: string, ohms: number): void {
    const model = `SW${this.models.size}`;
    this.models.set(model, `.model ${model} SW(VT=0.5 VH=0 RON=${text(ohms)} ROFF=1e7)`);
    this.lines.push(`S${name} ${a} ${b} ${gate} 0 ${model}`);
  }

  /** A switch with `ohms` while the gate node is low: the exact complement, at the simulator's own instant. */
  complement(name: string, a: string, b: string, gate: string, ohms: number): void {
    const model = `SW${this.models.size}`;
    this.models.set(model, `.model ${model} SW(VT=-0.5 VH=0 RON=${text(ohms)} ROFF=1e7)`);
    this.lines.push(`S${name} ${a} ${b} 0 ${gate} ${model}`);
  }

  /** A diode that conducts with next to no drop of its own (8 mV), in series with `volts` and `ohms`. */
  diode(name: string, anode: string, cathode: string, volts: number, ohms: number): void {
    this.models.set('IDEAL', '.model IDEAL D(IS=1e-12 N=0.01)');
    this.lines.push(`D${name} ${anode} d${name}a IDEAL`, `VD${name} d${name}a d${name}b DC ${text(volts)}`);
    this.lines.push(`RD${name} d${name}b ${cathode} ${text(ohms)}`);
  }

  /** The finished text: `periods` of length `period` (s), of which the last is kept. */
  finish(title: string, exactPeriod: number, periods: number): string {
    const period = picoseconds(exactPeriod);
    const stop = periods * period;
    return [
      // The WASM module stops for good at a byte beyond ASCII.
      `* ${title.replace(/[^ -~]/g, 'x')}`,
      ...this.lines,
      ...this.models.values(),
      '.options method=gear reltol=1e-4 abstol=1e-6 vntol=1e-6',
      `.save ${this.kept.join(' ')}`,
      `.tran ${text(period / STEPS)} ${text(stop)} ${text(stop - period)} ${text(period / STEPS)} uic`,
      '.end',
      '',
    ].join('\n');
  }
}

/** Whole picoseconds: edges of two gates that miss each other by less send a simulator into steps without end. */
function picoseconds(seconds: number): number {
  return Math.round(seconds * 1e12) / 1e12;
}

function text(value: number): string {
  return value.toPrecision(12);
}
