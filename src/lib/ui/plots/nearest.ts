import type { PlotPoint, Scene } from './scene.ts';

/** Position of the point nearest to a place, or −1 when none lies within `reach` pixels. */
export function nearest(points: readonly PlotPoint[], x: number, y: number, reach: number): number {
  let best = -1;
  let least = reach * reach;
  points.forEach((point, i) => {
    const distance = (point.x - x) ** 2 + (point.y - y) ** 2;
    if (distance <= least) {
      least = distance;
      best = i;
    }
  });
  return best;
}

/** Order in which the arrow keys walk the points. */
export function walkOrder({ points, walk }: Pick<Scene, 'points' | 'walk'>): number[] {
  const [first, second] = walk === 'rows' ? (['y', 'x'] as const) : (['x', 'y'] as const);
  return points
    .map((point, i) => ({ point, i }))
    .sort((a, b) => a.point[first] - b.point[first] || a.point[second] - b.point[second])
    .map(({ i }) => i);
}
