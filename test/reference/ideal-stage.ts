/** One operating point of an architecture's own stage without any loss, as published examples state it: the model's path, not a copy of it. */
import { Design } from '../../model/design.ts';
import { EdgeFigures } from '../../model/edge-figures.ts';
import type { Inductor } from '../../model/parts/inductor.ts';
import { type Architecture, stageOf } from '../../model/stages/list.ts';
import { StageState } from '../../model/stages/state.ts';
import { Transformer } from '../../model/transformer.ts';
import { peak, valley } from '../../model/waveform/moments.ts';
import { sumShifted } from '../../model/waveform/superpose.ts';
import { createWaveform, type Waveform } from '../../model/waveform/waveform.ts';

/** What an example states. SI units. */
export interface Example {
  readonly architecture: Architecture;
  /** Of one switch, Hz. */
  readonly frequency: number;
  readonly input: number;
  readonly output: number;
  /** Of the load, A. */
  readonly current: number;
  readonly phases?: number;
  /** Of one choke; so large that there is no ripple where absent. */
  readonly inductance?: number;
  /** Np/Ns. */
  readonly ratio?: number;
  readonly primaryTurns?: number;
  /** m². */
  readonly area?: number;
  readonly magnetizing?: number;
  /** Primary side; so small that it takes no time where absent. */
  readonly leakage?: number;
  readonly shifted?: boolean;
}

/** Large and small enough that they change no printed digit: none of either would leave nothing to divide by. */
const NO_RIPPLE = 1;
const NO_LEAKAGE = 1e-18;
const NO_MAGNETIZING = 1e9;

/** An inductor that never saturates. */
const STRAIGHT: Pick<Inductor, 'saturationCurrent' | 'saturationDrop' | 'saturationExponent'> = {
  saturationCurrent: 1e9,
  saturationDrop: 0.2,
  saturationExponent: 2,
};

/** The solved stage of `example`. */
export function solvedExample(example: Example): StageState {
  return solvedDesign(example).state;
}

/** The same with the design behind it: parts that a test does not set are not there. */
export function solvedDesign(example: Example): { readonly design: Design; readonly state: StageState } {
  const stage = stageOf(example.architecture);
  if (stage === undefined) throw new Error(`no stage ${example.architecture}`);
  const inductance = example.inductance ?? NO_RIPPLE;
  const transformer = Object.assign(new Transformer(), {
    ratio: example.ratio ?? 1,
    primaryTurns: example.primaryTurns ?? 1,
    area: example.area ?? 1,
    magnetizing: example.magnetizing ?? NO_MAGNETIZING,
    leakage: example.leakage ?? NO_LEAKAGE,
  });
  const design: Design = Object.assign(Object.create(Design.prototype), {
    stage,
    phases: example.phases ?? 1,
    frequency: example.frequency,
    inductance,
    inductor: { ...STRAIGHT, inductance },
    high: { bodyDrop: 0 },
    low: { bodyDrop: 0 },
    shortestOnTime: 0,
    gap: 0,
    gapCurrent: 1,
    phaseShifted: example.shifted ?? false,
    emulates: false,
    transformer,
    highEdges: new EdgeFigures(),
    lowEdges: new EdgeFigures(),
  });
  const state = Object.assign(new StageState(), {
    inputVoltage: example.input,
    outputVoltage: example.output,
    loadCurrent: example.current,
    activePhases: example.phases ?? 1,
    inductance,
    highResistance: 0,
    lowResistance: 0,
    pathResistance: 0,
    primaryResistance: 0,
    secondaryResistance: 0,
  });
  stage.solve(design, state);
  return { design, state };
}

/** The current that all chokes of a solved stage bring together. */
export function together(state: StageState): Waveform {
  const into = createWaveform(64);
  sumShifted(state.choke, state.activePhases * state.chokes, into);
  return into;
}

/** Peak to peak. */
export function swing(w: Waveform): number {
  return peak(w) - valley(w);
}
