export { contain } from './contain.ts';
export { crossover } from './crossover.ts';
export { differential } from './differential.ts';
export { mutate } from './mutation.ts';
export type { Operator } from './operator.ts';
export { refineMember, stepAround } from './refinement.ts';
export { drawOperator, learn } from './shares.ts';
export { createSpace, LINE, type Space, toCoordinates, toGenes } from './space.ts';
