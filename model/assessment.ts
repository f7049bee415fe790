/** What the model says of one design, whole: the rich twin of the numbers that the search sees. SI base units. */
import type { Architecture } from './stages/list.ts';

/** A design as a person names it: numbers by gene name, parts by slot. Choices that are parts stand under `parts` alone. */
export interface DesignRecord {
  readonly architecture: Architecture;
  /** Every active numeric gene in SI units, such as `phases`, `frequency`, `inductance`, `outputCeramicCount`. */
  readonly genes: Readonly<Record<string, number>>;
  /** Part name by slot, such as `highSwitch`, `lowSwitch`, `inductor`, `outputCeramic`, `controller`; unused slots absent. */
  readonly parts: Readonly<Record<string, string>>;
}

/** One objective's figure. */
export interface ObjectiveFigure {
  readonly name: string;
  readonly unit: string;
  readonly value: number;
}

/** Where a limit was judged worst. */
export interface Corner {
  /** V. */
  readonly inputVoltage: number;
  /** V. */
  readonly outputVoltage: number;
  /** −1 … 1. */
  readonly load: number;
}

/** One limit, judged. */
export interface LimitFigure {
  readonly name: string;
  readonly unit: string;
  /** What the design has, in `unit`. */
  readonly value: number;
  /** What is allowed, in `unit`. */
  readonly allowed: number;
  /** How far inside, in `unit`: ≥ 0 holds. */
  readonly margin: number;
  /** The margin as a fraction of what is allowed (of the allowed rise for a temperature): ≥ 0 holds. */
  readonly slack: number;
  /** 0 where it holds, else the fraction by which it is missed. */
  readonly violation: number;
  /** Absent where the limit does not depend on the operating point. */
  readonly corner?: Corner;
}

/** Watts of one effect in one part position. */
export interface LossItem {
  /** Slot or body it heats: `highSwitch`, `lowSwitch`, `inductor`, `outputCeramic`, `controller`, `board`, … */
  readonly part: string;
  /** Effect: `conduction`, `overlap`, `outputCharge`, `recovery`, `deadTime`, `gate`, `winding`, `windingAc`, `core`, `seriesResistance`, `quiescent`, … */
  readonly effect: string;
  /** W, all phases together. */
  readonly watts: number;
}

/** A current or voltage over one period as straight segments: value[i] at time[i], closed by value[0] at `period`. */
export interface Trace {
  readonly name: string;
  readonly unit: string;
  /** s. */
  readonly period: number;
  readonly time: readonly number[];
  readonly value: readonly number[];
}

export type Mode = 'continuous' | 'forced-continuous' | 'discontinuous' | 'pulse-skipping' | 'reverse' | 'off';

/** One operating point, whole. */
export interface PointReport extends Corner {
  /** Share of the profile's time; 0 for a point that is only judged. */
  readonly share: number;
  readonly mode: Mode;
  readonly activePhases: number;
  /** On-time of the controlled switch over the period. */
  readonly dutyCycle: number;
  /** Effective switching frequency, Hz (below the set one while skipping). */
  readonly frequency: number;
  /** Peak to peak in one phase's inductor, A. */
  readonly rippleCurrent: number;
  readonly peakCurrent: number;
  readonly valleyCurrent: number;
  /** V peak to peak, nominal capacitances. */
  readonly outputRipple: number;
  readonly inputRipple: number;
  /** W. */
  readonly outputPower: number;
  readonly inputPower: number;
  readonly loss: number;
  /** 0 … 1; 0 at no load. */
  readonly efficiency: number;
  readonly losses: readonly LossItem[];
  /** K by slot. */
  readonly temperatures: Readonly<Record<string, number>>;
  readonly traces: readonly Trace[];
}

/** One line of the parts list. */
export interface PartUse {
  readonly slot: string;
  readonly name: string;
  readonly count: number;
  /** m³, all pieces. */
  readonly volume: number;
  /** m², all pieces. */
  readonly area: number;
  /** m, of the piece. */
  readonly height: number;
  /** kg, all pieces. */
  readonly mass: number;
  /** Currency, all pieces. */
  readonly cost: number;
}

/** A contribution to volume or cost that is not a part: board, heat sink, assembly. */
export interface Share {
  readonly name: string;
  readonly value: number;
}

/** Everything about one design. */
export interface Assessment {
  readonly id: string;
  /** Architecture × phases, such as `buck-synchronous ×2`. */
  readonly family: string;
  readonly design: DesignRecord;
  readonly feasible: boolean;
  readonly objectives: readonly ObjectiveFigure[];
  readonly limits: readonly LimitFigure[];
  /** Smallest margin over all limits as a fraction of what is allowed. */
  readonly worstMargin: number;
  /** Profile points at nominal input first, in the profile's order; then the other corners that were judged. */
  readonly points: readonly PointReport[];
  /** Profile-weighted, at nominal input. */
  readonly losses: readonly LossItem[];
  readonly parts: readonly PartUse[];
  /** m³ by contribution; sums to the volume. */
  readonly volumes: readonly Share[];
  /** Currency by contribution; sums to the cost. */
  readonly costs: readonly Share[];
  /** Efficiency over load at minimum, nominal and maximum input, for plots. */
  readonly efficiencyCurves: readonly {
    readonly inputVoltage: number;
    readonly load: readonly number[];
    readonly efficiency: readonly number[];
  }[];
  readonly cautions: readonly string[];
}
