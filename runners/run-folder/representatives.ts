/** Designs that represent a front: the best in each objective, and a balanced one. */
import { type FrontFile, representativesOf } from '../../model/index.ts';
import type { FrontDesign } from './front.ts';

/** A design with what it is best at. */
export interface Representative {
  readonly title: string;
  readonly design: FrontDesign;
}

/** The best of each objective, then the balanced one; empty for an empty front. */
export function representatives(front: FrontFile): Representative[] {
  const names = front.objectives.map(({ name }) => name);
  const values = front.designs.map(({ objectives }) => objectives);
  return representativesOf(names, values).flatMap(({ title, index }) => {
    const design = front.designs[index];
    return design === undefined ? [] : [{ title, design }];
  });
}

/** The balanced design; undefined for an empty front. */
export function balancedOf(front: FrontFile): FrontDesign | undefined {
  return representatives(front).at(-1)?.design;
}
