/**
 * The exported netlist of twenty designs over all architectures: the same file in the system's simulator and in the packaged
 * one, against each other and against what the model says. Bands: mean output 1 %, ripple 5 %, rms 2 %, conduction 3 %
 * (design of this project); a ripple or a capacitor current counts only from 5 % of what is allowed on.
 */
import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import type { StageNetlist } from '../../model/handoff/netlist/stage-netlist.ts';
import { readFigure } from '../../runners/simulate/figures.ts';
import { nativePath, nativeSimulator } from '../../runners/simulate/native.ts';
import { packagedSimulator } from '../../runners/simulate/packaged.ts';
import type { Run, Simulator } from '../../runners/simulate/run.ts';
import { needs } from '../support/needs.ts';
import { type FoundDesign, foundDesigns } from './designs.ts';
import { beyondBands, missesOf, netlistOf } from './holding.ts';

const found = foundDesigns();
const netlists = new Map(found.map((design) => [design.name, netlistOf(design)]));
const native = nativePath();

function netlistNamed({ name }: FoundDesign): StageNetlist {
  const netlist = netlists.get(name);
  if (netlist === undefined) throw new Error(`no netlist of ${name}`);
  return netlist;
}

it('twenty designs of seven architectures', () => {
  expect(found).toHaveLength(20);
  expect(new Set(found.map(({ problem, genes }) => problem.record(genes).architecture)).size).toBe(7);
  // Interleaved double-ended stages with either rectifier, and bucks of one to four phases.
  const names = found.map(({ name }) => name).join(', ');
  for (const one of ['half-bridge-centre-tap ×2', 'full-bridge-current-doubler ×2']) expect(names).toContain(one);
  for (const phases of [1, 2, 3, 4]) expect(names).toContain(`buck-synchronous ×${phases}`);
});

describe.runIf(needs('ngspice'))('in the native simulator', () => {
  const simulator: Simulator = nativeSimulator(native ?? '');
  const swings: { name: string; misses: string[] }[] = [];

  it.each(found)('the model agrees: $name', async (design) => {
    const netlist = netlistNamed(design);
    const run = await simulator.run(netlist.text);
    swings.push({ name: design.name, misses: await missesOf(design, simulator) });
    expect(beyondBands(netlist, run)).toEqual([]);
  });

  it("the sheet's ripple and step limits hold in simulation for all twenty, so that there is no exception to understand", () => {
    expect(swings).toHaveLength(found.length);
    expect(swings.filter(({ misses }) => misses.length > 0)).toEqual([]);
  });

  it('runs the file unchanged and prints the measurements', () => {
    const folder = mkdtempSync(join(tmpdir(), 'chopfront-netlist-'));
    try {
      const design = found[0];
      const { text, predictions } = netlistNamed(design);
      const file = join(folder, 'stage.cir');
      writeFileSync(file, text);
      const { stdout, stderr, status } = spawnSync(native ?? '', ['-b', file], { encoding: 'utf8' });
      expect(status).toBe(0);
      expect(stderr).not.toMatch(/error|warning|unknown|unrecognized/i);
      const mean = /mean_output_voltage\s*=\s*(\S+)/.exec(stdout)?.[1];
      expect(Math.abs(Number(mean) / predictions[0].value - 1)).toBeLessThan(0.01);
    } finally {
      rmSync(folder, { recursive: true });
    }
  });
});

describe.runIf(needs('ngspice'))('in both simulators', () => {
  let packaged: Simulator | undefined;
  beforeAll(async () => {
    packaged = await packagedSimulator();
  });

  it.each(found)('within 0.5 %: $name', async (design) => {
    const netlist = netlistNamed(design);
    const a: Run = await nativeSimulator(native ?? '').run(netlist.text);
    const b = await packaged?.run(netlist.text);
    if (b === undefined) throw new Error('the packaged simulator is a dependency of the tests');
    const apart = netlist.predictions.flatMap((prediction) => {
      const [x, y] = [readFigure(a, prediction), readFigure(b, prediction)];
      const { name, floor = 0 } = prediction;
      return Math.abs(x / y - 1) <= 0.005 || Math.abs(x - y) <= 0.1 * floor ? [] : [`${name}: ${x} against ${y}`];
    });
    expect(apart).toEqual([]);
  });
});
