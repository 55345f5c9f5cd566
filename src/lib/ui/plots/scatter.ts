import { line } from 'd3-shape';
import { extentOf, frame } from './axes.ts';
import type { Mark, Scene } from './scene.ts';

export interface ScatterPoint {
  x: number;
  y: number;
  label: string;
  /** Ringed: worth a look. */
  flagged: boolean;
}

export interface ScatterOptions {
  width: number;
  height?: number;
  title: string;
  summary: string;
  xLabel: string;
  yLabel: string;
  locale: string;
  points: ScatterPoint[];
  table: Scene['table'];
  xWhole?: boolean;
  xNames?: { at: number; name: string }[];
  /** Horizontal line to compare with; null: none. */
  reference: number | null;
  /** Points of the lower and upper edge of a band, in order of x. */
  band?: { x: number; lower: number; upper: number }[];
  /** A line through the points, in order of x. */
  curve?: { x: number; y: number }[];
  second?: { x: number; y: number }[];
  /** Join the points in order of x. */
  joined?: boolean;
}

const two = (value: number): number => Math.round(value * 100) / 100;

/** Points in a plane. All of them are one path (a dot is a line of no length with round ends), so thousands stay quick. */
export function scatter(options: ScatterOptions): Scene {
  const { width, points } = options;
  const height = options.height ?? Math.round(Math.max(230, Math.min(340, width * 0.56)));
  const band = options.band ?? [];
  const lines = [...(options.curve ?? []), ...(options.second ?? [])];
  const xDomain = extentOf(
    [...points.map((p) => p.x), ...lines.map((p) => p.x), ...(options.xNames ?? []).map((n) => n.at)],
    0.04
  );
  const ys = [...points.map((p) => p.y), ...lines.map((p) => p.y), ...band.flatMap((b) => [b.lower, b.upper])];
  if (options.reference !== null) ys.push(options.reference);
  const axes = frame({
    width,
    height,
    xDomain,
    yDomain: extentOf(ys),
    xLabel: options.xLabel,
    yLabel: options.yLabel,
    locale: options.locale,
    ...(options.xWhole ? { xWhole: true } : {}),
    ...(options.xNames ? { xNames: options.xNames } : {})
  });
  const { x, y } = axes;
  const marks: Mark[] = [];
  if (band.length > 1) {
    const upper = band.map((b) => `${two(x(b.x))},${two(y(b.upper))}`);
    const lower = band.map((b) => `${two(x(b.x))},${two(y(b.lower))}`).reverse();
    marks.push({ kind: 'path', d: `M${[...upper, ...lower].join('L')}Z`, role: 'band' });
  }
  marks.push(...axes.marks);
  if (options.reference !== null)
    marks.push({
      kind: 'line',
      x1: axes.left,
      y1: y(options.reference),
      x2: axes.right,
      y2: y(options.reference),
      role: 'zero'
    });
  const path = line<{ x: number; y: number }>(
    (p) => two(x(p.x)),
    (p) => two(y(p.y))
  );
  if (options.second) marks.push({ kind: 'path', d: path(options.second) ?? '', role: 'curve-second' });
  if (options.curve) marks.push({ kind: 'path', d: path(options.curve) ?? '', role: 'curve' });
  if (options.joined && points.length > 1) marks.push({ kind: 'path', d: path(points) ?? '', role: 'plain-link' });
  if (points.length > 0)
    marks.push({ kind: 'path', d: points.map((p) => `M${two(x(p.x))},${two(y(p.y))}h0`).join(''), role: 'cloud' });
  for (const p of points) if (p.flagged) marks.push({ kind: 'circle', x: x(p.x), y: y(p.y), r: 7, role: 'flag' });
  return {
    width,
    height,
    title: options.title,
    summary: options.summary,
    marks,
    points: points.map((p) => ({ x: x(p.x), y: y(p.y), label: p.label })),
    walk: 'along',
    table: options.table
  };
}
