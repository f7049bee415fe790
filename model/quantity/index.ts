/** Quantities: reading, writing, exact engineering columns. */
export { isDecimal, readDecimal, shiftDecimal } from './decimal.ts';
export { DIMENSIONS, type Dimension, exampleOf } from './dimension.ts';
export { type EngineeringUnit, engineeringText, fromEngineering, toEngineering } from './engineering.ts';
export { formatDifference, formatQuantity } from './format.ts';
export { editDistance, nearest } from './nearest.ts';
export { parseQuantity, type Reading } from './parse.ts';
