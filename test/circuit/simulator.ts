/**
 * Two general-purpose circuit simulators behind one call: ngspice as a WASM module from the registry, and the system's own
 * ngspice where there is one.
 */
import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Simulation } from 'eecircuit-engine';

/** What a simulation kept: the time, s, and each vector by its lower-case name, such as `v(out)` or `i(vm1)`. */
export interface Run {
  readonly time: readonly number[];
  readonly vectors: ReadonlyMap<string, readonly number[]>;
}

/** Where Debian puts its ngspice. */
const NATIVE = '/usr/bin/ngspice';
/** A netlist that the WASM module does not like may never answer, ms. */
const PATIENCE = 15_000;

let engine: Promise<Simulation> | undefined;
let last: Promise<unknown> = Promise.resolve();

/** Runs `netlist` in the WASM module; runs wait for each other, for there is one module a thread. */
export function runWasm(netlist: string): Promise<Run> {
  const turn = last.then(() => simulate(netlist));
  last = turn.catch(() => undefined);
  return turn;
}

async function simulate(netlist: string): Promise<Run> {
  if (/[^ -~\n]/.test(netlist)) throw new Error('a netlist is plain ASCII: the module stops for good at anything else');
  engine ??= startEngine();
  const simulation = await engine;
  simulation.setNetList(netlist);
  const result = await withPatience(simulation.runSim());
  const vectors = new Map<string, number[]>();
  if (result.dataType === 'real') for (const { name, values } of result.data) vectors.set(name.toLowerCase(), values);
  return checked(netlist, vectors);
}

async function startEngine(): Promise<Simulation> {
  const simulation = new Simulation();
  await simulation.start();
  return simulation;
}

function withPatience<T>(work: Promise<T>): Promise<T> {
  return new Promise((resolve, reject) => {
    const timer = setTimeout(() => reject(new Error(`no answer from the simulator in ${PATIENCE} ms`)), PATIENCE);
    work.then(resolve, reject).finally(() => clearTimeout(timer));
  });
}

/** Runs `netlist` in the system's simulator. */
export function runNative(netlist: string): Run {
  const folder = mkdtempSync(join(tmpdir(), 'circuit-'));
  try {
    const file = join(folder, 'circuit.cir');
    const raw = join(folder, 'circuit.raw');
    writeFileSync(file, netlist);
    const { stderr, status } = spawnSync(NATIVE, ['-b', '-r', raw, file], { encoding: 'utf8', timeout: PATIENCE });
    if (status !== 0 || !existsSync(raw)) throw new Error(`the simulator failed: ${stderr}`);
    return checked(netlist, readRaw(readFileSync(raw)));
  } finally {
    rmSync(folder, { recursive: true });
  }
}

/** Reads the simulator's binary result: a text header, then all vectors of one point after the other as doubles. */
function readRaw(bytes: Buffer): Map<string, number[]> {
  const mark = 'Binary:\n';
  const at = bytes.indexOf(mark);
  const header = bytes.subarray(0, at).toString('latin1');
  const names = [...header.matchAll(/^\t\d+\t(\S+)\t\S+/gm)].map((match) => match[1].toLowerCase());
  const points = Number(/^No\. Points: *(\d+)/m.exec(header)?.[1]);
  const vectors = new Map(names.map((name): [string, number[]] => [name, []]));
  let offset = at + mark.length;
  for (let point = 0; point < points; point++) {
    for (const vector of vectors.values()) {
      vector.push(bytes.readDoubleLE(offset));
      offset += 8;
    }
  }
  return vectors;
}

/** A bad netlist gives an empty or partial result and no error: everything that was asked for must be there. */
function checked(netlist: string, vectors: ReadonlyMap<string, readonly number[]>): Run {
  const asked = /^\.save (.*)$/m.exec(netlist)?.[1].split(' ') ?? [];
  const time = vectors.get('time') ?? [];
  const missing = asked.filter((name) => vectors.get(name)?.length !== time.length);
  if (time.length < 50 || missing.length > 0) {
    throw new Error(`the simulator gave ${time.length} points and lacks: ${missing.join(', ')}`);
  }
  return { time, vectors };
}
