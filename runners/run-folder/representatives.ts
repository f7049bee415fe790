/** Four designs that represent a front: the best in each objective, and a balanced one. */
import type { FrontFile } from '../../model/index.ts';
import type { FrontDesign } from './front.ts';

/** What the best in an objective is called. */
const TITLES: Readonly<Record<string, string>> = {
  loss: 'coolest',
  inefficiency: 'most efficient',
  'full-load-loss': 'coolest at full load',
  volume: 'smallest',
  cost: 'cheapest',
  'board-area': 'least area',
  mass: 'lightest',
};

/** A design with what it is best at. */
export interface Representative {
  readonly title: string;
  readonly design: FrontDesign;
}

/** The best of each objective, then the balanced one; empty for an empty front. */
export function representatives(front: FrontFile): Representative[] {
  const best = front.objectives.flatMap(({ name }, i) => {
    const design = least(front.designs, (one) => one.objectives[i] ?? Infinity);
    return design === undefined ? [] : [{ title: TITLES[name] ?? `least ${name}`, design }];
  });
  const balanced = balancedOf(front);
  return balanced === undefined ? best : [...best, { title: 'balanced', design: balanced }];
}

/** The design with the smallest product of its objectives: a percent more of one weighs as a percent less of another. */
export function balancedOf(front: FrontFile): FrontDesign | undefined {
  return least(front.designs, (one) => one.objectives.reduce((product, value) => product * value, 1));
}

function least(designs: readonly FrontDesign[], of: (design: FrontDesign) => number): FrontDesign | undefined {
  let best = designs[0];
  for (const design of designs) if (best !== undefined && of(design) < of(best)) best = design;
  return best;
}
