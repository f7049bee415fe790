/** The model beside a general-purpose circuit simulator: hand-made bucks, and the exported netlists of twenty designs. */
import { agreesWith, fullLoad, solveAt, stageNetlist } from '../../model/index.ts';
import { conductionIn, readFigure } from '../../runners/simulate/figures.ts';
import { nativePath, nativeSimulator } from '../../runners/simulate/native.ts';
import { packagedSimulator } from '../../runners/simulate/packaged.ts';
import type { Simulator } from '../../runners/simulate/run.ts';
import { simulatorComparisons } from '../circuit/comparisons.ts';
import { type FoundDesign, foundDesigns } from '../circuit/designs.ts';
import type { Section } from '../reference/markdown.ts';
import { line } from './section.ts';

/** Band of the conduction loss, as the other bands stand in the netlist's own predictions. */
const CONDUCTION = 0.03;

interface Compared {
  readonly case: string;
  readonly quantity: string;
  readonly unit: string;
  readonly model: number;
  readonly simulated: number;
  readonly tolerance: number;
  readonly passed: boolean;
}

/** Both tables. The system's simulator runs the designs where it is, else the packaged one. */
export async function circuitSection(): Promise<Section> {
  const path = nativePath();
  const simulator = path === undefined ? await packagedSimulator() : nativeSimulator(path);
  if (simulator === undefined) throw new Error('the packaged simulator is a dependency of the evidence');
  const rows: Compared[] = [...(await simulatorComparisons())];
  for (const design of foundDesigns()) rows.push(...(await compareDesign(design, simulator)));
  const passed = rows.filter((row) => row.passed).length;
  const head = [
    '| case | quantity | unit | model | simulated | difference | tolerance | |',
    '|---|---|---|---|---|---|---|---|',
  ];
  const text = [
    '## The model beside a circuit simulator',
    '',
    'Ideal switches prove waveforms, conduction and ripple; they cannot prove switching or core loss. A figure that is a bound agrees',
    'when the simulated one is below it; ripples below a twentieth of what a sheet allows do not count.',
    '',
    ...head,
    ...rows.map(rowText),
    '',
  ].join('\n');
  return { text, passed, failed: rows.length - passed };
}

async function compareDesign({ name, problem, genes }: FoundDesign, simulator: Simulator): Promise<Compared[]> {
  const netlist = stageNetlist(problem, problem.id(genes), solveAt(problem, genes, fullLoad(problem.rail)));
  const run = await simulator.run(netlist.text);
  const figures = netlist.predictions.map((prediction): Compared => {
    const simulated = readFigure(run, prediction);
    const { name: quantity, unit, value: model, band: tolerance } = prediction;
    return { case: name, quantity, unit, model, simulated, tolerance, passed: agreesWith(prediction, simulated) };
  });
  const loss = conductionIn(run, netlist.losses);
  const passed = Math.abs(netlist.conduction / loss - 1) <= CONDUCTION;
  const conduction = { model: netlist.conduction, simulated: loss, tolerance: CONDUCTION, passed };
  return [...figures, { case: name, quantity: 'conduction loss', unit: 'W', ...conduction }];
}

function rowText({ case: where, quantity, unit, model, simulated, tolerance, passed }: Compared): string {
  const digits = (value: number): string => Number(value.toPrecision(5)).toString();
  const percent = (share: number): string => `${(100 * share).toFixed(2)} %`;
  const difference = percent(model / simulated - 1);
  const verdict = passed ? 'holds' : '**fails**';
  return line([where, quantity, unit, digits(model), digits(simulated), difference, percent(tolerance), verdict]);
}
