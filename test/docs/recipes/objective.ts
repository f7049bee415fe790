/** An objective: the height of the tallest part. */
import type { Recipe } from './recipe.ts';

export const OBJECTIVE: Recipe = {
  heading: 'An objective',
  edits: [
    { path: 'model/rail/rail.ts', after: 'export const OBJECTIVES = [', text: "'tallness', " },
    {
      path: 'model/objectives.ts',
      after: 'const OFFERS: Readonly<Record<ObjectiveName, Offer>> = {\n',
      text: `  tallness: {
    unit: 'm',
    reference: (rail) => rail.limits.height ?? 0.1,
    write: (e, into, k) => {
      into[k] = e.assembly.height;
    },
  },
`,
    },
    {
      path: 'viz/labels.ts',
      after: 'export const OBJECTIVE_WORDS: Readonly<Record<string, string>> = {\n',
      text: "  tallness: 'height of the tallest part',\n",
    },
    {
      path: 'viz/bands.ts',
      before: "  return objective === 'cost'",
      text: "  if (objective === 'tallness') return 0;\n",
    },
    {
      path: 'model/representatives.ts',
      after: 'const TITLES: Readonly<Record<string, string>> = {\n',
      text: "  tallness: 'flattest',\n",
    },
    { path: 'README.md', before: '`board-area` and `mass`; all', text: '`tallness`, ' },
  ],
  besides: [],
};
