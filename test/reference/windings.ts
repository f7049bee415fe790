/** Windings: Dowell's factor, skin and proximity effect of round wires, wire gauges, copper. */
import { copperResistivity, skinDepth, wireResistance } from '../../model/magnetics/copper.ts';
import { dowell, optimumThickness } from '../../model/magnetics/dowell.ts';
import { roundWireProximity, roundWireSkin } from '../../model/magnetics/round-wire.ts';
import { gaugeDiameter, roundArea } from '../../model/magnetics/wire.ts';
import { type CaseGroup, type Common, make } from './case.ts';

/** x, then F for m = 1, 2, 3, 4, 5, 6, 8, 10. */
const DOWELL: readonly (readonly number[])[] = [
  [0.2, 1.000142, 1.000676, 1.001564, 1.002809, 1.004409, 1.006364, 1.011341, 1.017741],
  [0.4, 1.002273, 1.010798, 1.025005, 1.044896, 1.070469, 1.101726, 1.181288, 1.283582],
  [0.5, 1.005542, 1.026323, 1.060958, 1.109446, 1.171788, 1.247985, 1.441938, 1.691308],
  [0.6, 1.011463, 1.054438, 1.126062, 1.226336, 1.35526, 1.512834, 1.91393, 2.429625],
  [0.8, 1.03585, 1.170157, 1.394003, 1.707386, 2.110308, 2.602767, 3.856301, 5.467987],
  [1.0, 1.085636, 1.406009, 1.939965, 2.687503, 3.648623, 4.823325, 7.813477, 11.657957],
  [1.2, 1.170898, 1.808636, 2.871533, 4.359589, 6.272803, 8.611176, 14.563399, 22.216256],
  [1.5, 1.378094, 2.779311, 5.114672, 8.384177, 12.587827, 17.725621, 30.803642, 47.61824],
  [2.0, 1.897806, 5.146489, 10.560961, 18.141221, 27.88727, 39.799108, 70.120149, 109.104344],
  [3.0, 3.010136, 9.538301, 20.418577, 35.650964, 55.23546, 79.172068, 140.101613, 218.4396],
  [5.0, 4.999372, 15.089115, 31.905352, 55.448085, 85.717312, 122.713034, 216.883964, 337.960874],
];

const LAYERS = [1, 2, 3, 4, 5, 6, 8, 10];

/** Wire diameter over skin depth, Rac/Rdc. */
const SKIN: readonly (readonly number[])[] = [
  [0.5, 1.000081375],
  [1, 1.001300729],
  [1.5, 1.006557237],
  [2, 1.020492389],
  [2.5, 1.048882042],
  [3, 1.097328246],
  [3.5, 1.169344589],
  [4, 1.264642906],
  [5, 1.505039429],
  [6, 1.768131653],
  [8, 2.273801067],
  [10, 2.768107601],
  [12, 3.265193849],
  [15, 4.012319949],
  [20, 5.259301858],
  [50, 12.75374578],
  [100, 25.25187449],
];

/** Gauge, diameter mm, area mm², mΩ/m, Ω/kft. */
const GAUGES: readonly (readonly number[])[] = [
  [10, 2.588187, 5.261155, 3.27704, 0.9988],
  [12, 2.052525, 3.308773, 5.21069, 1.5882],
  [14, 1.627727, 2.080908, 8.28533, 2.5254],
  [16, 1.290846, 1.308696, 13.17419, 4.0155],
  [18, 1.023687, 0.823047, 20.94778, 6.3849],
  [20, 0.811821, 0.517619, 33.30827, 10.1524],
  [22, 0.643803, 0.325534, 52.96222, 16.1429],
  [24, 0.510559, 0.20473, 84.21323, 25.6682],
  [26, 0.404892, 0.128756, 133.9043, 40.814],
  [28, 0.321094, 0.080976, 212.9161, 64.8968],
  [30, 0.254639, 0.050926, 338.5499, 103.19],
  [32, 0.201938, 0.032028, 538.3155, 164.079],
  [34, 0.160144, 0.020142, 855.9551, 260.895],
  [36, 0.127, 0.012668, 1361.022, 414.84],
  [38, 0.100716, 0.007967, 2164.11, 659.621],
  [40, 0.079871, 0.00501, 3441.069, 1048.84],
];

