/** The demo sheet: a series regulator as baseline, diode against synchronous, light load, an avoided band. */
import { explainRail } from '../../../model/explain.ts';
import type { Architecture } from '../../../model/stages/list.ts';
import { need } from '../../model/support.ts';
import { builtInTables, objectiveIndex, type Sweep, spaceOf, sweep } from '../spaces.ts';
import { percent, type Statement, stated, tally } from '../statement.ts';
import { pointsOf, touches } from './questions.ts';

/** What its row says; each side search may spend `evaluations`. */
export function sensors(found: Sweep, evaluations: number): Statement[] {
  const name = 'buoy-sensors';
  const { rail } = found.problem;
  const { baseline } = need(explainRail(rail, builtInTables()));
  // 3.3/12.8 of the power arrives; 26.4 W · (12.8/3.3 − 1) stays behind.
  const series = Math.abs(baseline.efficiency - 0.2578) < 1e-4 && Math.abs(baseline.loss - 76.0) < 0.05;
  const light = modesAt(found, 0.02);
  const slow = sweep(spaceOf({ ...rail, limits: { ...rail.limits, minimumOnTime: 150e-9 } }), evaluations);
  const skipping = modesAt(slow, 0.02);
  const open = sweep(spaceOf({ ...rail, avoid: [] }), evaluations);
  const inside = (of: Sweep): number => of.members.filter((member) => touches(of, member, 485e3, 525e3)).length;
  return [
    stated(
      name,
      'a series regulator reaches 25.8 % and turns 76.0 W into heat',
      `${percent(baseline.efficiency)}, ${baseline.loss.toFixed(1)} W`,
      series,
    ),
    ...diodeAgainstSynchronous(found),
    stated(name, 'runs discontinuous at 2 % load', tally(light), light.includes('discontinuous'), 'the sheet'),
    stated(
      name,
      'skips pulses at 2 % load where no on-time below 150 ns may be planned with',
      tally(skipping),
      skipping.includes('pulse-skipping'),
      'the sheet',
    ),
    stated(
      name,
      'leaves the avoided band empty, oscillator tolerance and all',
      `${inside(found)} of ${found.members.length} inside`,
      inside(found) === 0,
      'the sheet',
    ),
    stated(
      name,
      'would use that band if it might',
      `${inside(open)} of ${open.members.length} inside without it`,
      inside(open) > 0,
      'the sheet',
    ),
  ];
}

function diodeAgainstSynchronous(found: Sweep): Statement[] {
  const name = 'buoy-sensors';
  const synchronous = bestOf(found, 'buck-synchronous', 'loss');
  const diode = bestOf(found, 'buck-diode', 'loss');
  const ours = `synchronous ${(1e3 * synchronous).toFixed(0)} mW, diode ${(1e3 * diode).toFixed(0)} mW`;
  return [
    stated(name, 'a diode stage keeps every limit too', ours, Number.isFinite(diode), 'the sheet'),
    stated(
      name,
      'a synchronous stage loses less than a diode stage',
      ours,
      synchronous < diode,
      'common practice, no source',
    ),
  ];
}

/** Smallest feasible value of an objective that the sweep met in an architecture. */
function bestOf(found: Sweep, architecture: Architecture, objective: string): number {
  const { problem, record } = found;
  const m = problem.objectives.length;
  const place = objectiveIndex(problem, objective);
  const values = problem.families.names.flatMap((family, k) =>
    family.startsWith(`${architecture} `) ? [record.best[k * m + place]] : [],
  );
  return Math.min(...values);
}

function modesAt(found: Sweep, load: number): string[] {
  return pointsOf(found, (point) => Math.abs(point.load - load) < 1e-9).map((point) => point.mode);
}
