/** Published cost models of large capacitors: a check on the prices of invented parts. */

/**
 * Electrolytic capacitor, EUR: b·Vr + c·C·Vr², b = 1.437e-3 EUR/V, c = 24.757e-3 EUR/(F·V²) (the exponent in public copies does not
 * fit its dimensions; this one does). `capacitance` F, `ratedVoltage` V.
 * @source burkart-kolar-2013, electrolytic capacitors
 * @valid 200 V to 500 V, high volume, prices of 2013
 * @example electrolyticCost(470e-6, 450) = 3.0029
 */
export function electrolyticCost(capacitance: number, ratedVoltage: number): number {
  return 1.437e-3 * ratedVoltage + 24.757e-3 * capacitance * ratedVoltage * ratedVoltage;
}

/**
 * Film capacitor, EUR: a + b·Vr + c·C, a = −1.022 EUR, b = 2.426e-3 EUR/V, c = 54.956e3 EUR/F. `capacitance` F, `ratedVoltage` V.
 * @source burkart-kolar-2013, film capacitors
 * @valid 450 V to 1100 V, high volume, prices of 2013
 * @example filmCost(10e-6, 1000) = 1.9536
 */
export function filmCost(capacitance: number, ratedVoltage: number): number {
  return -1.022 + 2.426e-3 * ratedVoltage + 54.956e3 * capacitance;
}
