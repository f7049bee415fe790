/** Charge and energy of a switch's nonlinear output capacitance, and what a hard edge makes of them. */
import { powAt } from '../../optimizer/maths/index.ts';

const power = new Float64Array(2);

/**
 * Exponent p of the charge law Q(V) = Qt·(V/Vt)^p that has the row's own energy: E = ∫V dQ = Q·V·p/(1 + p), so
 * p = r/(1 − r) with r = E/(Q·V). The square-root law (abrupt junction) has r = 1/3 and p = 1/2, a linear capacitance
 * r = 1/2 and p = 1, superjunction devices r near 0.1. `charge` C and `energy` J at `voltage` V.
 * @source kasper-2016, section II (charge- and energy-related quantities of nonlinear output capacitances)
 * @valid 0 < E < Q·V
 * @example chargeExponent(1.5e-8, 3e-7, 60) = 0.5
 */
export function chargeExponent(charge: number, energy: number, voltage: number): number {
  const ratio = energy / (charge * voltage);
  return ratio / (1 - ratio);
}

/** Where `outputAt` writes. */
export const OUTPUT_CHARGE = 0;
export const OUTPUT_ENERGY = 1;

interface OutputRow {
  readonly outputCharge: number;
  readonly outputEnergy: number;
  readonly outputTestVoltage: number;
}

/**
 * Writes output charge (C) and energy (J) of one die at `voltage` (V ≥ 0) to `into[0]` and `into[1]`, from the row's test
 * point by the law of `chargeExponent`: Q ∝ V^p, E ∝ V^(p + 1). No charge and no energy at or below zero volts.
 * @source kasper-2016, section II
 * @valid up to the rated voltage; a fitted law between the test point and zero
 */
export function outputAt(row: OutputRow, voltage: number, into: Float64Array): void {
  into[0] = voltage;
  outputInPlaceAt(row, into);
}

/**
 * The same for the voltage that stands in `into[0]`: no double crosses the call.
 * @source kasper-2016, section II
 * @valid as `outputAt`
 */
export function outputInPlaceAt(row: OutputRow, into: Float64Array): void {
  const ratio = into[0] / row.outputTestVoltage;
  if (!(ratio > 0) || row.outputCharge <= 0) {
    into[OUTPUT_CHARGE] = 0;
    into[OUTPUT_ENERGY] = 0;
    return;
  }
  const share = row.outputEnergy / (row.outputCharge * row.outputTestVoltage);
  power[0] = ratio;
  power[1] = share / (1 - share);
  powAt(power, 0);
  into[OUTPUT_CHARGE] = row.outputCharge * power[0];
  into[OUTPUT_ENERGY] = row.outputEnergy * power[0] * ratio;
}

/**
 * Energy of one hard edge, J, of the switch that turns on at `voltage` (V): it draws the partner's charge from the bus and
 * burns what the partner does not store, and burns its own stored energy: E = Qp·V − Ep + Eo. Equal dice: Qoss·V.
 * `partnerCharge` C, `partnerEnergy` J, `ownEnergy` J, all at `voltage`.
 * @source kasper-2016, section II
 * @valid the whole swing is hard
 * @example hardEdgeEnergy(1e-8, 2e-7, 2e-7, 48) = 4.8e-7
 */
export function hardEdgeEnergy(
  partnerCharge: number,
  partnerEnergy: number,
  ownEnergy: number,
  voltage: number,
): number {
  return partnerCharge * voltage - partnerEnergy + ownEnergy;
}

/**
 * Charge-equivalent capacitance, F: Q/V. `charge` C at `voltage` V.
 * @source jedec-coss
 * @valid voltage above 0
 * @example chargeCapacitance(1.385641e-8, 48) = 2.8867521e-10
 */
export function chargeCapacitance(charge: number, voltage: number): number {
  return charge / voltage;
}

/**
 * Energy-equivalent capacitance, F: 2·E/V². `energy` J at `voltage` V.
 * @source jedec-coss
 * @valid voltage above 0
 * @example energyCapacitance(2.217025e-7, 48) = 1.9245009e-10
 */
export function energyCapacitance(energy: number, voltage: number): number {
  return (2 * energy) / (voltage * voltage);
}
