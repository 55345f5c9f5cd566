export type Paper = 'a4' | 'letter';

/** Paper sizes in millimetres. Source: ISO 216 (A4); ANSI/ASME Y14.1 (Letter, 8.5 × 11 in). */
export const papers: Record<Paper, { width: number; height: number }> = {
  a4: { width: 210, height: 297 },
  letter: { width: 215.9, height: 279.4 }
};

/** A sheet of labels: a grid, all lengths in millimetres from the top left corner of the paper. */
export interface LabelSheet {
  id: string;
  paper: Paper;
  columns: number;
  rows: number;
  width: number;
  height: number;
  left: number;
  top: number;
  /** From one label's edge to the next label's edge. */
  gapX: number;
  gapY: number;
}

/** Usual grids of self-adhesive sheets. Common practice, no source: measure your own sheet with the cutting lines. */
export const labelSheets: readonly LabelSheet[] = [
  {
    id: 'a4-21',
    paper: 'a4',
    columns: 3,
    rows: 7,
    width: 63.5,
    height: 38.1,
    left: 7.25,
    top: 15.15,
    gapX: 2.5,
    gapY: 0
  },
  { id: 'a4-24', paper: 'a4', columns: 3, rows: 8, width: 70, height: 37, left: 0, top: 0.5, gapX: 0, gapY: 0 },
  {
    id: 'a4-14',
    paper: 'a4',
    columns: 2,
    rows: 7,
    width: 99.1,
    height: 38.1,
    left: 4.65,
    top: 15.15,
    gapX: 2.5,
    gapY: 0
  },
  {
    id: 'a4-65',
    paper: 'a4',
    columns: 5,
    rows: 13,
    width: 38.1,
    height: 21.2,
    left: 4.75,
    top: 10.7,
    gapX: 2.5,
    gapY: 0
  },
  {
    id: 'letter-30',
    paper: 'letter',
    columns: 3,
    rows: 10,
    width: 66.675,
    height: 25.4,
    left: 4.7625,
    top: 12.7,
    gapX: 3.175,
    gapY: 0
  },
  {
    id: 'letter-20',
    paper: 'letter',
    columns: 2,
    rows: 10,
    width: 101.6,
    height: 25.4,
    left: 3.96875,
    top: 12.7,
    gapX: 4.7625,
    gapY: 0
  },
  {
    id: 'letter-10',
    paper: 'letter',
    columns: 2,
    rows: 5,
    width: 101.6,
    height: 50.8,
    left: 3.96875,
    top: 12.7,
    gapX: 4.7625,
    gapY: 0
  },
  {
    id: 'letter-80',
    paper: 'letter',
    columns: 4,
    rows: 20,
    width: 44.45,
    height: 12.7,
    left: 7.14375,
    top: 12.7,
    gapX: 7.9375,
    gapY: 0
  }
];

/** Returns the labels page by page: null where a label is already gone from the first sheet or none is left. */
export function labelPages<T>(labels: readonly T[], sheet: LabelSheet, skip: number): (T | null)[][] {
  const each = sheet.columns * sheet.rows;
  const gone = Math.max(0, Math.min(each - 1, Math.trunc(skip) || 0));
  const all: (T | null)[] = [...Array.from({ length: gone }, () => null), ...labels];
  const pages: (T | null)[][] = [];
  for (let at = 0; at < all.length; at += each) {
    const page = all.slice(at, at + each);
    pages.push([...page, ...Array.from({ length: each - page.length }, () => null)]);
  }
  return pages;
}
