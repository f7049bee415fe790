/** Which parts a design is built of and how many of each: one list for size and cost, the parts list and the handoff. */
import type { Design } from './design.ts';
import type { Part } from './parts/common.ts';

/** Room for every slot that a design may have. */
const ROOM = 16;

/** Parts of one design. Rewritten for each design; entries beyond `length` are stale. */
export class PartsList {
  length = 0;
  readonly slots: string[] = new Array(ROOM).fill('');
  readonly parts: (Part | undefined)[] = new Array(ROOM).fill(undefined);
  /** Pieces of each, all phases. */
  readonly counts = new Float64Array(ROOM);
}

/** Rewrites `list` for `design`. */
export function listParts(list: PartsList, design: Design): void {
  const { phases, stage } = design;
  list.length = 0;
  if (design.powerStage !== undefined) {
    put(list, 'powerStage', design.powerStage, phases);
  } else {
    put(list, 'highSwitch', design.high, phases * stage.highDevices * design.highParallel);
    if (design.diode === undefined) put(list, 'lowSwitch', design.low, phases * stage.lowDevices * design.lowParallel);
    else put(list, 'diode', design.diode, phases);
  }
  put(list, 'inductor', design.inductor, phases * stage.chokes);
  if (stage.form !== undefined) put(list, 'transformer', design.transformer, phases);
  if (design.clampDiode !== undefined) put(list, 'clampDiode', design.clampDiode, 2 * phases);
  if (design.dividerCount > 0) put(list, 'dividerCeramic', design.inputCeramic, 2 * phases * design.dividerCount);
  put(list, 'outputCeramic', design.outputCeramic, design.outputCeramicCount);
  if (design.outputBulk !== undefined) put(list, 'outputBulk', design.outputBulk, design.outputBulkCount);
  put(list, 'inputCeramic', design.inputCeramic, design.inputCeramicCount);
  if (design.inputBulk !== undefined) put(list, 'inputBulk', design.inputBulk, design.inputBulkCount);
  if (design.filterChoke !== undefined) put(list, 'filterChoke', design.filterChoke, 1);
  put(list, 'controller', design.controller, 1);
}

function put(list: PartsList, slot: string, part: Part, count: number): void {
  const place = list.length;
  list.slots[place] = slot;
  list.parts[place] = part;
  list.counts[place] = count;
  list.length = place + 1;
}
