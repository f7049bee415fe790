/**
 * What both switching edges of a cycle cost. At each edge one switch of the leg turns off and the other on; which of them
 * pays is decided by the sign of the current at that instant, so the same lines serve forward and reverse power, forced
 * continuous operation and everything between, without a jump.
 */
import type { Design } from './design.ts';
import { diodeRecovery, type EdgeFigures, lookUpBus } from './edge-figures.ts';
import { SLOT } from './ledger.ts';
import type { StageState } from './stages/state.ts';
import {
  deadTimeEnergy,
  diodeChargeEnergy,
  hardEdgeEnergy,
  loopEnergy,
  overlapEnergy,
  swingFraction,
  swungSharesAt,
  transitionTime,
} from './switches/index.ts';

/** Inductance of the loop through input capacitor and both switches, H: a tight layout (common practice, no source). */
export const LOOP_INDUCTANCE = 1e-9;

/** Slots of the effects, from the first slot of a position on: both positions list them in the same order. */
const HIGH = SLOT['highSwitch.conduction'];
const LOW = SLOT['lowSwitch.conduction'];
const OVERLAP = SLOT['highSwitch.overlap'] - HIGH;
const OUTPUT = SLOT['highSwitch.outputCharge'] - HIGH;
const RECOVERY = SLOT['highSwitch.recovery'] - HIGH;
const DEAD_TIME = SLOT['highSwitch.deadTime'] - HIGH;
const GATE = SLOT['highSwitch.gate'] - HIGH;
const LOOP = SLOT['highSwitch.loop'] - HIGH;
const DRIVE_SUPPLY = SLOT['controller.driveSupply'];

/** One edge, told to the functions below through a record so that no double crosses a call. */
class Edge {
  /** Current that the switch which turns on takes over, A; below 0 it helps the node to swing. */
  current = 0.5;
  /** What the choke swings about, V. */
  against = 0.5;
  /** How far the node has come by itself, 0 … 1. */
  swing = 0.5;
  /** Sum of the gate charges a second, A. */
  drawn = 0.5;
}

const edge = new Edge();
const shares = new Float64Array(3);

/**
 * Adds the switching losses of all active phases at `state` to `ledger`, W.
 * @source rohm-aek59; each term names its own
 * @valid both edges of a leg settle within the cycle
 */
export function addEdgeLosses(design: Design, state: StageState, ledger: Float64Array): void {
  const { highEdges, lowEdges } = design;
  edge.drawn = 0;
  highEdges.volts = state.inputVoltage;
  lookUpBus(highEdges);
  if (design.diode === undefined) {
    lowEdges.volts = state.inputVoltage;
    lookUpBus(lowEdges);
    edge.current = state.valleyCurrent;
    edge.against = state.outputVoltage;
    addEdge(design, state, highEdges, HIGH, lowEdges, LOW, ledger);
    // The mirror image.
    edge.current = -state.peakCurrent;
    edge.against = state.inputVoltage - state.outputVoltage;
    addEdge(design, state, lowEdges, LOW, highEdges, HIGH, ledger);
  } else {
    addDiodeEdges(design, state, ledger);
  }
  addDriveSupply(design, state, ledger);
}

/**
 * The edge at which `own` turns on and `partner` has turned off: hard while the current flows against it.
 * @derivation the sign of the current at the instant decides which edge is hard; gate charge Q·f·V
 * @valid edges short beside both intervals
 */
function addEdge(
  design: Design,
  state: StageState,
  own: EdgeFigures,
  ownAt: number,
  partner: EdgeFigures,
  partnerAt: number,
  ledger: Float64Array,
): void {
  if (edge.current > 0) addHardEdge(design, state, own, ownAt, partner, partnerAt, ledger);
  else addSoftEdge(design, state, own, ownAt, partner, partnerAt, ledger);
  const charge = cycles(state) * (own.gateCharge - edge.swing * own.gateSpared);
  ledger[ownAt + GATE] += charge * design.driver.driveVoltage;
  edge.drawn += charge;
}

/**
 * Cycles a second of all active phases.
 * @derivation every active phase switches once a period
 * @valid effective frequency ≥ 0
 */
function cycles(state: StageState): number {
  return state.frequency * state.activePhases;
}

/**
 * The body diode of the partner carries the current through the whole gap, then recovers while the voltage is still there.
 * @source ren-2006 (overlap)
 * @source kasper-2016 (output charge)
 * @source rohm-aek59 (dead time)
 * @valid current > 0 against the edge
 */
