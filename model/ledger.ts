/**
 * Where watts are written down while one operating point is solved: one slot for each effect in each part position, so
 * that the search's fast path and the full breakdown read the same numbers.
 */

/** Slots of the ledger: the part position that the loss heats, and the effect. Order is fixed by this list alone. */
export const LOSS_SLOTS = [
  ['highSwitch', 'conduction'],
  ['highSwitch', 'overlap'],
  ['highSwitch', 'outputCharge'],
  ['highSwitch', 'recovery'],
  ['highSwitch', 'deadTime'],
  ['highSwitch', 'gate'],
  ['highSwitch', 'loop'],
  ['lowSwitch', 'conduction'],
  ['lowSwitch', 'overlap'],
  ['lowSwitch', 'outputCharge'],
  ['lowSwitch', 'recovery'],
  ['lowSwitch', 'deadTime'],
  ['lowSwitch', 'gate'],
  ['lowSwitch', 'loop'],
  ['diode', 'conduction'],
  ['diode', 'leakage'],
  ['inductor', 'winding'],
  ['inductor', 'windingAc'],
  ['inductor', 'core'],
  ['transformer', 'winding'],
  ['transformer', 'core'],
  ['board', 'copper'],
  ['outputCeramic', 'seriesResistance'],
  ['outputBulk', 'seriesResistance'],
  ['inputCeramic', 'seriesResistance'],
  ['inputBulk', 'seriesResistance'],
  ['dividerCeramic', 'seriesResistance'],
  ['filterChoke', 'winding'],
  ['controller', 'quiescent'],
  ['controller', 'driveSupply'],
] as const;

/** Index of each slot, by `part.effect`. */
export const SLOT = Object.fromEntries(
  LOSS_SLOTS.map(([part, effect], index) => [`${part}.${effect}`, index]),
) as Readonly<Record<`${(typeof LOSS_SLOTS)[number][0]}.${(typeof LOSS_SLOTS)[number][1]}`, number>>;

/** Sum of the slots `from` … `to − 1` of `ledger`, W. */
export function sumSlots(ledger: Float64Array, from: number, to: number): number {
  let sum = 0;
  for (let i = from; i < to; i++) sum += ledger[i];
  return sum;
}
