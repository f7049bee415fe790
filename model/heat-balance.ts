/**
 * Temperatures of one operating point. Losses rise with temperature and temperatures with losses; where every loss is a
 * straight line in its own temperature the whole balance is a set of linear equations, so it is solved, not iterated: no
 * convergence to wait for, and thermal runaway shows as a denominator that reaches zero.
 */

/** Parts that have a junction or hot spot of their own. */
export const HOT = { high: 0, low: 1, inductor: 2, transformer: 3 } as const;
/** How many there are. */
export const HOT_PARTS = 4;
/** Highest board temperature, K: 105 °C, the usual rating of glass-epoxy board material (common practice, no source). */
export const BOARD_MAXIMUM = 378.15;
/** Kelvin by which a sink is sized below the limit, so that rounding never turns a kept limit into a missed one. */
const SINK_RESERVE = 1;
/** Least denominator: beyond it the balance has run away, and figures are only kept finite. */
const LEAST = 0.02;

/** The balance of one point: what goes in and what comes out. Reused. */
export class HeatBalance {
  /** Loss of each hot part at zero kelvin of its straight line, W, all its pieces together. */
  readonly constant = new Float64Array(HOT_PARTS);
  /** Slope of the loss, W/K. */
  readonly slope = new Float64Array(HOT_PARTS);
  /** Part to board, K/W, all its pieces together. */
  readonly resistance = new Float64Array(HOT_PARTS);
  /** 1 where the part gives all its heat to the air by its own surface, 0 where the board carries it or a share of it. */
  readonly toAir = new Uint8Array(HOT_PARTS);
  /** Conductance of a part on the board to the air by its own faces, W/K, all its pieces together; 0 where it has none to speak of. */
  readonly faces = new Float64Array(HOT_PARTS);
  /** Highest allowed temperature, K. */
  readonly allowed = new Float64Array(HOT_PARTS);
  /** Loss that heats the board alone, W, and its slope with board temperature, W/K. */
  boardConstant = 0.5;
  boardSlope = 0.5;
  /** Highest board temperature that the board and what stands on it without a hot spot of its own allow, K. */
  boardAllowed = 300.5;
  /** Rise of the bulk capacitors at output and input over the board, K. */
  outputBulkRise = 0.5;
  inputBulkRise = 0.5;
  /** K. */
  ambient = 300.5;
  /** Board and sink to ambient, W/K. */
  conductance = 0.5;

  /** K. */
  readonly temperature = new Float64Array(HOT_PARTS);
  boardTemperature = 300.5;
  /** W that all parts together make. */
  total = 0.5;
  /** Largest loop gain of heating, 0 … : at 1 the balance runs away. */
  runaway = 0.5;
  /** Conductance of a heat sink that would bring every part within its limit, W/K; 0 where none is needed. */
  sinkNeeded = 0.5;
}

/**
 * Solves `h` in place.
 * @derivation parts on one board: linear equations in their temperatures, solved by elimination
 * @valid loop gain below 1; beyond it a limit tells
 */
export function solveHeat(h: HeatBalance): void {
  let constant = h.boardConstant;
  let slope = h.boardSlope;
  let runaway = 0;
  let { boardAllowed } = h;
  let toAir = 0;
  for (let i = 0; i < HOT_PARTS; i++) {
    if (h.toAir[i] === 1) {
      const gain = h.resistance[i] * h.slope[i];
      if (gain > runaway) runaway = gain;
      const watts = (h.constant[i] + h.slope[i] * h.ambient) / left(gain);
      h.temperature[i] = warm(h, h.ambient + h.resistance[i] * watts);
      toAir += watts;
      continue;
    }
    // What the faces carry off is a loss that shrinks with the part's temperature: only the rest reaches the board.
    const atZero = h.constant[i] + h.faces[i] * h.ambient;
    const net = h.slope[i] - h.faces[i];
    const gain = h.resistance[i] * net;
    if (gain > runaway) runaway = gain;
    const rest = left(gain);
    constant += atZero / rest;
    slope += net / rest;
    const most = h.allowed[i] * rest - h.resistance[i] * atZero;
    if (most < boardAllowed) boardAllowed = most;
  }
  const gain = slope / h.conductance;
  if (gain > runaway) runaway = gain;
  h.runaway = runaway;
  h.boardTemperature = warm(h, (h.ambient + constant / h.conductance) / left(gain));
  for (let i = 0; i < HOT_PARTS; i++) {
    if (h.toAir[i] === 1) continue;
    const net = h.slope[i] - h.faces[i];
    const atZero = h.constant[i] + h.faces[i] * h.ambient;
    const watts = (atZero + net * h.boardTemperature) / left(h.resistance[i] * net);
    h.temperature[i] = warm(h, h.boardTemperature + h.resistance[i] * watts);
    toAir += h.faces[i] * (h.temperature[i] - h.ambient);
  }
  h.total = constant + slope * h.boardTemperature + toAir;
  h.sinkNeeded = sinkFor(h, constant, slope, boardAllowed);
}

/** A temperature that no straight line through a far point can take below ambient. */
function warm(h: HeatBalance, temperature: number): number {
  return Math.max(h.ambient, temperature);
}

/** What a heating loop of gain `gain` leaves of one: never so little that figures become infinite. */
function left(gain: number): number {
  return gain < 1 - LEAST ? 1 - gain : LEAST;
}

/**
 * Conductance that a heat sink must add, W/K.
 * @derivation conductance that holds the hottest part at its limit, less what the board has
 * @valid ambient below the board's allowance
 */
function sinkFor(h: HeatBalance, constant: number, slope: number, boardAllowed: number): number {
  if (h.boardTemperature <= boardAllowed) return 0;
  const target = boardAllowed - SINK_RESERVE;
  const head = target - h.ambient;
  // Where a part is too hot even on a board at ambient, no sink helps: none is sized, and the part's own limit tells.
  if (head <= 1) return 0;
  return (constant + slope * target) / head - h.conductance;
}
