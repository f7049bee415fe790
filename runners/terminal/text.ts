/** What may reach a terminal: names from sheets and tables can carry control characters and must stay mere text. */

/** Control characters, zero-width and bidirectional marks, line and paragraph separators: shown, never obeyed. */
export const HOSTILE = /[\p{Cc}\p{Cf}\p{Zl}\p{Zp}]/gu;

/** `text` with every character that could steer a terminal written as its code point. */
export function plain(text: string): string {
  return text.replace(HOSTILE, (char) => `\\u{${(char.codePointAt(0) ?? 0).toString(16)}}`);
}

/** Like `plain`, but keeps line ends: for texts that we laid out ourselves. */
export function plainLines(text: string): string {
  return text.split('\n').map(plain).join('\n');
}

/** `plain`, cut to `width` code points with an ellipsis. */
export function short(text: string, width: number): string {
  const points = [...plain(text.slice(0, 4 * width + 8))];
  return points.length <= width ? points.join('') : `${points.slice(0, width - 1).join('')}…`;
}

/** A path made plain and cut to `width` code points at its front: its end tells it from others. */
export function shortPath(path: string, width: number): string {
  const points = [...plain(path)];
  return points.length <= width ? points.join('') : `…${points.slice(1 - width).join('')}`;
}

/** Columns that `text` takes: code points, which is right for what we print (`µ`, `Ω`, `²`). */
export function widthOf(text: string): number {
  return [...text].length;
}
