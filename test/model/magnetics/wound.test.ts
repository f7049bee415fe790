/** Laws of wound parts, and of the shipped tables of cores, materials and conductors. */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  copperMass,
  coreTemperatureFactor,
  createWinding,
  createWindingAtFrequency,
  dowell,
  fluxOfCurrent,
  gaugeDiameter,
  idleLayerFactor,
  layWinding,
  leakageInductance,
  litzLoss,
  materialConstants,
  materialViolation,
  prepareWinding,
  saturationFlux,
  steinmetz,
  windingLossAt,
  windowFill,
  woundCoreLossAt,
} from '../../../model/magnetics/index.ts';
import { roundArea } from '../../../model/magnetics/wire.ts';
import type { Conductor } from '../../../model/parts/conductor.ts';
import { readTable } from '../../../model/parts/read-table.ts';
import type { RowOf } from '../../../model/parts/schemas.ts';
import type { PartKind } from '../../../model/parts/tables.ts';
import { addSegment, createWaveform } from '../../../model/waveform/index.ts';

function table<K extends PartKind>(kind: K): readonly RowOf<K>[] {
  const file = `${kind}.csv`;
  const outcome = readTable(kind, readFileSync(join(import.meta.dirname, '../../../model/tables', file), 'utf8'), file);
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.findings[0]));
  return outcome.value;
}
const cores = table('cores');
const materials = table('materials');
const conductors = table('conductors');
const solid: Conductor = { name: 'S', kind: 'solid', size: 0.5e-3, strands: 1, outerSize: 0.55e-3, pricePerMass: 20 };

describe('A laid winding', () => {
  const w = createWinding();
  it('of 20 turns of 0.55 mm wire in 6 mm takes two layers of ten', () => {
    layWinding(solid, 20, 1, 6e-3, 1, w);
    expect([w.layers, w.dowellLayers]).toEqual([2, 2]);
    expect(w.build).toBeCloseTo(1.1e-3, 12);
    expect(w.copperArea).toBeCloseTo(roundArea(0.5e-3), 15);
  });
  it('of foil takes a layer a turn, as broad as the window', () => {
    layWinding({ ...solid, kind: 'foil', size: 0.2e-3, outerSize: 0.25e-3 }, 5, 1, 10e-3, 1, w);
    expect([w.layers, w.dowellLayers]).toEqual([5, 5]);
    expect(w.dowellThickness).toBe(0.2e-3);
    expect(w.copperArea).toBeCloseTo(2e-6, 15);
  });
  it('between two halves of the other winding sees half the layers', () => {
    layWinding(solid, 20, 1, 6e-3, 2, w);
    expect(w.dowellLayers).toBe(1);
  });
  it('never packs more copper than there is window', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...conductors),
        fc.integer({ min: 1, max: 60 }),
        fc.constantFrom(...cores),
        (conductor, turns, core) => {
          layWinding(conductor, turns, 1, core.windowBreadth, 1, w);
          const fits = windowFill(w.build, 0, core.windowHeight) <= 1 && conductor.outerSize <= core.windowBreadth;
          if (fits) expect(w.copperArea * turns).toBeLessThan(core.windowBreadth * core.windowHeight);
          expect(w.dowellThickness).toBeLessThanOrEqual(conductor.size);
        },
      ),
    );
  });
  it('of litz loses less at 200 kHz than one wire of the same copper, and near what the strand formula says', () => {
    const depth = 0.1695e-3;
    const litz: Conductor = { ...solid, kind: 'litz', size: 0.1e-3, strands: 100, outerSize: 1.45e-3 };
    const single: Conductor = { ...solid, size: 1e-3, outerSize: 1.05e-3 };
    layWinding(litz, 10, 1, 20e-3, 1, w);
    const stranded = dowell(w.dowellThickness / depth, w.dowellLayers);
    layWinding(single, 10, 1, 20e-3, 1, w);
    expect(stranded).toBeLessThan(dowell(w.dowellThickness / depth, w.dowellLayers));
    // One layer of 10 turns in 20 mm: field of peak current I between 0 and 10·I/20 mm, mean square a third of its top.
    const field = (10 / 20e-3) * Math.sqrt(1 / 3 - 1 / 12);
    const dc = 0.5 * (1 / 100);
    const strands = litzLoss(100, 0.1e-3, 1.45e-3, depth, 1, 1, field) / dc;
    expect(stranded / strands).toBeGreaterThan(0.8);
    expect(stranded / strands).toBeLessThan(1.25);
  });
});

