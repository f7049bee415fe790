/** A part kind: a fuse at the input. */
import type { Recipe } from './recipe.ts';

const TYPE = "import type { Fuse } from './fuse.ts';\n";

export const PART_KIND: Recipe = {
  heading: 'A part kind',
  edits: [
    {
      path: 'model/parts/fuse.ts',
      text: `/** A fuse in the input line. */
import type { Part } from './common.ts';

export interface Fuse extends Part {
  /** A. */
  readonly currentRating: number;
}
`,
    },
    {
      path: 'model/parts/columns/fuses.ts',
      text: `/** Columns of a table of fuses. */
import { BOX_COLUMNS, positive, type TableSchema, word } from '../column.ts';
import type { Fuse } from '../fuse.ts';

export const FUSE_SCHEMA: TableSchema<Fuse> = {
  priced: true,
  columns: { name: word('name'), currentRating: positive('current', 'A', 'current', 1000), ...BOX_COLUMNS },
  checks: [],
};
`,
    },
    {
      path: 'model/parts/schemas.ts',
      before: 'import { INDUCTOR_SCHEMA }',
      text: "import { FUSE_SCHEMA } from './columns/fuses.ts';\n",
    },
    { path: 'model/parts/schemas.ts', after: '  powerStages: POWER_STAGE_SCHEMA,\n', text: '  fuses: FUSE_SCHEMA,\n' },
    { path: 'model/parts/schemas.ts', after: "  'powerStages',\n", text: "  'fuses',\n" },
    { path: 'model/parts/tables.ts', before: 'import type { Inductor }', text: TYPE },
    {
      path: 'model/parts/tables.ts',
      after: '  readonly powerStages: readonly PowerStage[];\n',
      text: '  readonly fuses: readonly Fuse[];\n',
    },
    {
      path: 'model/parts/join.ts',
      after: "    powerStages: rowsOf(tables, 'powerStages'),\n",
      text: "    fuses: rowsOf(tables, 'fuses'),\n",
    },
    {
      path: 'model/parts/meanings.ts',
      before: '  diodes: {\n',
      text: "  fuses: { name: NAME, currentRating: 'rated current', ...BOX },\n",
    },
    { path: 'model/parts/trends.ts', after: '  powerStages: [],\n', text: '  fuses: [],\n' },
    {
      path: 'model/tables/fuses.csv',
      text: `# Fuses of no maker: invented for this example, price rising with the current.
name,current [A],length [mm],width [mm],height [mm],mass [mg],price_1 [EUR],price_100 [EUR]
FU-4,4,3.2,1.6,0.6,8,0.2,0.1
FU-10,10,6.1,2.7,2.6,60,0.4,0.2
`,
    },
    {
      path: 'model/parts/built-in.ts',
      after: "  { kind: 'powerStages', file: 'power-stages.csv' },\n",
      text: "  { kind: 'fuses', file: 'fuses.csv' },\n",
    },
    {
      path: 'model/catalogue.ts',
      before: 'import type { Inductor }',
      text: "import type { Fuse } from './parts/fuse.ts';\n",
    },
    {
      path: 'model/catalogue.ts',
      after: 'export interface Catalogue {\n',
      text: '  /** By rising price. */\n  readonly fuses: readonly Fuse[];\n',
    },
    {
      path: 'model/catalogue.ts',
      after: '  const catalogue: Catalogue = {\n',
      text: '    fuses: sortBy(usable(rail, tables.fuses), (row) => priceAt(row, rail.quantity)),\n',
    },
    {
      path: 'model/catalogue.ts',
      after: '    powerStages: alike(tables.powerStages),\n',
      text: '    fuses: alike(tables.fuses),\n',
    },
    { path: 'model/genes.ts', before: '] as const;\nexport type GeneName', text: "  'fuse',\n" },
    { path: 'model/genes.ts', after: 'const NAMED_GENES: readonly GeneName[] = [\n', text: "  'fuse',\n" },
    {
      path: 'model/genes.ts',
      after: '  const genes: Record<GeneName, Gene> = {\n',
      text: "    fuse: ordered('fuse', catalogue.fuses),\n",
    },
    {
      path: 'model/record.ts',
      after: 'const SLOTS: readonly (readonly [GeneName, string])[] = [\n',
      text: "  ['fuse', 'fuse'],\n",
    },
    {
      path: 'model/problem.ts',
      before: "    if (name === 'powerStage') return packaged;\n",
      text: "    if (name === 'fuse') return catalogue.fuses.length > 0;\n",
    },
    {
      path: 'model/design.ts',
      before: 'import type { Inductor }',
      text: "import type { Fuse } from './parts/fuse.ts';\n",
    },
    { path: 'model/design.ts', after: 'export class Design {\n', text: '  fuse: Fuse | undefined;\n' },
    {
      path: 'model/design.ts',
      before: '  design.outputCeramic = catalogue',
      text: '  design.fuse = catalogue.fuses[genes[GENE.fuse]];\n',
    },
    {
      path: 'model/parts-list.ts',
      before: "  put(list, 'controller'",
      text: "  if (design.fuse !== undefined) put(list, 'fuse', design.fuse, 1);\n",
    },
    { path: 'viz/labels.ts', before: "  controller: 'controller',\n", text: "  fuse: 'fuse',\n" },
    { path: 'README.md', before: '| `controllers.csv` |', text: '| `fuses.csv` | fuses |\n' },
  ],
  besides: ['model/snap.ts', 'model/ledger.ts', 'model/point.ts'],
};
