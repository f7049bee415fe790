/**
 * Trends that the parts of a kind follow in the trade, as laws between the fields of a row. They are common practice, read
 * off many data sheets, with no single source; a row far off one is worth a second look, not an error.
 */
import { pow } from '../../optimizer/maths/index.ts';
import type { Bulk } from './bulk.ts';
import type { Ceramic } from './ceramic.ts';
import type { Row } from './column.ts';
import type { Diode } from './diode.ts';
import type { Inductor } from './inductor.ts';
import type { RowOf } from './schemas.ts';
import type { Switch } from './switch.ts';
import type { PartKind } from './tables.ts';

/** A law: what a row has, what is usual, and how far off is still usual. */
export interface Trend<T extends Row> {
  readonly name: string;
  /** SI unit of `value` and `usual`. */
  readonly unit: string;
  value(row: T): number;
  /** Usual value for a row of this class; undefined where the law says nothing. */
  usual(row: T): number | undefined;
  /** Least and largest usual value over `usual`. */
  readonly low: number;
  readonly high: number;
}

/** The trends of every kind. */
export const TRENDS: { readonly [K in PartKind]: readonly Trend<RowOf<K>>[] } = {
  switches: switchTrends(),
  diodes: diodeTrends(),
  inductors: inductorTrends(),
  ceramics: ceramicTrends(),
  bulks: bulkTrends(),
  controllers: [],
  cores: [],
  materials: [],
  conductors: [],
  powerStages: [],
};

/** From this rating on silicon is superjunction, V. */
const SUPERJUNCTION = 400;

function switchTrends(): readonly Trend<Switch>[] {
  return [
    {
      name: 'on-resistance × gate charge',
      unit: 'V·s',
      value: (row) => row.onResistance * row.gateCharge,
      usual: ({ technology, voltageRating: v }) => {
        if (technology === 'gan') return 1e-12 * (v < SUPERJUNCTION ? 15 + 0.3 * v : 300 * (v / 650));
        return 1e-12 * (v < SUPERJUNCTION ? 30 * pow(v / 25, 1.4) : 4300 * pow(v / 600, 1.2));
      },
      low: 0.3,
      high: 3,
    },
    {
      name: 'on-resistance × output charge',
      unit: 'V·s',
      value: (row) => row.onResistance * row.outputCharge,
      usual: ({ technology, voltageRating: v }) => {
        if (technology === 'gan') return 150e-12 * pow(v / 100, 1.6);
        return 1e-12 * (v < SUPERJUNCTION ? 30 * pow(v / 25, 1.7) : 30000 * pow(v / 600, 1.3));
      },
      low: 0.3,
      high: 3,
    },
  ];
}

function diodeTrends(): readonly Trend<Diode>[] {
  return [
    {
      name: 'drop at rated current',
      unit: 'V',
      value: (row) => row.forwardDrop + row.slopeResistance * row.currentRating,
      usual: ({ technology, voltageRating }) => (technology === 'junction' ? 1.2 : 0.4 + 0.003 * voltageRating),
      low: 0.6,
      high: 1.7,
    },
  ];
}

function inductorTrends(): readonly Trend<Inductor>[] {
  const box = (row: Inductor): number => row.length * row.width * row.height;
  const surface = ({ length, width, height }: Inductor): number => 2 * (length * width + (length + width) * height);
  return [
    {
      name: 'energy at saturation over volume',
      unit: 'J/m³',
      value: (row) => (0.5 * row.inductance * row.saturationCurrent * row.saturationCurrent) / box(row),
      usual: (row) =>
        row.saturationExponent < 5 ? 1600 * pow(box(row) / 130e-9, 0.12) : 620 * pow(box(row) / 5e-6, 0.05),
      low: 0.3,
      high: 2,
    },
    {
      name: 'inductance over resistance',
      unit: 's',
      value: (row) => row.inductance / row.dcResistance,
      usual: (row) => 150e-6 * pow(box(row) / 130e-9, 2 / 3),
      low: 0.25,
      high: 4,
    },
    {
      name: 'thermal resistance that the rated current implies',
      unit: 'K/W',
      value: (row) =>
        row.ratedRise / (row.ratedCurrent * row.ratedCurrent * row.dcResistance * (1 + 0.00393 * row.ratedRise)),
      usual: (row) => 28 * pow(surface(row) / 162e-6, -0.65),
      low: 0.4,
      high: 2.5,
    },
  ];
}

function ceramicTrends(): readonly Trend<Ceramic>[] {
  return [
    {
      name: 'halving bias over √(volume / capacitance)',
      unit: 'V·√(µF/mm³)',
      value: (row) => row.halvingVoltage * Math.sqrt((row.capacitance * 1e6) / boxOf(row)),
      usual: ({ dielectric }) => (/^X[5-8]/.test(dielectric) ? 16 : undefined),
      low: 0.4,
      high: 2.5,
    },
    {
      name: 'series resistance for the capacitance',
      unit: 'Ω',
      value: (row) => row.seriesResistance,
      usual: (row) => 2.3e-3 * pow(22e-6 / row.capacitance, 0.32),
      low: 0.25,
      high: 4,
    },
  ];
}

/** mm³. */
function boxOf(row: Ceramic): number {
  return row.length * row.width * row.height * 1e9;
}

function bulkTrends(): readonly Trend<Bulk>[] {
  return [
    {
      name: 'stored energy over volume',
      unit: 'J/m³',
      value: (row) =>
        (0.5 * row.capacitance * row.voltageRating * row.voltageRating) / (row.length * row.width * row.height),
      usual: ({ technology, voltageRating: v }) => {
        if (technology === 'polymer') return 110e3 * pow(v / 25, 0.9);
        return technology === 'film' ? 22e3 * pow(v / 63, 0.85) : 75e3 * pow(v / 25, 0.75);
      },
      low: 0.04,
      high: 2.5,
    },
  ];
}
