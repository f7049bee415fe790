/** Colour on terminals only, off with NO_COLOR (any value) or TERM=dumb; colour never carries a meaning alone. */

/** Styles that we use. */
export type Style = 'bold' | 'dim' | 'good' | 'bad';

const CODES: Readonly<Record<Style, readonly [number, number]>> = {
  bold: [1, 22],
  dim: [2, 22],
  good: [32, 39],
  bad: [31, 39],
};

/** A function that paints text, or returns it as it is where colour is not wanted. */
export type Paint = (text: string, style: Style) => string;

/** The painter for a stream. */
export function painter(stream: { readonly isTTY?: boolean }, env: NodeJS.ProcessEnv = process.env): Paint {
  const wanted = stream.isTTY === true && (env.NO_COLOR ?? '') === '' && env.TERM !== 'dumb';
  if (!wanted) return (text) => text;
  return (text, style) => `\u001b[${CODES[style][0]}m${text}\u001b[${CODES[style][1]}m`;
}
