import type { CampaignState } from '../../core/campaign/state.ts';
import type { Block, ReportColumn, ReportPicture, ReportRow } from '../../core/exchange/report/report-document.ts';
import type { NumberWriter } from '../format/number-writer.ts';
import { drawOnPaper } from '../plots/ink.ts';
import type { Scene } from '../plots/scene.ts';
import type { ResultView } from '../results/view.ts';
import type { report as reportTexts } from '../texts/en/report.ts';
import type { ResultWords } from '../texts/result-words.ts';

/** All that a report is made of; its words are handed in, so that it can be made without a screen. */
export interface ReportContext {
  language: string;
  campaign: CampaignState;
  /** One result for each measurand; the primary one first. */
  views: ResultView[];
  words: ResultWords;
  report: typeof reportTexts;
  write: NumberWriter;
  /** Program version. */
  app: string;
  /** RFC 3339 with offset. */
  made: string;
  campaignFile: { name: string; sha256: string; events: number } | null;
}

/** Width at which pictures are drawn for paper: text keeps a readable size when they fill a page of A4 or Letter. */
export const PAPER_WIDTH = 680;

export const picture = (scene: Scene): ReportPicture => ({
  width: scene.width,
  height: scene.height,
  title: scene.title,
  summary: scene.summary,
  elements: scene.marks.map(drawOnPaper)
});

export const figure = (scene: Scene, caption: string): Block => ({ kind: 'figure', picture: picture(scene), caption });
export const heading = (text: string, level: 2 | 3 = 3): Block => ({ kind: 'heading', level, text });
export const paragraph = (text: string, tone: Extract<Block, { kind: 'paragraph' }>['tone'] = 'plain'): Block => ({
  kind: 'paragraph',
  text,
  tone
});
export const column = (head: string): ReportColumn => ({ head, number: false });
export const numbers = (head: string): ReportColumn => ({ head, number: true });
export const row = (...cells: string[]): ReportRow => ({ cells, struck: false });
export const table = (caption: string, columns: ReportColumn[], rows: ReportRow[]): Block => ({
  kind: 'table',
  caption,
  columns,
  rows
});
