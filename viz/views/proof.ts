/** Predicted beside simulated: the design's netlist in a circuit simulator, corner by corner, where that was done. */
import type { Proof, ProofCorner, ProofFigure, ProofLimit } from '../../model/handoff/proof.ts';
import { capital, spokenLimit } from '../labels.ts';
import { clear, type Root } from '../marks/root.ts';
import { loadWords, percent, show } from '../units.ts';

export function renderProof<E extends Element>(root: Root<E>, id: string, proof: Proof | undefined): void {
  clear(root);
  if (proof === undefined) {
    root
      .append('p')
      .attr('class', 'hint')
      .text(
        `Not simulated yet. “chopfront prove”, given the run and ${id}, runs this design’s netlist in a circuit simulator and puts predicted beside simulated here.`,
      );
    return;
  }
  root
    .append('p')
    .attr('class', proof.agrees ? 'kept' : 'flagged')
    .text(verdictOf(proof));
  const table = root.append('table').attr('class', 'ledger proof');
  table.append('caption').attr('class', 'unseen').text('Figures predicted by the model and simulated, by corner');
  const head = table.append('thead').append('tr');
  for (const word of ['Figure', 'predicted', 'simulated', 'apart', 'band'])
    head.append('th').attr('scope', 'col').text(word);
  for (const corner of proof.corners) cornerRows(table, corner);
  if (proof.limits.length > 0) limitRows(table, proof.limits);
}

/** One sentence: whether simulation bears the model out, and where not. */
export function verdictOf(proof: Proof): string {
  if (proof.agrees)
    return `A circuit simulation (${proof.simulator.replace(/ \(.*/, '')}) agrees with the model in every figure.`;
  const figures = proof.corners.flatMap((corner) => corner.figures.filter((figure) => !figure.agrees));
  const names = [...new Set(figures.map((figure) => figure.name))];
  const failed = proof.corners.filter((corner) => corner.failure !== undefined).length;
  const words = [...names, ...(failed > 0 ? [`${failed} corners could not be simulated`] : [])];
  return `Simulation disagrees with the model here: ${words.join(', ')}.`;
}

function cornerRows(table: Root<HTMLTableElement>, corner: ProofCorner): void {
  const body = table.append('tbody');
  const { inputVoltage, outputVoltage, load } = corner;
  const words = `${show(inputVoltage, 'V')} in, ${show(outputVoltage, 'V')} out, ${loadWords(load)}`;
  groupHead(body, corner.failure === undefined ? words : `${words}: ${corner.failure}`);
  for (const figure of corner.figures) figureRow(body.append('tr'), figure);
}

function groupHead(body: Root<HTMLTableSectionElement>, words: string): void {
  body.append('tr').attr('class', 'group').append('th').attr('scope', 'rowgroup').attr('colspan', 5).text(words);
}

function figureRow(row: Root<HTMLTableRowElement>, figure: ProofFigure): void {
  row.attr('class', figure.agrees ? 'within' : 'broken');
  const name = row.append('th').attr('scope', 'row').text(capital(figure.name));
  if (!figure.agrees) name.append('span').attr('class', 'flag').text('disagrees');
  const apart = `${figure.difference < 0 ? '' : '+'}${percent(figure.difference)}`;
  const texts = [show(figure.predicted, figure.unit), show(figure.simulated, figure.unit), apart];
  for (const text of [...texts, `±${percent(figure.band, 0)}`]) row.append('td').text(text);
}

function limitRows(table: Root<HTMLTableElement>, limits: readonly ProofLimit[]): void {
  const body = table.append('tbody');
  groupHead(body, 'The sheet’s limits, in simulation');
  for (const limit of limits) {
    const row = body.append('tr').attr('class', limit.holds ? 'within' : 'broken');
    row
      .append('th')
      .attr('scope', 'row')
      .text(capital(spokenLimit(limit.name)));
    row.append('td').text(`≤ ${show(limit.allowed, limit.unit)}`);
    row.append('td').text(show(limit.simulated, limit.unit));
    row.append('td').text(limit.holds ? 'holds' : 'broken');
    row.append('td').text('');
  }
}
