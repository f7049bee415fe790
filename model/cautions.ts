/**
 * Cautions that a sheet or a result calls for, in plain words. The tool plans; it does not certify: every caution defers to
 * local codes and licensed practice.
 */
import type { PointReport } from './assessment.ts';
import type { Rail } from './rail/rail.ts';

/** Dc voltage above which touch is dangerous, V: the limit of class ES1 in IEC 62368-1 (from memory). */
export const TOUCH_VOLTAGE = 60;
/** Surface temperature above which a caution is shown, K: 70 °C, metal touched briefly (common practice, no source). */
const TOUCH_TEMPERATURE = 343.15;

/** What every result carries. */
export const STANDING_CAUTION =
  'Every figure comes from a model with stated tolerances: build and measure before release.';

/** What the tool does not cover, for `check`, page and notes. */
export const NOT_COVERED: readonly string[] = [
  'two-stage buses',
  'resonant stages',
  'coupled inductors',
  'isolation design',
  'electromagnetic compliance',
  'layout',
];

/** The cautions for `rail` and, where given, the solved points of a design. */
export function cautionsOf(rail: Rail, points: readonly PointReport[] = []): string[] {
  const cautions: string[] = [];
  const highest = Math.max(rail.input.maximum, rail.output.maximum);
  if (highest > TOUCH_VOLTAGE) {
    cautions.push(
      `Shock: ${highest} V dc is above ${TOUCH_VOLTAGE} V, the usual touch-safety line. Isolation, creepage and clearance ` +
        'are not designed here, even with a transformer in the design; follow local codes and licensed practice.',
    );
  }
  if (rail.output.battery || rail.input.takesPower) {
    cautions.push(
      'Stored energy: batteries, supercapacitors and large capacitor banks drive very large short-circuit currents; ' +
        'fusing and disconnection are yours to design to local codes.',
    );
  }
  if (rail.profile.some((point) => point.fraction < 0)) {
    cautions.push(
      'Reverse power: the input source must be able to absorb what flows back; if it cannot, its voltage rises.',
    );
  }
  if (points.some((point) => Math.max(...Object.values(point.temperatures)) > TOUCH_TEMPERATURE)) {
    cautions.push(
      "Hot surfaces: parts run above 70 °C in the worst case; check the touch-temperature limits of the product's own " +
        'safety standard.',
    );
  }
  cautions.push(STANDING_CAUTION);
  return cautions;
}
