/** What a simulation of a design's netlist is held to: the model's figures within their bands, and the limits of its sheet. */

import { BANDS } from '../../model/handoff/netlist/predictions.ts';
import type { StageNetlist } from '../../model/handoff/netlist/stage-netlist.ts';
import { agreesWith, fullLoad, solveAt, stageNetlist, stepNetlist } from '../../model/index.ts';
import { conductionIn, readFigure } from '../../runners/simulate/figures.ts';
import type { Run, Simulator } from '../../runners/simulate/run.ts';
import type { FoundDesign } from './designs.ts';

/** The netlist of a design at full load, nominal line and usual values. */
export function netlistOf({ problem, genes }: FoundDesign): StageNetlist {
  return stageNetlist(problem, problem.id(genes), solveAt(problem, genes, fullLoad(problem.rail)));
}

/** Figures that lie beyond their bands, each in words; empty where the model agrees. */
export function beyondBands(netlist: StageNetlist, run: Run): string[] {
  const beyond = netlist.predictions.flatMap((prediction) => {
    const simulated = readFigure(run, prediction);
    const { name, value } = prediction;
    return agreesWith(prediction, simulated) ? [] : [`${name}: ${value} against ${simulated}`];
  });
  const loss = conductionIn(run, netlist.losses);
  if (Math.abs(netlist.conduction / loss - 1) > BANDS.conduction)
    beyond.push(`conduction: ${netlist.conduction} against ${loss}`);
  return beyond;
}

/** Ripples that a sheet limits, and where a netlist shows them. */
const RIPPLES = [
  ['outputRipple', 'v(out)'],
  ['inputRipple', 'v(in)'],
] as const;

/** Limits of the sheet that a simulation misses, each at the corner where the model finds it worst: ripples of the stage, the step in the closed averaged loop. */
export async function missesOf({ problem, genes }: FoundDesign, simulator: Simulator): Promise<string[]> {
  const { limits } = problem.assess(genes);
  const misses: string[] = [];
  const runs = new Map<string, Run>();
  for (const [name, vector] of RIPPLES) {
    const ripple = limits.find((one) => one.name === name);
    if (ripple?.corner === undefined) continue;
    const place = JSON.stringify(ripple.corner);
    const point = solveAt(problem, genes, { ...ripple.corner, share: 0 }, true);
    const run = runs.get(place) ?? (await simulator.run(stageNetlist(problem, problem.id(genes), point).text));
    runs.set(place, run);
    const swing = readFigure(run, { reading: 'peak-to-peak', vectors: [vector] });
    if (swing > ripple.allowed) misses.push(`${name}: ${swing} beyond ${ripple.allowed}, by the model ${ripple.value}`);
  }
  const limit = limits.find(({ name }) => name === 'loadStep');
  if (limit?.corner === undefined) return misses;
  const point = solveAt(problem, genes, { ...limit.corner, share: 0 }, true);
  const netlist = stepNetlist(problem, problem.id(genes), point);
  if (netlist === undefined) return [...misses, 'no loop'];
  const volts = (await simulator.run(netlist.text)).vectors.get('v(out)') ?? [];
  const excursion = Math.max(...Array.from(volts, (v) => Math.abs(v - volts[0])));
  const most = excursion + 0.5 * point.solver.outputRipple.ripple;
  if (most > limit.allowed) misses.push(`load step: ${most} beyond ${limit.allowed}, by the model ${limit.value}`);
  return misses;
}
