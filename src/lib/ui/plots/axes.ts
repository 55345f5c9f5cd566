import { scaleLinear, type ScaleLinear } from 'd3-scale';
import type { Mark } from './scene.ts';

/** Writes a number of the axis for people (decimal sign of the locale, a true minus). */
export type Write = (value: number) => string;

export interface Frame {
  x: ScaleLinear<number, number>;
  y: ScaleLinear<number, number>;
  left: number;
  right: number;
  top: number;
  bottom: number;
  marks: Mark[];
}

/** Smallest and largest of the finite values, widened by a share of the span; a flat set gets a span of its own. */
export function extentOf(values: Iterable<number | null>, widen = 0.06): [number, number] {
  let low = Infinity;
  let high = -Infinity;
  for (const value of values) {
    if (value === null || !Number.isFinite(value)) continue;
    if (value < low) low = value;
    if (value > high) high = value;
  }
  if (low > high) return [0, 1];
  const size = Math.max(Math.abs(low), Math.abs(high));
  // Below this spread neither the scale nor its ticks can tell the values apart.
  if (high - low <= size * 1e-12 || size < 1e-200) {
    const half = size < 1e-200 ? 0.5 : size * 0.1;
    return [low - half, high + half];
  }
  const pad = (high - low) * widen;
  return [low - pad, high + pad];
}

/** How many ticks fit into a length. */
export const tickCount = (length: number, each: number): number => Math.max(2, Math.floor(length / each));

/** Writer with as many decimals as the ticks of the scale need. */
export function tickWriter(scale: ScaleLinear<number, number>, count: number, locale: string): Write {
  const ticks = scale.ticks(count);
  const step = ticks.length > 1 ? Math.abs((ticks[1] ?? 0) - (ticks[0] ?? 0)) : 1;
  const decimals = Math.min(12, Math.max(0, -Math.floor(Math.log10(step) + 1e-9)));
  const largest = Math.max(...ticks.map(Math.abs), 0);
  const far = largest >= 1e7 || (step > 0 && step < 1e-6);
  const format = far
    ? new Intl.NumberFormat(locale, { notation: 'scientific', maximumSignificantDigits: 4 })
    : new Intl.NumberFormat(locale, { minimumFractionDigits: decimals, maximumFractionDigits: decimals });
  return (value) => format.format(Object.is(value, -0) ? 0 : value).replace('-', '−');
}

export interface FrameOptions {
  width: number;
  height: number;
  xDomain: [number, number];
  yDomain: [number, number];
  xLabel: string;
  yLabel: string;
  locale: string;
  /** Whole-number ticks only (session numbers). */
  xWhole?: boolean;
  /** Ticks of a categorical axis: where, and what is written. */
  xNames?: { at: number; name: string }[];
}

/** Axes of a plot with a number on each side: left and bottom line, ticks, soft horizontal grid, labels. */
export function frame(options: FrameOptions): Frame {
  const { width, height, locale } = options;
  const top = 26;
  const bottom = height - 42;
  const y = scaleLinear().domain(options.yDomain).range([bottom, top]).nice(4);
  const yCount = tickCount(bottom - top, 52);
  const writeY = tickWriter(y, yCount, locale);
  const yTicks = y.ticks(yCount);
  const left = 14 + Math.max(...yTicks.map((tick) => writeY(tick).length), 1) * 7;
  const right = width - 12;
  const x = scaleLinear().domain(options.xDomain).range([left, right]);
  const marks: Mark[] = [];
  for (const tick of yTicks) {
    marks.push({ kind: 'line', x1: left, y1: y(tick), x2: right, y2: y(tick), role: 'grid' });
    marks.push({ kind: 'text', x: left - 6, y: y(tick) + 4, text: writeY(tick), anchor: 'end', role: 'tick-text' });
  }
  if (options.xNames) {
    for (const { at, name } of options.xNames)
      marks.push({ kind: 'text', x: x(at), y: bottom + 17, text: name, anchor: 'middle', role: 'tick-text' });
  } else {
    const xCount = tickCount(right - left, 76);
    const writeX = tickWriter(x, xCount, locale);
    const ticks = options.xWhole ? x.ticks(xCount).filter(Number.isInteger) : x.ticks(xCount);
    for (const tick of ticks) {
      marks.push({ kind: 'line', x1: x(tick), y1: bottom, x2: x(tick), y2: bottom + 4, role: 'axis' });
      marks.push({
        kind: 'text',
        x: x(tick),
        y: bottom + 17,
        text: options.xWhole ? String(tick) : writeX(tick),
        anchor: 'middle',
        role: 'tick-text'
      });
    }
  }
  marks.push({ kind: 'line', x1: left, y1: bottom, x2: right, y2: bottom, role: 'axis' });
  marks.push({ kind: 'text', x: right, y: bottom + 35, text: options.xLabel, anchor: 'end', role: 'axis-text' });
  marks.push({ kind: 'text', x: 2, y: 13, text: options.yLabel, anchor: 'start', role: 'axis-text' });
  return { x, y, left, right, top, bottom, marks };
}
