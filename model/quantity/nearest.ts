/** The nearest known word to one that is not known: what a person most likely meant. */

/** Longest word that is compared, characters. */
const LONGEST = 64;

/** The known word nearest to `word`, where it is near enough to be meant: at most two fifths of its length in edits. */
export function nearest(word: string, known: readonly string[]): string | undefined {
  if (word === '' || word.length > LONGEST) return undefined;
  let best: string | undefined;
  let least = Number.POSITIVE_INFINITY;
  for (const candidate of known) {
    const edits = editDistance(word.toLowerCase(), candidate.toLowerCase());
    if (edits < least) {
      least = edits;
      best = candidate;
    }
  }
  return best !== undefined && least <= Math.max(1, Math.floor(0.4 * Math.max(word.length, best.length)))
    ? best
    : undefined;
}

/**
 * Least number of insertions, deletions, substitutions and swaps of neighbours that turn `from` into `to`, no place touched
 * twice (Damerau 1964, Levenshtein 1966), by the table of Wagner and Fischer, three rows at a time.
 */
export function editDistance(from: string, to: string): number {
  let above = Array.from({ length: to.length + 1 }, (_, i) => i);
  let before = above;
  for (let i = 1; i <= from.length; i++) {
    const row = [i];
    for (let j = 1; j <= to.length; j++) {
      const replaced = (above[j - 1] ?? 0) + (from[i - 1] === to[j - 1] ? 0 : 1);
      const least = Math.min(replaced, (above[j] ?? 0) + 1, (row[j - 1] ?? 0) + 1);
      const swap = i > 1 && j > 1 && from[i - 1] === to[j - 2] && from[i - 2] === to[j - 1];
      row.push(swap ? Math.min(least, (before[j - 2] ?? 0) + 1) : least);
    }
    before = above;
    above = row;
  }
  return above[to.length] ?? 0;
}
