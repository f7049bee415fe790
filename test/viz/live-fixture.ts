/** Entry of the script in a test page: the live page over the invented model. */
import { unpack } from '../../viz/pack.ts';
import { start } from '../../viz/start.ts';
import { fixtureAssessor } from './fixture.ts';

const island = document.getElementById('data')?.textContent;
if (island) start(document, unpack(island), fixtureAssessor());
