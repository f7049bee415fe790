/** Core loss: constants, closed forms, published parameters, a published implementation's outputs, measurements. */
import {
  cosinePowerIntegral,
  igseAt,
  igseConstant,
  igseConstantApproximate,
  steinmetz,
  triangleLossDensity,
} from '../../model/magnetics/core-loss.ts';
import { type CaseGroup, type Common, make } from './case.ts';
import { chain } from './stage-figures.ts';

/** α, integral of |cos|^α, then triangle over sine at D = 0.5, 0.4, 0.3, 0.25, 0.2, 0.1, 0.05. */
const RT: readonly (readonly number[])[] = [
  [1.1, 3.88244533, 0.984788, 0.987003, 0.994302, 1.000563, 1.00943, 1.042661, 1.08167],
  [1.2, 3.77436233, 0.968261, 0.973021, 0.98883, 1.00254, 1.022196, 1.098405, 1.193101],
  [1.3, 3.67457193, 0.950643, 0.958251, 0.983725, 1.006071, 1.038516, 1.168812, 1.340459],
  [1.36, 3.6182609, 0.93963, 0.949082, 0.980885, 1.00898, 1.050093, 1.218817, 1.44917],
  [1.4, 3.5820875, 0.932129, 0.942862, 0.979098, 1.011262, 1.058578, 1.25564, 1.531233],
  [1.5, 3.49607674, 0.912891, 0.926998, 0.975036, 1.018198, 1.082556, 1.360858, 1.774548],
  [1.6, 3.41583232, 0.893082, 0.910784, 0.971605, 1.026942, 1.110608, 1.486685, 2.081528],
  [1.8, 3.27030576, 0.852267, 0.877717, 0.966815, 1.050028, 1.179531, 1.810538, 2.943723],
  [2.0, Math.PI, 0.810569, 0.844343, 0.964964, 1.080759, 1.266515, 2.251582, 4.266155],
];

/** Material, ki, α, β, W/m³ at 100 kHz, 0.2 T peak to peak for a triangle of D = 0.5, 0.3, 0.1. */
const FITS = [
  ['3C90', 0.23732, 1.3932, 2.5481, 95429.8, 100131, 127713],
  ['3F4', 52.6956, 1.0598, 2.7734, 251932, 253330, 260307],
  ['77', 0.21406, 1.4182, 2.4746, 131457, 138484, 180248],
  ['78', 0.095863, 1.4742, 2.4951, 112831, 119974, 163711],
  ['N27', 0.42941, 1.3697, 2.4634, 148542, 155293, 194422],
  ['N30', 0.00034663, 1.8984, 2.4024, 83972.3, 97470.8, 203024],
  ['N49', 1.9502, 1.2553, 2.8231, 93583.6, 96250.0, 110841],
  ['N87', 0.79822, 1.3453, 2.5752, 171242, 178367, 219150],
  ['3E6', 0.00029059, 1.8702, 2.1475, 75201.9, 86704.6, 175106],
] as const;

/** f, ΔB, rise, measured, published model. */
const ORACLE: readonly (readonly number[])[] = [
  [112104.713, 0.055356217, 0.100668794, 11040.026, 8466.600542],
  [99997.3, 0.109937632, 0.199637817, 37066.238, 33568.804313],
  [112104.536, 0.174552521, 0.300140995, 117339.359, 112620.020457],
  [199202.363, 0.196051252, 0.398144891, 309033.695, 311635.819158],
  [282481.7, 0.246766638, 0.502585389, 887597.358, 858447.923188],
  [141243.5, 0.069612333, 0.700686199, 15256.943, 16525.325597],
  [63130.513, 0.19408522, 0.900505718, 107676.115, 82530.130309],
];

const DUTIES = [0.5, 0.4, 0.3, 0.25, 0.2, 0.1, 0.05];

/** Loss density under a triangle of `swing` T peak to peak, by the general piecewise-linear form. */
function general(ki: number, alpha: number, beta: number, f: number, swing: number, rise: number): number {
  const into = new Float64Array(1);
  igseAt(ki, alpha, beta, chain([rise / f, 0, swing], [(1 - rise) / f, swing, 0]), swing, into);
  return into[0];
}

