/** Loss of the body diode in the gaps where neither switch of a leg is on. */

/**
 * Energy of one gap, J: Vsd·|I|·max(0, t − transition). `drop` V of the off channel (2 to 3 V for gallium nitride),
 * `current` A, `gap` s, `transition` s: the part of the gap in which the node still moves and the diode does not yet conduct.
 * @source rohm-64an035e, equation of dead-time loss (Vf·I·(t1 + t2)·f)
 * @valid constant current during the gap
 * @example deadTimeEnergy(0.5, 3, 3e-8, 0) = 4.5e-8
 */
export function deadTimeEnergy(drop: number, current: number, gap: number, transition: number): number {
  const conducting = gap - transition;
  return conducting > 0 ? drop * Math.abs(current) * conducting : 0;
}

/**
 * Time the node takes to move by the charge `nodeCharge` (C) with `current` (A) of either sign, s; at most `gap` (s).
 * @source kasper-2016, section III (dead time = moved charge over current)
 * @valid constant current during the gap
 * @example transitionTime(2e-8, -4, 1e-7) = 5e-9
 */
export function transitionTime(nodeCharge: number, current: number, gap: number): number {
  return Math.min(gap, nodeCharge / Math.max(Math.abs(current), 1e-12));
}
