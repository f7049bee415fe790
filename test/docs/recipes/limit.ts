/** A limit that the sheet sets: the number of parts to place. */
import type { Recipe } from './recipe.ts';

export const LIMIT: Recipe = {
  heading: 'A limit',
  edits: [
    {
      path: 'model/limits/list.ts',
      before: '] as const;',
      text: "  most('placements', '', (rail) => rail.limits.placements !== undefined),\n",
    },
    {
      path: 'model/limits/construction.ts',
      before: '  if (limits.height !== undefined)',
      text: `  if (limits.placements !== undefined) {
    book.judge(places.placements, assembly.placements, limits.placements, -1);
  }
`,
    },
    {
      path: 'model/rail/schema.ts',
      after: 'const limits = keyed({\n',
      text: '  placements: count(1, 10000).optional(),\n',
    },
    {
      path: 'model/rail/rail.ts',
      after: 'export interface SheetLimits {\n',
      text: '  /** Parts to place. */\n  readonly placements?: number;\n',
    },
    {
      path: 'model/rail/build.ts',
      before: '    efficiency: limits.efficiency.map',
      text: '    ...(limits.placements === undefined ? {} : { placements: limits.placements }),\n',
    },
    { path: 'model/rail/starter.ts', before: '  efficiency:\n', text: '  # placements: 40       # parts to place\n' },
    {
      path: 'viz/labels.ts',
      after: 'export const LIMITS: Readonly<Record<string, string>> = {\n',
      text: "  placements: 'parts to place',\n",
    },
  ],
  besides: ['model/limits/point.ts', 'model/limits/magnetics.ts', 'model/rail/diff.ts'],
};
