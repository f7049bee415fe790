/** Runs inside a page and in Node alike: random what-if moves judged by the bundled model, as bits; and the hash of the maths. */
import type { PageData } from '../../viz/data.ts';
import { modelAssessor } from '../../viz/model-assessor.ts';
import { unpack } from '../../viz/pack.ts';
import { recordOf } from '../../viz/scene.ts';
import { applied, railKnobs } from '../../viz/whatif.ts';
import { stream } from '../viz/fixture.ts';
import { mathsHash } from './maths.ts';

/** What both sides must agree on. */
export interface Probe {
  /** Objectives, slacks and losses of `count` random moves, each double as hexadecimal bits. */
  judged(data: PageData, count: number): string[];
  mathsHash(): string;
  unpack(text: string): PageData;
}

export const probe: Probe = { judged, mathsHash, unpack };

function judged(data: PageData, count: number): string[] {
  const assessor = modelAssessor(data);
  const draw = stream(11);
  const between = (low: number, high: number) => low + draw() * (high - low);
  return Array.from({ length: count }, () => {
    const design = data.front.designs[Math.floor(draw() * data.front.designs.length)];
    const gene = assessor.genes[Math.floor(draw() * assessor.genes.length)];
    if (design === undefined || gene === undefined) return 'nothing to judge';
    const value =
      gene.options?.[Math.floor(draw() * gene.options.length)] ??
      String(gene.kind === 'whole' ? Math.round(between(gene.low, gene.high)) : between(gene.low, gene.high));
    const knob = railKnobs(data.rail)[Math.floor(draw() * 5)];
    const changes = {
      [gene.name]: value,
      ...(draw() < 0.3 && knob !== undefined ? { [knob.name]: String(between(knob.low, knob.high)) } : {}),
    };
    const { moves, rail } = applied(data.rail, assessor.genes, changes);
    const verdict = assessor.assess(recordOf(design), rail, moves);
    if (!verdict.ok) return verdict.why;
    const numbers = [
      ...verdict.value.objectives.map((one) => one.value),
      ...verdict.value.limits.map((one) => one.slack),
      ...verdict.value.losses.map((one) => one.watts),
    ];
    return bits(numbers);
  });
}

function bits(numbers: readonly number[]): string {
  const bytes = new Uint8Array(Float64Array.from(numbers).buffer);
  return Array.from(bytes, (byte) => byte.toString(16).padStart(2, '0')).join('');
}
