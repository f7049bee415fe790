/**
 * How sure the model is, drawn on the front: built prototypes differ from models like this one by about 0.25 points of efficiency and 20 %
 * of volume (common practice, no source); prices are the tables' own and carry no band of the model.
 */
import type { Rail } from '../model/rail/rail.ts';

const EFFICIENCY_BAND = 0.0025;
const VOLUME_BAND = 0.2;

/** Half-width of the model's band about `value` of an objective, in the objective's unit; 0 where it has none. */
export function bandOf(objective: string, value: number, rail: Rail): number {
  if (objective === 'loss') return EFFICIENCY_BAND * (meanPower(rail) + value);
  if (objective === 'full-load-loss') return EFFICIENCY_BAND * (rail.output.nominal * rail.output.current + value);
  if (objective === 'inefficiency') return EFFICIENCY_BAND;
  return objective === 'cost' ? 0 : VOLUME_BAND * value;
}

/**
 * Rows that the model cannot tell from the design `centre`, itself among them: every objective that carries a band lies within it. What is
 * known without the model, the price, may still tell them apart.
 */
export function indistinguishable(
  names: readonly string[],
  rows: readonly { readonly objectives: readonly number[] }[],
  { objectives: centre }: { readonly objectives: readonly number[] },
  rail: Rail,
): readonly number[] {
  const widths = names.map((name, k) => bandOf(name, centre[k] ?? 0, rail) || Number.POSITIVE_INFINITY);
  if (!widths.some(Number.isFinite)) return [];
  return rows.flatMap((row, i) => {
    const near = widths.every((width, k) => Math.abs((row.objectives[k] ?? 0) - (centre[k] ?? 0)) <= width);
    return near ? [i] : [];
  });
}

/** Output power averaged over the profile's time, W; power that flows back counts with its size. */
function meanPower(rail: Rail): number {
  const full = rail.output.nominal * rail.output.current;
  return rail.profile.reduce((sum, point) => sum + point.share * Math.abs(point.fraction) * full, 0);
}
