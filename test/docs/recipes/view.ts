/** A view: how many designs each family has on the front. */
import type { Recipe } from './recipe.ts';

export const VIEW: Recipe = {
  heading: 'A view of the page',
  edits: [
    {
      path: 'viz/views/tally.ts',
      text: `/** How many designs each family has on the front. */
import { clear, type Root } from '../marks/root.ts';

export function renderTally<E extends Element>(root: Root<E>, families: readonly string[]): void {
  const table = clear(root).append('table').attr('class', 'tally');
  for (const family of new Set(families)) {
    const row = table.append('tr');
    row.append('th').attr('scope', 'row').text(family);
    row.append('td').text(String(families.filter((one) => one === family).length));
  }
}
`,
    },
    {
      path: 'viz/layout.ts',
      before: "  ['mind', 'Mind'",
      text: "  ['tally', 'How many of each', 'Designs of each family on the front.'],\n",
    },
    {
      path: 'viz/paint.ts',
      before: 'import { renderTemperatures }',
      text: "import { renderTally } from './views/tally.ts';\n",
    },
    {
      path: 'viz/paint.ts',
      before: "  renderMind(place('mind')",
      text: "  renderTally(\n    place('tally'),\n    data.front.designs.map((design) => design.family),\n  );\n",
    },
    { path: 'viz/theme.css', end: true, text: '\n.tally td {\n  text-align: right;\n}\n' },
    {
      path: 'test/viz/gallery.ts',
      before: 'import { renderTemperatures }',
      text: "import { renderTally } from '../../viz/views/tally.ts';\n",
    },
    {
      path: 'test/viz/gallery.ts',
      before: '  mind: (root)',
      text: "  tally: (root) => renderTally(root, ['buck-diode ×1', 'buck-diode ×2', 'buck-diode ×1']),\n",
    },
    {
      path: 'test/viz/drawings/tally.html',
      text: `<table class="tally">
<tr>
<th scope="row">buck-diode ×1</th>
<td>2</td>
</tr>
<tr>
<th scope="row">buck-diode ×2</th>
<td>1</td>
</tr>
</table>
`,
    },
  ],
  besides: ['test/viz/views/'],
};