const FACTOR: Common = {
  source: 'dowell-1966',
  place: 'layer factor F(x, m)',
  unit: '1',
  mark: 'computed',
  tolerance: 1e-6,
};
const factors = DOWELL.flatMap(([x, ...row]) =>
  row.map((value, i) => make(FACTOR, `x ${x}, m ${LAYERS[i]}`, value, () => dowell(x, LAYERS[i]))),
);
const halves = [
  [0.5, 1.000347],
  [1, 1.005542],
  [2, 1.085636],
  [3, 1.378094],
].map(([x, value]) => make(FACTOR, `x ${x}, m 1/2`, value, () => dowell(x, 0.5)));

/** Thickness of least F/x, by golden-section search over our F. */
function bestThickness(layers: number): number {
  let low = 0.1;
  let high = 2.5;
  for (let round = 0; round < 60; round++) {
    const a = low + 0.382 * (high - low);
    const b = low + 0.618 * (high - low);
    if (dowell(a, layers) / a < dowell(b, layers) / b) high = b;
    else low = a;
  }
  return (low + high) / 2;
}
const BEST: Common = {
  source: 'hurley-2000',
  place: 'optimum thickness',
  unit: '1',
  mark: 'computed',
  tolerance: 3e-6,
};
const optima = [
  [1, 1.570796, 1.44066],
  [2, 0.961288, 1.348651],
  [3, 0.770426, 1.339664],
  [4, 0.663111, 1.336809],
  [5, 0.591449, 1.335534],
  [6, 0.539105, 1.334852],
  [10, 0.416684, 1.333876],
].flatMap(([m, x, f]) => [
  make(BEST, `m ${m}: thickness`, x, () => bestThickness(m)),
  make(BEST, `m ${m}: factor there`, f, () => dowell(bestThickness(m), m)),
  ...(m > 1
    ? [make({ ...BEST, tolerance: 0.021 }, `m ${m}: thickness by the closed form`, x, () => optimumThickness(m))]
    : []),
]);

const WIRE: Common = {
  source: 'ferreira-1994',
  place: 'skin effect, Kelvin functions',
  unit: '1',
  mark: 'computed',
  tolerance: 1e-8,
};
const skin = SKIN.map(([ratio, value]) => make(WIRE, `d/δ ${ratio}`, value, () => roundWireSkin(ratio, 1)));
const NBS: Common = {
  source: 'nbs-74',
  place: 'skin effect table, x = d/(√2·δ)',
  unit: '1',
  mark: 'from memory',
  tolerance: 5e-4,
};
const handbook = [
  [0.5, 1.0003],
  [1, 1.0052],
  [1.5, 1.0258],
  [2, 1.0782],
  [2.5, 1.1755],
  [3, 1.3181],
  [4, 1.6779],
  [5, 2.043],
  [10, 3.799],
  [20, 7.328],
  [50, 17.93],
  [100, 35.61],
].map(([x, value]) => make(NBS, `x ${x}`, value, () => roundWireSkin(Math.SQRT2 * x, 1)));
const neher = make(
  { source: 'neher-mcgrath-1957', place: 'table III', unit: '1', mark: 'seen', tolerance: 1e-3 },
  'skin effect of 10.05 % at x = 2.14',
  0.1005,
  () => roundWireSkin(Math.SQRT2 * 2.14, 1) - 1,
);
const NEAR: Common = {
  source: 'ferreira-1994',
  place: 'proximity factor G/d²',
  unit: '1',
  mark: 'computed',
  tolerance: 1e-7,
};
const proximity = [
  [0.25, 0.0003011879978],
  [0.5, 0.004816986774],
  [1, 0.07655818263],
  [1.5, 0.3767138003],
  [2, 1.107420274],
  [3, 3.987258698],
  [4, 7.289855088],
  [6, 12.33898401],
  [10, 22.14705054],
].map(([ratio, value]) => make(NEAR, `d/δ ${ratio}`, value, () => roundWireProximity(ratio, 1) / ratio ** 2));

