/**
 * A plot as plain data: what is drawn, which points can be read out, and the same figures as a table. One description serves
 * the screen, the printed page, the downloaded picture and the report, so that they cannot differ.
 */

/** What a mark stands for; colours and widths follow from it in one place (`ink.ts`). */
export type Role =
  | 'axis'
  | 'grid'
  | 'zero'
  | 'tick-text'
  | 'axis-text'
  | 'row-text'
  | 'value-text'
  | 'letter-text'
  | 'letter-rail'
  | 'band'
  | 'interval'
  | 'interval-weak'
  | 'estimate'
  | 'estimate-weak'
  | 'plain'
  | 'plain-link'
  | 'curve'
  | 'curve-second'
  | 'cloud'
  | 'flag'
  | 'cell-0'
  | 'cell-1'
  | 'cell-2'
  | 'cell-3'
  | 'cell-none'
  | 'cell-text'
  | 'ring'
  | 'beam';

export type Mark =
  | { kind: 'line'; x1: number; y1: number; x2: number; y2: number; role: Role }
  | { kind: 'rect'; x: number; y: number; width: number; height: number; corner: number; role: Role }
  | { kind: 'circle'; x: number; y: number; r: number; role: Role }
  | { kind: 'path'; d: string; role: Role }
  | { kind: 'text'; x: number; y: number; text: string; anchor: 'start' | 'middle' | 'end'; role: Role; turned?: true };

/** A point that can be read out by pointer, touch or keyboard. */
export interface PlotPoint {
  x: number;
  y: number;
  /** What is said and shown, complete: "Paint C: 4.10 µm, 95 % interval 3.40 to 4.80". */
  label: string;
}

/** The text alternative: the figures of the plot as a table. */
export interface PlotTable {
  columns: string[];
  rows: string[][];
}

export interface Scene {
  width: number;
  height: number;
  title: string;
  /** One sentence that says what the picture shows. */
  summary: string;
  marks: Mark[];
  points: PlotPoint[];
  /** How the arrow keys walk the points: down the rows, or along the bottom axis. */
  walk: 'rows' | 'along';
  /** Made only when asked for: a table of thousands of rows is not free. */
  table: () => PlotTable;
}

/** Builds the scene for the width at hand (in CSS pixels). */
export type SceneMaker = (width: number) => Scene;

/** Estimated width of a text in pixels; a scene is made without a screen, so it cannot be measured. */
export const textWidth = (text: string, size: number): number => text.length * size * 0.56;

/** Shortens a text to a width, marking the cut. */
export function fitText(text: string, size: number, width: number): string {
  if (textWidth(text, size) <= width) return text;
  const keep = Math.max(1, Math.floor(width / (size * 0.56)) - 1);
  return `${text.slice(0, keep).trimEnd()}…`;
}
