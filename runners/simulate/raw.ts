/** Reading a simulator's binary result: a text header, then all vectors of one point after the other as doubles. */

const MARK = 'Binary:\n';

/** The vectors by lower-case name. Throws where the bytes are no such result. */
export function readRaw(bytes: Buffer): Map<string, Float64Array> {
  const at = bytes.indexOf(MARK);
  if (at < 0) throw new Error('the result has no data');
  const header = bytes.subarray(0, at).toString('latin1');
  const names = [...header.matchAll(/^\t\d+\t(\S+)\t\S+/gm)].map((match) => (match[1] ?? '').toLowerCase());
  const from = at + MARK.length;
  const points = Math.min(
    Number(/^No\. Points: *(\d+)/m.exec(header)?.[1] ?? 0),
    Math.floor((bytes.length - from) / (8 * names.length)),
  );
  return new Map(names.map((name, i) => [name, column(bytes, from + 8 * i, 8 * names.length, points)]));
}

function column(bytes: Buffer, from: number, step: number, points: number): Float64Array {
  return Float64Array.from({ length: points }, (_, i) => bytes.readDoubleLE(from + i * step));
}
