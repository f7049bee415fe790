/** A page's data filled up to the size that a page is held to. */
import type { PageData } from '../../viz/data.ts';

/** The sweep's own designs, repeated with small shifts until there are `count`, and `points` behind them. */
export function filled(data: PageData, count: number, points: number): PageData {
  const own = data.front.designs;
  const designs = Array.from({ length: count }, (_, i) => {
    const design = own[i % own.length];
    if (design === undefined) throw new Error('the sweep found nothing');
    const shift = (k: number) => 1 + (Math.floor(i / own.length) * (k + 2) * 7) / 1000 / (k + 1);
    return i < own.length
      ? design
      : { ...design, id: `${design.id}x${i}`, objectives: design.objectives.map((value, k) => value * shift(k)) };
  });
  const m = data.front.objectives.length;
  const objectives = new Float64Array(points * m);
  for (let i = 0; i < points; i++) {
    const design = designs[(i * 7919) % count];
    for (let k = 0; k < m; k++)
      objectives[i * m + k] = (design?.objectives[k] ?? 0) * (1 + (((i * (k + 13) * 104729) % 1000) / 1000) ** 2);
  }
  return {
    ...data,
    front: { ...data.front, designs },
    cloud: { families: data.cloud.families, family: new Uint8Array(points), objectives },
  };
}
