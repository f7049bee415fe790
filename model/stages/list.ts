/** Every architecture that the model knows. Adding one is a file beside this and a line here: all else asks the stage. */
import { buckDiode, buckSynchronous } from './buck.ts';
import type { Stage } from './contract.ts';
import { fullBridgeCentreTap, fullBridgeCurrentDoubler } from './full-bridge.ts';
import { halfBridgeCentreTap, halfBridgeCurrentDoubler } from './half-bridge.ts';
import { twoSwitchForward } from './two-switch-forward.ts';

const LIST = [
  buckSynchronous,
  buckDiode,
  twoSwitchForward,
  halfBridgeCentreTap,
  halfBridgeCurrentDoubler,
  fullBridgeCentreTap,
  fullBridgeCurrentDoubler,
] as const;

/** Name of an architecture; a transformer stage names its secondary too. */
export type Architecture = (typeof LIST)[number]['architecture'];

/** The stages, in the order in which people are shown them. */
export const STAGES: readonly Stage[] = LIST;

/** Their names, in the same order: what a sheet may ask for. */
export const ARCHITECTURES: readonly Architecture[] = STAGES.map((stage) => stage.architecture);

const BY_NAME: ReadonlyMap<Architecture, Stage> = new Map(STAGES.map((stage) => [stage.architecture, stage]));

/** The stage of `architecture`; undefined where the model does not have it. */
export function stageOf(architecture: Architecture): Stage | undefined {
  return BY_NAME.get(architecture);
}
