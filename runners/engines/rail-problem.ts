/** The problem of a rail, built in a worker from the texts it was born with (see protocol.ts). */
import { type InputTexts, problemOf, readInputs } from '../inputs.ts';
import type { CreateProblem } from './protocol.ts';

/** Builds the problem from `InputTexts`. Throws where the texts are not those of a readable sheet. */
export const createProblem: CreateProblem = (source) => problemOf(readInputs(source as InputTexts));
