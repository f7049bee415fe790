/** Entry of the script inside the page: reads the island, takes the drawn page over. */
import { modelAssessor } from './model-assessor.ts';
import { unpack } from './pack.ts';
import { start } from './start.ts';

const island = document.getElementById('data')?.textContent;
if (island) {
  const data = unpack(island);
  start(document, data, modelAssessor(data));
}
