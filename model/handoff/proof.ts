/** A proof as data: a design's netlist simulated at several corners, predicted beside simulated. Runners make it, the page shows it. */

/** One figure, predicted and simulated, SI. */
export interface ProofFigure {
  readonly name: string;
  readonly unit: string;
  readonly predicted: number;
  readonly simulated: number;
  /** predicted/simulated − 1. */
  readonly difference: number;
  /** Largest size of the difference that counts as agreement. */
  readonly band: number;
  readonly agrees: boolean;
}

/** One corner. */
export interface ProofCorner {
  /** V, V, fraction of full load. */
  readonly inputVoltage: number;
  readonly outputVoltage: number;
  readonly load: number;
  readonly figures: readonly ProofFigure[];
  /** What went wrong where nothing was simulated. */
  readonly failure?: string;
}

/** A sheet's limit held against a simulation of usual values (ripple) or of the closed averaged loop (load step). */
export interface ProofLimit {
  readonly name: string;
  readonly unit: string;
  readonly simulated: number;
  readonly allowed: number;
  readonly holds: boolean;
}

/** `proof-<id>.json`. Fields may be added, never renamed. */
export interface Proof {
  readonly format: 'chopfront-proof';
  readonly version: 1;
  readonly tool: string;
  readonly id: string;
  readonly simulator: string;
  readonly corners: readonly ProofCorner[];
  readonly limits: readonly ProofLimit[];
  /** Whether every figure of every corner agrees within its band. */
  readonly agrees: boolean;
}
