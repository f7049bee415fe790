/** A design as names and numbers, and back: what files hold, what a person reads, and what a design's id is made of. */
import type { Gene } from '../optimizer/problem.ts';
import type { DesignRecord } from './assessment.ts';
import { GENE, type GeneName, NUMERIC_GENES, STOCKED, WOUND } from './genes.ts';
import { shortHash } from './hash.ts';
import { bad, type Finding, good, type Outcome } from './outcome.ts';
import { shorten } from './quantity/parse.ts';
import type { Architecture } from './stages/list.ts';

/** Slot of the parts record in which each named gene stands. */
const SLOTS: readonly (readonly [GeneName, string])[] = [
  ['highSwitch', 'highSwitch'],
  ['lowSwitch', 'lowSwitch'],
  ['diode', 'diode'],
  ['powerStage', 'powerStage'],
  ['bridgeControl', 'bridgeControl'],
  ['inductorSeries', 'inductor'],
  ['controller', 'controller'],
  ['outputCeramic', 'outputCeramic'],
  ['outputBulk', 'outputBulk'],
  ['inputCeramic', 'inputCeramic'],
  ['inputBulk', 'inputBulk'],
  ['chokeCore', 'chokeCore'],
  ['chokeMaterial', 'chokeMaterial'],
  ['chokeConductor', 'chokeConductor'],
  ['transformerCore', 'transformerCore'],
  ['transformerMaterial', 'transformerMaterial'],
  ['primaryConductor', 'primaryConductor'],
  ['secondaryConductor', 'secondaryConductor'],
];

/** What a record needs to know of the space. */
export interface RecordSpace {
  readonly genes: readonly Gene[];
  readonly architectures: readonly Architecture[];
  /** Whether a gene plays a part in the design of snapped `genes`. */
  active(genes: Float64Array, name: GeneName): boolean;
  /** Name of the inductor row that snapped `genes` stand for. */
  inductorName(genes: Float64Array): string;
  /** Series and inductance (H) of the stocked inductor `name`. */
  inductorPlace(name: string): { readonly series: string; readonly inductance: number } | undefined;
}

/** The record of snapped `genes`: active genes and parts only. */
export function toRecord(space: RecordSpace, genes: Float64Array): DesignRecord {
  const numbers: Record<string, number> = {};
  for (const name of NUMERIC_GENES) if (space.active(genes, name)) numbers[name] = genes[GENE[name]];
  const parts: Record<string, string> = {};
  for (const [name, slot] of SLOTS) {
    if (!space.active(genes, name)) continue;
    parts[slot] =
      slot === 'inductor' ? space.inductorName(genes) : (space.genes[GENE[name]].options?.[genes[GENE[name]]] ?? '');
  }
  return { architecture: space.architectures[genes[GENE.architecture]], genes: numbers, parts };
}

/** The design's id: a letter, then a hash of its active genes and part names alone. */
export function recordId(record: DesignRecord): string {
  const sorted = (entries: Readonly<Record<string, number | string>>): string =>
    Object.keys(entries)
      .sort()
      .map((key) => `${key}=${entries[key]}`)
      .join(';');
  return `d${shortHash(`${record.architecture}|${sorted(record.genes)}|${sorted(record.parts)}`)}`;
}

/** The gene vector of `record`, not yet snapped, or everything in it that this space does not know. */
export function fromRecord(space: RecordSpace, record: DesignRecord, file: string): Outcome<Float64Array> {
  const findings: Finding[] = [];
  const genes = Float64Array.from(space.genes, (gene) => gene.low);
  const refuse = (field: string, found: string, allowed: string): void => {
    findings.push({ file, line: 0, column: 0, field: shorten(field), found: shorten(found), allowed });
  };
  const architecture = space.architectures.indexOf(record.architecture);
  if (architecture < 0) refuse('architecture', record.architecture, space.architectures.join(', '));
  else genes[GENE.architecture] = architecture;
  for (const [name, value] of Object.entries(record.genes)) {
    if ((NUMERIC_GENES as readonly string[]).includes(name)) genes[GENE[name as GeneName]] = value;
    else refuse(`genes.${name}`, String(value), NUMERIC_GENES.join(', '));
  }
  if (record.parts.powerStage !== undefined) genes[GENE.legBuild] = space.genes[GENE.legBuild].high;
  const build = record.parts.chokeCore === undefined ? STOCKED : WOUND;
  genes[GENE.chokeBuild] = Math.max(0, space.genes[GENE.chokeBuild].options?.indexOf(build) ?? 0);
  for (const [slot, part] of Object.entries(record.parts)) readSlot(space, genes, slot, part, refuse);
  outsideRange(space, record, build, refuse);
  if (findings.length === 0) missing(space, record, genes, refuse);
  return findings.length > 0 ? bad(findings) : good(genes);
}

/** Refuses a record that leaves out a part or a number that its design has. */
function missing(
  space: RecordSpace,
  record: DesignRecord,
  genes: Float64Array,
  refuse: (field: string, found: string, allowed: string) => void,
): void {
  for (const [name, slot] of SLOTS) {
    if (space.active(genes, name) && record.parts[slot] === undefined)
      refuse(`parts.${slot}`, 'nothing', 'a part name');
  }
  for (const name of NUMERIC_GENES) {
    // A stocked inductor's row says its inductance.
    if (name === 'inductance' && record.parts.inductor !== undefined) continue;
    if (space.active(genes, name) && record.genes[name] === undefined) refuse(`genes.${name}`, 'nothing', 'a number');
  }
}

function readSlot(
  space: RecordSpace,
  genes: Float64Array,
  slot: string,
  part: string,
  refuse: (field: string, found: string, allowed: string) => void,
): void {
  const entry = SLOTS.find(([, known]) => known === slot);
  if (entry === undefined) {
    refuse(`parts.${slot}`, part, SLOTS.map(([, known]) => known).join(', '));
    return;
  }
  const name = entry[0];
  let option = part;
  if (slot === 'inductor') {
    const place = space.inductorPlace(part);
    option = place?.series ?? '';
    if (place !== undefined) genes[GENE.inductance] = place.inductance;
  }
  const index = space.genes[GENE[name]].options?.indexOf(option) ?? -1;
  if (index < 0) refuse(`parts.${slot}`, part, 'a part of the tables that this rail may use');
  else genes[GENE[name]] = index;
}

function outsideRange(
  space: RecordSpace,
  record: DesignRecord,
  build: string,
  refuse: (field: string, found: string, allowed: string) => void,
): void {
  for (const name of NUMERIC_GENES) {
    const value = record.genes[name];
    if (value === undefined || (name === 'inductance' && build === STOCKED)) continue;
    const gene = space.genes[GENE[name]];
    if (value >= gene.low && value <= gene.high) continue;
    refuse(`genes.${name}`, `${value} ${gene.unit}`.trim(), `${gene.low} to ${gene.high} ${gene.unit}`.trim());
  }
}