describe('A wound inductor, put together', () => {
  const [core] = cores.filter((row) => row.name === 'PQ26/25');
  const [material] = materials.filter((row) => row.name === 'MZ-B');
  const out = new Float64Array(1);
  it('loses I²·R at dc and more with ripple, more again at a higher frequency', () => {
    const w = createWinding();
    layWinding(solid, 12, 2, core.windowBreadth, 1, w);
    const lossOf = (swing: number, frequency: number) => {
      const at = createWindingAtFrequency();
      prepareWinding(w, core.turnLength, frequency, 353.15, at);
      const current = createWaveform(2);
      addSegment(current, 0.4 / frequency, 10 - swing / 2, 10 + swing / 2);
      addSegment(current, 0.6 / frequency, 10 + swing / 2, 10 - swing / 2);
      windingLossAt(at, current, out);
      return out[0];
    };
    // 12 turns of 56 mm, two wires of 0.19635 mm²: 2.1308e-8·0.672/3.927e-7 = 36.46 mΩ at 80 °C.
    expect(lossOf(0, 1e5)).toBeCloseTo(3.646, 2);
    expect(lossOf(4, 1e5)).toBeGreaterThan(lossOf(0, 1e5));
    expect(lossOf(4, 4e5)).toBeGreaterThan(lossOf(4, 1e5));
  });
  it('loses in its core what Steinmetz says of a triangle near a sine, by volume and temperature', () => {
    const flux = createWaveform(2);
    addSegment(flux, 5e-6, -0.1, 0.1);
    addSegment(flux, 5e-6, 0.1, -0.1);
    woundCoreLossAt(core, material, materialConstants(material), flux, 0.2, 373.15, out);
    const hot = out[0];
    // 320 kW/m³ at 200 mT is 320·0.5^2.55 at 100 mT; a triangle at α 1.4 loses 0.932129 of a sine (table of ratios).
    expect(hot / (320e3 * 0.5 ** 2.55 * 0.932129 * core.coreVolume)).toBeCloseTo(1, 3);
    woundCoreLossAt(core, material, materialConstants(material), flux, 0.2, 298.15, out);
    expect(out[0]).toBeGreaterThan(hot);
  });
});

describe('A transformer', () => {
  it('leaks as turns squared, and a quarter when one winding lies between halves of the other', () => {
    const one = leakageInductance(10, 0.05, 0.02, 3e-3, 2e-4, 1);
    expect(leakageInductance(20, 0.05, 0.02, 3e-3, 2e-4, 1) / one).toBeCloseTo(4, 12);
    expect(leakageInductance(10, 0.05, 0.02, 3e-3, 2e-4, 2) / one).toBeCloseTo(0.25, 12);
  });
  it('heats an idle half by as much as Dowell’s layer term', () => {
    // Three layers, the third idle in the field of two: proximity alone, and none at dc.
    expect(idleLayerFactor(0.01, 2)).toBeLessThan(1e-6);
    expect(idleLayerFactor(1, 2)).toBeCloseTo(4 * idleLayerFactor(1, 1), 12);
  });
});

