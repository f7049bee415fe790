/** The ε-grid archive read off its definition, from the whole set of designs ever shown. */

/** A design as the oracle sees it. */
export interface PlainDesign {
  readonly genes: readonly number[];
  readonly objectives: readonly number[];
}

/** Members in canonical order: first of each cell that no other cell dominates, and first in each objective. */
export function plainArchive(
  shown: readonly PlainDesign[],
  ideal: readonly number[],
  resolution: readonly number[],
): PlainDesign[] {
  const cellOf = (d: PlainDesign): number[] => d.objectives.map((v, c) => Math.floor((v - ideal[c]) / resolution[c]));
  const merit = (d: PlainDesign): number => d.objectives.reduce((sum, v, c) => sum + (v - ideal[c]) / resolution[c], 0);
  const fixed = (a: PlainDesign, b: PlainDesign): number => merit(a) - merit(b) || canonical(a, b);
  const kept = shown.filter((a) =>
    shown.every((b) => {
      const [cellA, cellB] = [cellOf(a), cellOf(b)];
      const same = cellA.every((v, c) => v === cellB[c]);
      return same ? fixed(a, b) <= 0 : !cellB.every((v, c) => v <= cellA[c]);
    }),
  );
  for (let c = 0; c < ideal.length && shown.length > 0; c++) {
    kept.push(shown.reduce((best, d) => ((d.objectives[c] - best.objectives[c] || fixed(d, best)) < 0 ? d : best)));
  }
  return kept.sort(canonical).filter((d, i, all) => i === 0 || canonical(all[i - 1], d) !== 0);
}

/** Order by objectives, then genes, lexicographically. */
function canonical(a: PlainDesign, b: PlainDesign): number {
  return lexicographic(a.objectives, b.objectives) || lexicographic(a.genes, b.genes);
}

function lexicographic(a: readonly number[], b: readonly number[]): number {
  const at = a.findIndex((v, i) => v !== b[i]);
  return at < 0 ? 0 : a[at] - b[at];
}
