/** A core of one material in a design: the loss constant that its Steinmetz parameters give, and its loss under a flux. */
import { pow } from '../../optimizer/maths/index.ts';
import type { Core } from '../parts/core.ts';
import type { Material } from '../parts/material.ts';
import type { Waveform } from '../waveform/waveform.ts';
import { igseAt, igseConstant } from './core-loss.ts';
import { coreTemperatureFactor } from './wound-part.ts';

/** Loss constants of a material, taken once. */
export interface MaterialConstants {
  /** ki of the improved generalized equation. */
  readonly ki: number;
  readonly alpha: number;
  readonly beta: number;
  /** 2^α. */
  readonly doubling: number;
}

/**
 * Constants of `material` for piecewise-linear flux.
 * @source igse-2002
 * @valid as `igseConstant`
 */
export function materialConstants(material: Material): MaterialConstants {
  const { lossCoefficient: k, frequencyExponent: alpha, fluxExponent: beta } = material;
  return { ki: igseConstant(k, alpha, beta), alpha, beta, doubling: pow(2, alpha) };
}

/**
 * The same from `known`, and worked out only where it is not known yet: a search asks for few materials many times.
 * @source igse-2002
 * @valid as `igseConstant`
 */
export function knownConstants(known: Map<Material, MaterialConstants>, material: Material): MaterialConstants {
  let constants = known.get(material);
  if (constants === undefined) {
    constants = materialConstants(material);
    known.set(material, constants);
  }
  return constants;
}

/**
 * Writes to `into[0]` the core loss, W: density under `flux` (T over s, `swing` T peak to peak) × volume × temperature factor.
 * `temperature` K of the core.
 * @source igse-2002
 * @valid inside the material's range: ask `materialViolation`
 */
export function woundCoreLossAt(
  core: Core,
  material: Material,
  constants: MaterialConstants,
  flux: Waveform,
  swing: number,
  temperature: number,
  into: Float64Array,
): void {
  igseAt(constants.ki, constants.alpha, constants.beta, flux, swing, into);
  into[0] *= core.coreVolume * coreTemperatureFactor(material, temperature);
}
