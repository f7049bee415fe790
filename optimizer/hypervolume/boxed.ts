/**
 * The volume one point of four objectives dominates alone: its own box less what the others, pushed into that box, dominate there
 * (the limit set of While, Bradstreet, Barone 2012). Kernel.
 */
import { Solids } from './solids.ts';

/** Measures single contributions in four objectives; owns its scratch. */
export interface BoxedContribution {
  /**
   * Writes to `volume[0]` what the point points[4·self …] dominates alone below `reference`, the others being the `n` points named in `rising`,
   * ascending in the fourth objective (`self` among them is passed over). O(N²) at worst, nearer O(N) as few points reach into one box.
   */
  measure(
    points: Float64Array,
    self: number,
    rising: Int32Array,
    n: number,
    reference: Float64Array,
    volume: Float64Array,
  ): void;
}

/** A measure for sets of up to `capacity` points. */
export function createBoxedContribution(capacity: number): BoxedContribution {
  const solids = new Solids(capacity);
  const pushed = new Float64Array(4);
  const added = new Float64Array(1);
  return {
    measure(points, self, rising, n, reference, volume) {
      const at = 4 * self;
      let left = 1;
      for (let c = 0; c < 4; c++) left *= reference[c] - points[at + c];
      solids.count = 0;
      for (let k = 0; k < n; k++) {
        const other = 4 * rising[k];
        if (other === at) continue;
        let within = 0;
        for (let c = 0; c < 4; c++) {
          const value = points[other + c];
          if (value > points[at + c]) pushed[c] = value;
          else {
            pushed[c] = points[at + c];
            within++;
          }
        }
        if (within === 4) {
          volume[0] = 0;
          return;
        }
        solids.exclusive(pushed, 0, reference, -1, added);
        if (added[0] === 0) continue;
        left -= added[0] * (reference[3] - pushed[3]);
        solids.removeDominated(pushed, 0);
        solids.insert(pushed, 0, 0);
      }
      // Rounding may leave a hair below zero where almost nothing is left.
      volume[0] = Math.max(left, 0);
    },
  };
}
