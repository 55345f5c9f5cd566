/**
 * A report as plain data: what is said, in which order, with which figures. One description serves the file that leaves the
 * house and the page that is printed from the screen.
 */

/** An SVG picture as elements with literal colours. */
export interface ReportPicture {
  width: number;
  height: number;
  title: string;
  summary: string;
  elements: { tag: string; attributes: Record<string, string | number>; text: string | null }[];
}

export interface ReportColumn {
  head: string;
  number: boolean;
}

export type Block =
  | { kind: 'heading'; level: 2 | 3; text: string }
  | { kind: 'paragraph'; text: string; tone: 'answer' | 'lead' | 'plain' | 'soft' | 'caution' }
  | { kind: 'list'; items: string[] }
  | { kind: 'facts'; facts: { name: string; value: string }[] }
  | { kind: 'table'; caption: string; columns: ReportColumn[]; rows: ReportRow[] }
  | { kind: 'figure'; picture: ReportPicture; caption: string }
  | { kind: 'page' };

export interface ReportRow {
  cells: string[];
  /** Struck out: a ruined run. */
  struck: boolean;
}

export interface ReportDocument {
  /** BCP 47. */
  language: string;
  title: string;
  subtitle: string;
  /** Mark of invented data; null for a real campaign. */
  mark: string | null;
  blocks: Block[];
  footer: string;
}
