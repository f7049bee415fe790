/** The objectives that the model offers: what each is, and the grid and reference that a rail gives it. */
import type { Objective } from '../optimizer/problem.ts';
import { hasTransformer } from './catalogue.ts';
import type { Evaluator } from './evaluate.ts';
import type { ObjectiveName, Rail } from './rail/rail.ts';

interface Offer {
  readonly unit: string;
  /** Worst value that still counts, from the sheet alone, in `unit`. */
  reference(rail: Rail): number;
  /** Writes the value of the design that `e` holds, in `unit`: a double that a call returns would be boxed. */
  readonly write: ObjectiveWriter;
}

/** Archive cells over the range of an objective. */
const CELLS = 1000;
/** Loss that still counts, as a share of the power delivered at full load. */
const LOSS_SHARE = 0.25;
/** Volume that still counts where the sheet sets none, m³ per watt of full load (0.5 kW/dm³). */
const VOLUME_PER_WATT = 2e-6;
/** Cost that still counts where the sheet sets none, currency per watt and on top. */
const COST_PER_WATT = 0.3;
const COST_BASE = 5;
/** The base where a transformer may be bought. */
const COST_BASE_ISOLATED = 50;
/** Mass that still counts where the sheet sets none, kg/m³ of the volume that counts. */
const DENSITY = 2500;
/** Height over which board area is taken from volume where the sheet sets none, m. */
const USUAL_HEIGHT = 8e-3;

const costBase = (rail: Rail): number =>
  rail.search.architectures.some(hasTransformer) ? COST_BASE_ISOLATED : COST_BASE;
const volumeReference = (rail: Rail): number => rail.limits.volume ?? VOLUME_PER_WATT * fullPower(rail);

const OFFERS: Readonly<Record<ObjectiveName, Offer>> = {
  loss: {
    unit: 'W',
    reference: (rail) => LOSS_SHARE * Math.max(meanPower(rail), 0.1 * fullPower(rail)),
    write: (e, into, k) => {
      into[k] = e.loss;
    },
  },
  inefficiency: {
    unit: '',
    reference: () => LOSS_SHARE,
    write: (e, into, k) => {
      into[k] = e.loss / e.inflow;
    },
  },
  volume: {
    unit: 'm³',
    reference: volumeReference,
    write: (e, into, k) => {
      into[k] = e.assembly.volume;
    },
  },
  cost: {
    unit: 'currency',
    reference: (rail) => rail.limits.cost ?? costBase(rail) + COST_PER_WATT * fullPower(rail),
    write: (e, into, k) => {
      into[k] = e.assembly.cost;
    },
  },
  'board-area': {
    unit: 'm²',
    reference: (rail) => rail.limits.boardArea ?? volumeReference(rail) / (rail.limits.height ?? USUAL_HEIGHT),
    write: (e, into, k) => {
      into[k] = e.assembly.boardArea;
    },
  },
  mass: {
    unit: 'kg',
    reference: (rail) => rail.limits.mass ?? DENSITY * volumeReference(rail),
    write: (e, into, k) => {
      into[k] = e.assembly.mass;
    },
  },
  'full-load-loss': {
    unit: 'W',
    reference: (rail) => LOSS_SHARE * fullPower(rail),
    write: (e, into, k) => {
      into[k] = e.fullLoss;
    },
  },
};

/** The objectives of `rail` in the sheet's order. */
export function objectivesOf(rail: Rail): readonly Objective[] {
  return rail.objectives.map((name) => {
    const reference = OFFERS[name].reference(rail);
    const unit = OFFERS[name].unit === 'currency' ? rail.currency : OFFERS[name].unit;
    return { name, unit, resolution: reference / CELLS, ideal: 0, reference };
  });
}

/** Writes an objective's value to `into[place]`. */
export type ObjectiveWriter = (e: Evaluator, into: Float64Array, place: number) => void;

/** Writers of the objectives' values, in the sheet's order. */
export function objectiveWriters(rail: Rail): readonly ObjectiveWriter[] {
  return rail.objectives.map((name) => OFFERS[name].write);
}

/** W at full load and nominal output. */
function fullPower(rail: Rail): number {
  return rail.output.nominal * rail.output.current;
}

/** W, mean size of the power over the profile. */
function meanPower(rail: Rail): number {
  let sum = 0;
  for (const point of rail.profile) sum += point.share * Math.abs(point.fraction);
  return sum * fullPower(rail);
}
