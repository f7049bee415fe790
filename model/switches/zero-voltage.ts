/**
 * Zero-voltage turn-on: how far a negative valley current swings the switching node before the switch turns on, and what
 * the rest of the swing costs. Everything is continuous in the valley current: a search parks on any jump.
 */
import { pow, powAt } from '../../optimizer/maths/index.ts';
import { chargeExponent, OUTPUT_CHARGE, OUTPUT_ENERGY, outputAt } from './output-charge.ts';

/**
 * Fraction 0 … 1 of the bus that the node swings by. `valley` A (negative helps), `inductance` H, `nodeCharge` C moved by
 * a whole swing (own plus partner, 2·Qoss for equal dice), `busVoltage` V, `againstVoltage` V: what the inductor swings
 * about (Vo for the high switch of a buck; Vi − Vo for its low switch in reverse flow), `deadTime` s.
 * Two bounds, the smaller counts. Charge: |I|·td over the charge of the swing, raised to `inverseExponent` (1/p of Q ∝ V^p, 1 for a
 * constant capacitance), for charge moved is not voltage swung. Energy: the resonance reaches
 * Vo + √(Vo² + I²·L/Ce), Ce = charge/bus; for equal dice that is the rail when ½·L·I² ≥ Qoss·(Vi − 2·Vo).
 * The charge bound brings the fraction to 0 at zero current, where the bare resonance would jump to 2·Vo.
 * @source kasper-2016, section III (charge-based zero-voltage condition and dead time)
 * @valid charge-equivalent node capacitance; deadTime ≥ 0
 * @example swingFraction(-4, 1e-6, 2e-8, 48, 12, 1e-7) = 1
 * @example swingFraction(-1, 1e-5, 2e-8, 48, 30, 1e-8) = 0.5
 * @example swingFraction(-1, 1e-5, 2e-8, 48, 30, 1e-8, 2) = 0.25
 * @example swingFraction(2, 1e-6, 2e-8, 48, 12, 1e-7) = 0
 */
export function swingFraction(
  valley: number,
  inductance: number,
  nodeCharge: number,
  busVoltage: number,
  againstVoltage: number,
  deadTime: number,
  inverseExponent = 1,
): number {
  if (valley >= 0 || deadTime <= 0) return 0;
  const share = (-valley * deadTime) / nodeCharge;
  const moved = share < 1 && inverseExponent !== 1 ? pow(share, inverseExponent) : share;
  const stored = (valley * valley * inductance * busVoltage) / nodeCharge;
  const reached = (againstVoltage + Math.sqrt(againstVoltage * againstVoltage + stored)) / busVoltage;
  return Math.min(1, moved, reached);
}

/**
 * Smallest |valley| for a full swing by energy, A: √(2·Qoss·(Vi − 2·Vo)/L), 0 where Vo ≥ Vi/2. `outputCharge` C of one of
 * two equal dice at the bus, `busVoltage` V, `againstVoltage` V, `inductance` H.
 * @source kasper-2016, section III
 * @valid equal dice
 * @example zeroVoltageCurrent(1e-8, 48, 12, 4.8e-7) = 1
 */
export function zeroVoltageCurrent(
  outputCharge: number,
  busVoltage: number,
  againstVoltage: number,
  inductance: number,
): number {
  return Math.sqrt(Math.max(0, (2 * outputCharge * (busVoltage - 2 * againstVoltage)) / inductance));
}

interface OutputRow {
  readonly outputCharge: number;
  readonly outputEnergy: number;
  readonly outputTestVoltage: number;
}

const full = new Float64Array(2);
const rest = new Float64Array(2);
const shares = new Float64Array(3);
const power = new Float64Array(2);

/**
 * Writes to `into[0]` the energy, J, of an edge that starts with the node already swung by `fraction` (0 … 1) of `busVoltage` (V):
 * bus·(Qp(V) − Qp(sV)) − (Ep(V) − Ep(sV)) + Eo((1 − s)·V) for partner row p and own row o, one die each.
 * 0 at a full swing, `hardEdgeEnergy` at none, continuous between.
 * @source kasper-2016, section II
 * @valid fraction 0 … 1
 */
export function partialEdgeEnergyAt(
  partner: OutputRow,
  partnerDice: number,
  own: OutputRow,
  ownDice: number,
  busVoltage: number,
  fraction: number,
  into: Float64Array,
): void {
  outputAt(partner, busVoltage, full);
  outputAt(own, busVoltage, rest);
  shares[0] = fraction;
  shares[1] = chargeExponent(partner.outputCharge, partner.outputEnergy, partner.outputTestVoltage);
  shares[2] = chargeExponent(own.outputCharge, own.outputEnergy, own.outputTestVoltage);
  swungSharesAt(shares);
  const drawn = busVoltage * full[OUTPUT_CHARGE] * (1 - shares[0]) - full[OUTPUT_ENERGY] * (1 - shares[1]);
  into[0] = partnerDice * drawn + ownDice * rest[OUTPUT_ENERGY] * shares[2];
}

/**
 * For the fraction s in `into[0]`, the partner's exponent p of Q ∝ V^p in `into[1]` and the own one in `into[2]` writes the shares of the whole
 * bus's figures: the partner's charge that has moved, s^p, and its energy, s^(p + 1), and the own energy that is left, (1 − s)^(p + 1).
 * No double crosses the call.
 * @source kasper-2016, section II
 * @valid fraction 0 … 1
 */
export function swungSharesAt(into: Float64Array): void {
  const fraction = Math.min(1, into[0]);
  const left = 1 - fraction;
  powAt(into, 0);
  into[1] = into[0] * fraction;
  const exponent = into[2];
  power[0] = left;
  power[1] = exponent;
  powAt(power, 0);
  into[2] = power[0] * left;
}
