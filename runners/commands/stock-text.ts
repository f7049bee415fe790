/** Which parts of a design a table has too few of for the quantity of the sheet. */
import type { Assessment, RailProblem } from '../../model/index.ts';
import { plain } from '../terminal/text.ts';

/** A line for each part with a stock figure below what the sheet's quantity needs; none where no table gives figures. */
export function stockLines(assessment: Assessment, problem: RailProblem): string[] {
  const stock = stockByName(problem);
  const needed = new Map<string, number>();
  for (const { name, count } of assessment.parts) {
    needed.set(name, (needed.get(name) ?? 0) + count * problem.rail.quantity);
  }
  return [...needed].flatMap(([name, pieces]) => {
    const there = stock.get(name);
    return there === undefined || there >= pieces ? [] : [`  - ${plain(name)}: ${there} in stock, ${pieces} needed`];
  });
}

function stockByName({ catalogue }: RailProblem): Map<string, number> {
  const { inductorSeries, legs, ...lists } = catalogue;
  const rows: readonly { readonly name: string; readonly stock?: number }[] = [
    ...Object.values(lists).flat(),
    ...inductorSeries.flatMap((series) => series.rows),
    ...legs.map((leg) => leg.stage),
  ];
  return new Map(rows.flatMap(({ name, stock }) => (stock === undefined ? [] : [[name, stock] as const])));
}