describe('The shipped materials', () => {
  it('are six or more, of three kinds, and lose what published grades of their kind lose', () => {
    expect(materials.length).toBeGreaterThanOrEqual(6);
    expect(new Set(materials.map((m) => m.kind))).toEqual(new Set(['MnZn', 'NiZn', 'powder']));
    const loss = (name: string, f: number, b: number) => {
      const m = materials.find((row) => row.name === name);
      return m === undefined
        ? Number.NaN
        : steinmetz(m.lossCoefficient, m.frequencyExponent, m.fluxExponent, f, b) / 1e3;
    };
    // Published: 290 to 560 kW/m³ at 100 kHz, 200 mT, 100 °C (N87, N97, 3C90 to 3C96); 68 to 126 at 100 mT; 135 to 174 at 500 kHz, 50 mT.
    for (const name of ['MZ-A', 'MZ-B', 'MZ-C']) {
      expect(loss(name, 1e5, 0.2)).toBeGreaterThan(290);
      expect(loss(name, 1e5, 0.2)).toBeLessThan(560);
    }
    expect(loss('MZ-A', 1e5, 0.1)).toBeGreaterThan(50);
    expect(loss('MZ-A', 1e5, 0.1)).toBeLessThan(126);
    expect(loss('MZ-D', 5e5, 0.05)).toBeGreaterThan(135);
    expect(loss('MZ-D', 5e5, 0.05)).toBeLessThan(174);
    // PC200 data sheet: 180 kW/m³ at 1 MHz, 50 mT would be exceeded by a lower grade; 2 MHz, 30 mT 200.
    expect(loss('MZ-E', 2e6, 0.03)).toBeGreaterThan(150);
    expect(loss('MZ-E', 2e6, 0.03)).toBeLessThan(400);
  });
  it('hold their loss at 100 °C, lose more cold, and saturate earlier hot', () => {
    for (const m of materials) {
      expect(coreTemperatureFactor(m, 373.15)).toBe(1);
      if (m.kind === 'MnZn') expect(coreTemperatureFactor(m, 298.15)).toBeGreaterThan(1);
      expect(saturationFlux(m.saturation25, m.saturation100, 373.15)).toBeLessThan(m.saturation25);
      expect(m.fluxMaximum).toBeLessThan(m.saturation100);
    }
  });
  it('are never extrapolated: outside their range is a violation with its size', () => {
    const [m] = materials;
    expect(materialViolation(m, m.frequencyMaximum, m.fluxMaximum)).toBe(0);
    expect(materialViolation(m, 2 * m.frequencyMaximum, 0.01)).toBeCloseTo(1, 12);
    expect(materialViolation(m, m.frequencyMinimum / 2, 0.01)).toBeCloseTo(1, 12);
    expect(materialViolation(m, 1e5, 1.5 * m.fluxMaximum)).toBeCloseTo(0.5, 12);
  });
});

describe('The shipped cores', () => {
  it('are twelve shapes or more, whose volume is length × area and whose smallest area is not the largest', () => {
    expect(cores.length).toBeGreaterThanOrEqual(12);
    for (const core of cores) {
      expect(core.coreVolume / (core.area * core.pathLength), core.name).toBeCloseTo(1, 2);
      expect(core.minimumArea, core.name).toBeLessThanOrEqual(core.area);
      expect(core.windowBreadth * core.windowHeight, core.name).toBeLessThan(core.length * core.height);
      // The shortest turn goes round a square of the core's area.
      expect(core.turnLength, core.name).toBeGreaterThan(4 * Math.sqrt(core.area) * 0.88);
    }
  });
  it('carry L·I²: the flux of 10 µH at 10 A in ten turns on 100 mm² is 0.1 T', () => {
    expect(fluxOfCurrent(1e-5, 10, 10, 1e-4)).toBeCloseTo(0.1, 12);
  });
});

describe('The shipped conductors', () => {
  it('follow the gauge series, and insulation only adds', () => {
    for (const conductor of conductors) {
      expect(conductor.outerSize).toBeGreaterThan(conductor.size);
      if (conductor.kind === 'litz') {
        expect(conductor.strands * roundArea(conductor.size)).toBeLessThan(roundArea(conductor.outerSize));
      }
      const gauge = /^W(\d+)$/.exec(conductor.name)?.[1];
      if (gauge !== undefined) expect(conductor.size / gaugeDiameter(Number(gauge))).toBeCloseTo(1, 3);
    }
    expect(new Set(conductors.map((c) => c.kind))).toEqual(new Set(['solid', 'foil', 'litz']));
  });
  it('weigh what copper weighs: a metre of 1 mm² is 8.89 g', () =>
    expect(copperMass(1, 1, 1e-6)).toBeCloseTo(8.89e-3, 12));
});
