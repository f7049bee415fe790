/** Wound parts put together as the model puts them together: published core loss of published materials on a published core. */
import type { Design } from '../../model/design.ts';
import { HeatBalance } from '../../model/heat-balance.ts';
import { SLOT } from '../../model/ledger.ts';
import {
  createInductorAtFrequency,
  igseConstant,
  prepareInductor,
  stockedCoreLoss,
} from '../../model/magnetics/index.ts';
import type { Conductor } from '../../model/parts/conductor.ts';
import type { Core } from '../../model/parts/core.ts';
import type { Material } from '../../model/parts/material.ts';
import { addOtherLosses } from '../../model/point-losses.ts';
import { PointSolver } from '../../model/point-solver.ts';
import { windingDepth, windTransformer } from '../../model/transformer.ts';
import { WoundChoke, windChoke } from '../../model/wound-choke.ts';
import { type CaseGroup, type Common, make } from './case.ts';
import { solvedDesign } from './ideal-stage.ts';

/** ETD29/16/10 (Ferroxcube 2008, seen): effective figures; the window of its usual bobbin. */
const ETD29: Core = {
  name: 'ETD29',
  shape: 'ETD',
  area: 76e-6,
  minimumArea: 71e-6,
  pathLength: 72e-3,
  coreVolume: 5470e-9,
  windowBreadth: 19.4e-3,
  windowHeight: 4.85e-3,
  turnLength: 53e-3,
  surface: 3e-3,
  ...{ length: 30e-3, width: 30e-3, height: 16e-3, mass: 28e-3, prices: [] },
};
const WIRE: Conductor = { name: 'W', kind: 'solid', size: 0.5e-3, strands: 1, outerSize: 0.55e-3, pricePerMass: 20 };

/** A material of the published triangle parameters, the same at every temperature. */
function materialOf(ki: number, alpha: number, beta: number): Material {
  return {
    name: 'published',
    kind: 'MnZn',
    lossCoefficient: ki / igseConstant(1, alpha, beta),
    frequencyExponent: alpha,
    fluxExponent: beta,
    lossSlope: 0,
    lossCurvature: 0,
    frequencyMinimum: 1e4,
    frequencyMaximum: 1e7,
    fluxMaximum: 0.3,
    saturation25: 0.49,
    saturation100: 0.39,
    permeability: 2000,
    density: 4800,
    pricePerMass: 10,
  };
}

/** Still air at 40 °C. */
const AIR = { airSpeed: 0, ambient: 313.15 };

/** W/m³ of a choke wound to order whose ripple swings its core by 0.2 T at 100 kHz, rising for `duty`. */
function chokeLoss(material: Material, duty: number): number {
  const [turns, inductance] = [12, 50e-6];
  const choke = Object.assign(new WoundChoke(), { turns, inductance });
  windChoke(choke, ETD29, material, WIRE, AIR);
  const at = createInductorAtFrequency();
  prepareInductor(choke, 1e5, 353.15, at);
  const watts = new Float64Array(2);
  stockedCoreLoss(choke, at, (0.2 * turns * ETD29.area) / inductance, duty, watts);
  return (watts[0] ?? Number.NaN) / ETD29.coreVolume;
}

/** W/m³ of a bridge's transformer driven at the whole duty: a flux of 0.2 T peak to peak at 100 kHz without flats. */
function transformerLoss(material: Material): number {
  const example = { frequency: 1e5, input: 48, output: 12, current: 10, ratio: 4, inductance: 1 } as const;
  const { design, state } = solvedDesign({ architecture: 'full-bridge-centre-tap', ...example });
  const choice = { core: ETD29, material, primary: WIRE, secondary: WIRE, primaryTurns: 8, secondaryTurns: 2 };
  const driven = { frequency: 1e5, duty: 0.5, depth: windingDepth(AIR) };
  windTransformer(design.transformer, { ...choice, ...driven, form: 'centre-tap' }, AIR);
  Object.assign(state, { frequency: 2e5, fluxSwing: 0.2, fluxRamp: 0.5, transformerTemperature: 373.15 });
  const bare = { coreCoefficient: 0, coreFrequencyExponent: 1.4, coreSwingExponent: 2.5, dcResistance: 0 };
  const inductor = { ...design.inductor, ...bare, conductorThickness: 1e-6, layers: 1 };
  const inductorAt = createInductorAtFrequency();
  prepareInductor(inductor, 2e5, 353.15, inductorAt);
  const controller = { linearDriveSupply: false, driveVoltage: 5, quiescentCurrent: 0 };
  const whole: Design = Object.assign(design, { inductor, inductorAt, controller, transformerChoice: choice });
  const solver: PointSolver = Object.assign(Object.create(PointSolver.prototype), {
    state,
    heat: new HeatBalance(),
    ledger: new Float64Array(Object.keys(SLOT).length),
  });
  addOtherLosses(solver, whole);
  return (solver.ledger[SLOT['transformer.core']] ?? Number.NaN) / ETD29.coreVolume;
}

const MAGNET: Common = {
  source: 'magnet-2021',
  place: 'fitted parameters at 25 °C; triangle at 100 kHz, 0.2 T peak to peak, on an ETD29',
  unit: 'W/m³',
  mark: 'computed',
  tolerance: 1e-5,
};
/** Material, ki, α, β, and the triangle's loss at D = 0.5 and 0.1. */
const FITS = [
  ['3C90', 0.23732, 1.3932, 2.5481, 95429.8, 127713],
  ['N87', 0.79822, 1.3453, 2.5752, 171242, 219150],
  ['N49', 1.9502, 1.2553, 2.8231, 93583.6, 110841],
] as const;
const losses = FITS.flatMap(([name, ki, alpha, beta, half, tenth]) => [
  make(MAGNET, `choke of ${name}, D 0.5`, half, () => chokeLoss(materialOf(ki, alpha, beta), 0.5)),
  make(MAGNET, `choke of ${name}, D 0.1`, tenth, () => chokeLoss(materialOf(ki, alpha, beta), 0.1)),
  make(MAGNET, `transformer of ${name} at the whole duty`, half, () => transformerLoss(materialOf(ki, alpha, beta))),
]);

export const WOUND_PARTS: readonly CaseGroup[] = [{ title: 'Core loss: parts wound to order', cases: losses }];
