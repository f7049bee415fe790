/** Every architecture that the model knows, by name. Adding one is a file beside this and a line here. */
import type { Architecture } from '../rail/rail.ts';
import { buckDiode, buckSynchronous } from './buck.ts';
import type { Stage } from './contract.ts';
import { fullBridgeCentreTap, fullBridgeCurrentDoubler } from './full-bridge.ts';
import { halfBridgeCentreTap, halfBridgeCurrentDoubler } from './half-bridge.ts';
import { twoSwitchForward } from './two-switch-forward.ts';

export const STAGES: readonly Stage[] = [
  buckSynchronous,
  buckDiode,
  twoSwitchForward,
  halfBridgeCentreTap,
  halfBridgeCurrentDoubler,
  fullBridgeCentreTap,
  fullBridgeCurrentDoubler,
];

/** The stage of `architecture`; undefined where the model does not have it. */
export function stageOf(architecture: Architecture): Stage | undefined {
  return STAGES.find((stage) => stage.architecture === architecture);
}
