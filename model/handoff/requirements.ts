/** What a buyer must know of each part to find a substitute: the least ratings that the sheet and the solved corners ask for. */
import type { Assessment } from '../assessment.ts';
import type { Design } from '../design.ts';
import type { Part } from '../parts/common.ts';
import type { Rail } from '../rail/rail.ts';

/** Needs of one part, SI; absent where they do not apply. */
export interface Requirement {
  /** Resistance Ω, inductance H or capacitance F, with its unit. */
  readonly value?: { readonly amount: number; readonly unit: string };
  /** Rated voltage at least, V. */
  readonly voltage?: number;
  /** Saturation current at least, A. */
  readonly saturation?: number;
  /** Continuous or peak current at least, A. */
  readonly current?: number;
  /** Ripple current at least, A rms, one piece. */
  readonly ripple?: number;
  /** On-resistance or winding resistance at most, Ω. */
  readonly resistance?: number;
  /** Height at most, m. */
  readonly height?: number;
}

/** The needs of the part in `slot`. */
export function requirementOf(design: Design, rail: Rail, assessment: Assessment, slot: string): Requirement {
  const limit = (name: string): number | undefined => assessment.limits.find((one) => one.name === name)?.value;
  const height = rail.limits.height === undefined ? {} : { height: rail.limits.height };
  const bus = rail.input.maximum;
  const { derating } = rail;
  const capacitor = (farads: number, volts: number, share: number, ripple: number | undefined): Requirement => ({
    value: { amount: farads, unit: 'F' },
    voltage: volts / share,
    ...given('ripple', ripple),
    ...height,
  });
  switch (slot) {
    case 'highSwitch':
      return {
        resistance: design.high.onResistance,
        voltage: bus / derating.switchVoltage,
        ...given('current', limit('switchCurrent')),
        ...height,
      };
    case 'lowSwitch': {
      const volts = design.stage.lowBlocking(bus, design.transformer.ratio);
      return { resistance: design.low.onResistance, voltage: volts / derating.switchVoltage, ...height };
    }
    case 'powerStage':
      return { voltage: bus / derating.switchVoltage, ...given('current', limit('switchCurrent')), ...height };
    case 'diode':
      return { voltage: bus / derating.switchVoltage, ...given('current', limit('switchCurrent')), ...height };
    case 'inductor':
      return {
        value: { amount: design.inductance, unit: 'H' },
        ...given('saturation', limit('saturation')),
        resistance: design.inductor.dcResistance,
        current: Math.max(...assessment.points.map((point) => Math.abs(point.peakCurrent))),
        ...height,
      };
    case 'outputCeramic':
      return capacitor(
        design.outputCeramic.capacitance,
        rail.output.maximum,
        derating.ceramicVoltage,
        limit('outputCeramicCurrent'),
      );
    case 'inputCeramic':
      return capacitor(design.inputCeramic.capacitance, bus, derating.ceramicVoltage, limit('inputCeramicCurrent'));
    case 'outputBulk':
      return capacitor(
        design.outputBulk?.capacitance ?? 0,
        rail.output.maximum,
        derating.bulkVoltage,
        over(limit('outputBulkCurrent'), derating.rippleCurrent),
      );
    case 'inputBulk':
      return capacitor(
        design.inputBulk?.capacitance ?? 0,
        bus,
        derating.bulkVoltage,
        over(limit('inputBulkCurrent'), derating.rippleCurrent),
      );
    default:
      return slot === 'controller' ? { voltage: bus, ...height } : height;
  }
}

function over(value: number | undefined, share: number): number | undefined {
  return value === undefined ? undefined : value / share;
}

function given<K extends string>(key: K, value: number | undefined): { readonly [key in K]?: number } {
  return value === undefined ? {} : ({ [key]: value } as { readonly [key in K]?: number });
}

/** Box of a part in words, mm. */
export function boxText(part: Part): string {
  const mm = (metres: number): string => String(Number((1e3 * metres).toPrecision(3)));
  return `${mm(part.length)} x ${mm(part.width)} x ${mm(part.height)}`;
}
