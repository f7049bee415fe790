/** Heat: surfaces, fixed points, sinks. */
import { fixedPoint } from '../../model/heat/resistance.ts';
import { sinkVolumeByIndex, volumetricResistance } from '../../model/heat/sink.ts';
import {
  forcedConvection,
  MCLYMAN_RISE,
  radiation,
  surfaceCoefficient,
  surfaceRise,
} from '../../model/heat/surface.ts';
import { woundCost } from '../../model/magnetics/wound-part.ts';
import { type CaseGroup, type Common, make } from './case.ts';

const HOLMAN: Common = {
  source: 'holman-2010',
  place: 'example 5-4, plate at 2 m/s',
  unit: 'W/(m²·K)',
  mark: 'from memory',
  tolerance: 0.01,
};
const surfaces = [
  make(HOLMAN, 'mean over 0.2 m', 12.3, () => forcedConvection(2, 0.2)),
  make(HOLMAN, 'mean over 0.4 m', 8.698, () => forcedConvection(2, 0.4)),
  make(
    { ...HOLMAN, place: '4·σ·T³ at 300 K', mark: 'computed', tolerance: 1e-4 },
    'black surface at ambient',
    6.124,
    () => radiation(300, 300, 1),
  ),
  make(
    {
      source: 'churchill-1977',
      place: 'fourth-power blend of 8 and 8 is 8·2^¼ (length and rise chosen so)',
      unit: 'W/(m²·K)',
      mark: 'computed',
      tolerance: 2e-3,
    },
    'natural and forced alike, radiation taken off',
    9.5137,
    () => {
      const rise = 0.1 * (8 / 1.42) ** 4;
      const speed = 0.1 * (8 / 3.9) ** 2;
      return surfaceCoefficient(rise, 0.1, speed, 300) - radiation(300 + rise, 300, 0.9);
    },
  ),
  ...MCLYMAN_RISE.map(({ density, rise }) =>
    make(
      {
        source: 'mclyman-2004',
        place: 'surface dissipation against rise, still air; 3 cm part',
        unit: 'K',
        mark: 'from memory',
        tolerance: 0.15,
      },
      `rise at ${density} W/m²`,
      rise,
      () => surfaceRise(density * 60e-4, 60e-4, 0.03, 0, 298.15),
    ),
  ),
];

const POINT: Common = {
  source: 'ltc3729',
  place: 'page 14, solved by algebra',
  unit: 'K',
  mark: 'computed',
  tolerance: 1e-9,
};
const points = [
  // 313.15 + 40·1·(1 + 0.005·(T − 298.15)) = T, so 0.8·T = 293.52.
  make(POINT, '1 W at 25 °C, 40 K/W, 40 °C, 0.005/K', 366.9, () => fixedPoint(313.15, 40, 1, 0.005)),
];

const SINK: Common = {
  source: 'lee-1995',
  place: 'middle of the published band',
  unit: 'm³·K/W',
  mark: 'from memory',
  tolerance: 1e-9,
};
const sinks = [
  make({ ...SINK, tolerance: 150 / 650 }, 'still air, 500 to 800 cm³·K/W', 650e-6, () => volumetricResistance(0)),
  make({ ...SINK, tolerance: 50 / 200 }, '1 m/s, 150 to 250 cm³·K/W', 200e-6, () => volumetricResistance(1)),
  make({ ...SINK, tolerance: 35 / 115 }, '2.5 m/s, 80 to 150 cm³·K/W', 115e-6, () => volumetricResistance(2.5)),
  make(
    { source: 'drofenik-kolar', place: 'definition of the index', unit: 'm³', mark: 'from memory', tolerance: 1e-9 },
    '0.5 K/W at 20 W/(K·dm³)',
    1e-4,
    () => sinkVolumeByIndex(0.5, 20e3),
  ),
];

const wound = [
  make(
    { source: 'burkart-kolar-2013', place: 'inductors', unit: 'EUR', mark: 'computed', tolerance: 1e-5 },
    '0.1 kg ferrite, 0.05 kg solid wire',
    5.8667,
    () => woundCost(0.1, 5.5, 0.05, 10, 1, 7, 2, 0.25),
  ),
];

export const HEAT: readonly CaseGroup[] = [
  { title: 'Heat: surfaces', cases: surfaces },
  { title: 'Heat: fixed point', cases: points },
  { title: 'Heat: sinks', cases: sinks },
  { title: 'Cost of wound parts', cases: wound },
];
