/**
 * `npm run evidence`: every check whose expected value comes from outside the code, as one table, to the terminal and to
 * test/evidence.md. Closes with the count; the exit status tells whether all hold. `-- --quick` leaves the searches of minutes out
 * and test/evidence.md as it is.
 */
import { writeFileSync } from 'node:fs';
import { circuitSection } from './evidence/circuit.ts';
import { scenarioSections } from './evidence/scenarios.ts';
import { CASES } from './reference/index.ts';
import { publishedSection, type Section, sourceSection } from './reference/markdown.ts';

const INTRODUCTION = [
  '# Evidence',
  '',
  'What the model says beside what was published or found by other means. Made by `npm run evidence`; do not edit.',
  '',
].join('\n');

const quick = process.argv.includes('--quick');

/** Every section, in the order of printing. */
async function sections(): Promise<readonly Section[]> {
  const searches = quick ? [] : scenarioSections();
  return [publishedSection(CASES), await circuitSection(), ...searches, sourceSection()];
}

const all = await sections();
const passed = all.reduce((sum, section) => sum + section.passed, 0);
const failed = all.reduce((sum, section) => sum + section.failed, 0);
const note = quick ? ['Searches were left out (--quick); test/evidence.md is as it was.', ''] : [];
const count = `${passed} passed, ${failed} failed`;
const text = [INTRODUCTION, ...all.map((section) => section.text), ...note, count, ''].join('\n');
if (!quick) writeFileSync('test/evidence.md', text);
process.stdout.write(text);
process.exitCode = failed === 0 ? 0 : 1;
