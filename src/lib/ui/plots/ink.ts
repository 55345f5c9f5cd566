import type { Mark, Role } from './scene.ts';

/** Drawing attributes of each role, in terms of the colour names of the tokens. */
type Attributes = Record<string, string | number>;

const stroke = (colour: string, width: number, rest: Attributes = {}): Attributes => ({
  fill: 'none',
  stroke: `var(--${colour})`,
  'stroke-width': width,
  ...rest
});
const fill = (colour: string, rest: Attributes = {}): Attributes => ({ fill: `var(--${colour})`, ...rest });
const type = (colour: string, size: number, weight = 400): Attributes =>
  fill(colour, { 'font-size': size, 'font-weight': weight });

export const ink: Record<Role, Attributes> = {
  axis: stroke('rule-strong', 1),
  grid: stroke('rule', 1, { 'stroke-opacity': 0.6 }),
  zero: stroke('ink', 1.25),
  'tick-text': type('ink-soft', 12),
  'axis-text': type('ink-soft', 12.5),
  'row-text': type('ink', 13.5, 500),
  'value-text': type('ink-soft', 12.5),
  'letter-text': type('ink', 12.5, 600),
  'letter-rail': stroke('rule-strong', 2, { 'stroke-linecap': 'round' }),
  band: fill('well'),
  interval: fill('act-wash', { stroke: 'var(--act)', 'stroke-width': 1 }),
  'interval-weak': fill('well', { stroke: 'var(--rule-strong)', 'stroke-width': 1 }),
  estimate: stroke('act', 3.5, { 'stroke-linecap': 'butt' }),
  'estimate-weak': stroke('ink-soft', 3),
  plain: fill('sheet', { stroke: 'var(--ink-soft)', 'stroke-width': 1.5 }),
  'plain-link': stroke('ink-soft', 1, { 'stroke-dasharray': '1.5 3', 'stroke-linecap': 'round' }),
  curve: stroke('act', 2, { 'stroke-linejoin': 'round' }),
  'curve-second': stroke('ink-soft', 1.5, { 'stroke-dasharray': '5 3' }),
  cloud: stroke('act', 5, { 'stroke-linecap': 'round', 'stroke-opacity': 0.62 }),
  flag: stroke('ruin', 2),
  'cell-0': fill('well'),
  'cell-1': fill('act-wash'),
  'cell-2': fill('act', { 'fill-opacity': 0.55 }),
  'cell-3': fill('act'),
  'cell-none': fill('ruin-wash'),
  'cell-text': type('act-ink', 13.5, 600),
  ring: stroke('ink', 2),
  beam: fill('ink')
};

/** Element name, attributes and text of one mark: what any renderer needs. */
export interface Drawn {
  tag: 'line' | 'rect' | 'circle' | 'path' | 'text';
  attributes: Attributes;
  text: string | null;
}

/** Coordinates are rounded to a hundredth of a pixel, which keeps files small and comparisons steady. */
const at = (value: number): number => Math.round(value * 100) / 100;

/** Turns a mark into an SVG element description. */
export function draw(mark: Mark): Drawn {
  const style = ink[mark.role];
  switch (mark.kind) {
    case 'line':
      return {
        tag: 'line',
        attributes: { x1: at(mark.x1), y1: at(mark.y1), x2: at(mark.x2), y2: at(mark.y2), ...style },
        text: null
      };
    case 'rect':
      return {
        tag: 'rect',
        attributes: {
          x: at(mark.x),
          y: at(mark.y),
          width: at(Math.max(0, mark.width)),
          height: at(Math.max(0, mark.height)),
          rx: mark.corner,
          ...style
        },
        text: null
      };
    case 'circle':
      return { tag: 'circle', attributes: { cx: at(mark.x), cy: at(mark.y), r: mark.r, ...style }, text: null };
    case 'path':
      return { tag: 'path', attributes: { d: mark.d, ...style }, text: null };
    case 'text': {
      const place: Attributes = { x: at(mark.x), y: at(mark.y), 'text-anchor': mark.anchor };
      if (mark.turned) place.transform = `rotate(-90 ${at(mark.x)} ${at(mark.y)})`;
      return { tag: 'text', attributes: { ...place, ...style }, text: mark.text };
    }
  }
}

/** The light colours as literals, for files that leave the app. They repeat tokens.css; a test holds the two together. */
export const paper: Record<string, string> = {
  ground: '#f4f2ec',
  sheet: '#ffffff',
  well: '#e9e6dc',
  ink: '#1a2129',
  'ink-soft': '#4a545d',
  rule: '#c9c5b8',
  'rule-strong': '#767b7b',
  act: '#0a5c63',
  'act-wash': '#dcebe9',
  'act-ink': '#ffffff',
  ruin: '#a3271c',
  'ruin-wash': '#f8e0dc'
};

const onPaper = (value: string | number): string =>
  String(value).replace(/var\(--([a-z-]+)\)/g, (_, name: string) => paper[name] ?? '#000000');

/** The same element with literal colours. */
export const drawOnPaper = (mark: Mark): Drawn => {
  const drawn = draw(mark);
  const attributes: Attributes = {};
  for (const [name, value] of Object.entries(drawn.attributes)) attributes[name] = onPaper(value);
  return { ...drawn, attributes };
};
