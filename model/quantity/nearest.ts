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
 * Least number of insertions, deletions and substitutions that turn `from` into `to` (Levenshtein 1966), two rows of
 * Wagner and Fischer's table at a time.
 */
export function editDistance(from: string, to: string): number {
  let above = Array.from({ length: to.length + 1 }, (_, i) => i);
  for (let i = 1; i <= from.length; i++) {
    const row = [i];
    for (let j = 1; j <= to.length; j++) {
      const swap = (above[j - 1] ?? 0) + (from[i - 1] === to[j - 1] ? 0 : 1);
      row.push(Math.min(swap, (above[j] ?? 0) + 1, (row[j - 1] ?? 0) + 1));
    }
    above = row;
  }
  return above[to.length] ?? 0;
}
