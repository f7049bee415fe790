/** The mark of a family: as many corners as it has phases, and an inner cut that tells its architecture without colour. */
import { ARCHITECTURES } from '../../model/stages/list.ts';

/** What a family's name says: `buck-synchronous ×2` has two phases. */
export interface Look {
  readonly architecture: string;
  readonly phases: number;
}

/** The order of the list of architectures numbers the cuts. */
const NAMES: readonly string[] = ARCHITECTURES;

/** Architecture and phases of a family; an unknown form counts as one phase. */
export function lookOf(family: string): Look {
  const [architecture = family, phases] = family.split(' ×');
  const count = Number(phases);
  return { architecture, phases: Number.isInteger(count) && count > 0 ? count : 1 };
}

/** Colour class number of a family, 0 … 6: neighbours in phases differ, and so do architectures of equal phases. */
export function colourOf({ architecture, phases }: Look): number {
  return (phases - 1 + 3 * rankOf(architecture)) % 7;
}

function rankOf(architecture: string): number {
  const rank = NAMES.indexOf(architecture);
  return rank < 0 ? NAMES.length - 1 : rank;
}

/** Path of a family's mark about the origin, with about the area of a circle of radius `r`; fill with `evenodd`. */
export function markPath(look: Look, r: number): string {
  return `${outline(look.phases, r)}${cut(rankOf(look.architecture), r)}`;
}

function outline(phases: number, r: number): string {
  if (phases === 1) return circle(r);
  if (phases === 2) return `M0 ${n(-1.42 * r)}Q${n(1.5 * r)} 0 0 ${n(1.42 * r)}Q${n(-1.5 * r)} 0 0 ${n(-1.42 * r)}Z`;
  if (phases <= 4) return polygon(phases, phases === 3 ? 1.5 * r : 1.27 * r, phases === 4 ? Math.PI / 4 : 0);
  return star(phases, 1.45 * r, (phases === 5 ? 0.66 : 0.74) * r);
}

/** Inner shapes: none, hole, bar, dot in a hole, upright bar, two bars, dot; after these, dots in a row, one more each. */
function cut(kind: number, r: number): string {
  if (kind === 1) return circle(0.55 * r);
  if (kind === 2) return box(-0.8 * r, -0.17 * r, 1.6 * r, 0.34 * r);
  if (kind === 3) return `${circle(0.66 * r)}${circle(0.28 * r)}`;
  if (kind === 4) return box(-0.17 * r, -0.8 * r, 0.34 * r, 1.6 * r);
  if (kind === 5) return `${box(-0.6 * r, -0.42 * r, 1.2 * r, 0.26 * r)}${box(-0.6 * r, 0.16 * r, 1.2 * r, 0.26 * r)}`;
  if (kind === 6) return circle(0.28 * r);
  return kind < 7 ? '' : row(kind - 5, r);
}

function row(count: number, r: number): string {
  const pitch = (1.7 * r) / count;
  return Array.from({ length: count }, (_, i) => dot((i - (count - 1) / 2) * pitch, 0.36 * pitch)).join('');
}

function dot(x: number, r: number): string {
  return `M${n(x - r)} 0a${n(r)} ${n(r)} 0 1 1 ${n(2 * r)} 0a${n(r)} ${n(r)} 0 1 1 ${n(-2 * r)} 0Z`;
}

function circle(r: number): string {
  return dot(0, r);
}

function box(x: number, y: number, width: number, height: number): string {
  return `M${n(x)} ${n(y)}h${n(width)}v${n(height)}h${n(-width)}Z`;
}

function polygon(corners: number, radius: number, turn: number): string {
  const points = Array.from({ length: corners }, (_, i) => at(radius, turn + (2 * Math.PI * i) / corners));
  return `M${points.join('L')}Z`;
}

function star(points: number, outer: number, inner: number): string {
  const ring = Array.from({ length: 2 * points }, (_, i) => at(i % 2 === 0 ? outer : inner, (Math.PI * i) / points));
  return `M${ring.join('L')}Z`;
}

function at(radius: number, angle: number): string {
  return `${n(radius * Math.sin(angle))} ${n(-radius * Math.cos(angle))}`;
}

function n(value: number): string {
  return String(Math.round(value * 100) / 100);
}
