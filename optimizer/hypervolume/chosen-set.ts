/** A changing set of chosen points that tells what one more point would add to the hypervolume: the common ground of greedy and exchange. */
import { createBoxedContribution } from './boxed.ts';
import { Solids } from './solids.ts';

/** Chosen points, known by number. */
export interface ChosenSet {
  /** Hypervolume the point adds to the chosen ones (the point itself, if among them, not counted). */
  gain(point: number): number;
  add(point: number): void;
  /** The point must be in the set. */
  remove(point: number): void;
}

/** A set for up to `capacity` of the given points (three or four objectives), all inside the reference. */
export function createChosenSet(points: Float64Array, m: number, capacity: number, reference: Float64Array): ChosenSet {
  return m === 4 ? createFourSet(points, capacity, reference) : createThreeSet(points, capacity, reference);
}

function createThreeSet(points: Float64Array, capacity: number, reference: Float64Array): ChosenSet {
  const solids = new Solids(capacity);
  const volume = new Float64Array(1);
  const within = new Uint8Array(points.length / 3);
  return {
    gain(point) {
      solids.exclusive(points, 3 * point, reference, within[point] === 1 ? solids.find(point) : -1, volume);
      return volume[0];
    },
    add(point) {
      solids.insert(points, 3 * point, point);
      within[point] = 1;
    },
    remove(point) {
      solids.removeAt(solids.find(point));
      within[point] = 0;
    },
  };
}

function createFourSet(points: Float64Array, capacity: number, reference: Float64Array): ChosenSet {
  const boxed = createBoxedContribution(capacity);
  const rising = new Int32Array(capacity);
  const volume = new Float64Array(1);
  let count = 0;
  return {
    gain(point) {
      boxed.measure(points, point, rising, count, reference, volume);
      return volume[0];
    },
    add(point) {
      let at = count++;
      for (; at > 0 && points[4 * rising[at - 1] + 3] > points[4 * point + 3]; at--) rising[at] = rising[at - 1];
      rising[at] = point;
    },
    remove(point) {
      const at = rising.indexOf(point);
      rising.copyWithin(at, at + 1, count);
      count--;
    },
  };
}
