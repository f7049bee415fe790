/** Heat and life of capacitors under ripple current. */
import { expAt } from '../../optimizer/maths/index.ts';

const scratch = new Float64Array(1);
const given = new Float64Array(3);

/**
 * Loss in a group's series resistance, W: I²rms·R. `meanSquareCurrent` A², `resistance` Ω, both of the whole group.
 * @derivation Joule's law
 * @valid resistance near the frequency it is stated for
 * @example seriesLoss(4, 0.002) = 0.008
 */
export function seriesLoss(meanSquareCurrent: number, resistance: number): number {
  return meanSquareCurrent * resistance;
}

/**
 * Self-heating, K: rated rise times (current/rating)². `meanSquareCurrent` A² of one part, `rating` A rms, `ratedRise` K.
 * @derivation loss goes with the square of the current, rise with the loss
 * @valid linear thermal path
 * @example selfHeating(1, 2, 20) = 5
 */
export function selfHeating(meanSquareCurrent: number, rating: number, ratedRise: number): number {
  return (ratedRise * meanSquareCurrent) / (rating * rating);
}

/**
 * Life of an electrolytic capacitor, s: rated life × 2^((Tmax − T)/10 K). `ratedLife` s at `maximumTemperature` K;
 * `temperature` K of the part, self-heating included.
 * @source ncp5314, page 20 (life halves each 10 K)
 * @valid wet electrolytics, 313 K up to the rated temperature
 * @example electrolyticLife(7.2e6, 378.15, 358.15) = 2.88e7
 */
export function electrolyticLife(ratedLife: number, maximumTemperature: number, temperature: number): number {
  given[0] = ratedLife;
  given[1] = maximumTemperature;
  given[2] = temperature;
  electrolyticLifeAt(given);
  return given[0];
}

/**
 * The same for rated life, rated temperature and temperature that stand in `into[0 … 2]`; writes the life to `into[0]`: no double crosses the call.
 * @source ncp5314, page 20 (life halves each 10 K)
 * @valid as `electrolyticLife`
 */
export function electrolyticLifeAt(into: Float64Array): void {
  scratch[0] = (Math.LN2 * (into[1] - into[2])) / 10;
  expAt(scratch, 0);
  into[0] *= scratch[0];
}
