/** The kinds of quantity that sheets and tables hold: SI unit, words and an example of each. */

interface Kind {
  /** SI unit that a value has after reading; empty for a bare number. */
  readonly unit: string;
  /** What it is called in a message. */
  readonly words: string;
  /** How a person may write it. */
  readonly example: string;
}

/** Every kind of quantity. */
export const DIMENSIONS = {
  voltage: { unit: 'V', words: 'a voltage', example: '48 V' },
  current: { unit: 'A', words: 'a current', example: '8 A' },
  resistance: { unit: 'Ω', words: 'a resistance', example: '2.8 mΩ' },
  inductance: { unit: 'H', words: 'an inductance', example: '4.7 µH' },
  capacitance: { unit: 'F', words: 'a capacitance', example: '22 µF' },
  frequency: { unit: 'Hz', words: 'a frequency', example: '500 kHz' },
  time: { unit: 's', words: 'a time', example: '50 ns' },
  temperature: { unit: 'K', words: 'a temperature', example: '55 °C' },
  'temperature difference': { unit: 'K', words: 'a temperature difference', example: '40 K' },
  length: { unit: 'm', words: 'a length', example: '8 mm' },
  area: { unit: 'm²', words: 'an area', example: '25 cm²' },
  volume: { unit: 'm³', words: 'a volume', example: '8 cm³' },
  mass: { unit: 'kg', words: 'a mass', example: '30 g' },
  power: { unit: 'W', words: 'a power', example: '50 mW' },
  energy: { unit: 'J', words: 'an energy', example: '175 nJ' },
  charge: { unit: 'C', words: 'a charge', example: '10 nC' },
  fraction: { unit: '', words: 'a share', example: '85 %' },
  slew: { unit: 'A/s', words: 'a slew of current', example: '5 A/µs' },
  'thermal resistance': { unit: 'K/W', words: 'a thermal resistance', example: '2.2 K/W' },
  speed: { unit: 'm/s', words: 'a speed', example: '2 m/s' },
  'change per kelvin': { unit: '1/K', words: 'a change per kelvin', example: '0.005 1/K' },
  'curvature per kelvin': { unit: '1/K²', words: 'a change per kelvin squared', example: '0.0001 1/K²' },
  'voltage per kelvin': { unit: 'V/K', words: 'a change of voltage per kelvin', example: '-1.2 mV/K' },
  'flux density': { unit: 'T', words: 'a flux density', example: '390 mT' },
  density: { unit: 'kg/m³', words: 'a density', example: '4.8 g/cm³' },
  number: { unit: '', words: 'a number without a unit', example: '3' },
} as const satisfies Record<string, Kind>;
export type Dimension = keyof typeof DIMENSIONS;

/** `a voltage such as 48 V`: what a message offers. */
export function exampleOf(dimension: Dimension): string {
  const { words, example } = DIMENSIONS[dimension];
  return `${words} such as ${example}`;
}