function addHardEdge(
  design: Design,
  state: StageState,
  own: EdgeFigures,
  ownAt: number,
  partner: EdgeFigures,
  partnerAt: number,
  ledger: Float64Array,
): void {
  const { current } = edge;
  const volts = state.inputVoltage;
  const rate = cycles(state);
  edge.swing = 0;
  ledger[ownAt + OVERLAP] += rate * overlapEnergy(volts, current, own.onTime + own.onSlope * current);
  ledger[ownAt + RECOVERY] += rate * volts * partner.recovery * current;
  ledger[ownAt + OUTPUT] += rate * hardEdgeEnergy(partner.charge, partner.energy, own.energy, volts);
  ledger[partnerAt + DEAD_TIME] += rate * deadTimeEnergy(partner.bodyDrop, current, design.driver.deadTime, 0);
}

/**
 * The current moves the node towards the switch that turns on; its body diode waits for the node to arrive.
 * @source kasper-2016: swing by the choke's current
 * @valid current ≥ 0 with the edge
 */
function addSoftEdge(
  design: Design,
  state: StageState,
  own: EdgeFigures,
  ownAt: number,
  partner: EdgeFigures,
  partnerAt: number,
  ledger: Float64Array,
): void {
  const current = -edge.current;
  const volts = state.inputVoltage;
  const gap = design.driver.deadTime;
  const rate = cycles(state);
  const node = own.charge + partner.charge;
  ledger[partnerAt + OVERLAP] += rate * overlapEnergy(volts, current, partner.offTime + partner.offSlope * current);
  ledger[partnerAt + LOOP] += rate * loopEnergy(LOOP_INDUCTANCE, current);
  const wait = transitionTime(node, current, gap);
  ledger[ownAt + DEAD_TIME] += rate * deadTimeEnergy(own.bodyDrop, current, gap, wait);
  const inductance = state.effectiveInductance;
  edge.swing = swingFraction(-current, inductance, node, volts, edge.against, gap, partner.inverseExponent);
  if (edge.swing < 1) ledger[ownAt + OUTPUT] += rate * restOfSwing(own, partner, volts);
}

/**
 * What the switch `own` burns, J, as it turns on after the node has come only part of the way.
 * @source kasper-2016: charge law Q ∝ V^p between where the swing ends and the rail
 * @valid swing 0 … 1
 */
function restOfSwing(own: EdgeFigures, partner: EdgeFigures, volts: number): number {
  if (!(edge.swing > 0)) return hardEdgeEnergy(partner.charge, partner.energy, own.energy, volts);
  shares[0] = edge.swing;
  shares[1] = partner.exponent;
  shares[2] = own.exponent;
  swungSharesAt(shares);
  return partner.charge * volts * (1 - shares[0]) - partner.energy * (1 - shares[1]) + own.energy * shares[2];
}

/**
 * A linear drive supply burns the rest of the input in the driver.
 * @derivation a linear regulator carries the same charge from the whole input: Q·f·(Vi − Vdrive)
 * @valid input above the drive voltage
 */
function addDriveSupply(design: Design, state: StageState, ledger: Float64Array): void {
  const { driver } = design;
  if (!driver.linearDriveSupply) return;
  const drop = state.inputVoltage - driver.driveVoltage;
  if (drop > 0) ledger[DRIVE_SUPPLY] += edge.drawn * drop;
}

/**
 * Both edges of a leg with a diode in the low position: the diode commutates by itself.
 * @source rohm-aek59; junction charge of the diode Q·V less its stored energy
 * @valid current never below zero
 */
function addDiodeEdges(design: Design, state: StageState, ledger: Float64Array): void {
  const { diode, highEdges: high, driver } = design;
  if (diode === undefined) return;
  const rate = cycles(state);
  const { valleyCurrent, peakCurrent, inputVoltage } = state;
  ledger[HIGH + OVERLAP] +=
    rate *
    (overlapEnergy(inputVoltage, valleyCurrent, high.onTime + high.onSlope * valleyCurrent) +
      overlapEnergy(inputVoltage, peakCurrent, high.offTime + high.offSlope * peakCurrent));
  ledger[HIGH + OUTPUT] +=
    rate * (high.energy + diodeChargeEnergy(diode.junctionCharge, diode.chargeVoltage, inputVoltage));
  if (peakCurrent > 0) ledger[HIGH + LOOP] += rate * loopEnergy(LOOP_INDUCTANCE, peakCurrent);
  if (valleyCurrent > 0) ledger[HIGH + RECOVERY] += rate * inputVoltage * diodeRecovery(diode) * valleyCurrent;
  const charge = rate * high.gateCharge;
  ledger[HIGH + GATE] += charge * driver.driveVoltage;
  edge.drawn += charge;
}
