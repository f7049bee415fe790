/** A half-bridge power stage: both switches of a buck phase with their driver in one package. */
import type { Part } from './common.ts';
import type { Switch } from './switch.ts';

export interface PowerStage extends Part {
  /** Rated voltage of both switches, V. */
  readonly voltageRating: number;
  /** Rated mean output current, A. */
  readonly currentRating: number;
  /** On-resistance of the high and of the low switch at 25 °C, Ω. */
  readonly highResistance: number;
  readonly lowResistance: number;
  /** Rise of both over their 25 °C value per kelvin, 1/K. */
  readonly resistanceTempco: number;
  /** Gate charge of each at the driver's voltage, C. */
  readonly highGateCharge: number;
  readonly lowGateCharge: number;
  /** Output charge and energy of each at `outputTestVoltage`, C and J. */
  readonly highOutputCharge: number;
  readonly highOutputEnergy: number;
  readonly lowOutputCharge: number;
  readonly lowOutputEnergy: number;
  /** V. */
  readonly outputTestVoltage: number;
  /** Recovery charge of the low body diode at `recoveryCurrent`, C, without output charge. */
  readonly recoveryCharge: number;
  /** A. */
  readonly recoveryCurrent: number;
  /** Source-drain drop of the low switch while off, V. */
  readonly bodyDrop: number;
  /** Turn-on and turn-off time of the high switch under its driver, s. */
  readonly turnOnTime: number;
  readonly turnOffTime: number;
  /** V. */
  readonly driveVoltage: number;
  /** Each gap between the two switches, s. */
  readonly deadTime: number;
  /** Supply current of the driver, A. */
  readonly quiescentCurrent: number;
  /** Junction to board, K/W, for the loss of both switches. */
  readonly thermalResistance: number;
  /** K. */
  readonly maximumJunction: number;
}

/** What drives the gates of a leg: a controller's own drivers, or those of a power stage. */
export interface Driver {
  readonly driveVoltage: number;
  readonly linearDriveSupply: boolean;
  readonly driverSourceResistance: number;
  readonly driverSinkResistance: number;
  readonly deadTime: number;
}

/** A power stage told as two switches and a driver, so that one physics serves both. */
export interface Leg {
  readonly stage: PowerStage;
  readonly high: Switch;
  readonly low: Switch;
  readonly driver: Driver;
}

/** Plateau that stands in for the gates inside a package, V: edge times are given, so it cancels. */
const PLATEAU = 2;
/** Share of the gate charge that moves the drain (common practice, no source): the driver's resistance is set by it. */
const DRAIN_SHARE = 0.3;

/**
 * The leg of `stage`: edge times become the resistance through which this driver moves the drain in that time.
 * @derivation t = Q·R/(Vdrive − Vplateau) turned round; two halves side by side of twice the package's thermal resistance
 * @valid edge times given for the package's own driver
 */
export function legOf(stage: PowerStage): Leg {
  const charge = DRAIN_SHARE * stage.highGateCharge;
  const source = (stage.turnOnTime * (stage.driveVoltage - PLATEAU)) / charge;
  const sink = (stage.turnOffTime * PLATEAU) / charge;
  const shared = {
    technology: 'si' as const,
    voltageRating: stage.voltageRating,
    resistanceTempco: stage.resistanceTempco,
    dynamicFactor: 1,
    driveVoltage: stage.driveVoltage,
    gateRating: stage.driveVoltage,
    plateauVoltage: PLATEAU,
    gateChargeSwitch: 0,
    gateResistance: 0,
    outputTestVoltage: stage.outputTestVoltage,
    recoveryCurrent: stage.recoveryCurrent,
    recoveryHoldsOutput: false,
    bodyDrop: stage.bodyDrop,
    commonSourceInductance: 0,
    // Both junctions share the package's path to the board.
    thermalResistance: 2 * stage.thermalResistance,
    maximumJunction: stage.maximumJunction,
    // A package is rated by its mean output; half as much again is the usual room for the peak (common practice, no source).
    currentRating: 1.5 * stage.currentRating,
    ...{ length: 0, width: 0, height: 0, mass: 0, prices: [] },
  };
  return {
    stage,
    high: {
      ...shared,
      name: `${stage.name} high`,
      onResistance: stage.highResistance,
      gateCharge: stage.highGateCharge,
      gateDrainCharge: charge,
      outputCharge: stage.highOutputCharge,
      outputEnergy: stage.highOutputEnergy,
      recoveryCharge: stage.recoveryCharge,
    },
    low: {
      ...shared,
      name: `${stage.name} low`,
      onResistance: stage.lowResistance,
      gateCharge: stage.lowGateCharge,
      gateDrainCharge: DRAIN_SHARE * stage.lowGateCharge,
      outputCharge: stage.lowOutputCharge,
      outputEnergy: stage.lowOutputEnergy,
      recoveryCharge: stage.recoveryCharge,
    },
    driver: {
      driveVoltage: stage.driveVoltage,
      linearDriveSupply: false,
      driverSourceResistance: source,
      driverSinkResistance: sink,
      deadTime: stage.deadTime,
    },
  };
}
