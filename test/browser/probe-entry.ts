/** Entry of the bundle that a page runs for the tests. */
import { probe } from './probe.ts';

Object.assign(globalThis, { probe });
