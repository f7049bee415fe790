/** A heat sink: its volume for a wanted thermal resistance, by air speed. */

/** Volumetric resistance, m³·K/W, by air speed, m/s: middle of the published bands 500–800, 150–250 and 80–150 cm³·K/W. */
export const VOLUMETRIC_RESISTANCE: readonly { readonly airSpeed: number; readonly value: number }[] = [
  { airSpeed: 0, value: 650e-6 },
  { airSpeed: 1, value: 200e-6 },
  { airSpeed: 2.5, value: 115e-6 },
];

/**
 * Volumetric thermal resistance of an extruded heat sink, m³·K/W, at `airSpeed` m/s: straight between the table's points, constant beyond 2.5 m/s.
 * @source lee-1995, table of volumetric resistance by air speed
 * @valid 0 to 2.5 m/s; sinks of about 0.1 to 1 L, 50 K rise
 * @example volumetricResistance(0.5) = 4.25e-4
 */
export function volumetricResistance(airSpeed: number): number {
  const v = Math.min(2.5, Math.max(0, airSpeed));
  return v < 1 ? 650e-6 - 450e-6 * v : 200e-6 - (85e-6 / 1.5) * (v - 1);
}

/**
 * Heat sink volume, m³: volumetric resistance over wanted resistance. `resistance` K/W; 0 where none is needed (Infinity).
 * @source lee-1995
 * @valid as `volumetricResistance`
 * @example sinkVolume(2, 1) = 1e-4
 */
export function sinkVolume(resistance: number, airSpeed: number): number {
  return volumetricResistance(airSpeed) / resistance;
}

/**
 * The same by a cooling-system performance index, m³: 1/(R·index). `resistance` K/W, `index` W/(K·m³): 10 to 25 W/(K·dm³) for
 * optimised forced-air sinks.
 * @source drofenik-kolar, cooling system performance index
 * @valid forced air
 * @example sinkVolumeByIndex(1, 2e4) = 5e-5
 */
export function sinkVolumeByIndex(resistance: number, index: number): number {
  return 1 / (resistance * index);
}

/** Aluminium over the boxed volume of an extruded sink. Common practice, no source. */
const FILL = 0.3;
/** kg/m³. */
const ALUMINIUM_DENSITY = 2700;
/** Currency per m³ of boxed volume (30 a litre), fixing included. Common practice, no source. */
const SINK_PRICE = 3e4;

/**
 * Mass of a sink, kg, from its boxed `volume` m³.
 * @derivation three tenths of the box are aluminium (common practice, no source)
 * @valid extruded sinks
 * @example sinkMass(1e-4) = 0.081
 */
export function sinkMass(volume: number): number {
  return FILL * ALUMINIUM_DENSITY * volume;
}

/**
 * Cost of a sink, currency, from its boxed `volume` m³: in proportion, so that a sink may begin at nothing without a jump.
 * @derivation 30 a litre (common practice, no source)
 * @valid thousands of pieces
 * @example sinkCost(1e-4) = 3
 */
export function sinkCost(volume: number): number {
  return SINK_PRICE * volume;
}
