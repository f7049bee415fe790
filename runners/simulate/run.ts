/** What a circuit simulation leaves, whichever simulator made it. */

/** The kept time, s, and each vector by its lower-case name, such as `v(out)` or `i(vmc0)`. */
export interface Run {
  readonly time: ArrayLike<number>;
  readonly vectors: ReadonlyMap<string, ArrayLike<number>>;
}

/** A general-purpose circuit simulator. */
export interface Simulator {
  /** For a person: name, and where it comes from. */
  readonly name: string;
  /** Simulates `netlist`. Rejects with an `Error` that says what went wrong. */
  run(netlist: string): Promise<Run>;
}

/** Fewest points of a result that counts as one. */
const FEWEST = 50;

/** The run, or an error: a bad netlist gives an empty or partial result and no complaint, so everything asked for must be there. */
export function checkedRun(netlist: string, vectors: ReadonlyMap<string, ArrayLike<number>>): Run {
  const asked = /^\.save (.*)$/m.exec(netlist)?.[1]?.split(' ') ?? [];
  const time = vectors.get('time') ?? [];
  const missing = asked.filter((name) => vectors.get(name)?.length !== time.length);
  if (time.length < FEWEST || missing.length > 0) {
    throw new Error(`the simulator gave ${time.length} points and lacks: ${missing.join(', ') || 'nothing'}`);
  }
  return { time, vectors };
}

/** The netlist without its `.meas` lines: figures are computed from the vectors, the same way for every simulator. */
export function withoutMeasurements(netlist: string): string {
  return netlist
    .split('\n')
    .filter((line) => !line.startsWith('.meas'))
    .join('\n');
}
