/** All parts that a rail may choose from, by kind. */
import type { Bulk } from './bulk.ts';
import type { Ceramic } from './ceramic.ts';
import type { Conductor } from './conductor.ts';
import type { Controller } from './controller.ts';
import type { Core } from './core.ts';
import type { Diode } from './diode.ts';
import type { Inductor } from './inductor.ts';
import type { Material } from './material.ts';
import type { PowerStage } from './power-stage.ts';
import type { Switch } from './switch.ts';

/** Rows of every kind; names are unique over all of them. */
export interface PartsTables {
  readonly switches: readonly Switch[];
  readonly diodes: readonly Diode[];
  readonly inductors: readonly Inductor[];
  readonly ceramics: readonly Ceramic[];
  readonly bulks: readonly Bulk[];
  readonly controllers: readonly Controller[];
  readonly cores: readonly Core[];
  readonly materials: readonly Material[];
  readonly conductors: readonly Conductor[];
  readonly powerStages: readonly PowerStage[];
}

/** A kind of parts table. */
export type PartKind = keyof PartsTables;
