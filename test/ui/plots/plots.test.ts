import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { extentOf } from '#lib/ui/plots/axes.ts';
import { draw, ink, paper } from '#lib/ui/plots/ink.ts';
import { intervalRows, type IntervalRow } from '#lib/ui/plots/interval-rows.ts';
import { nearest, walkOrder } from '#lib/ui/plots/nearest.ts';
import { fileName } from '#lib/ui/plots/save-picture.ts';
import { scatter } from '#lib/ui/plots/scatter.ts';
import { svgText } from '#lib/ui/plots/svg-text.ts';

const row = (name: string, estimate: number, letters = 'a'): IntervalRow => ({
  name,
  estimate,
  lower: estimate - 1,
  upper: estimate + 1,
  plain: estimate + 0.5,
  letters,
  weak: false,
  label: `${name}: ${estimate}`
});

const rows = (width: number, list: IntervalRow[]) =>
  intervalRows({
    width,
    title: 'Invented <title> & more',
    summary: 'Invented figures.',
    axisLabel: 'loss, µm',
    locale: 'en',
    rows: list,
    reference: null,
    band: null,
    letterHead: 'letters',
    table: () => ({ columns: ['name', 'mean'], rows: [] })
  });

const dots = (points: { x: number; y: number }[], width = 600) =>
  scatter({
    width,
    title: 'dots',
    summary: 's',
    xLabel: 'x',
    yLabel: 'y',
    locale: 'en',
    points: points.map((p) => ({ ...p, label: '', flagged: false })),
    reference: 0,
    table: () => ({ columns: [], rows: [] })
  });

describe('intervalRows(options)', () => {
  test('places a larger estimate further right, and the interval around its estimate', () => {
    const scene = rows(800, [row('A', 4), row('B', 6)]);
    const [a, b] = scene.points;
    expect(b!.x).toBeGreaterThan(a!.x);
    const bars = scene.marks.filter((m) => m.kind === 'rect' && m.role === 'interval');
    expect(bars).toHaveLength(2);
    const bar = bars[0]!;
    if (bar.kind !== 'rect') throw new Error('a bar is a rectangle');
    expect(bar.x + bar.width / 2).toBeCloseTo(a!.x, 6);
  });

  test('keeps every mark inside the picture at phone and desk widths', () => {
    for (const width of [280, 390, 820, 1200]) {
      const scene = rows(width, [row('A paint with a very long name indeed, number 1', 4, 'ab'), row('B', 6, 'b')]);
      for (const mark of scene.marks) {
        if (mark.kind === 'line') expect(Math.max(mark.x1, mark.x2)).toBeLessThanOrEqual(width);
        if (mark.kind === 'rect') expect(mark.x + mark.width).toBeLessThanOrEqual(width);
        if (mark.kind !== 'path') expect('y' in mark ? mark.y : 0).toBeLessThanOrEqual(scene.height);
      }
    }
  });

  test('joins treatments that share a letter by one rail', () => {
    const rails = (list: IntervalRow[]) => rows(800, list).marks.filter((m) => m.role === 'letter-rail');
    expect(rails([row('A', 1, 'a'), row('B', 2, 'ab'), row('C', 3, 'b')])).toHaveLength(2);
    expect(rails([row('A', 1, 'a'), row('B', 2, 'b')])).toHaveLength(0);
  });
});

describe('scatter(options)', () => {
  test('draws 8,000 points as one path', () => {
    const scene = dots(Array.from({ length: 8000 }, (_, i) => ({ x: i, y: Math.sin(i) })));
    expect(scene.marks.filter((m) => m.role === 'cloud')).toHaveLength(1);
    expect(scene.points).toHaveLength(8000);
  });

  test('keeps every point inside the frame whatever the scale', () => {
    const number = fc.double({ min: -1e12, max: 1e12, noNaN: true });
    fc.assert(
      fc.property(fc.array(fc.record({ x: number, y: number }), { minLength: 1, maxLength: 30 }), (points) => {
        const scene = dots(points);
        for (const p of scene.points) {
          expect(p.x).toBeGreaterThanOrEqual(0);
          expect(p.x).toBeLessThanOrEqual(600);
          expect(p.y).toBeGreaterThanOrEqual(0);
          expect(p.y).toBeLessThanOrEqual(scene.height);
        }
      })
    );
  });
});

describe('extentOf(values)', () => {
  test('gives a flat set a span of its own and an empty one the unit interval', () => {
    expect(extentOf([])).toEqual([0, 1]);
    const [low, high] = extentOf([5, 5]);
    expect(low).toBeLessThan(5);
    expect(high).toBeGreaterThan(5);
    expect(extentOf([0, 0])).toEqual([-0.5, 0.5]);
  });
});

describe('nearest(points, x, y, reach)', () => {
  test('finds the closest point in reach, else none', () => {
    const points = [
      { x: 0, y: 0, label: '' },
      { x: 10, y: 0, label: '' }
    ];
    expect(nearest(points, 7, 1, 20)).toBe(1);
    expect(nearest(points, 100, 100, 20)).toBe(-1);
  });
});

describe('walkOrder(scene)', () => {
  test('visits each point once, down the rows or along the axis', () => {
    const points = [
      { x: 9, y: 1, label: '' },
      { x: 1, y: 5, label: '' },
      { x: 4, y: 3, label: '' }
    ];
    expect(walkOrder({ points, walk: 'rows' })).toEqual([0, 2, 1]);
    expect(walkOrder({ points, walk: 'along' })).toEqual([1, 2, 0]);
  });
});

describe('svgText(scene)', () => {
  const text = svgText(rows(800, [row('<script>alert(1)</script> & "B"', 4)]), 'p');

  test('escapes every text', () => {
    expect(text).not.toContain('<script');
    expect(text).toContain('&#60;title&#62;');
  });

  test('holds no colour variable and no outside reference but the SVG namespace', () => {
    expect(text).not.toContain('var(');
    expect(text.replaceAll('http://www.w3.org/2000/svg', '')).not.toMatch(/https?:|url\(|href/);
  });
});

describe('ink and paper', () => {
  test('paper repeats the light side of tokens.css', () => {
    const tokens = readFileSync('src/lib/ui/tokens.css', 'utf8');
    for (const [name, colour] of Object.entries(paper)) {
      expect(tokens).toMatch(new RegExp(`--${name}:\\s*light-dark\\(${colour},`));
    }
  });

  test('every colour of a role is on paper as well', () => {
    for (const style of Object.values(ink))
      for (const value of Object.values(style)) {
        const name = /var\(--([a-z-]+)\)/.exec(String(value))?.[1];
        if (name !== undefined) expect(paper).toHaveProperty(name);
      }
    expect(draw({ kind: 'circle', x: 1.23456, y: 2, r: 3, role: 'plain' }).attributes.cx).toBe(1.23);
  });
});

describe('fileName(title, extension)', () => {
  test('keeps letters of any script and is never empty', () => {
    expect(fileName('Loss, µm: größer/kleiner?', 'svg')).toBe('Loss-µm-größer-kleiner.svg');
    expect(fileName('///', 'png')).toBe('picture.png');
  });
});
