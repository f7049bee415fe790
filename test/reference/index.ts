/** All published cases. */
import { BUCK } from './buck.ts';
import { CAPACITORS } from './capacitors.ts';
import type { CaseGroup } from './case.ts';
import { CONTROL } from './control.ts';
import { CORE_LOSS } from './core-loss.ts';
import { CORES } from './cores.ts';
import { HEAT } from './heat.ts';
import { MATHS } from './maths.ts';
import { MULTIPHASE } from './multiphase.ts';
import { PROFILE_CASES } from './profiles.ts';
import { SWITCHES } from './switches.ts';
import { TABLES } from './tables.ts';
import { TRANSFORMER } from './transformer.ts';
import { WINDINGS } from './windings.ts';
import { WOUND_PARTS } from './wound-parts.ts';

export { checkCase } from './case.ts';

export const CASES: readonly CaseGroup[] = [
  ...BUCK,
  ...MULTIPHASE,
  ...SWITCHES,
  ...TRANSFORMER,
  ...CORE_LOSS,
  ...WINDINGS,
  ...WOUND_PARTS,
  ...CORES,
  ...CAPACITORS,
  ...CONTROL,
  ...HEAT,
  ...MATHS,
  ...TABLES,
  ...PROFILE_CASES,
];
