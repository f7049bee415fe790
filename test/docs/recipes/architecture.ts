/** An architecture: a synchronous buck that may use half of each period. */
import type { Recipe } from './recipe.ts';

export const ARCHITECTURE: Recipe = {
  heading: 'An architecture',
  edits: [
    {
      path: 'model/stages/half-duty-buck.ts',
      text: `/** A synchronous buck whose high driver is charged while the low switch conducts, for half of each period at least. */
import { buckSynchronous } from './buck.ts';
import type { Stage } from './contract.ts';

export const halfDutyBuck: Stage<'half-duty-buck'> = {
  ...buckSynchronous,
  architecture: 'half-duty-buck',
  words: 'half-duty buck',
  packagedLegs: false,
  highestDuty: 0.5,
  refusal: (rail) =>
    rail.output.maximum < 0.5 * rail.input.minimum ? undefined : 'the output is above half of the input',
};
`,
    },
    {
      path: 'model/stages/list.ts',
      before: 'import { halfBridgeCentreTap',
      text: "import { halfDutyBuck } from './half-duty-buck.ts';\n",
    },
    { path: 'model/stages/list.ts', before: '] as const;', text: '  halfDutyBuck,\n' },
    { path: 'README.md', after: '(`buck-synchronous`, `buck-diode`', text: ', `half-duty-buck`' },
  ],
  besides: [
    'model/stages/contract.ts',
    'model/stages/transformer-stages.ts',
    'model/genes.ts',
    'model/snap.ts',
    'model/record.ts',
    'test/reference/',
    'test/circuit/',
    'model/handoff/netlist/',
    'test/docs/links.test.ts',
  ],
};
