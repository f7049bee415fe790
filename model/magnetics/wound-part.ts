/** What a wound part's core loses and stands: material at a temperature, its valid range, its weight of copper. */
import type { Material } from '../parts/material.ts';

/**
 * Core loss at a temperature over that at 100 °C: 1 + c1·θ + c2·θ², θ = T − 373.15 K, never below a tenth. `material` c1 in 1/K, c2 in
 * 1/K²; `temperature` K.
 * @source ferroxcube-2008, form of the loss polynomial (there about 0 °C)
 * @valid 273 K to 420 K
 */
export function coreTemperatureFactor(material: Material, temperature: number): number {
  const theta = temperature - 373.15;
  return Math.max(0.1, 1 + theta * (material.lossSlope + material.lossCurvature * theta));
}

/**
 * Fraction by which an operating point lies outside the range of a material's loss parameters; 0 inside. `frequency` Hz, `peakFlux` T.
 * @derivation a fitted law is never extrapolated: outside its range is a violation
 * @valid frequency above 0
 */
export function materialViolation(material: Material, frequency: number, peakFlux: number): number {
  const high = frequency / material.frequencyMaximum - 1;
  const low = material.frequencyMinimum / frequency - 1;
  const flux = peakFlux / material.fluxMaximum - 1;
  return Math.max(0, high, low, flux);
}

/**
 * Copper mass of a winding, kg: density·l·N·A. `turns`, `turnLength` m, `copperArea` m² of one turn.
 * @derivation volume times density of copper, 8890 kg/m³ (IEC 60028)
 * @valid insulation neglected
 * @example copperMass(10, 0.05, 1e-6) = 0.004445
 */
export function copperMass(turns: number, turnLength: number, copperArea: number): number {
  return 8890 * turns * turnLength * copperArea;
}

/**
 * Cost of a wound part, currency: (core + winding + labour)/(1 − margin). `coreMass` kg at `corePrice` a kg; `windingMass` kg at
 * `windingPrice` a kg plus `windingFixed`; labour `labourPrice` a kg of winding plus `labourFixed`; `margin` fraction.
 * @source burkart-kolar-2013, inductors and transformers
 * @valid high volume, prices of 2013
 * @example woundCost(0.1, 5.5, 0.05, 10, 1, 7, 2, 0.25) = 5.8666667
 */
export function woundCost(
  coreMass: number,
  corePrice: number,
  windingMass: number,
  windingPrice: number,
  windingFixed: number,
  labourPrice: number,
  labourFixed: number,
  margin: number,
): number {
  Object.assign(paid, {
    coreMass,
    corePrice,
    windingMass,
    windingPrice,
    windingFixed,
    labourPrice,
    labourFixed,
    margin,
  });
  woundCostAt(paid);
  return paid.cost;
}

/** Masses, kg, and prices of a wound part, as `woundCost` takes them, and the cost that they come to. */
export interface WoundBill {
  coreMass: number;
  corePrice: number;
  windingMass: number;
  windingPrice: number;
  windingFixed: number;
  labourPrice: number;
  labourFixed: number;
  margin: number;
  cost: number;
}

/** One to be filled: all ½. */
export function createWoundBill(): WoundBill {
  const masses = { coreMass: 0.5, corePrice: 0.5, windingMass: 0.5, windingPrice: 0.5, windingFixed: 0.5 };
  return { ...masses, labourPrice: 0.5, labourFixed: 0.5, margin: 0.5, cost: 0.5 };
}

const paid = createWoundBill();

/**
 * Writes `bill.cost`, as `woundCost`: no double crosses the call.
 * @source burkart-kolar-2013, inductors and transformers
 * @valid as `woundCost`
 */
export function woundCostAt(bill: WoundBill): void {
  const core = bill.coreMass * bill.corePrice;
  const winding = bill.windingMass * bill.windingPrice + bill.windingFixed;
  const labour = bill.windingMass * bill.labourPrice + bill.labourFixed;
  bill.cost = (core + winding + labour) / (1 - bill.margin);
}

/**
 * Hottest spot of a wound part over its surroundings, K: surface rise plus a tenth. `surfaceRise` K.
 * @derivation inner gradient taken as a tenth of the surface rise (common practice, no source)
 * @valid parts below 100 cm³
 * @example hotSpotRise(40) = 44
 */
export function hotSpotRise(surfaceRise: number): number {
  return 1.1 * surfaceRise;
}
