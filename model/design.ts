/**
 * A design resolved from its genes: the rows behind every choice, and everything that does not depend on the operating
 * point, worked out once. One object is reused for all designs of a search; nothing is allocated.
 */
import { type Catalogue, priceAt } from './catalogue.ts';
import { GENE } from './genes.ts';
import { createInductorAtFrequency } from './magnetics/index.ts';
import type { Bulk } from './parts/bulk.ts';
import type { Ceramic } from './parts/ceramic.ts';
import type { Controller } from './parts/controller.ts';
import type { Diode } from './parts/diode.ts';
import type { Inductor } from './parts/inductor.ts';
import type { Switch } from './parts/switch.ts';
import type { Rail } from './rail/rail.ts';
import { nearestRow } from './snap.ts';
import type { Stage } from './stages/contract.ts';

/** One design. Counts are whole numbers stored as doubles; SI units. */
export class Design {
  stage: Stage;
  phases = 1;
  /** Hz. */
  frequency = 0.5;
  inductor: Inductor;
  /** Zero-bias inductance of the row, H. */
  inductance = 0.5;
  high: Switch;
  highParallel = 1;
  low: Switch;
  lowParallel = 1;
  diode: Diode | undefined;
  controller: Controller;
  outputCeramic: Ceramic;
  outputCeramicCount = 1;
  outputBulk: Bulk | undefined;
  outputBulkCount = 0;
  inputCeramic: Ceramic;
  inputCeramicCount = 1;
  inputBulk: Bulk | undefined;
  inputBulkCount = 0;
  /** Whether the low switch turns off at zero current at light load (the sheet's policy and the controller's ability). */
  emulates = false;
  /** Whether phases are dropped at light load. */
  sheds = false;

  /** Core and winding figures of the inductor at this frequency. */
  readonly inductorAt = createInductorAtFrequency();
  /** Choke to board, K/W. */
  inductorThermalResistance = 0.5;

  constructor(rail: Rail, catalogue: Catalogue, stages: readonly Stage[]) {
    this.stage = stages[0];
    this.inductor = catalogue.inductorSeries[0].rows[0];
    this.high = catalogue.highSwitches[0];
    this.low = catalogue.lowSwitches[0];
    this.diode = catalogue.diodes[0];
    this.controller = catalogue.controllers[0];
    this.outputCeramic = catalogue.outputCeramics[0];
    this.inputCeramic = catalogue.inputCeramics[0];
    this.outputBulk = catalogue.outputBulks[0];
    this.inputBulk = catalogue.inputBulks[0];
    this.emulates = rail.lightLoad !== 'forced-continuous';
  }

  /** Drop of the diode at zero current and junction temperature `temperature` (K), V; 0 without a diode. */
  diodeDrop(temperature: number): number {
    if (this.diode === undefined) return 0;
    const drop = this.diode.forwardDrop + this.diode.dropTempco * (temperature - 298.15);
    return Math.max(drop, 0);
  }
}

/** Reads snapped `genes` into `design`. */
export function resolveDesign(
  design: Design,
  genes: Float64Array,
  rail: Rail,
  catalogue: Catalogue,
  stages: readonly Stage[],
): void {
  design.stage = stages[genes[GENE.architecture]];
  design.phases = genes[GENE.phases];
  design.frequency = genes[GENE.frequency];
  const series = catalogue.inductorSeries[genes[GENE.inductorSeries]];
  design.inductor = series.rows[nearestRow(series, genes[GENE.inductance])];
  design.inductance = design.inductor.inductance;
  design.high = catalogue.highSwitches[genes[GENE.highSwitch]];
  design.highParallel = genes[GENE.highParallel];
  design.low = catalogue.lowSwitches[genes[GENE.lowSwitch]];
  design.lowParallel = genes[GENE.lowParallel];
  design.diode = design.stage.diode ? catalogue.diodes[genes[GENE.diode]] : undefined;
  design.controller = catalogue.controllers[genes[GENE.controller]];
  design.outputCeramic = catalogue.outputCeramics[genes[GENE.outputCeramic]];
  design.outputCeramicCount = genes[GENE.outputCeramicCount];
  design.outputBulkCount = genes[GENE.outputBulkCount];
  design.outputBulk = design.outputBulkCount > 0 ? catalogue.outputBulks[genes[GENE.outputBulk]] : undefined;
  design.inputCeramic = catalogue.inputCeramics[genes[GENE.inputCeramic]];
  design.inputCeramicCount = genes[GENE.inputCeramicCount];
  design.inputBulkCount = genes[GENE.inputBulkCount];
  design.inputBulk = design.inputBulkCount > 0 ? catalogue.inputBulks[genes[GENE.inputBulk]] : undefined;
  const asked = rail.lightLoad !== 'forced-continuous';
  design.emulates = !design.stage.diode && asked && design.controller.diodeEmulation;
  design.sheds = rail.lightLoad === 'phase-shedding' && design.controller.phaseShedding && design.phases > 1;
}

/** Cost of the controller and its drivers for all phases, in the sheet's currency. */
export function controllerCost(design: Design, quantity: number): number {
  return priceAt(design.controller, quantity) * (1 + design.controller.phasePriceShare * (design.phases - 1));
}
