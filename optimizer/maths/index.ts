/** Portable elementary functions: the same bits on every engine, in every thread and in the page. */
export { atan } from './atan.ts';
export { exp, expAt } from './exp.ts';
export { expm1 } from './expm1.ts';
export { cosh, sinh, tanh } from './hyperbolic.ts';
export { log, logAt } from './log.ts';
export { log2, log10 } from './log2.ts';
export { pow, powAt } from './pow.ts';
export { cbrt, hypot } from './roots.ts';
export { tan } from './tan.ts';
export { cos, cosAt, sin, sinAt, sincosAt } from './trig.ts';
