/** Cores: toroids, effective permeability, gaps with fringing. */
import { effectivePermeability, inductanceFactor, toroidParameters } from '../../model/magnetics/effective.ts';
import { fringingFactor, gapFor } from '../../model/magnetics/gap.ts';
import { magnetizingInductance } from '../../model/magnetics/leakage.ts';
import { type CaseGroup, type Common, make } from './case.ts';

const RING: Common = {
  source: 'iec-60205',
  place: 'ring cores; published table of tested cores',
  unit: '',
  mark: 'seen',
  tolerance: 1.5e-3,
};
const toroids = [
  [20, 10, 7, 43.55, 33.63],
  [22.1, 13.7, 6.35, 54.15, 26.17],
  [16, 9.6, 6.3, 38.52, 19.73],
  [34, 20.5, 12.5, 82.06, 82.6],
  [22.1, 13.7, 7.9, 54.2, 32.6],
  [25, 15, 10, 60.18, 48.9],
].flatMap(([outer, inner, height, length, area]) => {
  const ours = () => toroidParameters(outer * 1e-3, inner * 1e-3, height * 1e-3);
  const name = `R${outer}x${inner}x${height}`;
  return [
    make({ ...RING, unit: 'm' }, `${name}: effective length`, length * 1e-3, () => ours().length),
    make({ ...RING, unit: 'm²' }, `${name}: effective area`, area * 1e-6, () => ours().area),
  ];
});

/** Core, le mm, Ae mm², then pairs AL nH, published µe. */
const PERMEABILITIES = [
  {
    name: 'ETD29',
    length: 72,
    area: 76,
    pairs: [
      [2350, 1770],
      [2860, 2160],
      [2200, 1660],
      [1600, 1210],
    ],
  },
  {
    name: 'RM8 without hole',
    length: 38,
    area: 64,
    pairs: [
      [160, 76],
      [250, 118],
      [400, 189],
      [630, 298],
    ],
  },
  {
    name: 'RM8 with hole',
    length: 35.1,
    area: 52,
    pairs: [
      [250, 133],
      [315, 168],
      [400, 213],
      [630, 336],
    ],
  },
  {
    name: 'RM8/I',
    length: 38.4,
    area: 63,
    pairs: [
      [100, 49],
      [160, 78],
      [250, 121],
      [315, 153],
      [400, 194],
    ],
  },
];
const permeabilities = PERMEABILITIES.flatMap(({ name, length, area, pairs }) =>
  pairs.map(([al, value]) =>
    make(
      {
        source: 'ferroxcube-2008',
        place: 'data sheets of ETD29 and RM8; EPCOS for RM8 by IEC 60431',
        unit: '1',
        mark: 'seen',
        tolerance: 0.015,
      },
      `${name}: µe at AL ${al} nH`,
      value,
      () => effectivePermeability(al * 1e-9, length * 1e-3, area * 1e-6),
    ),
  ),
);

const RM8 = { area: 63e-6, length: 38.4e-3, permeability: 1600, height: 10.8e-3 };
const GAP: Common = {
  source: 'mclyman-2004',
  place: 'fringing factor; published gaps of RM8/I (Ferroxcube 2008)',
  unit: 'H',
  mark: 'seen',
  tolerance: 0.04,
};
/** AL nH, gap µm, AL without fringing nH. */
const GAPS = [
  [100, 1100, 70.4],
  [160, 610, 124.9],
  [250, 360, 206.2],
  [315, 270, 269.3],
  [400, 200, 353.4],
];
const gaps = GAPS.flatMap(([al, gap, bare]) => {
  const lg = gap * 1e-6;
  return [
    make(GAP, `RM8/I, ${gap} µm: AL with fringing`, al * 1e-9, () =>
      inductanceFactor(RM8.area, lg, fringingFactor(lg, RM8.area, RM8.height), RM8.length, RM8.permeability),
    ),
    make({ ...GAP, mark: 'computed', tolerance: 1e-3 }, `RM8/I, ${gap} µm: AL without`, bare * 1e-9, () =>
      inductanceFactor(RM8.area, lg, 1, RM8.length, RM8.permeability),
    ),
    make({ ...GAP, unit: 'm', tolerance: 0.06 }, `RM8/I, AL ${al} nH: gap`, lg, () =>
      gapFor(al * 1e-7, 10, RM8.area, RM8.length, RM8.permeability, RM8.height),
    ),
  ];
});

const magnetizing = [
  make(
    { source: 'lm5036', place: 'design section', unit: 'H', mark: 'seen', tolerance: 1e-6 },
    'magnetizing inductance, 4 turns at 4.4 µH',
    70.4e-6,
    () => magnetizingInductance(4.4e-6, 4),
  ),
];

export const CORES: readonly CaseGroup[] = [
  { title: 'Cores: toroids', cases: toroids },
  { title: 'Cores: effective permeability', cases: permeabilities },
  { title: 'Cores: gaps', cases: gaps },
  { title: 'Cores: magnetizing inductance', cases: magnetizing },
];
