/** The operating points at which a rail's designs are judged: chosen once from the sheet, the same for every design. */
import type { Rail } from './rail/rail.ts';

/** One operating point to solve. */
export interface PlannedPoint {
  /** V. */
  readonly inputVoltage: number;
  readonly outputVoltage: number;
  /** −1 … 1. */
  readonly load: number;
  /** Share of the profile's time; 0 for a point that is only judged. */
  readonly share: number;
}

/** All points of a rail. */
export interface PointPlan {
  /** The profile at nominal input and output with usual values, then loads that only an efficiency or no-load limit asks for. */
  readonly usual: readonly PlannedPoint[];
  /** Every load at every corner of line and output, with worst-case values: limits are judged here. */
  readonly worst: readonly PlannedPoint[];
  /** Pairs of input and output voltage between which ripple cancellation may be worst inside (N > 1): [low, high, output]. */
  readonly spans: readonly { readonly low: number; readonly high: number; readonly outputVoltage: number }[];
}

/** The points of `rail`. */
export function planPoints(rail: Rail): PointPlan {
  return { usual: usualPoints(rail), worst: worstPoints(rail), spans: spans(rail) };
}

/** Every load fraction at which limits are judged, by falling size. */
function judgedLoads(rail: Rail): readonly number[] {
  const loads = new Set(rail.profile.map((point) => point.fraction));
  loads.add(1);
  for (const limit of rail.limits.efficiency) loads.add(limit.load);
  return [...loads].sort((a, b) => Math.abs(b) - Math.abs(a) || b - a);
}

function usualPoints(rail: Rail): PlannedPoint[] {
  const at = (load: number, share: number): PlannedPoint => ({
    inputVoltage: rail.input.nominal,
    outputVoltage: rail.output.nominal,
    load,
    share,
  });
  const points = rail.profile.map((point) => at(point.fraction, point.share));
  const extra = new Set(rail.limits.efficiency.map((limit) => limit.load));
  extra.add(1);
  if (rail.limits.noLoadPower !== undefined) extra.add(0);
  for (const load of extra) if (!points.some((point) => point.load === load)) points.push(at(load, 0));
  return points;
}

function worstPoints(rail: Rail): PlannedPoint[] {
  const inputs = distinct([rail.input.minimum, rail.input.nominal, rail.input.maximum]);
  const outputs = distinct([rail.output.minimum, rail.output.maximum]);
  const points: PlannedPoint[] = [];
  for (const inputVoltage of inputs) {
    for (const outputVoltage of outputs) {
      for (const load of judgedLoads(rail)) points.push({ inputVoltage, outputVoltage, load, share: 0 });
    }
  }
  return points;
}

function spans(rail: Rail): { low: number; high: number; outputVoltage: number }[] {
  return distinct([rail.output.minimum, rail.output.maximum]).map((outputVoltage) => ({
    low: rail.input.minimum,
    high: rail.input.maximum,
    outputVoltage,
  }));
}

function distinct(values: readonly number[]): readonly number[] {
  return [...new Set(values)];
}
