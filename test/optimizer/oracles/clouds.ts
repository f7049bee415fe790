/** Small sets of points to try kernels on, drawn by fast-check with many ties. */
import fc from 'fast-check';

/** Up to `most` points: coarse ones (many ties and duplicates), fine ones, a single front, or values of very different size. */
export function clouds(m: number, most: number): fc.Arbitrary<number[][]> {
  const coarse = fc.integer({ min: 0, max: 4 });
  const fine = fc.double({ min: 0, max: 4, noNaN: true });
  const wild = fc.oneof(fc.constantFrom(0, 1e-300, 1e-9, 1, 1e9), fine);
  const rowsOf = (value: fc.Arbitrary<number>): fc.Arbitrary<number[][]> =>
    fc.array(fc.array(value, { minLength: m, maxLength: m }), { maxLength: most });
  const oneFront = rowsOf(coarse).map((rows) =>
    rows.map((row) => [...row.slice(1), 4 * m - row.slice(1).reduce((a, b) => a + b, 0)]),
  );
  return fc.oneof(rowsOf(coarse), rowsOf(fine), oneFront, rowsOf(wild));
}
