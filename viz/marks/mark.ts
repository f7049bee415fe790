/** The mark of a family: as many corners as it has phases, and an inner cut that tells its architecture without colour. */

/** What a family's name says: `buck-synchronous ×2` has two phases. */
export interface Look {
  readonly architecture: string;
  readonly phases: number;
}

/** Order of the architectures, which numbers the cuts. */
const ORDER = [
  'buck-synchronous',
  'buck-diode',
  'two-switch-forward',
  'half-bridge-centre-tap',
  'half-bridge-current-doubler',
  'full-bridge-centre-tap',
  'full-bridge-current-doubler',
];

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
  const rank = ORDER.indexOf(architecture);
  return rank < 0 ? ORDER.length - 1 : rank;
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

/** Inner shapes: none, hole, small dot in a hole, slit, two dots, cross slit, large hole. */
function cut(kind: number, r: number): string {
  if (kind === 1) return circle(0.55 * r);
  if (kind === 2) return box(-0.8 * r, -0.17 * r, 1.6 * r, 0.34 * r);
  if (kind === 3) return `${circle(0.66 * r)}${circle(0.28 * r)}`;
  if (kind === 4) return box(-0.17 * r, -0.8 * r, 0.34 * r, 1.6 * r);
  if (kind === 5) return `${box(-0.6 * r, -0.42 * r, 1.2 * r, 0.26 * r)}${box(-0.6 * r, 0.16 * r, 1.2 * r, 0.26 * r)}`;
  return kind === 6 ? circle(0.28 * r) : '';
}

function circle(r: number): string {
  return `M${n(-r)} 0a${n(r)} ${n(r)} 0 1 1 ${n(2 * r)} 0a${n(r)} ${n(r)} 0 1 1 ${n(-2 * r)} 0Z`;
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