const IGSE: Common = {
  source: 'igse-2002',
  place: 'constant of the equation',
  unit: '1',
  mark: 'computed',
  tolerance: 1e-8,
};
const integrals = RT.map(([alpha, value]) =>
  make(IGSE, `∫|cos|^α over a turn, α ${alpha}`, value, () => cosinePowerIntegral(alpha)),
);
const ratios = RT.flatMap(([alpha, , ...row]) =>
  row.map((value, i) =>
    make({ ...IGSE, place: 'triangle over sine', tolerance: 1e-6 }, `α ${alpha}, D ${DUTIES[i]}`, value, () => {
      const ki = igseConstant(1, alpha, 2.5);
      return triangleLossDensity(ki, alpha, 2.5, 1e5, 0.2, DUTIES[i]) / steinmetz(1, alpha, 2.5, 1e5, 0.1);
    }),
  ),
);
const approximations = (
  [
    [1.1, -0.00074],
    [1.36, -0.00018],
    [1.5, 0.00014],
    [1.8, 0.00067],
  ] as const
).map(([alpha, error]) =>
  make(
    { ...IGSE, place: 'error of the closed approximation of the constant', tolerance: 0.51e-5 / Math.abs(error) },
    `α ${alpha}`,
    error,
    () => igseConstantApproximate(1, alpha, 2.5) / igseConstant(1, alpha, 2.5) - 1,
  ),
);

const MAGNET: Common = {
  source: 'magnet-2021',
  place: 'fitted parameters at 25 °C; triangle at 100 kHz, 0.2 T peak to peak',
  unit: 'W/m³',
  mark: 'computed',
  tolerance: 1e-5,
};
const fits = FITS.flatMap(([name, ki, alpha, beta, ...row]) =>
  row.map((value, i) =>
    make(MAGNET, `${name}, D ${[0.5, 0.3, 0.1][i]}`, value, () =>
      general(ki, alpha, beta, 1e5, 0.2, [0.5, 0.3, 0.1][i]),
    ),
  ),
);

/** Parameters recovered from the published outputs: ki = k/2^α. */
const N87 = { ki: 1.3972225200307382 / 2 ** 1.3320181075798208, alpha: 1.3320181075798208, beta: 2.4228059171403626 };
const n87 = (f: number, swing: number, rise: number) => general(N87.ki, N87.alpha, N87.beta, f, swing, rise);
const GUILLOD: Common = {
  source: 'guillod-2023',
  place: 'open data, N87 at 25 °C, asymmetric triangles',
  unit: 'W/m³',
  mark: 'seen',
  tolerance: 1e-7,
};
const oracle = ORACLE.flatMap(([f, swing, rise, measured, published]) => {
  const what = `${(f / 1e3).toFixed(1)} kHz, ${(swing * 1e3).toFixed(1)} mT, rise ${rise.toFixed(2)}`;
  return [
    make(GUILLOD, `${what}: published model`, published, () => n87(f, swing, rise)),
    make(
      { ...GUILLOD, place: 'open data, measured; band of the fit (95th percentile)', tolerance: 0.246 },
      `${what}: measured`,
      measured,
      () => n87(f, swing, rise),
    ),
  ];
});

/** Sine loss density from triangle parameters: k = ki·(2π)^(α − 1)·∫·2^(β − α). */
function sine(ki: number, alpha: number, beta: number, f: number, peak: number): number {
  const k = ki * (2 * Math.PI) ** (alpha - 1) * cosinePowerIntegral(alpha) * 2 ** (beta - alpha);
  return steinmetz(k, alpha, beta, f, peak);
}
const ANCHOR: Common = {
  source: 'magnet-2021',
  place: 'single measured points; band: largest error of a constant-parameter fit (27.7 %, Guillod 2023, table I)',
  unit: 'W/m³',
  mark: 'seen',
  tolerance: 0.277,
};
const anchors = [
  make(ANCHOR, 'N27 sine, 99.95 kHz, 49.8 mT peak, 25 °C', 29866, () => sine(0.42941, 1.3697, 2.4634, 99.95e3, 0.0498)),
  make(ANCHOR, 'N27 triangle, 199.17 kHz, 98.3 mT peak', 291623, () =>
    general(0.42941, 1.3697, 2.4634, 199.17e3, 0.1966, 0.5),
  ),
  make(ANCHOR, '78 sine, 63.02 kHz, 99.9 mT peak', 67779, () => sine(0.095863, 1.4742, 2.4951, 63.02e3, 0.0999)),
  make(ANCHOR, '78 triangle D 0.7, 158.73 kHz, 77.5 mT peak', 106867, () =>
    general(0.095863, 1.4742, 2.4951, 158.73e3, 0.155, 0.7),
  ),
  make(ANCHOR, 'N87 triangle, 99 997 Hz, 195.4 mT peak to peak', 124676, () => n87(99997, 0.1954, 0.5)),
];

export const CORE_LOSS: readonly CaseGroup[] = [
  { title: 'Core loss: the integral of |cos|^α', cases: integrals },
  { title: 'Core loss: triangle over sine', cases: ratios },
  { title: 'Core loss: the closed approximation of the constant', cases: approximations },
  { title: 'Core loss: published parameters', cases: fits },
  { title: 'Core loss: a published implementation, and measurements', cases: oracle },
  { title: 'Core loss: measured anchors', cases: anchors },
];
