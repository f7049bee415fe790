/** A capacitor bank: one or two groups of equal parts in parallel (ceramic, and bulk beside it). */

/** Two parallel groups, each a capacitance in series with a resistance; a group of 0 F is absent. Filled in place. */
export interface Bank {
  /** F, of the whole first group; above 0. */
  c1: number;
  /** Ω, of the whole first group. */
  r1: number;
  /** H, of the whole first group. */
  l1: number;
  /** F, of the whole second group; 0 where there is none. */
  c2: number;
  /** Ω. */
  r2: number;
  /** H. */
  l2: number;
}

/** What the steady state of a bank shows. Filled in place. */
export interface BankRipple {
  /** Highest terminal voltage over its mean level, V. */
  highest: number;
  /** Lowest, V. */
  lowest: number;
  /** highest − lowest: the ripple, V peak to peak. */
  ripple: number;
  /** Mean square current of the first group, A². */
  meanSquare1: number;
  /** Mean square current of the second group, A². */
  meanSquare2: number;
}

/** A bank to be filled: all zero. */
export function createBank(): Bank {
  return { c1: 0, r1: 0, l1: 0, c2: 0, r2: 0, l2: 0 };
}

/** A result to be filled: all zero. */
export function createBankRipple(): BankRipple {
  return { highest: 0, lowest: 0, ripple: 0, meanSquare1: 0, meanSquare2: 0 };
}

/**
 * Group 1 of `count` equal parts: `capacitance` F, `resistance` Ω, `inductance` H of one part. Capacitances add, the rest divides.
 * @derivation equal parts in parallel carry equal currents
 * @valid count ≥ 1
 */
export function setGroup1(
  bank: Bank,
  count: number,
  capacitance: number,
  resistance: number,
  inductance: number,
): void {
  bank.c1 = count * capacitance;
  bank.r1 = resistance / count;
  bank.l1 = inductance / count;
}

/** Group 2, as `setGroup1`; count 0 leaves the group out. */
export function setGroup2(
  bank: Bank,
  count: number,
  capacitance: number,
  resistance: number,
  inductance: number,
): void {
  bank.c2 = count * capacitance;
  bank.r2 = count > 0 ? resistance / count : 0;
  bank.l2 = count > 0 ? inductance / count : 0;
}
