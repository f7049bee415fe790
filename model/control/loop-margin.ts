/** Crossover and phase margin of a whole loop, found on its gain. */
import { type Compensator, compensatorResponse, type LoopPlant, plantResponse } from './compensator.ts';

/** A margin found on the loop gain. */
export interface LoopMargin {
  /** Hz; NaN where the gain never crosses one. */
  readonly crossover: number;
  /** rad. */
  readonly phaseMargin: number;
}

/**
 * Crossover and phase margin of the loop, found on the loop gain itself: the highest frequency below `highest` Hz where its magnitude
 * falls through 1, located on 200 logarithmic points and by bisection.
 * @derivation Nyquist: margin = π + phase at the crossover
 * @valid loops that are stable without feedback
 */
export function loopMargin(plant: LoopPlant, g: Compensator, lowest: number, highest: number): LoopMargin {
  const ratio = highest / lowest;
  const points = 200;
  const step = rootOf(ratio, points);
  let above = highest;
  for (let i = 0; i < points; i++) {
    const below = above / step;
    if (gainAt(plant, g, below) >= 1 && gainAt(plant, g, above) < 1) return refine(plant, g, below, above);
    above = below;
  }
  return { crossover: Number.NaN, phaseMargin: Number.NaN };
}

/** n-th root by bisection; once a margin. */
function rootOf(x: number, n: number): number {
  let low = 1;
  let high = x;
  for (let round = 0; round < 100; round++) {
    const middle = 0.5 * (low + high);
    let product = 1;
    for (let i = 0; i < n && product <= x; i++) product *= middle;
    if (product < x) low = middle;
    else high = middle;
  }
  return high;
}

function gainAt(plant: LoopPlant, g: Compensator, frequency: number): number {
  const omega = 2 * Math.PI * frequency;
  return plantResponse(plant, omega).magnitude * compensatorResponse(g, omega).magnitude;
}

function refine(plant: LoopPlant, g: Compensator, from: number, to: number): LoopMargin {
  let low = from;
  let high = to;
  for (let round = 0; round < 60; round++) {
    const middle = 0.5 * (low + high);
    if (gainAt(plant, g, middle) >= 1) low = middle;
    else high = middle;
  }
  const omega = 2 * Math.PI * low;
  const phase = plantResponse(plant, omega).phase + compensatorResponse(g, omega).phase;
  return { crossover: low, phaseMargin: Math.PI + phase };
}
