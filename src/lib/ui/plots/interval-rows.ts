import { scaleLinear } from 'd3-scale';
import { extentOf, tickCount, tickWriter } from './axes.ts';
import { fitText, textWidth, type Mark, type Scene } from './scene.ts';

/** One line of the picture: a name, an estimate with its interval, a second value beside, the letters. */
export interface IntervalRow {
  name: string;
  estimate: number | null;
  lower: number | null;
  upper: number | null;
  /** The plain average beside the adjusted mean, or the second model's value; null: none. */
  plain: number | null;
  letters: string;
  /** Drawn without the accent: not part of the verdict. */
  weak: boolean;
  /** Complete sentence for the read-out. */
  label: string;
}

export interface IntervalOptions {
  width: number;
  title: string;
  summary: string;
  axisLabel: string;
  locale: string;
  rows: IntervalRow[];
  /** Line to compare with: zero for differences, the target for means; null: none. */
  reference: number | null;
  /** Soft band (a margin of equivalence, say); null: none. */
  band: [number, number] | null;
  table: Scene['table'];
  /** Head above the letters; empty: no letters are drawn. */
  letterHead: string;
}

const NARROW = 560;

/** Rails that join the treatments of one letter, so that a shared letter is seen without reading. */
function letterRails(rows: IntervalRow[], yOf: (i: number) => number, left: number, step: number): Mark[] {
  const alphabet = [...new Set(rows.flatMap((row) => [...row.letters]))].sort();
  const marks: Mark[] = [];
  alphabet.forEach((letter, column) => {
    const x = left + column * step;
    const held = rows.flatMap((row, i) => (row.letters.includes(letter) ? [i] : []));
    const first = held[0];
    const last = held.at(-1);
    if (first === undefined || last === undefined) return;
    if (last > first) marks.push({ kind: 'line', x1: x, y1: yOf(first), x2: x, y2: yOf(last), role: 'letter-rail' });
    for (const i of held) {
      marks.push({ kind: 'circle', x, y: yOf(i), r: 8, role: 'plain' });
      marks.push({ kind: 'text', x, y: yOf(i) + 4, text: letter, anchor: 'middle', role: 'letter-text' });
    }
  });
  return marks;
}

/** Intervals one under the other over a common number line. Narrow screens put each name above its interval. */
export function intervalRows(options: IntervalOptions): Scene {
  const { width, rows, locale } = options;
  const narrow = width < NARROW;
  const step = narrow ? 48 : rows.length > 40 ? 22 : rows.length > 14 ? 30 : 38;
  const nameSize = 13.5;
  const widest = Math.max(0, ...rows.map((row) => textWidth(row.name, nameSize)));
  const nameWidth = narrow ? 0 : Math.min(widest + 14, width * 0.34);
  const letterCount = options.letterHead ? new Set(rows.flatMap((row) => [...row.letters])).size : 0;
  const letterStep = letterCount > 8 ? 14 : 20;
  const letterWidth =
    letterCount > 0 ? Math.max(letterCount * letterStep + 12, textWidth(options.letterHead, 12.5)) : 0;
  const left = nameWidth + 8;
  const right = width - letterWidth - 14;
  const top = 34;
  const bottom = top + rows.length * step;
  const height = bottom + 46;
  const values = rows.flatMap((row) => [row.estimate, row.lower, row.upper, row.plain]);
  if (options.reference !== null) values.push(options.reference);
  if (options.band) values.push(...options.band);
  const x = scaleLinear().domain(extentOf(values)).range([left, right]);
  const count = tickCount(right - left, 84);
  const write = tickWriter(x, count, locale);
  const yOf = (i: number): number => top + (i + 0.5) * step + (narrow ? 9 : 0);
  const marks: Mark[] = [];

  if (options.band) {
    const [low, high] = options.band;
    marks.push({
      kind: 'rect',
      x: x(low),
      y: top,
      width: x(high) - x(low),
      height: bottom - top,
      corner: 0,
      role: 'band'
    });
  }
  for (const tick of x.ticks(count)) {
    marks.push({ kind: 'line', x1: x(tick), y1: top, x2: x(tick), y2: bottom, role: 'grid' });
    marks.push({ kind: 'text', x: x(tick), y: bottom + 17, text: write(tick), anchor: 'middle', role: 'tick-text' });
  }
  marks.push({ kind: 'line', x1: left, y1: bottom, x2: right, y2: bottom, role: 'axis' });
  if (options.reference !== null)
    marks.push({
      kind: 'line',
      x1: x(options.reference),
      y1: top - 6,
      x2: x(options.reference),
      y2: bottom,
      role: 'zero'
    });

  const half = Math.min(7, step * 0.22);
  rows.forEach((row, i) => {
    const y = yOf(i);
    if (narrow)
      marks.push({
        kind: 'text',
        x: 2,
        y: y - 15,
        text: fitText(row.name, nameSize, width - letterWidth - 16),
        anchor: 'start',
        role: 'row-text'
      });
    else
      marks.push({
        kind: 'text',
        x: nameWidth - 4,
        y: y + 4.5,
        text: fitText(row.name, nameSize, nameWidth - 10),
        anchor: 'end',
        role: 'row-text'
      });
    if (row.lower !== null && row.upper !== null)
      marks.push({
        kind: 'rect',
        x: x(row.lower),
        y: y - half,
        width: x(row.upper) - x(row.lower),
        height: 2 * half,
        corner: half,
        role: row.weak ? 'interval-weak' : 'interval'
      });
    if (row.plain !== null) {
      if (row.estimate !== null)
        marks.push({ kind: 'line', x1: x(row.plain), y1: y, x2: x(row.estimate), y2: y, role: 'plain-link' });
      marks.push({ kind: 'circle', x: x(row.plain), y, r: 4.5, role: 'plain' });
    }
    if (row.estimate !== null)
      marks.push({
        kind: 'line',
        x1: x(row.estimate),
        y1: y - half - 4,
        x2: x(row.estimate),
        y2: y + half + 4,
        role: row.weak ? 'estimate-weak' : 'estimate'
      });
  });
  if (letterCount > 0) {
    marks.push({
      kind: 'text',
      x: width - letterWidth,
      y: 18,
      text: options.letterHead,
      anchor: 'start',
      role: 'axis-text'
    });
    marks.push(...letterRails(rows, yOf, width - letterWidth + 10, letterStep));
  }
  marks.push({ kind: 'text', x: right, y: bottom + 37, text: options.axisLabel, anchor: 'end', role: 'axis-text' });
  return {
    width,
    height,
    title: options.title,
    summary: options.summary,
    marks,
    points: rows.flatMap((row, i) => {
      const middle = row.lower !== null && row.upper !== null ? (row.lower + row.upper) / 2 : row.plain;
      const place = row.estimate ?? middle;
      return place === null ? [] : [{ x: x(place), y: yOf(i), label: row.label }];
    }),
    walk: 'rows',
    table: options.table
  };
}
