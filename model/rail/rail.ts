/** A rail sheet after reading: every quantity in SI base units (temperatures in kelvin), every default filled in. */
import type { Architecture } from '../stages/list.ts';

/** What the input source and the output hold: their smallest, usual and largest voltage, V. */
export interface VoltageRange {
  readonly minimum: number;
  readonly nominal: number;
  readonly maximum: number;
}

/** One point of the load profile. */
export interface LoadPoint {
  /** Load current over the full-load current, −1 … 1; negative runs power from output to input; 0 is no load. */
  readonly fraction: number;
  /** Share of the time spent there, above 0 … 1; all shares of a profile sum to 1. */
  readonly share: number;
}

/** What the stage does when the load is light. */
export type LightLoadPolicy = 'forced-continuous' | 'diode-emulation' | 'phase-shedding';

/** Objectives that the model offers; all are minimised. */
export const OBJECTIVES = ['loss', 'inefficiency', 'volume', 'cost', 'board-area', 'mass', 'full-load-loss'] as const;
export type ObjectiveName = (typeof OBJECTIVES)[number];

/** A change of load that the output must ride through. */
export interface LoadStep {
  /** Size of the step, A. */
  readonly current: number;
  /** Slew of the load current, A/s. */
  readonly slew: number;
  /** Largest excursion allowed to either side, V. */
  readonly deviation: number;
}

/** A band of frequencies that no switching frequency (nor, where asked, its harmonics) may fall into. */
export interface AvoidedBand {
  /** Hz. */
  readonly from: number;
  /** Hz. */
  readonly to: number;
  /** Highest harmonic of the switching frequency that must stay out too; 1 for the fundamental alone. */
  readonly harmonics: number;
}

/** Least efficiency asked for at one load. */
export interface EfficiencyLimit {
  /** Load fraction, −1 … 1, not 0. */
  readonly load: number;
  /** 0 … 1, judged at nominal input. */
  readonly atLeast: number;
}

/** Limits that a sheet may set beside those that physics and parts set; absent ones do not bind. */
export interface SheetLimits {
  /** Tallest part, m. */
  readonly height?: number;
  /** Whole converter, m³. */
  readonly volume?: number;
  /** Board area, m². */
  readonly boardArea?: number;
  /** kg. */
  readonly mass?: number;
  /** In the sheet's currency. */
  readonly cost?: number;
  readonly efficiency: readonly EfficiencyLimit[];
  /** Shortest on-time that may be planned with, whatever the controller promises, s. */
  readonly minimumOnTime?: number;
  /** Input power at no load and nominal input, W. */
  readonly noLoadPower?: number;
  /** Shortest life of wet electrolytic capacitors over the load profile at the sheet's ambient, usual values, s. */
  readonly life?: number;
}

/** Worst-case deviations, each a fraction above 0 (0.2 is ±20 %). */
export interface Tolerances {
  /** Inductance against its row, beside the row's own tolerance (the larger counts). */
  readonly inductance: number;
  /** Capacitance against its row, beside the row's own tolerance (the larger counts). */
  readonly capacitance: number;
  /** Switching frequency. */
  readonly oscillator: number;
  /** On-resistance of switches at a given temperature. */
  readonly onResistance: number;
}

/** Shares of ratings that may be used, each 0 … 1. */
export interface Derating {
  /** Switch and diode voltage. */
  readonly switchVoltage: number;
  /** Ceramic capacitor voltage. */
  readonly ceramicVoltage: number;
  /** Bulk capacitor voltage. */
  readonly bulkVoltage: number;
  /** Bulk capacitor ripple current. */
  readonly rippleCurrent: number;
  /** Kelvin kept below every rated temperature. */
  readonly temperature: number;
}

/** The space to search. */
export interface SearchRange {
  readonly architectures: readonly Architecture[];
  /** 1 … 8. */
  readonly phases: { readonly minimum: number; readonly maximum: number };
  /** Switching frequency of one switch, Hz. */
  readonly frequency: { readonly minimum: number; readonly maximum: number };
  /** Per-phase inductance, H. */
  readonly inductance: { readonly minimum: number; readonly maximum: number };
  /** Whether chokes wound to order on a core of the tables are searched beside stocked ones. */
  readonly woundChokes?: boolean;
  /** Most dice in parallel in one switch position. */
  readonly parallelSwitches: number;
  /** Most ceramic capacitors at output and at input, each. */
  readonly ceramics: number;
  /** Most bulk capacitors at output and at input, each. */
  readonly bulks: number;
}

/** Which parts may be used. Tables are named as in the sheet; `built-in` is the shipped set. */
export interface PartsChoice {
  readonly tables: readonly string[];
  /** Names of parts that must not be used. */
  readonly barred: readonly string[];
  /** Names of parts that alone may be used for their kind, where any of the kind is named. */
  readonly preferred: readonly string[];
}

/** Advanced settings of the search; every one has a default that suits. */
export interface SearchSettings {
  readonly islands: number;
  readonly population: number;
  readonly epochGenerations: number;
  /** Designs kept for the page. */
  readonly frontSize: number;
}

/** Everything the engineer asked for. */
export interface Rail {
  readonly name: string;
  /** Three letters, shown beside every price. */
  readonly currency: string;
  /** Pieces bought, which chooses the price break. */
  readonly quantity: number;
  readonly input: VoltageRange & {
    /** Resistance of the source, Ω. */
    readonly sourceResistance: number;
    /** Inductance of the source, H. */
    readonly sourceInductance: number;
    /** Largest peak-to-peak voltage ripple at the input terminals, V; absent where none is asked. */
    readonly ripple?: number;
    /** Largest ripple current that may flow in the source, A peak to peak; a filter choke is added where it asks for one. */
    readonly sourceRipple?: number;
    /** Whether the source can take power back. */
    readonly takesPower: boolean;
  };
  readonly output: VoltageRange & {
    /** Full-load current, A. */
    readonly current: number;
    /** Largest peak-to-peak voltage ripple, V. */
    readonly ripple: number;
    /** Whether the output is a battery or another source of its own. */
    readonly battery: boolean;
  };
  readonly step?: LoadStep;
  readonly profile: readonly LoadPoint[];
  readonly lightLoad: LightLoadPolicy;
  /** Highest ambient temperature, K: limits are judged here. */
  readonly ambient: number;
  /** Speed of the air over the board, m/s, 0 … 5; 0 is still air. */
  readonly airSpeed: number;
  /** Area of the board that carries heat away, m². */
  readonly coolingArea: number;
  readonly limits: SheetLimits;
  readonly avoid: readonly AvoidedBand[];
  readonly tolerances: Tolerances;
  readonly derating: Derating;
  readonly search: SearchRange;
  readonly objectives: readonly ObjectiveName[];
  readonly parts: PartsChoice;
  /** Spec files of designs that exist already: the search starts from them and the results are compared with them. */
  readonly incumbents?: readonly string[];
  readonly settings: SearchSettings;
}
