/** The front's two files: sorted, complete, and the same numbers in both. */

import Papa from 'papaparse';
import { describe, expect, it } from 'vitest';
import { frontCsv, frontFile } from '../../model/front-file.ts';
import { toEngineering } from '../../model/quantity/index.ts';
import { RAIL_NAMES, shippedProblem } from './shipped.ts';
import { randomFrom, randomGenes } from './support.ts';

/** A header as a person reads it: name, and unit where there is one. */
function split(header: string): { name: string; unit: string } {
  const found = /^(.*?)(?: \[(.*)\])?$/.exec(header);
  return { name: found?.[1] ?? '', unit: found?.[2] ?? '' };
}

describe.each(RAIL_NAMES)('%s', (name) => {
  const problem = shippedProblem(name);
  const next = randomFrom(17);
  const rows = Array.from({ length: 60 }, () => randomGenes(problem, next));
  const file = frontFile(problem, rows);
  const table = Papa.parse<string[]>(frontCsv(file).trimEnd()).data;
  const head = table[0].map(split);

  it('does not depend on the order in which designs come', () => {
    const turned = frontFile(problem, [...rows].reverse());
    expect(frontCsv(turned)).toBe(frontCsv(file));
    expect(JSON.stringify(turned)).toBe(JSON.stringify(file));
    const ids = file.designs.map(({ id }) => id);
    expect(ids).toEqual([...ids].sort());
  });

  it('has one header row, a row a design, id first and worst margin last', () => {
    expect(table.length).toBe(61);
    expect(head[0].name).toBe('id');
    expect(head[head.length - 1].name).toBe('worst margin');
    for (const row of table) expect(row.length).toBe(head.length);
  });

  /** The cells of one column by its name. */
  const column = (wanted: string): { unit: string; cells: string[] } => {
    const at = head.findIndex((one) => one.name === wanted);
    expect(at, wanted).toBeGreaterThanOrEqual(0);
    return { unit: head[at].unit, cells: table.slice(1).map((row) => row[at]) };
  };

  it('names every part of every design, wound ones by core, material and conductors', () => {
    for (const [i, { parts }] of file.designs.entries()) {
      for (const [slot, part] of Object.entries(parts)) expect(column(slot).cells[i], slot).toBe(part);
    }
  });

  it('every gene and objective in the sheet reads back to the double that front.json holds', () => {
    const named = [
      ...file.genes.map((gene) => ({ ...gene, of: (i: number) => file.designs[i].genes[gene.name] })),
      ...file.objectives.map((objective, k) => ({ ...objective, of: (i: number) => file.designs[i].objectives[k] })),
    ];
    for (const { name: wanted, unit, of } of named) {
      const engineering = toEngineering(unit);
      const { cells, unit: shown } = column(wanted);
      expect(shown).toBe(engineering.unit);
      for (const [i, cell] of cells.entries()) {
        const value = of(i);
        if (value === undefined) expect(cell).toBe('');
        else expect(Object.is(readBack(cell, engineering), value), `${wanted} ${cell} ${value}`).toBe(true);
      }
    }
  });

  it('every limit has its margin, and the worst is the smallest of their fractions', () => {
    for (const { name: limit } of file.limits) {
      const { cells } = column(`${limit} margin`);
      for (const [i, cell] of cells.entries()) {
        const margin = file.designs[i].margins[limit];
        expect(cell === '').toBe(margin === undefined);
        if (margin !== undefined) expect(Math.sign(Number(cell))).toBe(Math.sign(margin));
      }
    }
    for (const [i, cell] of column('worst margin').cells.entries()) {
      expect(Number(cell)).toBe(file.designs[i].worstMargin);
    }
  });

  it('front.json keeps the shape that other programs read', () => {
    expect(file.format).toBe('chopfront-front');
    expect(file.version).toBe(1);
    expect(Object.keys(file)).toEqual(
      expect.arrayContaining(['format', 'version', 'rail', 'objectives', 'limits', 'genes', 'designs']),
    );
    for (const design of file.designs) {
      expect(Object.keys(design)).toEqual(
        expect.arrayContaining(['id', 'family', 'genes', 'parts', 'objectives', 'margins', 'worstMargin']),
      );
    }
  });
});

/** SI value of a cell, as a reader of the file would take it: number times the unit's factor, the power of ten taken exactly. */
function readBack(cell: string, { factor, offset }: { factor: number; offset: number }): number {
  const exponent = Math.round(Math.log10(factor));
  const [digits, power = '0'] = cell.toLowerCase().split('e');
  const scaled = Number(`${digits}e${Number(power) + exponent}`);
  return offset === 0 ? scaled : Number(cell) * factor + offset;
}
