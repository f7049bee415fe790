/** Everything that solving one operating point fills in. One per thread, reused from point to point. */
import { type BankRipple, createBankRipple } from './capacitors/index.ts';
import { type HeatBalance, HOT_PARTS } from './heat-balance.ts';
import { LOSS_SLOTS } from './ledger.ts';
import type { Rail } from './rail/rail.ts';
import { StageState } from './stages/state.ts';
import { createWaveform } from './waveform/index.ts';

export class PointSolver {
  readonly rail: Rail;
  readonly state = new StageState();
  /** Where the heat of the point at hand is balanced. */
  heat: HeatBalance;
  readonly ledger = new Float64Array(LOSS_SLOTS.length);
  /** Summed choke current and summed draw from the input. */
  readonly summed = createWaveform(257);
  readonly drawn = createWaveform(257);
  readonly outputRipple: BankRipple = createBankRipple();
  readonly inputRipple: BankRipple = createBankRipple();
  /** Whether a point starts from the temperatures of the point before; the first of a design must not. */
  warm = false;
  /** Whether ripple voltages are wanted, beside the currents that heat the capacitors. */
  wantsRipple = true;
  /** Losses in resistances at the reference temperature of rows, W, of each hot part; those of its ac currents are part of the choke's. */
  readonly resistive = new Float64Array(HOT_PARTS);
  /** Their rise with temperature, 1/K. */
  readonly tempco = new Float64Array(HOT_PARTS);
  /** W, ac loss of all chokes' windings and loss of the board's copper, each at its reference temperature. */
  chokeAc = 0.5;
  boardCopper = 0.5;
  /** W, all losses. */
  loss = 0.5;
  /** W, delivered to the load; negative in reverse flow. */
  outputPower = 0.5;
  /** W, that flows in on the side that feeds: set at usual points. */
  inputPower = 0.5;
  /** Board and sink to ambient, W/K. */
  conductance = 0.5;

  constructor(rail: Rail, heat: HeatBalance) {
    this.rail = rail;
    this.heat = heat;
  }
}
