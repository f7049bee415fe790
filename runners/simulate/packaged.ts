/** The circuit simulator that comes as a package: an optional dependency, one instance a thread, runs one after the other. */
import { checkedRun, type Run, type Simulator, withoutMeasurements } from './run.ts';

/** A netlist that the packaged simulator does not like may never answer, ms. */
const PATIENCE = 120_000;

type Engine = InstanceType<typeof import('eecircuit-engine').Simulation>;

let engine: Promise<Engine> | undefined;
let last: Promise<unknown> = Promise.resolve();

/** The packaged simulator; undefined where the package is not installed. */
export async function packagedSimulator(): Promise<Simulator | undefined> {
  try {
    engine ??= start();
    await engine;
  } catch {
    engine = undefined;
    return undefined;
  }
  return { name: 'eecircuit-engine (packaged)', run: inTurn };
}

async function start(): Promise<Engine> {
  const { Simulation } = await import('eecircuit-engine');
  const simulation = new Simulation();
  await simulation.start();
  return simulation;
}

function inTurn(netlist: string): Promise<Run> {
  const turn = last.then(() => simulate(netlist));
  last = turn.catch(() => undefined);
  return turn;
}

async function simulate(netlist: string): Promise<Run> {
  if (/[^ -~\n]/.test(netlist))
    throw new Error('a netlist is plain ASCII: the simulator stops for good at anything else');
  const simulation = await (engine ?? start());
  simulation.setNetList(withoutMeasurements(netlist));
  const result = await withPatience(simulation.runSim());
  const vectors = new Map<string, number[]>();
  if (result.dataType === 'real') for (const { name, values } of result.data) vectors.set(name.toLowerCase(), values);
  return checkedRun(netlist, vectors);
}

function withPatience<T>(work: Promise<T>): Promise<T> {
  return new Promise((resolve, reject) => {
    const timer = setTimeout(() => {
      // It will not answer any more: the next netlist gets a new one.
      engine = undefined;
      reject(new Error(`no answer from the simulator in ${PATIENCE / 1000} s`));
    }, PATIENCE);
    work.then(resolve, reject).finally(() => clearTimeout(timer));
  });
}