const COPPER: Common = {
  source: 'iec-60028',
  place: 'standard annealed copper',
  unit: 'Ω·m',
  mark: 'from memory',
  tolerance: 1e-6,
};
const copper = [
  make(COPPER, 'resistivity at 20 °C', 1.724138e-8, () => copperResistivity(293.15)),
  make(COPPER, 'resistivity at 100 °C', 2.266207e-8, () => copperResistivity(373.15)),
];
const DEPTH: Common = { source: 'hurley-2000', place: 'skin depth', unit: 'm', mark: 'computed', tolerance: 1e-5 };
/** The stated 1e-5, or half a unit of the sixth printed decimal where that is more. */
const depthDigits = (millimetres: number) => Math.max(1e-5, 0.51e-6 / millimetres);
const depths = [
  [60, 8.5316, 9.781248],
  [1e3, 2.089807, 2.395907],
  [1e4, 0.660855, 0.757652],
  [5e4, 0.295543, 0.338832],
  [1e5, 0.208981, 0.239591],
  [2e5, 0.147772, 0.169416],
  [5e5, 0.093459, 0.107148],
  [1e6, 0.066085, 0.075765],
  [2e6, 0.04673, 0.053574],
].flatMap(([f, cold, hot]) => [
  make({ ...DEPTH, tolerance: depthDigits(cold) }, `${f} Hz, 20 °C`, cold * 1e-3, () =>
    skinDepth(copperResistivity(293.15), f),
  ),
  make({ ...DEPTH, tolerance: depthDigits(hot) }, `${f} Hz, 100 °C`, hot * 1e-3, () =>
    skinDepth(copperResistivity(373.15), f),
  ),
]);

const GAUGE: Common = { source: 'astm-b258', place: 'gauge series', unit: 'm', mark: 'computed', tolerance: 1e-5 };
/** Half a unit of the last printed digit. */
const digits = (value: number, places: number) => Math.max(1e-6, (0.51 * 10 ** -places) / value);
const gauges = GAUGES.flatMap(([n, d, area, milliohm]) => [
  make({ ...GAUGE, tolerance: digits(d, 6) }, `gauge ${n}: diameter`, d * 1e-3, () => gaugeDiameter(n)),
  make({ ...GAUGE, unit: 'm²', tolerance: digits(area, 6) }, `gauge ${n}: area`, area * 1e-6, () =>
    roundArea(gaugeDiameter(n)),
  ),
  make(
    { ...GAUGE, unit: 'Ω', tolerance: digits(milliohm, 5) },
    `gauge ${n}: resistance of a metre`,
    milliohm * 1e-3,
    () => wireResistance(1.7241e-8, 1, roundArea(gaugeDiameter(n))),
  ),
]);
const feet = [
  [10, 0.9989],
  [20, 10.15],
  [24, 25.67],
  [30, 103.2],
  [36, 414.8],
  [40, 1049],
].map(([n, value]) =>
  make(
    { ...GAUGE, unit: 'Ω', mark: 'from memory', tolerance: 1e-3, place: 'handbook wire table' },
    `gauge ${n}: 1000 ft`,
    value,
    () => wireResistance(1.7241e-8, 304.8, roundArea(gaugeDiameter(n))),
  ),
);

export const WINDINGS: readonly CaseGroup[] = [
  { title: "Windings: Dowell's factor", cases: [...factors, ...halves] },
  { title: 'Windings: optimum layer thickness', cases: optima },
  { title: 'Windings: skin effect of a round wire', cases: [...skin, ...handbook, neher] },
  { title: 'Windings: proximity effect of a round wire', cases: proximity },
  { title: 'Copper: resistivity and skin depth', cases: [...copper, ...depths] },
  { title: 'Copper: wire gauges', cases: [...gauges, ...feet] },
];
