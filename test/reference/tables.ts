/** Published dimensions and curves that the parts tables and their laws follow. */
import { ceramicCapacitance } from '../../model/capacitors/ceramic.ts';
import { effectiveParameters } from '../../model/magnetics/effective.ts';
import { type CaseGroup, type Common, make } from './case.ts';

/** Core, le mm, Ae mm², Ve mm³ as printed, page seen or not, tolerance. */
const SHAPES = [
  ['ETD29/16/10', 72, 76, 5470, 'seen', 0.005],
  ['RM8/I', 38.4, 63, 2440, 'seen', 0.01],
  ['RM8 with hole', 35.1, 52, 1840, 'seen', 0.01],
  ['RM10', 44, 98, 4310, 'seen', 0.005],
  ['P5.8/3.3', 7.9, 4.7, 37, 'seen', 0.01],
  ['ETD34/17/11', 78.6, 97.1, 7640, 'from memory', 0.03],
  ['ETD39/20/13', 92.2, 125, 11500, 'from memory', 0.03],
  ['ETD44/22/15', 103, 173, 17800, 'from memory', 0.03],
  ['ETD49/25/16', 114, 211, 24000, 'from memory', 0.03],
  ['PQ20/20', 45.7, 62, 2790, 'from memory', 0.04],
  ['PQ26/20', 46.3, 119, 5490, 'from memory', 0.04],
  ['PQ26/25', 55.5, 118, 6530, 'from memory', 0.04],
  ['PQ32/20', 55.5, 170, 9420, 'from memory', 0.04],
  ['PQ32/30', 74.6, 161, 11970, 'from memory', 0.04],
  ['PQ35/35', 87.9, 196, 17260, 'from memory', 0.04],
  ['PQ40/40', 102, 201, 20500, 'from memory', 0.04],
  ['E25/13/7', 58, 52, 2990, 'from memory', 0.03],
  ['E32/16/9', 74, 83, 6180, 'from memory', 0.03],
  ['E42/21/15', 97, 178, 17300, 'from memory', 0.03],
  ['E42/21/20', 97, 233, 22700, 'from memory', 0.03],
  ['E55/28/21', 124, 353, 44000, 'from memory', 0.03],
] as const;
const shapes = SHAPES.map(([name, length, area, volume, mark, tolerance]) =>
  make(
    { source: 'iec-63093', place: 'effective volume as makers print it', unit: 'm³', mark, tolerance },
    `${name}: volume from length and area`,
    volume * 1e-9,
    () => effectiveParameters(length / area / 1e-3, length / (area * area) / 1e-9).volume,
  ),
);

/** Small-signal share at 0, 25, 50, 75, 100 % of the rated voltage. */
const CURVES = [
  { name: '1206 22 µF 25 V X5R', rated: 25, shares: [0.815, 0.462, 0.223, 0.134, 0.094] },
  { name: '1206 4.7 µF 50 V X7R', rated: 50, shares: [0.962, 0.819, 0.539, 0.349, 0.244] },
  { name: '0805 10 µF 25 V X5R', rated: 25, shares: [0.59, 0.324, 0.164, 0.109, 0.08] },
  { name: '0402 1 µF 25 V X5R', rated: 25, shares: [0.752, 0.413, 0.211, 0.14, 0.106] },
];
const CURVE: Common = {
  source: 'derating-curves-2025',
  place: 'measured bias curves; law laid through 0, 25 and 100 %, judged between',
  unit: '1',
  mark: 'seen',
  tolerance: 0.12,
};
/** The law's two parameters from the share at a quarter of the rating and at all of it. */
function law(rated: number, [zero, quarter, , , full]: readonly number[]): (voltage: number) => number {
  const first = zero / quarter - 1;
  const exponent = Math.log((zero / full - 1) / first) / Math.log(4);
  const half = rated / 4 / first ** (1 / exponent);
  return (voltage) => ceramicCapacitance(1, zero, half, exponent, voltage);
}
const curves = CURVES.flatMap(({ name, rated, shares }) =>
  [2, 3].map((i) => make(CURVE, `${name} at ${25 * i} %`, shares[i], () => law(rated, shares)((rated * i) / 4))),
);

export const TABLES: readonly CaseGroup[] = [
  { title: 'Cores: published volumes', cases: shapes },
  { title: 'Ceramics: bias curves', cases: curves },
];
